import type { ChartOptions } from 'chart.js'
import { stepText } from './quantity.js'
import type { Theme } from './theme.js'

export interface AxisText {
  /** With its unit; empty for an axis that says itself. */
  readonly title: string | readonly string[]
  readonly min?: number
  readonly max?: number
  readonly suggestedMin?: number
  readonly suggestedMax?: number
  readonly step?: number
  /** Lines across the plot; default true. */
  readonly grid?: boolean
  /** Room between the axis and its numbers, px. */
  readonly tickGapPx?: number
  /** Share of the height among panels that stand on one another. */
  readonly panelWeight?: number
}

const TITLE_GAP_PX = 4

export type Axis = NonNullable<ChartOptions['scales']>[string]

/** Look of any numeric axis. */
function axisLook(theme: Theme, text: AxisText) {
  const { family, textSize } = theme
  return {
    title: {
      display: text.title !== '',
      text: typeof text.title === 'string' ? text.title : [...text.title],
      color: theme.ink,
      font: { family, size: textSize },
      // Chart.js counts the room between axis and numbers twice.
      padding: { top: TITLE_GAP_PX - (text.tickGapPx ?? 0), bottom: TITLE_GAP_PX },
    },
    grid: {
      display: text.grid ?? true,
      color: theme.grid,
      tickColor: theme.faint,
      tickLength: text.tickGapPx ? 0 : 6,
    },
    border: { color: theme.faint },
    ...(text.panelWeight ? { axis: 'y' as const, stack: 'panels', stackWeight: text.panelWeight } : {}),
  }
}

export function linearAxis(theme: Theme, text: AxisText): Axis {
  return {
    type: 'linear',
    ...axisLook(theme, text),
    ...(text.min === undefined ? {} : { min: text.min }),
    ...(text.max === undefined ? {} : { max: text.max }),
    ...(text.suggestedMin === undefined ? {} : { suggestedMin: text.suggestedMin }),
    ...(text.suggestedMax === undefined ? {} : { suggestedMax: text.suggestedMax }),
    ticks: {
      color: theme.ink,
      font: { family: theme.family, size: theme.textSize },
      padding: text.tickGapPx ?? 3,
      maxRotation: 0,
      autoSkipPadding: 8,
      ...(text.step === undefined ? {} : { stepSize: text.step }),
      includeBounds: false,
      callback: (value: number | string, _index: number, ticks: readonly { value: number }[]) =>
        stepText(Number(value), ticks.length > 1 ? ticks[1].value - ticks[0].value : 1),
    },
  }
}

/** Numbers at 1, 2 and 5 of each decade. */
export function logAxis(theme: Theme, text: AxisText): Axis {
  return {
    type: 'logarithmic',
    ...axisLook(theme, text),
    ...(text.min === undefined ? {} : { min: text.min }),
    ...(text.max === undefined ? {} : { max: text.max }),
    ticks: {
      color: theme.ink,
      font: { family: theme.family, size: theme.textSize },
      padding: 3,
      maxRotation: 0,
      autoSkip: false,
      callback: (value: number | string) => {
        const leading = Number(value) / 10 ** Math.floor(Math.log10(Number(value)) + 1e-9)
        return [1, 2, 5].some((d) => Math.abs(leading - d) < 1e-6) ? String(Number(Number(value).toPrecision(6))) : ''
      },
    },
  }
}

/** An axis that only places things and is not drawn. */
export function hiddenAxis(min: number, max: number): Axis {
  return { type: 'linear', display: false, min, max }
}

/** Names along the side of horizontal bars, first on top. */
export function nameAxis(theme: Theme): Axis {
  return {
    type: 'category',
    grid: { display: false },
    border: { color: theme.faint },
    ticks: { color: theme.ink, font: { family: theme.family, size: theme.textSize }, autoSkip: false },
  }
}

/** Empty room between two panels that stand on one another. */
export function panelGap(weight: number): Axis {
  return {
    type: 'linear',
    position: 'left',
    stack: 'panels',
    stackWeight: weight,
    ticks: { display: false },
    grid: { display: false },
    border: { display: false },
  }
}
