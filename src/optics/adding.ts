/**
 * Joining without phase, from the panel up. W (real 4×4 on the coherency vector) is what everything below a thick medium
 * sends back, e (4) what it emits upward. A packet on top of it, all round trips summed:
 *
 *   W ← r + tUp W (I - rBelow W)⁻¹ t,     e ← tUp (I - W rBelow)⁻¹ e = tUp (e + W (I - rBelow W)⁻¹ rBelow e).
 *
 * The sum of incoherent partial waves of S. Nichols, O. Arteaga, A. Martin, B. Kahr, J. Opt. Soc. Am. A 32, 2049 (2015).
 * The light crossing the thick layer above is in the packet already (`Joiner.fold`).
 */
import { coherencyMatrix } from './coherency.js'
import { apply, RoundTrips } from './matrix4.js'
import type { Packet } from './packet.js'

/** What lies below a thick medium: `16 n` and `4 n` numbers, component after component. */
export interface Below {
  readonly w: Float64Array
  readonly e: Float64Array
}

export function createBelow(count: number): Below {
  return { w: new Float64Array(16 * count), e: new Float64Array(4 * count) }
}

const R = new Float64Array(16)
const T = new Float64Array(16)
const R_BELOW = new Float64Array(16)
const T_UP = new Float64Array(16)
const W = new Float64Array(16)
const X = new Float64Array(4)
const V = new Float64Array(4)
const E = new Float64Array(4)
const TRIPS = new RoundTrips()

/** `above` ← packet on `below`. */
export function addPacket(packet: Packet, below: Below, above: Below, n: number): void {
  for (let i = 0; i < n; i++) {
    coherencyMatrix(packet.r, i, n, R)
    coherencyMatrix(packet.t, i, n, T)
    coherencyMatrix(packet.rBelow, i, n, R_BELOW)
    coherencyMatrix(packet.tUp, i, n, T_UP)
    for (let c = 0; c < 16; c++) W[c] = below.w[c * n + i]
    TRIPS.factor(R_BELOW, W)
    for (let column = 0; column < 4; column++) {
      for (let row = 0; row < 4; row++) X[row] = T[4 * row + column]
      TRIPS.solve(X)
      apply(W, X, V)
      apply(T_UP, V, X)
      for (let row = 0; row < 4; row++) above.w[(4 * row + column) * n + i] = R[4 * row + column] + X[row]
    }
    for (let c = 0; c < 4; c++) E[c] = below.e[c * n + i]
    apply(R_BELOW, E, X)
    TRIPS.solve(X)
    apply(W, X, V)
    for (let c = 0; c < 4; c++) V[c] += E[c]
    apply(T_UP, V, X)
    for (let c = 0; c < 4; c++) above.e[c * n + i] = X[c]
  }
}
