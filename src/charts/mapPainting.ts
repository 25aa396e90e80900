import type { BandedMap } from './bandedMap.js'
import type { ColorScale } from './colorScale.js'
import type { LabelPlacer } from './labels.js'
import type { Plane } from './painter.js'
import { type Pen, type Pixel, strokeLine, trace } from './pen.js'
import { stepText } from './quantity.js'
import { fontOf, type Theme } from './theme.js'

/** A map on its sheet: its bands, and where their unit square lies. */
export interface MapDrawing extends BandedMap {
  readonly toPixel: (u: number, v: number) => Pixel
  /** Whether a pixel belongs to the map: labels are set inside only. */
  readonly inside: (pixel: Pixel) => boolean
}

/** Room to the right of a map for its color bar, px. */
export const COLOR_BAR_MARGIN_PX = 96
/** Shorter rings have no room for their number. */
const SHORTEST_LABELLED_PX = 55

function bandColor(theme: Theme, scale: ColorScale, i: number): string {
  return theme.ramp((i + 0.5) / (scale.levels.length - 1))
}

/** Fills from the lowest level up, each band over the one below it. The caller has clipped to the map. */
export function paintBands(pen: Pen, { bands, scale, toPixel }: MapDrawing, theme: Theme): void {
  bands.slice(0, -1).forEach((band, i) => {
    pen.fillStyle = bandColor(theme, scale, i)
    pen.beginPath()
    for (const ring of band.rings) {
      trace(
        pen,
        ring.map(([u, v]) => toPixel(u, v)),
      )
      pen.closePath()
    }
    pen.fill('evenodd')
  })
}

/** Lines at every level but the lowest, with their values where there is room. The caller has clipped to the map. */
export function paintIsoLines(
  pen: Pen,
  { bands, scale, toPixel, inside }: MapDrawing,
  placer: LabelPlacer,
  theme: Theme,
): void {
  const lines = bands.slice(1).map((band) => ({
    text: stepText(band.level, scale.step),
    rings: band.rings.map((ring) => ring.map(([u, v]) => toPixel(u, v))),
  }))
  for (const { rings } of lines) {
    for (const ring of rings) strokeLine(pen, ring, { color: theme.paper, width: 1 })
  }
  for (const { text, rings } of lines) {
    for (const ring of rings) labelRing(ring.filter(inside), text, placer)
  }
}

/** At the flattest stretch of the ring where the text fits. */
function labelRing(ring: readonly Pixel[], text: string, placer: LabelPlacer): void {
  const reach = 4
  let length = 0
  const places: { pixel: Pixel; slope: number }[] = []
  for (let i = 1; i < ring.length; i++) {
    length += Math.hypot(ring[i][0] - ring[i - 1][0], ring[i][1] - ring[i - 1][1])
    const [from, to] = [ring[Math.max(0, i - reach)], ring[Math.min(ring.length - 1, i + reach)]]
    places.push({ pixel: ring[i], slope: Math.abs(to[1] - from[1]) / (Math.abs(to[0] - from[0]) + 1e-9) })
  }
  if (length < SHORTEST_LABELLED_PX) return
  places.sort((a, b) => a.slope - b.slope)
  places.some(({ pixel }) => placer.centered(text, pixel[0], pixel[1]))
}

/** The scale to the right of the plot: one patch a band, the levels beside it, the quantity along it. */
export function paintColorBar(
  pen: Pen,
  { area }: Plane,
  left: number,
  scale: ColorScale,
  title: string,
  theme: Theme,
): void {
  const width = 16
  const count = scale.levels.length - 1
  const yOf = (i: number): number => area.bottom - (area.height * i) / count
  pen.font = fontOf(theme, theme.smallSize)
  pen.textAlign = 'left'
  pen.textBaseline = 'middle'
  scale.levels.forEach((level, i) => {
    if (i < count) {
      pen.fillStyle = bandColor(theme, scale, i)
      pen.fillRect(left, yOf(i + 1), width, yOf(i) - yOf(i + 1) + 0.5)
    }
    pen.fillStyle = theme.ink
    pen.fillText(stepText(level, scale.step), left + width + 6, yOf(i))
  })
  pen.strokeStyle = theme.faint
  pen.lineWidth = 1
  pen.strokeRect(left, area.top, width, area.height)
  pen.translate(left + width + 58, (area.top + area.bottom) / 2)
  pen.rotate(-Math.PI / 2)
  pen.textAlign = 'center'
  pen.font = fontOf(theme, theme.textSize)
  pen.fillText(title, 0, 0)
}
