import type { ChartConfiguration } from 'chart.js'
import { type Axis, linearAxis } from './axis.js'
import { rangeOf } from './colorScale.js'
import { frameOptions, paperPainter } from './frame.js'
import { LabelPlacer } from './labels.js'
import { type Plane, painter } from './painter.js'
import { type Pen, type Pixel, strokeLine } from './pen.js'
import { axisTitle, type Quantity, quantityText } from './quantity.js'
import { pointSeries } from './series.js'
import { seriesStyle, type Theme } from './theme.js'

interface ParetoAxis {
  readonly quantity: Quantity
  readonly better: 'low' | 'high'
}

interface Candidate {
  readonly label: string
  readonly x: number
  readonly y: number
  readonly onFront: boolean
  readonly limitsMet: boolean
}

export interface ParetoFrontData {
  readonly title: string
  readonly notes?: readonly string[]
  readonly x: ParetoAxis
  readonly y: ParetoAxis
  /** In stored units. */
  readonly candidates: readonly Candidate[]
}

/** Candidates in two metrics; those that no other beats in both are joined and named. */
export function paretoFront(data: ParetoFrontData, theme: Theme): ChartConfiguration {
  const groups = groupsOf(data.candidates)
  return {
    type: 'scatter',
    data: {
      datasets: groups.map(({ label, members, style, hollow }) =>
        pointSeries(
          theme,
          label,
          members.map((c) => data.x.quantity.factor * c.x),
          members.map((c) => data.y.quantity.factor * c.y),
          seriesStyle(theme, style),
          { hollow, radius: hollow ? theme.markerRadius - 1 : theme.markerRadius + 0.5 },
        ),
      ),
    },
    options: {
      ...frameOptions(theme, {
        title: data.title,
        notes: data.notes,
        legend: 'markers',
        hover: ({ datasetIndex, dataIndex }) => {
          const { label, x, y } = groups[datasetIndex].members[dataIndex]
          return `${label}: ${quantityText(data.x.quantity, x)}, ${quantityText(data.y.quantity, y)}`
        },
      }),
      scales: { x: candidateAxis(data, 'x', theme), y: candidateAxis(data, 'y', theme) },
    },
    plugins: [
      paperPainter(theme),
      painter('front', 'beforeDatasetsDraw', (pen, plane) => paintFront(pen, plane, data, theme)),
    ],
  }
}

/** Solid on the front, hollow when beaten; the second style where a limit is missed. */
function groupsOf(candidates: readonly Candidate[]) {
  return [
    { label: 'on the front', onFront: true, limitsMet: true },
    { label: 'on the front, misses a limit', onFront: true, limitsMet: false },
    { label: 'beaten', onFront: false, limitsMet: true },
    { label: 'beaten, misses a limit', onFront: false, limitsMet: false },
  ]
    .map(({ label, onFront, limitsMet }) => ({
      label,
      members: candidates.filter((c) => c.onFront === onFront && c.limitsMet === limitsMet),
      style: limitsMet ? 0 : 1,
      hollow: !onFront,
    }))
    .filter(({ members }) => members.length > 0)
}

function candidateAxis({ candidates, ...axes }: ParetoFrontData, key: 'x' | 'y', theme: Theme): Axis {
  const { quantity, better } = axes[key]
  const { min, max } = rangeOf(candidates.map((candidate) => quantity.factor * candidate[key]))
  const margin = 0.06 * (max - min || 1)
  return linearAxis(theme, { title: `${axisTitle(quantity)}, ${better} is good`, min: min - margin, max: max + margin })
}

/** Steps, not straight lines: between two candidates there is nothing to buy. */
function paintFront(pen: Pen, { area, at }: Plane, { candidates, x, y }: ParetoFrontData, theme: Theme): void {
  const pixel = (c: { readonly x: number; readonly y: number }): Pixel => [
    at('x', x.quantity.factor * c.x),
    at('y', y.quantity.factor * c.y),
  ]
  const front = candidates.filter((c) => c.onFront).sort((a, b) => (x.better === 'low' ? a.x - b.x : b.x - a.x))
  const placer = new LabelPlacer(pen, theme, area)
  for (const candidate of candidates) placer.reserve(...pixel(candidate), theme.markerRadius + 2)
  for (let i = 0; i + 1 < front.length; i++) {
    const [from, to] = [pixel(front[i]), pixel(front[i + 1])]
    const corner: Pixel = [to[0], from[1]]
    strokeLine(pen, [from, corner, to], { color: theme.faint, width: 1.5 })
    placer.reserveLine(from, corner)
    placer.reserveLine(corner, to)
  }
  for (const candidate of front) placer.beside(candidate.label, ...pixel(candidate))
}
