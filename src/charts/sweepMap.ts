import type { ChartConfiguration } from 'chart.js'
import { type Axis, linearAxis } from './axis.js'
import { type BandedMap, bandedMap } from './bandedMap.js'
import { rangeOf, type ScaleRange } from './colorScale.js'
import { beyondEnd, cubicBetween } from './cubicBetween.js'
import { frameOptions, paperPainter } from './frame.js'
import { LabelPlacer } from './labels.js'
import { COLOR_BAR_MARGIN_PX, type MapDrawing, paintBands, paintColorBar, paintIsoLines } from './mapPainting.js'
import { type Plane, painter } from './painter.js'
import type { Pen } from './pen.js'
import { axisTitle, type Quantity, quantityText } from './quantity.js'
import { hoverPoints } from './series.js'
import type { Theme } from './theme.js'

interface SweptAxis {
  readonly quantity: Quantity
  readonly values: readonly number[]
}

export interface SweepMapData {
  readonly title: string
  readonly notes?: readonly string[]
  /** Evenly spaced, ascending, at least two values each. */
  readonly x: SweptAxis
  readonly y: SweptAxis
  readonly metric: Quantity
  /** `values[iy][ix]`, in stored units. */
  readonly values: readonly (readonly number[])[]
  /** In stored units; absent: the values' own. Give compared maps the same. */
  readonly range?: ScaleRange
  /** The design of the stack file, in stored units. */
  readonly current?: { readonly x: number; readonly y: number }
}

/** A metric over two parameters as a map with iso-lines; the stack file's design as a ring. */
export function sweepMap(data: SweepMapData, theme: Theme): ChartConfiguration {
  const { x, y, metric, values, current } = data
  const shown = ({ quantity, values: stored }: SweptAxis): number[] => stored.map((value) => quantity.factor * value)
  const map = bandedMap(metric, data.range ?? rangeOf(values.flat()), (u, v) => valueAt(values, u, v))
  const grid = shown(x).flatMap((a) => shown(y).map((b) => ({ x: a, y: b })))
  return {
    type: 'scatter',
    data: { datasets: [hoverPoints(theme, grid)] },
    options: {
      ...frameOptions(
        theme,
        {
          title: data.title,
          notes: [...(data.notes ?? []), ...(current ? ['○ the stack file’s design'] : [])],
          hover: ({ dataIndex }) =>
            quantityText(metric, values[dataIndex % y.values.length][Math.floor(dataIndex / y.values.length)]),
        },
        COLOR_BAR_MARGIN_PX,
      ),
      scales: { x: sweptAxis(x, theme), y: sweptAxis(y, theme) },
    },
    plugins: [
      paperPainter(theme),
      painter('map', 'beforeDatasetsDraw', (pen, plane) => {
        const { area, at } = plane
        const ring =
          current && ([at('x', x.quantity.factor * current.x), at('y', y.quantity.factor * current.y)] as const)
        paintMap(pen, plane, map, ring, theme)
        paintColorBar(pen, plane, area.right + 18, map.scale, axisTitle(metric), theme)
      }),
    ],
  }
}

function sweptAxis({ quantity, values }: SweptAxis, theme: Theme): Axis {
  return linearAxis(theme, {
    title: axisTitle(quantity),
    min: quantity.factor * values[0],
    max: quantity.factor * values[values.length - 1],
    grid: false,
  })
}

function paintMap(
  pen: Pen,
  { area }: Plane,
  banded: BandedMap,
  ring: readonly [number, number] | undefined,
  theme: Theme,
): void {
  const map: MapDrawing = {
    ...banded,
    toPixel: (u, v) => [area.left + u * area.width, area.bottom - v * area.height],
    inside: ([x, y]) => x > area.left && x < area.right && y > area.top && y < area.bottom,
  }
  const placer = new LabelPlacer(pen, theme, area)
  pen.save()
  pen.beginPath()
  pen.rect(area.left, area.top, area.width, area.height)
  pen.clip()
  paintBands(pen, map, theme)
  if (ring) placer.reserve(...ring, 11)
  paintIsoLines(pen, map, placer, theme)
  pen.restore()
  if (!ring) return
  for (const [color, width] of [
    [theme.paper, 5],
    [theme.ink, 2],
  ] as const) {
    pen.strokeStyle = color
    pen.lineWidth = width
    pen.beginPath()
    pen.arc(...ring, 7, 0, 2 * Math.PI)
    pen.stroke()
  }
}

/** Cubic through the samples, in the unit square; beyond the edges the edge's value. */
function valueAt(rows: readonly (readonly number[])[], u: number, v: number): number {
  const along = (row: readonly number[]): number => cubicAt(u, row.length, (i) => row[i])
  return cubicAt(v, rows.length, (i) => along(rows[i]))
}

function cubicAt(unit: number, count: number, sample: (i: number) => number): number {
  const position = Math.min(1, Math.max(0, unit)) * (count - 1)
  if (count === 2) return sample(0) + (sample(1) - sample(0)) * position
  const i = Math.min(count - 2, Math.floor(position))
  const before = i > 0 ? sample(i - 1) : beyondEnd(sample(0), sample(1), sample(2))
  const after = i + 2 < count ? sample(i + 2) : beyondEnd(sample(count - 1), sample(count - 2), sample(count - 3))
  return cubicBetween([before, sample(i), sample(i + 1), after], position - i)
}
