import type { ChartConfiguration } from 'chart.js'
import { linearAxis, logAxis } from './axis.js'
import { frameOptions, paperPainter } from './frame.js'
import { spreadApart } from './labels.js'
import { type Plane, painter } from './painter.js'
import { type Pen, strokeSegment } from './pen.js'
import { axisTitle, type Quantity, quantityText } from './quantity.js'
import { lineSeries } from './series.js'
import { fontOf, seriesStyle, type Theme } from './theme.js'

export interface SearchProgressData {
  readonly title: string
  readonly notes?: readonly string[]
  readonly objective: Quantity
  /** Each time the best objective improved, and the last evaluation; ascending. */
  readonly evaluations: readonly number[]
  readonly best: readonly number[]
  /** Objective of the design the search began with. */
  readonly start: number
  /** The distinct designs found, best first. */
  readonly families: readonly { readonly label: string; readonly objective: number }[]
}

/** A range wider than this is shown in decades. */
const LOG_RATIO = 6
const FAMILY_MARGIN_PX = 155

/** Best objective so far against evaluations; the families found as ticks on the right. */
export function searchProgress(data: SearchProgressData, theme: Theme): ChartConfiguration {
  const { objective, evaluations, best } = data
  const shown = (value: number): number => objective.factor * value
  const values = [data.start, ...best, ...data.families.map((f) => f.objective)].map(shown)
  const [low, high] = [Math.min(...values), Math.max(...values)]
  const inDecades = low > 0 && high / low > LOG_RATIO
  const margin = (high - low || Math.abs(high) || 1) * 0.08
  const text = { title: `best ${axisTitle(objective)}` }
  const last = evaluations[evaluations.length - 1]
  const curve = lineSeries(theme, 'best so far', evaluations, best.map(shown), seriesStyle(theme, 0))
  return {
    type: 'scatter',
    data: {
      datasets: [
        { ...curve, stepped: 'before' },
        {
          ...lineSeries(
            theme,
            'design at the start',
            [0, last],
            [shown(data.start), shown(data.start)],
            seriesStyle(theme, 1),
          ),
          borderColor: theme.muted,
          borderWidth: 1.5,
        },
      ],
    },
    options: {
      ...frameOptions(
        theme,
        {
          title: data.title,
          notes: data.notes,
          hover: ({ parsed }) =>
            `${parsed.x} evaluations: ${quantityText({ ...objective, factor: 1 }, parsed.y ?? 0, 5)}`,
        },
        data.families.length > 0 ? FAMILY_MARGIN_PX : 0,
      ),
      scales: {
        x: linearAxis(theme, { title: 'evaluations of the objective', min: 0, max: last }),
        y: inDecades
          ? logAxis(theme, { ...text, min: low / 1.3, max: high * 1.3 })
          : linearAxis(theme, { ...text, suggestedMin: low - margin, suggestedMax: high + margin }),
      },
    },
    plugins: [
      paperPainter(theme),
      painter('families', 'afterDatasetsDraw', (pen, plane) => paintFamilies(pen, plane, data, theme)),
    ],
  }
}

function paintFamilies(pen: Pen, { area, at }: Plane, data: SearchProgressData, theme: Theme): void {
  const ticks = data.families
    .map((family) => ({ ...family, y: at('y', data.objective.factor * family.objective) }))
    .sort((a, b) => a.y - b.y)
  const spread = spreadApart(
    ticks.map((tick) => tick.y),
    theme.smallSize * 1.35,
  )
  // A crowd about the foot of the plot would run into the numbers below the axis.
  const lift = Math.max(0, (spread.at(-1) ?? 0) - area.bottom)
  pen.font = fontOf(theme, theme.smallSize)
  pen.textAlign = 'left'
  pen.textBaseline = 'middle'
  ticks.forEach((tick, i) => {
    const textY = spread[i] - lift
    strokeSegment(pen, [area.right - 8, tick.y], [area.right + 6, tick.y], { color: theme.series[0].color, width: 2 })
    strokeSegment(pen, [area.right + 6, tick.y], [area.right + 18, textY], { color: theme.faint })
    pen.fillStyle = theme.ink
    pen.fillText(`${tick.label}: ${quantityText(data.objective, tick.objective, 4)}`, area.right + 21, textY)
  })
}
