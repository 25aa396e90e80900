import type { ChartConfiguration } from 'chart.js'
import { hiddenAxis } from './axis.js'
import { type ColorScale, colorScale, rangeOf, type ScaleRange } from './colorScale.js'
import { contourBands } from './contourBands.js'
import { frameOptions, paperPainter } from './frame.js'
import { LabelPlacer } from './labels.js'
import { COLOR_BAR_MARGIN_PX, type MapDrawing, paintBands, paintColorBar, paintIsoLines } from './mapPainting.js'
import { type Plane, painter, squareArea } from './painter.js'
import type { Pen } from './pen.js'
import { type PolarField, valueInPolarField, worstOf } from './polarField.js'
import { axisTitle, directionText, type Quantity, quantityText } from './quantity.js'
import { fontOf, type Theme } from './theme.js'

export interface ViewingConeData {
  readonly title: string
  readonly notes?: readonly string[]
  readonly quantity: Quantity
  /** Where the eye stands and what it sees there. */
  readonly field: PolarField
  /** In stored units; absent: the field's own. Give compared designs the same. */
  readonly range?: ScaleRange
  /** Whether a high or a low value is the worst; default high. */
  readonly worst?: 'highest' | 'lowest'
}

/** Room around the disc for the azimuths, px. */
const RIM_PX = 34

/**
 * Polar map of a metric: radius θ, azimuth φ counter-clockwise from three o'clock as the viewer sees the screen.
 */
export function viewingCone(data: ViewingConeData, theme: Theme): ChartConfiguration {
  const { field, quantity } = data
  const thetaMax = field.thetaRad[field.thetaRad.length - 1]
  const shown = { ...field, values: field.values.map((row) => row.map((value) => quantity.factor * value)) }
  const range = data.range
    ? { min: quantity.factor * data.range.min, max: quantity.factor * data.range.max }
    : rangeOf(shown.values.flat())
  const scale = colorScale(range)
  // What a fixed scale does not reach is shown in its last color.
  const clamp = (value: number): number =>
    Math.min(scale.levels[scale.levels.length - 1] - 1e-9 * scale.step, Math.max(scale.levels[0], value))
  const bands = contourBands((u, v) => {
    const [x, y] = [2 * u - 1, 2 * v - 1]
    return clamp(valueInPolarField(shown, Math.hypot(x, y) * thetaMax, Math.atan2(y, x)))
  }, scale.levels)
  const worst = worstDirection(data)
  return {
    type: 'scatter',
    data: { datasets: [hoverPoints(field, thetaMax, theme)] },
    options: {
      ...frameOptions(
        theme,
        {
          title: data.title,
          notes: [...(data.notes ?? []), `worst ${quantityText(quantity, worst.value)} at ${directionText(worst)} (✕)`],
          hover: ({ parsed }) => hoverText(field, quantity, thetaMax, parsed.x ?? 0, parsed.y ?? 0),
        },
        COLOR_BAR_MARGIN_PX,
      ),
      scales: { x: hiddenAxis(-1, 1), y: hiddenAxis(-1, 1) },
    },
    plugins: [
      paperPainter(theme),
      squareArea(RIM_PX),
      painter('cone', 'beforeDatasetsDraw', (pen, plane) => {
        paintDisc(pen, plane, { bands, scale }, { thetaMax, worst }, theme)
        paintColorBar(pen, plane, plane.area.right + RIM_PX + 18, scale, axisTitle(quantity), theme)
      }),
    ],
  }
}

function worstDirection({ field, worst }: ViewingConeData): ReturnType<typeof worstOf> {
  if (worst !== 'lowest') return worstOf(field)
  const found = worstOf({ ...field, values: field.values.map((row) => row.map((value) => -value)) })
  return { ...found, value: -found.value }
}

/** The grid as points without a marker, so that the page has something under the pointer. */
function hoverPoints(field: PolarField, thetaMax: number, theme: Theme) {
  const points = field.thetaRad.flatMap((theta) =>
    field.phiRad.map((phi) => ({ x: (theta / thetaMax) * Math.cos(phi), y: (theta / thetaMax) * Math.sin(phi) })),
  )
  return {
    type: 'scatter' as const,
    label: '',
    data: points,
    pointRadius: 0,
    pointHitRadius: 8,
    pointHoverRadius: 4,
    borderColor: theme.paper,
    backgroundColor: theme.ink,
  }
}

function hoverText(field: PolarField, quantity: Quantity, thetaMax: number, x: number, y: number): string {
  const thetaRad = Math.hypot(x, y) * thetaMax
  const phiRad = (Math.atan2(y, x) + 2 * Math.PI) % (2 * Math.PI)
  return `${directionText({ thetaRad, phiRad })}: ${quantityText(quantity, valueInPolarField(field, thetaRad, phiRad))}`
}

type DiscMap = Pick<MapDrawing, 'bands'> & { readonly scale: ColorScale }

function paintDisc(
  pen: Pen,
  { area }: Plane,
  map: DiscMap,
  { thetaMax, worst }: { readonly thetaMax: number; readonly worst: ReturnType<typeof worstOf> },
  theme: Theme,
): void {
  const radius = area.width / 2
  const [cx, cy] = [area.left + radius, area.top + radius]
  const at = (thetaRad: number, phiRad: number): readonly [number, number] => {
    const r = (radius * thetaRad) / thetaMax
    return [cx + r * Math.cos(phiRad), cy - r * Math.sin(phiRad)]
  }
  const drawing: MapDrawing = {
    ...map,
    toPixel: (u, v) => [area.left + u * area.width, area.bottom - v * area.height],
    inside: ([x, y]) => Math.hypot(x - cx, y - cy) < radius - 16,
  }
  const placer = new LabelPlacer(pen, theme, area)
  const [worstX, worstY] = at(worst.thetaRad, worst.phiRad)
  placer.reserve(worstX, worstY, 11)
  pen.save()
  pen.beginPath()
  pen.arc(cx, cy, radius, 0, 2 * Math.PI)
  pen.clip()
  paintBands(pen, drawing, theme)
  paintPolarMarks(pen, at, thetaMax, placer, theme)
  paintIsoLines(pen, drawing, placer, theme)
  pen.restore()
  paintAzimuths(pen, cx, cy, radius, theme)
  paintCross(pen, worstX, worstY, theme)
}

/** Rings of equal θ and spokes of equal φ. */
function paintPolarMarks(
  pen: Pen,
  at: (thetaRad: number, phiRad: number) => readonly [number, number],
  thetaMax: number,
  placer: LabelPlacer,
  theme: Theme,
): void {
  const degree = Math.PI / 180
  const step = (thetaMax / degree > 50 ? 20 : 10) * degree
  const [cx, cy] = at(0, 0)
  pen.save()
  pen.globalAlpha = 0.45
  pen.strokeStyle = theme.faint
  pen.setLineDash([2, 3])
  for (let theta = step; theta < thetaMax - 1e-9; theta += step) {
    pen.beginPath()
    pen.arc(cx, cy, at(theta, 0)[0] - cx, 0, 2 * Math.PI)
    pen.stroke()
  }
  for (let phi = 0; phi < 360; phi += 45) {
    pen.beginPath()
    pen.moveTo(cx, cy)
    pen.lineTo(...at(thetaMax, phi * degree))
    pen.stroke()
  }
  pen.restore()
  for (let theta = step; theta < thetaMax - 1e-9; theta += step) {
    placer.centered(`θ ${Math.round(theta / degree)}°`, ...at(theta, 67.5 * degree))
  }
}

function paintAzimuths(pen: Pen, cx: number, cy: number, radius: number, theme: Theme): void {
  pen.strokeStyle = theme.faint
  pen.lineWidth = 1.25
  pen.beginPath()
  pen.arc(cx, cy, radius, 0, 2 * Math.PI)
  pen.stroke()
  pen.font = fontOf(theme, theme.smallSize)
  pen.textAlign = 'center'
  pen.textBaseline = 'middle'
  pen.fillStyle = theme.ink
  for (let phi = 0; phi < 360; phi += 45) {
    const direction = (phi * Math.PI) / 180
    const r = radius + 14 + 9 * Math.abs(Math.cos(direction))
    pen.fillText(phi === 0 ? 'φ 0°' : `${phi}°`, cx + r * Math.cos(direction), cy - r * Math.sin(direction))
  }
}

/** Dark cross on a halo of paper: reads on every color of the ramp. */
function paintCross(pen: Pen, x: number, y: number, theme: Theme): void {
  for (const [color, width] of [
    [theme.paper, 5],
    [theme.ink, 2],
  ] as const) {
    pen.strokeStyle = color
    pen.lineWidth = width
    pen.setLineDash([])
    pen.beginPath()
    for (const side of [-1, 1]) {
      pen.moveTo(x - 6, y - 6 * side)
      pen.lineTo(x + 6, y + 6 * side)
    }
    pen.stroke()
  }
}
