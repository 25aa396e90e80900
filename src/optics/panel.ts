/**
 * The end of every stack. A mirror panel lies under an immersion medium of index m: with c² = 1 - ξ²/m² it returns
 *
 *   W = ρ[(1 - δ) I + δ D],   D = ½ [[1, c²], [1/c², 1]] on (|Ex'|², |Ey'|²), 0 elsewhere:
 *
 * an ideal mirror turns the tangential field round (E → -E, the identity on the coherency vector), the depolarizer sends
 * back the same flux unpolarized. Emission of unit flux starts upward in the immersion medium.
 */
import type { Below } from './adding.js'
import type { MirrorEnd } from './opticalLayer.js'

/**
 * State of the light a panel emits, in the (p, s) frame: fractions of unit flux; unpolarized is (1, 0, 0, 0). S3 > 0 is
 * right-handed as named from the source.
 */
export type EmissionStokes = readonly [number, number, number, number]

/** Fills W and e just above the mirror. */
export function fillMirror(end: MirrorEnd, xi: number, stokes: EmissionStokes, below: Below, n: number): void {
  const { w, e } = below
  w.fill(0)
  for (let i = 0; i < n; i++) {
    const index = end.index[i]
    const c2 = 1 - (xi * xi) / (index * index)
    const kept = end.reflectance[i] * (1 - end.depolarized[i])
    const mixed = (end.reflectance[i] * end.depolarized[i]) / 2
    w[i] = kept + mixed
    w[n + i] = mixed * c2
    w[4 * n + i] = mixed / c2
    w[5 * n + i] = kept + mixed
    w[10 * n + i] = kept
    w[15 * n + i] = kept
    e[i] = (c2 * (stokes[0] + stokes[1])) / 2
    e[n + i] = (stokes[0] - stokes[1]) / 2
    e[2 * n + i] = (Math.sqrt(c2) * stokes[2]) / 2
    e[3 * n + i] = (Math.sqrt(c2) * stokes[3]) / 2
  }
}
