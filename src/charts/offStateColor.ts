import type { ChartConfiguration } from 'chart.js'
import { linearAxis } from './axis.js'
import { frameOptions, paperPainter } from './frame.js'
import { LabelPlacer } from './labels.js'
import { type Plane, painter, squareArea } from './painter.js'
import { type Pen, type Pixel, strokeLine, strokeSegment } from './pen.js'
import { givenText, numberText } from './quantity.js'
import { pointSeries } from './series.js'
import { fontOf, seriesStyle, type Theme } from './theme.js'

type AB = readonly [aStar: number, bStar: number]

export interface OffStateColorData {
  readonly title: string
  readonly notes?: readonly string[]
  /** One entry a direction, in CIELAB against the illuminant's white. */
  readonly points: readonly { readonly label: string; readonly before?: AB; readonly after: AB }[]
  /** Largest chroma allowed, if the stack file has such a limit. */
  readonly limitChroma?: number
}

const CIRCLE_CHROMAS = [0.5, 1, 2, 5, 10, 15, 20, 30, 50, 75, 100]

/** The a*b* plane with circles of equal chroma; hollow before, solid after, an arrow between. */
export function offStateColor(data: OffStateColorData, theme: Theme): ChartConfiguration {
  const after = data.points.map((p) => p.after)
  const before = data.points.flatMap((p) => (p.before ? [p.before] : []))
  const reach = 1.18 * Math.max(1, data.limitChroma ?? 0, ...[...after, ...before].map(([a, b]) => Math.hypot(a, b)))
  const circles = circlesWithin(reach, data.limitChroma, theme)
  const column = (points: readonly AB[], i: 0 | 1): number[] => points.map((p) => p[i])
  const series = (label: string, points: readonly AB[], style: number, hollow: boolean) =>
    pointSeries(theme, label, column(points, 0), column(points, 1), seriesStyle(theme, style), { hollow })
  return {
    type: 'scatter',
    data: {
      datasets: [
        series(before.length > 0 ? 'after' : 'design', after, 0, false),
        ...(before.length > 0 ? [series('before', before, 1, true)] : []),
      ],
    },
    options: {
      ...frameOptions(theme, {
        title: data.title,
        notes: data.notes,
        legend: 'markers',
        hover: ({ dataset, parsed }) =>
          `${dataset.label}: a* ${numberText(parsed.x ?? 0)}, b* ${numberText(parsed.y ?? 0)}, C*ab ${numberText(Math.hypot(parsed.x ?? 0, parsed.y ?? 0))}`,
      }),
      scales: {
        x: linearAxis(theme, { title: 'a*  (green − … + red)', min: -reach, max: reach, grid: false }),
        y: linearAxis(theme, { title: 'b*  (blue − … + yellow)', min: -reach, max: reach, grid: false }),
      },
    },
    plugins: [
      paperPainter(theme),
      squareArea(),
      painter('chromaCircles', 'beforeDatasetsDraw', (pen, plane) => paintPlane(pen, plane, circles, theme)),
      painter('directions', 'afterDatasetsDraw', (pen, plane) => paintPoints(pen, plane, data.points, circles, theme)),
    ],
  }
}

interface Circle {
  readonly chroma: number
  readonly text: string
  readonly color: string
  readonly dash: readonly number[]
  /** Where on the circle its text stands, counter-clockwise from +a*. */
  readonly textAngleRad: number
}

/** Only circles that can be told apart. */
function circlesWithin(reach: number, limitChroma: number | undefined, theme: Theme): Circle[] {
  const circles = CIRCLE_CHROMAS.filter((chroma) => chroma < reach && chroma > reach / 9).map(
    (chroma): Circle => ({
      chroma,
      text: `C*ab = ${chroma}`,
      color: theme.muted,
      dash: [3, 3],
      textAngleRad: (5 * Math.PI) / 4,
    }),
  )
  if (limitChroma === undefined) return circles
  const text = `limit C*ab = ${givenText({ unit: '', factor: 1 }, limitChroma)}`
  // A circle next to that of the limit would strike its text.
  const apart = circles.filter(({ chroma }) => Math.abs(chroma / limitChroma - 1) > 0.15)
  return [...apart, { chroma: limitChroma, text, color: theme.limit, dash: [], textAngleRad: (7 * Math.PI) / 4 }]
}

function textPlace({ chroma, textAngleRad }: Pick<Circle, 'chroma' | 'textAngleRad'>): AB {
  return [chroma * Math.cos(textAngleRad), chroma * Math.sin(textAngleRad)]
}

function paintPlane(pen: Pen, { area, at }: Plane, circles: readonly Circle[], theme: Theme): void {
  const [x0, y0] = [at('x', 0), at('y', 0)]
  strokeSegment(pen, [area.left, y0], [area.right, y0], { color: theme.grid })
  strokeSegment(pen, [x0, area.top], [x0, area.bottom], { color: theme.grid })
  pen.font = fontOf(theme, theme.smallSize)
  pen.textAlign = 'center'
  pen.textBaseline = 'middle'
  pen.lineWidth = 1
  for (const { chroma, text, color, dash, textAngleRad } of circles) {
    pen.strokeStyle = color
    pen.setLineDash(dash)
    pen.beginPath()
    pen.arc(x0, y0, at('x', chroma) - x0, 0, 2 * Math.PI)
    pen.stroke()
    const width = pen.measureText(text).width + 6
    pen.fillStyle = theme.paper
    const [a, b] = textPlace({ chroma, textAngleRad })
    const [x, y] = [at('x', a), at('y', b)]
    pen.fillRect(x - width / 2, y - 9, width, 18)
    pen.fillStyle = color
    pen.fillText(text, x, y)
  }
  strokeSegment(pen, [x0 - 7, y0], [x0 + 7, y0], { color: theme.ink, width: 2 })
  strokeSegment(pen, [x0, y0 - 7], [x0, y0 + 7], { color: theme.ink, width: 2 })
}

/** From marker edge to marker edge, head at `to`. */
function arrow(pen: Pen, from: Pixel, to: Pixel, theme: Theme): void {
  const length = Math.hypot(to[0] - from[0], to[1] - from[1])
  const gap = theme.markerRadius + 3
  if (length < 2 * gap + 8) return
  const [ux, uy] = [(to[0] - from[0]) / length, (to[1] - from[1]) / length]
  const tip: Pixel = [to[0] - gap * ux, to[1] - gap * uy]
  const wing = (side: number): Pixel => [tip[0] - 8 * ux + 3.5 * side * uy, tip[1] - 8 * uy - 3.5 * side * ux]
  strokeLine(pen, [[from[0] + gap * ux, from[1] + gap * uy], tip], { color: theme.muted, width: 1.25 })
  strokeLine(pen, [wing(1), tip, wing(-1)], { color: theme.muted, width: 1.25 })
}

function paintPoints(
  pen: Pen,
  { area, at }: Plane,
  points: OffStateColorData['points'],
  circles: readonly Circle[],
  theme: Theme,
): void {
  const placer = new LabelPlacer(pen, theme, area)
  const pixel = ([a, b]: AB): Pixel => [at('x', a), at('y', b)]
  placer.reserve(...pixel([0, 0]), 8)
  for (const circle of circles) placer.reserve(...pixel(textPlace(circle)), 52, 9)
  for (const { before, after } of points) {
    placer.reserve(...pixel(after), theme.markerRadius + 2)
    if (!before) continue
    placer.reserve(...pixel(before), theme.markerRadius + 2)
    placer.reserveLine(pixel(before), pixel(after))
    arrow(pen, pixel(before), pixel(after), theme)
  }
  for (const { label, after } of points) placer.beside(label, ...pixel(after))
}
