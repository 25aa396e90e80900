import type { ChartConfiguration } from 'chart.js'
import { linearAxis } from './axis.js'
import { frameOptions, paperPainter } from './frame.js'
import { LabelPlacer } from './labels.js'
import { type Plane, painter } from './painter.js'
import { panelAxes } from './panels.js'
import { type Pen, type Pixel, strokeSegment } from './pen.js'
import { axisTitle, givenText, type Quantity, quantityText } from './quantity.js'
import { lineSeries } from './series.js'
import { seriesStyle, type Theme } from './theme.js'

interface SweptMetric {
  readonly name: string
  readonly quantity: Quantity
  readonly values: readonly number[]
  /** Drawn as a line across its plot. */
  readonly limit?: number
}

export interface SweepLinesData {
  readonly title: string
  readonly notes?: readonly string[]
  readonly parameter: Quantity
  /** Ascending, in stored units. */
  readonly values: readonly number[]
  /** Metrics of the same quantity share a plot; different ones stand on one another. */
  readonly metrics: readonly SweptMetric[]
  /** Value in the stack file. */
  readonly current?: number
}

/** Metrics over one parameter; the stack file's value as a vertical line. */
export function sweepLines(data: SweepLinesData, theme: Theme): ChartConfiguration {
  const { parameter, metrics, current } = data
  const labels = [...new Set(metrics.map((metric) => metric.quantity.label))]
  const panelOf = (metric: SweptMetric): string => `y${labels.indexOf(metric.quantity.label)}`
  const x = data.values.map((value) => parameter.factor * value)
  const panels = labels.map((label, i) => {
    const members = metrics.filter((metric) => metric.quantity.label === label)
    const { quantity } = members[0]
    const bounds = members.flatMap(({ limit }) => (limit === undefined ? [] : [quantity.factor * limit]))
    return {
      id: `y${i}`,
      quantity,
      ...(bounds.length > 0 ? { suggestedMin: Math.min(...bounds), suggestedMax: Math.max(...bounds) } : {}),
    }
  })
  return {
    type: 'scatter',
    data: {
      datasets: metrics.map((metric, i) =>
        lineSeries(
          theme,
          metric.name,
          x,
          metric.values.map((value) => metric.quantity.factor * value),
          seriesStyle(theme, i),
          panelOf(metric),
        ),
      ),
    },
    options: {
      ...frameOptions(theme, {
        title: data.title,
        notes: [
          ...(data.notes ?? []),
          ...(current === undefined ? [] : [`vertical line: the stack file’s ${givenText(parameter, current)}`]),
        ],
        hover: ({ datasetIndex, dataIndex }) =>
          `${metrics[datasetIndex].name}: ${quantityText(metrics[datasetIndex].quantity, metrics[datasetIndex].values[dataIndex])} at ${quantityText(parameter, data.values[dataIndex])}`,
      }),
      scales: {
        ...panelAxes(theme, panels),
        x: linearAxis(theme, { title: axisTitle(parameter), min: x[0], max: x[x.length - 1] }),
      },
    },
    plugins: [
      paperPainter(theme),
      painter('marks', 'beforeDatasetsDraw', (pen, plane) => paintMarks(pen, plane, data, panelOf, theme)),
    ],
  }
}

function paintMarks(
  pen: Pen,
  { area, at }: Plane,
  { parameter, values, metrics, current }: SweepLinesData,
  panelOf: (metric: SweptMetric) => string,
  theme: Theme,
): void {
  const placer = new LabelPlacer(pen, theme, area)
  for (const metric of metrics) {
    const curve = metric.values.map(
      (value, i): Pixel => [at('x', parameter.factor * values[i]), at(panelOf(metric), metric.quantity.factor * value)],
    )
    for (let i = 1; i < curve.length; i++) placer.reserveLine(curve[i - 1], curve[i])
  }
  if (current !== undefined) {
    const x = at('x', parameter.factor * current)
    strokeSegment(pen, [x, area.top], [x, area.bottom], { color: theme.muted, dash: [4, 3], width: 1.5 })
    placer.reserveLine([x, area.top], [x, area.bottom])
  }
  for (const metric of metrics) {
    if (metric.limit === undefined) continue
    const y = at(panelOf(metric), metric.quantity.factor * metric.limit)
    strokeSegment(pen, [area.left, y], [area.right, y], { color: theme.limit, width: 1.25 })
    placer.alongLine(`limit ${givenText(metric.quantity, metric.limit)}`, y, theme.limit)
  }
}
