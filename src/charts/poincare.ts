import type { ChartConfiguration } from 'chart.js'
import { hiddenAxis } from './axis.js'
import { frameOptions, paperPainter } from './frame.js'
import { LabelPlacer } from './labels.js'
import { type Plane, painter, squareArea } from './painter.js'
import { type Pen, type Pixel, strokeLine } from './pen.js'
import { seriesStyle, type Theme } from './theme.js'

type Vector = readonly [number, number, number]

interface Way {
  readonly name: string
  readonly states: readonly { readonly label: string; readonly stokes: Vector }[]
  readonly between?: readonly (readonly Vector[])[]
}

export interface PoincareData {
  readonly title: string
  readonly notes?: readonly string[]
  /**
   * Ways over the sphere, e.g. in and out. `states` are (S1, S2, S3)/S0 after each layer, S1 at azimuth 0°, S2 at 45°,
   * S3 > 0 right-handed named from the source; shorter than 1 where partly unpolarized. `between[i]` are points on the way
   * from state i to state i + 1, so that a retarder is seen to turn about its axis; absent: straight on.
   */
  readonly ways: readonly Way[]
  /** Where the sphere is seen from; default 35° from S1 towards S2, 25° above the equator. */
  readonly view?: { readonly azimuthRad: number; readonly elevationRad: number }
}

const DEFAULT_VIEW = { azimuthRad: (35 * Math.PI) / 180, elevationRad: (25 * Math.PI) / 180 }
/** Points closer than this are one mark with all their labels, in units of the radius. */
const SAME_PLACE = 0.03

/** Orthographic view: to the right, up, and towards the eye (positive: front half). */
type Projection = (s: Vector) => { readonly x: number; readonly y: number; readonly depth: number }

function projection({ azimuthRad, elevationRad }: typeof DEFAULT_VIEW): Projection {
  const [ca, sa] = [Math.cos(azimuthRad), Math.sin(azimuthRad)]
  const [ce, se] = [Math.cos(elevationRad), Math.sin(elevationRad)]
  return ([s1, s2, s3]) => {
    const forward = ca * s1 + sa * s2
    return { x: ca * s2 - sa * s1, y: ce * s3 - se * forward, depth: ce * forward + se * s3 }
  }
}

/** The Poincaré sphere with the light's way over it; what lies behind is drawn dotted. */
export function poincare(data: PoincareData, theme: Theme): ChartConfiguration {
  const project = projection(data.view ?? DEFAULT_VIEW)
  return {
    type: 'scatter',
    data: {
      datasets: data.ways.map(({ name, states }, i) => {
        const { color, marker, dash } = seriesStyle(theme, i)
        return {
          type: 'scatter' as const,
          label: name,
          data: states.map(({ stokes }) => project(stokes)),
          pointStyle: marker,
          pointRadius: theme.markerRadius,
          borderColor: color,
          borderDash: [...dash],
          backgroundColor: states.map(({ stokes }) => (project(stokes).depth < -0.02 ? theme.paper : color)),
        }
      }),
    },
    options: {
      ...frameOptions(theme, {
        title: data.title,
        notes: data.notes,
        legend: 'markers',
        hover: ({ datasetIndex, dataIndex }) => data.ways[datasetIndex].states[dataIndex].label,
      }),
      scales: { x: hiddenAxis(-1, 1), y: hiddenAxis(-1, 1) },
    },
    plugins: [
      paperPainter(theme),
      squareArea(34),
      painter('sphere', 'beforeDatasetsDraw', (pen, plane) => {
        paintSphere(pen, plane, project, theme)
        data.ways.forEach((way, i) => {
          paintTrack(pen, plane, trackOf(way).map(project), { ...seriesStyle(theme, i), width: theme.lineWidth })
        })
      }),
      painter('states', 'afterDatasetsDraw', (pen, plane) => paintLabels(pen, plane, data, project, theme)),
    ],
  }
}

function trackOf({ states, between }: Way): Vector[] {
  return states.flatMap(({ stokes }, i) => [stokes, ...(between?.[i] ?? [])])
}

function paintSphere(pen: Pen, plane: Plane, project: Projection, theme: Theme): void {
  const { area, at } = plane
  pen.strokeStyle = theme.muted
  pen.fillStyle = theme.wash
  pen.lineWidth = 1.25
  pen.beginPath()
  pen.arc(at('x', 0), at('y', 0), area.width / 2, 0, 2 * Math.PI)
  pen.fill()
  pen.stroke()
  const turn = Array.from({ length: 121 }, (_, i) => (2 * Math.PI * i) / 120)
  const circles: Vector[][] = [
    turn.map((t) => [Math.cos(t), Math.sin(t), 0]),
    turn.map((t) => [Math.cos(t), 0, Math.sin(t)]),
    turn.map((t) => [0, Math.cos(t), Math.sin(t)]),
  ]
  for (const circle of circles) {
    paintTrack(pen, plane, circle.map(project), { color: theme.faint, dash: [], width: 1 })
  }
}

/** Solid in front, dotted and thin behind. */
function paintTrack(
  pen: Pen,
  { at }: Plane,
  track: readonly ReturnType<Projection>[],
  style: { readonly color: string; readonly dash: readonly number[]; readonly width: number },
): void {
  let run: Pixel[] = []
  let front = true
  const flush = (): void => {
    strokeLine(pen, run, front ? style : { color: style.color, width: Math.max(1, style.width - 0.75), dash: [2, 3] })
  }
  for (const { x, y, depth } of track) {
    const pixel: Pixel = [at('x', x), at('y', y)]
    if (run.length > 0 && depth >= 0 !== front) {
      flush()
      run = run.slice(-1)
    }
    front = depth >= 0
    run.push(pixel)
  }
  flush()
}

const AXES: readonly { readonly text: string; readonly end: Vector }[] = [
  { text: 'linear 0°', end: [1, 0, 0] },
  { text: 'linear 90°', end: [-1, 0, 0] },
  { text: 'linear 45°', end: [0, 1, 0] },
  { text: 'linear 135°', end: [0, -1, 0] },
  { text: 'right circular', end: [0, 0, 1] },
  { text: 'left circular', end: [0, 0, -1] },
]

function paintLabels(
  pen: Pen,
  { width, height, at }: Plane,
  data: PoincareData,
  project: Projection,
  theme: Theme,
): void {
  const placer = new LabelPlacer(pen, theme, { left: 4, top: at('y', 1) - 32, right: width - 4, bottom: height - 4 })
  const marks: { x: number; y: number; label: string }[] = []
  for (const { label, stokes } of data.ways.flatMap((way) => way.states)) {
    const { x, y } = project(stokes)
    const same = marks.find((mark) => Math.hypot(mark.x - x, mark.y - y) < SAME_PLACE)
    if (same) same.label += `, ${label}`
    else marks.push({ x, y, label })
  }
  for (const track of data.ways.map((way) => trackOf(way).map(project))) {
    for (let i = 1; i < track.length; i++) {
      placer.reserveLine([at('x', track[i - 1].x), at('y', track[i - 1].y)], [at('x', track[i].x), at('y', track[i].y)])
    }
  }
  for (const { x, y } of marks) placer.reserve(at('x', x), at('y', y), theme.markerRadius + 2)
  for (const { x, y, label } of marks) placer.beside(label, at('x', x), at('y', y))
  for (const { text, end } of AXES) {
    const { x, y, depth } = project(end)
    pen.fillStyle = depth >= 0 ? theme.muted : theme.faint
    pen.beginPath()
    pen.arc(at('x', x), at('y', y), 2.5, 0, 2 * Math.PI)
    pen.fill()
    placer.beside(text, at('x', x), at('y', y), theme.muted)
  }
}
