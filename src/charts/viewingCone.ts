import type { ChartConfiguration } from 'chart.js'
import { hiddenAxis } from './axis.js'
import { type BandedMap, bandedMap } from './bandedMap.js'
import { rangeOf, type ScaleRange } from './colorScale.js'
import { frameOptions, paperPainter } from './frame.js'
import { LabelPlacer } from './labels.js'
import { COLOR_BAR_MARGIN_PX, type MapDrawing, paintBands, paintColorBar, paintIsoLines } from './mapPainting.js'
import { type Plane, painter, squareArea } from './painter.js'
import type { Pen } from './pen.js'
import { type PolarField, valueInPolarField, worstOf } from './polarField.js'
import { paintAzimuths, paintCross, paintPolarMarks } from './polarMarks.js'
import { axisTitle, directionText, type Quantity, quantityText } from './quantity.js'
import { hoverPoints } from './series.js'
import type { Theme } from './theme.js'

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
  const map = bandedMap(quantity, data.range ?? rangeOf(field.values.flat()), (u, v) => {
    const [x, y] = [2 * u - 1, 2 * v - 1]
    return valueInPolarField(field, Math.hypot(x, y) * thetaMax, Math.atan2(y, x))
  })
  const worst = worstDirection(data)
  return {
    type: 'scatter',
    data: { datasets: [hoverPoints(theme, gridPoints(field, thetaMax))] },
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
        paintDisc(pen, plane, map, { thetaMax, worst }, theme)
        paintColorBar(pen, plane, plane.area.right + RIM_PX + 18, map.scale, axisTitle(quantity), theme)
      }),
    ],
  }
}

function worstDirection({ field, worst }: ViewingConeData): ReturnType<typeof worstOf> {
  if (worst !== 'lowest') return worstOf(field)
  const found = worstOf({ ...field, values: field.values.map((row) => row.map((value) => -value)) })
  return { ...found, value: -found.value }
}

/** The samples, with θ/θmax as radius. */
function gridPoints({ thetaRad, phiRad }: PolarField, thetaMax: number): { x: number; y: number }[] {
  return thetaRad.flatMap((theta) =>
    phiRad.map((phi) => ({ x: (theta / thetaMax) * Math.cos(phi), y: (theta / thetaMax) * Math.sin(phi) })),
  )
}

function hoverText(field: PolarField, quantity: Quantity, thetaMax: number, x: number, y: number): string {
  const thetaRad = Math.hypot(x, y) * thetaMax
  const phiRad = (Math.atan2(y, x) + 2 * Math.PI) % (2 * Math.PI)
  return `${directionText({ thetaRad, phiRad })}: ${quantityText(quantity, valueInPolarField(field, thetaRad, phiRad))}`
}

function paintDisc(
  pen: Pen,
  { area }: Plane,
  map: BandedMap,
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
