/**
 * A face that reflects nothing and keeps the flux of p and of s: what a perfect antireflection coating would do. With the
 * flux Re Y |E|² of the tangential field (Y is n/cos θ for p and n cos θ for s),
 *
 *   r = rBelow = 0,   t = diag √(Re Y_A/Re Y_B),   tUp = t⁻¹,
 *
 * no phase. The off-diagonal part of Y of a birefringent medium (its Δn) is left out: unpolarized light does not see it.
 */
import type { LayerModes } from './layerModes.js'
import type { Packet } from './packet.js'

/** From the medium `above` to the medium `below`, into `out`. */
export function perfectFace(above: LayerModes, below: LayerModes, out: Packet, n: number): void {
  for (const part of [out.r, out.rBelow, out.t, out.tUp]) part.fill(0)
  out.diagonal = true
  for (const component of [0, 6]) {
    for (let i = component * n; i < (component + 1) * n; i++) {
      const t = Math.sqrt(above.y[i] / below.y[i])
      out.t[i] = t
      out.tUp[i] = 1 / t
    }
  }
}
