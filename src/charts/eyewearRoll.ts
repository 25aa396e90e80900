import type { ChartConfiguration } from 'chart.js'
import { linearAxis } from './axis.js'
import { frameOptions, paperPainter } from './frame.js'
import { painter } from './painter.js'
import { panelAxes } from './panels.js'
import { DEGREES, numberText, type Quantity, quantityText } from './quantity.js'
import { xyzToHex } from './screenColor.js'
import { lineSeries } from './series.js'
import { fontOf, seriesStyle, type Theme } from './theme.js'

export interface EyewearRollData {
  readonly title: string
  readonly notes?: readonly string[]
  /** Roll of the lens about the line of sight, ascending. */
  readonly rollRad: readonly number[]
  /** What is left of the screen's light: luminance in cd/m², or a share. */
  readonly brightness: Quantity
  readonly screens: readonly {
    readonly name: string
    /** Through the lens, in stored units of `brightness`. */
    readonly through: readonly number[]
    /** CIE 1976 u′v′ distance from the color seen without the lens; NaN where there is no light to have one. */
    readonly colorShift: readonly number[]
    /** XYZ of the screen's white through the lens, Y = 1 for the brightest roll: the swatches under the axis. */
    readonly xyz?: readonly (readonly [number, number, number])[]
  }[]
}

const STRIP_PX = 12

/** What polarized eyewear leaves of the lit screen: brightness and color against the lens's roll. */
export function eyewearRoll(data: EyewearRollData, theme: Theme): ChartConfiguration {
  const { screens, brightness } = data
  const rollDeg = data.rollRad.map((roll) => DEGREES.factor * roll)
  const strips = screens.flatMap(({ name, xyz }) => (xyz ? [{ name, xyz }] : []))
  return {
    type: 'scatter',
    data: {
      datasets: screens.flatMap(({ name, through, colorShift }, i) => [
        lineSeries(
          theme,
          name,
          rollDeg,
          through.map((value) => brightness.factor * value),
          seriesStyle(theme, i),
          'brightness',
        ),
        lineSeries(theme, '', rollDeg, colorShift, seriesStyle(theme, i), 'shift'),
      ]),
    },
    options: {
      ...frameOptions(theme, {
        title: data.title,
        notes: [...screens.map(worstText(data)), ...(data.notes ?? [])],
        hover: ({ parsed, dataset }) =>
          `${Number((parsed.x ?? 0).toFixed(1))}°: ${numberText(parsed.y ?? 0)} ${dataset.label ? brightness.unit : 'Δu′v′'}`,
      }),
      scales: {
        ...panelAxes(theme, [
          { id: 'brightness', quantity: brightness, min: 0 },
          { id: 'shift', quantity: { label: 'color shift Δu′v′', unit: '', factor: 1 }, min: 0 },
        ]),
        x: linearAxis(theme, {
          title: 'roll of the lens (°)',
          min: rollDeg[0],
          max: rollDeg[rollDeg.length - 1],
          step: 15,
          tickGapPx: strips.length > 0 ? strips.length * (STRIP_PX + 2) + 10 : undefined,
        }),
      },
    },
    plugins: [
      paperPainter(theme),
      painter('swatches', 'beforeDatasetsDraw', (pen, { area, at }) => {
        pen.font = fontOf(theme, theme.smallSize - 2)
        pen.textAlign = 'right'
        pen.textBaseline = 'middle'
        strips.forEach(({ name, xyz }, row) => {
          const top = area.bottom + 8 + row * (STRIP_PX + 2)
          pen.fillStyle = theme.muted
          pen.fillText(name, area.left - 6, top + STRIP_PX / 2)
          for (let i = 0; i + 1 < rollDeg.length; i++) {
            const left = at('x', rollDeg[i])
            pen.fillStyle = xyzToHex(xyz[i])
            pen.fillRect(left, top, Math.min(area.right, at('x', rollDeg[i + 1]) + 0.5) - left, STRIP_PX)
          }
          pen.strokeStyle = theme.faint
          pen.lineWidth = 0.5
          pen.strokeRect(area.left, top, area.width, STRIP_PX)
        })
      }),
    ],
  }
}

function worstText({ rollRad, brightness }: EyewearRollData) {
  return ({ name, through }: EyewearRollData['screens'][number]): string => {
    const darkest = through.indexOf(Math.min(...through))
    return `${name}: darkest ${quantityText(brightness, through[darkest])} at a roll of ${quantityText(DEGREES, rollRad[darkest])}`
  }
}
