import type { ChartConfiguration } from 'chart.js'
import { linearAxis } from './axis.js'
import { frameOptions, paperPainter } from './frame.js'
import { LabelPlacer } from './labels.js'
import { type Plane, painter } from './painter.js'
import { type Pen, strokeSegment } from './pen.js'
import { axisTitle, givenText, type Quantity, quantityText } from './quantity.js'
import type { Theme } from './theme.js'

export interface HistogramData {
  readonly title: string
  readonly notes?: readonly string[]
  readonly metric: Quantity
  /** Edges of the bins, evenly spaced, one more than counts. */
  readonly edges: readonly number[]
  readonly counts: readonly number[]
  readonly percentiles: { readonly p05: number; readonly p50: number; readonly p95: number }
  /** A sample passes up to `max`, or from `min`. */
  readonly limit?: { readonly max: number } | { readonly min: number }
}

/** Share of samples per bin, with the limit and three percentiles; what misses the limit is dark. */
export function histogram(data: HistogramData, theme: Theme): ChartConfiguration {
  const { metric, edges, counts } = data
  const total = counts.reduce((sum, count) => sum + count, 0)
  const shares = counts.map((count) => (100 * count) / total)
  const centers = counts.map((_, i) => (metric.factor * (edges[i] + edges[i + 1])) / 2)
  const misses = counts.map((_, i) => isMissed((edges[i] + edges[i + 1]) / 2, data.limit))
  const bars = (label: string, color: string, wanted: boolean) => ({
    type: 'bar' as const,
    label,
    data: centers.map((x, i) => ({ x, y: misses[i] === wanted ? shares[i] : 0 })),
    grouped: false,
    barPercentage: 1,
    categoryPercentage: 1,
    backgroundColor: color,
    borderColor: theme.paper,
    borderWidth: { left: 1, right: 1, top: 0, bottom: 0 },
  })
  const ends = [edges[0], edges[edges.length - 1], ...(data.limit ? [limitValue(data.limit)] : [])]
  return {
    type: 'bar',
    data: {
      datasets: [
        bars(data.limit ? 'meets the limit' : 'samples', theme.series[0].color, false),
        ...(data.limit ? [bars('misses the limit', theme.limit, true)] : []),
      ],
    },
    options: {
      ...frameOptions(theme, {
        title: data.title,
        notes: data.notes,
        hover: ({ dataIndex }) =>
          `${quantityText(metric, edges[dataIndex], 4)} to ${quantityText(metric, edges[dataIndex + 1], 4)}: ${counts[dataIndex]} of ${total}`,
      }),
      scales: {
        x: {
          ...linearAxis(theme, {
            title: axisTitle(metric),
            min: metric.factor * Math.min(...ends),
            max: metric.factor * Math.max(...ends),
            grid: false,
          }),
          offset: false,
        },
        // Head room for the percentiles' texts.
        y: linearAxis(theme, { title: 'share of samples (%)', min: 0, max: 1.3 * Math.max(...shares) }),
      },
    },
    plugins: [
      paperPainter(theme),
      painter('marks', 'afterDatasetsDraw', (pen, plane) => paintMarks(pen, plane, data, theme)),
    ],
  }
}

function limitValue(limit: NonNullable<HistogramData['limit']>): number {
  return 'max' in limit ? limit.max : limit.min
}

function isMissed(value: number, limit: HistogramData['limit']): boolean {
  if (limit === undefined) return false
  return 'max' in limit ? value > limit.max : value < limit.min
}

function paintMarks(pen: Pen, { area, at }: Plane, { metric, percentiles, limit }: HistogramData, theme: Theme): void {
  const placer = new LabelPlacer(pen, theme, area)
  const marks = [
    ...(['p05', 'p50', 'p95'] as const).map((name) => ({
      name,
      value: percentiles[name],
      text: quantityText(metric, percentiles[name]),
      color: theme.ink,
      dash: [4, 3],
    })),
    ...(limit
      ? [
          {
            name: 'limit',
            value: limitValue(limit),
            text: givenText(metric, limitValue(limit)),
            color: theme.limit,
            dash: [],
          },
        ]
      : []),
  ].map((mark) => ({ ...mark, x: at('x', metric.factor * mark.value) }))
  for (const { x, color, dash } of marks) {
    strokeSegment(pen, [x, area.top], [x, area.bottom], { color, width: 1.5, dash })
    placer.reserve(x, (area.top + area.bottom) / 2, 2, area.height / 2)
  }
  for (const { name, text, x, color } of marks) {
    placer.beside(`${name} ${text}`, x, area.top + 12, color)
  }
}
