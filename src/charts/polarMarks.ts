import type { LabelPlacer } from './labels.js'
import type { Pen } from './pen.js'
import { fontOf, type Theme } from './theme.js'

/** Rings of equal θ and spokes of equal φ. */
export function paintPolarMarks(
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

export function paintAzimuths(pen: Pen, cx: number, cy: number, radius: number, theme: Theme): void {
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
export function paintCross(pen: Pen, x: number, y: number, theme: Theme): void {
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
