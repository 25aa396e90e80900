import type { ChartConfiguration } from 'chart.js'
import { linearAxis, nameAxis } from './axis.js'
import { barSeries } from './bars.js'
import { frameOptions, paperPainter } from './frame.js'
import { type Plane, painter } from './painter.js'
import { type Pen, strokeSegment } from './pen.js'
import { PERCENT, quantityText } from './quantity.js'
import type { Theme } from './theme.js'

/** A share of the variance, a fraction, with its 95 % interval. */
export interface Share {
  readonly value: number
  readonly low: number
  readonly high: number
}

export interface SensitivityBarsData {
  readonly title: string
  readonly notes?: readonly string[]
  /** Drawn in this order from the top. */
  readonly parameters: readonly { readonly name: string; readonly firstOrder: Share; readonly total: Share }[]
}

/** Which spread matters: first-order and total shares of the variance, with their uncertainty. */
export function sensitivityBars(data: SensitivityBarsData, theme: Theme): ChartConfiguration {
  const { parameters } = data
  const kinds = ['firstOrder', 'total'] as const
  const highest = Math.max(...parameters.flatMap((p) => kinds.map((kind) => 100 * p[kind].high)))
  const lowest = Math.min(0, ...parameters.flatMap((p) => kinds.map((kind) => 100 * p[kind].low)))
  const values = (kind: (typeof kinds)[number]): number[] => parameters.map((p) => 100 * p[kind].value)
  return {
    type: 'bar',
    data: {
      labels: parameters.map((p) => p.name),
      datasets: [
        barSeries(theme, 'alone (first order)', values('firstOrder'), 'solid'),
        barSeries(theme, 'with all its interactions (total)', values('total'), 'hollow'),
      ],
    },
    options: {
      ...frameOptions(theme, {
        title: data.title,
        notes: data.notes,
        hover: ({ datasetIndex, dataIndex }) => {
          const { value, low, high } = parameters[dataIndex][kinds[datasetIndex]]
          return `${quantityText(PERCENT, value)} (${quantityText(PERCENT, low)} to ${quantityText(PERCENT, high)})`
        },
      }),
      indexAxis: 'y',
      scales: {
        x: linearAxis(theme, {
          title: 'share of the variance (%), whiskers: 95 % interval',
          min: lowest,
          max: 1.04 * highest || 100,
        }),
        y: nameAxis(theme),
      },
    },
    plugins: [
      paperPainter(theme),
      painter('intervals', 'afterDatasetsDraw', (pen, plane) => {
        kinds.forEach((kind, i) => {
          paintIntervals(
            pen,
            plane,
            i,
            parameters.map((p) => p[kind]),
            theme,
          )
        })
      }),
    ],
  }
}

function paintIntervals(
  pen: Pen,
  { at, ends }: Plane,
  datasetIndex: number,
  shares: readonly Share[],
  theme: Theme,
): void {
  ends(datasetIndex).forEach(({ y }, i) => {
    const [low, high] = [at('x', 100 * shares[i].low), at('x', 100 * shares[i].high)]
    for (const style of [
      { color: theme.paper, width: 4 },
      { color: theme.ink, width: 1.5 },
    ]) {
      strokeSegment(pen, [low, y], [high, y], style)
      for (const end of [low, high]) strokeSegment(pen, [end, y - 4], [end, y + 4], style)
    }
  })
}
