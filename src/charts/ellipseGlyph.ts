import { type Pen, type Pixel, strokeLine } from './pen.js'
import type { Theme } from './theme.js'

/** A state of polarization, as the viewer of the display sees it. */
export interface Polarization {
  /** Of the long axis, counter-clockwise from three o'clock as the viewer sees it. */
  readonly azimuthRad: number
  /** -π/4 to π/4; positive is right-handed, named from the source (thumb along the way of the light). */
  readonly ellipticityRad: number
  /** Polarized share of the power, in [0, 1]. */
  readonly degree: number
}

/** Narrower than this (3°), an ellipse is drawn as a line and its hand does not matter to the eye. */
const LINEAR_RAD = 0.052
/** Below this the light has no ellipse worth drawing. */
const UNPOLARIZED = 0.03
/** Half the length of an arrow head, in glyphs that have room for it. */
const ARROW_PX = 5

/**
 * The ellipse of the polarized part over a disc whose gray is the unpolarized part. Right-handed light going into the
 * screen turns clockwise as the viewer sees it, coming back counter-clockwise.
 */
export function paintEllipse(
  pen: Pen,
  [cx, cy]: Pixel,
  radius: number,
  state: Polarization,
  goingIn: boolean,
  theme: Theme,
): void {
  pen.save()
  pen.fillStyle = theme.faint
  pen.strokeStyle = theme.grid
  pen.lineWidth = 1
  pen.setLineDash([])
  pen.beginPath()
  pen.arc(cx, cy, radius, 0, 2 * Math.PI)
  pen.globalAlpha = 0.5 * (1 - state.degree)
  pen.fill()
  pen.globalAlpha = 1
  pen.stroke()
  pen.restore()
  if (state.degree < UNPOLARIZED) return
  const clockwise = state.ellipticityRad > 0 === goingIn
  const color = handColor(state, theme)
  const size = radius * Math.sqrt(state.degree)
  const outline = Array.from({ length: 73 }, (_, i) =>
    ellipsePoint([cx, cy], size, state, ((clockwise ? -1 : 1) * 2 * Math.PI * i) / 72),
  )
  strokeLine(pen, outline, { color, width: theme.lineWidth, dash: state.ellipticityRad < -LINEAR_RAD ? [6, 2] : [] })
  if (Math.abs(state.ellipticityRad) > LINEAR_RAD)
    paintArrow(pen, outline[8], outline[10], Math.min(ARROW_PX, 0.3 * radius), color)
}

/** Right, left and linear each have a color; the turn of the arrow says it without. */
function handColor({ ellipticityRad }: Polarization, theme: Theme): string {
  if (Math.abs(ellipticityRad) <= LINEAR_RAD) return theme.ink
  return theme.series[ellipticityRad > 0 ? 0 : 1].color
}

/** Pixels have y down, azimuths are counter-clockwise with y up. */
function ellipsePoint([cx, cy]: Pixel, size: number, { azimuthRad, ellipticityRad }: Polarization, t: number): Pixel {
  const long = size * Math.cos(ellipticityRad) * Math.cos(t)
  const short = size * Math.sin(Math.abs(ellipticityRad)) * Math.sin(t)
  const [c, s] = [Math.cos(azimuthRad), Math.sin(azimuthRad)]
  return [cx + c * long - s * short, cy - (s * long + c * short)]
}

function paintArrow(pen: Pen, from: Pixel, to: Pixel, size: number, color: string): void {
  const length = Math.hypot(to[0] - from[0], to[1] - from[1]) || 1
  const [ux, uy] = [(size * (to[0] - from[0])) / length, (size * (to[1] - from[1])) / length]
  pen.fillStyle = color
  pen.beginPath()
  pen.moveTo(to[0] + ux, to[1] + uy)
  pen.lineTo(to[0] - ux + uy, to[1] - uy - ux)
  pen.lineTo(to[0] - ux - uy, to[1] - uy + ux)
  pen.closePath()
  pen.fill()
}
