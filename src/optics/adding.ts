/**
 * Joining without phase, from the panel up. W (real 4×4 on the coherency vector) is what everything below a thick medium
 * sends back, e (4) what it emits upward. A packet on top of it, all round trips summed:
 *
 *   W ← r + tUp W (I - rBelow W)⁻¹ t,     e ← tUp (I - W rBelow)⁻¹ e = tUp (e + W (I - rBelow W)⁻¹ rBelow e).
 *
 * The sum of incoherent partial waves of S. Nichols, O. Arteaga, A. Martin, B. Kahr, J. Opt. Soc. Am. A 32, 2049 (2015).
 * The light crossing the thick layer above is in the packet already (`Joiner.fold`). I - rBelow W is the identity less a
 * contraction: elimination without pivoting is safe.
 */
import { coherencyMatrix } from './coherency.js'
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
/** LU factors of I - rBelow W; the diagonal holds reciprocals. */
const LU = new Float64Array(16)
const X = new Float64Array(4)
const V = new Float64Array(4)

/** `above` ← packet on `below`. */
export function addPacket(packet: Packet, below: Below, above: Below, n: number): void {
  const { w, e } = below
  for (let i = 0; i < n; i++) {
    coherencyMatrix(packet.r, i, n, R)
    coherencyMatrix(packet.t, i, n, T)
    coherencyMatrix(packet.rBelow, i, n, R_BELOW)
    coherencyMatrix(packet.tUp, i, n, T_UP)
    for (let c = 0; c < 16; c++) W[c] = w[c * n + i]
    factorRoundTrips()
    for (let column = 0; column < 4; column++) {
      X[0] = T[column]
      X[1] = T[4 + column]
      X[2] = T[8 + column]
      X[3] = T[12 + column]
      solve()
      apply(W, X, V)
      for (let row = 0; row < 4; row++) {
        const k = 4 * row
        above.w[(k + column) * n + i] =
          R[k + column] + T_UP[k] * V[0] + T_UP[k + 1] * V[1] + T_UP[k + 2] * V[2] + T_UP[k + 3] * V[3]
      }
    }
    const e0 = e[i]
    const e1 = e[n + i]
    const e2 = e[2 * n + i]
    const e3 = e[3 * n + i]
    for (let row = 0; row < 4; row++) {
      const k = 4 * row
      X[row] = R_BELOW[k] * e0 + R_BELOW[k + 1] * e1 + R_BELOW[k + 2] * e2 + R_BELOW[k + 3] * e3
    }
    solve()
    apply(W, X, V)
    V[0] += e0
    V[1] += e1
    V[2] += e2
    V[3] += e3
    apply(T_UP, V, X)
    for (let row = 0; row < 4; row++) above.e[row * n + i] = X[row]
  }
}

/**
 * The topmost packet, where only unpolarized light goes in and its power counts coming out: R = u (r + tUp W (…)⁻¹ t) v
 * with v = (cos²θ, 1, 0, 0)/2 and u = (1/cos²θ, 1, 0, 0); one column instead of four. Also the light emitted to the eye,
 * 4 n numbers on the coherency vector, into `emitted`.
 */
export function reflectUnpolarized(
  packet: Packet,
  below: Below,
  cosTheta: number,
  reflectance: Float64Array,
  emitted: Float64Array,
  n: number,
): void {
  const { w, e } = below
  const c2 = cosTheta * cosTheta
  for (let i = 0; i < n; i++) {
    coherencyMatrix(packet.r, i, n, R)
    coherencyMatrix(packet.t, i, n, T)
    coherencyMatrix(packet.rBelow, i, n, R_BELOW)
    coherencyMatrix(packet.tUp, i, n, T_UP)
    for (let c = 0; c < 16; c++) W[c] = w[c * n + i]
    factorRoundTrips()
    for (let row = 0; row < 4; row++) X[row] = (T[4 * row] * c2 + T[4 * row + 1]) / 2
    solve()
    apply(W, X, V)
    apply(T_UP, V, X)
    const outP = (R[0] * c2 + R[1]) / 2 + X[0]
    const outS = (R[4] * c2 + R[5]) / 2 + X[1]
    reflectance[i] = outP / c2 + outS
    V[0] = e[i]
    V[1] = e[n + i]
    V[2] = e[2 * n + i]
    V[3] = e[3 * n + i]
    apply(R_BELOW, V, X)
    solve()
    apply(W, X, V)
    for (let row = 0; row < 4; row++) V[row] += e[row * n + i]
    apply(T_UP, V, X)
    for (let row = 0; row < 4; row++) emitted[row * n + i] = X[row]
  }
}

/** LU = factors of I - R_BELOW W. */
function factorRoundTrips(): void {
  for (let row = 0; row < 4; row++) {
    const k = 4 * row
    const a = R_BELOW[k]
    const b = R_BELOW[k + 1]
    const c = R_BELOW[k + 2]
    const d = R_BELOW[k + 3]
    LU[k] = -(a * W[0] + b * W[4] + c * W[8] + d * W[12])
    LU[k + 1] = -(a * W[1] + b * W[5] + c * W[9] + d * W[13])
    LU[k + 2] = -(a * W[2] + b * W[6] + c * W[10] + d * W[14])
    LU[k + 3] = -(a * W[3] + b * W[7] + c * W[11] + d * W[15])
    LU[k + row] += 1
  }
  LU[0] = 1 / LU[0]
  LU[4] *= LU[0]
  LU[8] *= LU[0]
  LU[12] *= LU[0]
  LU[5] = 1 / (LU[5] - LU[4] * LU[1])
  LU[6] -= LU[4] * LU[2]
  LU[7] -= LU[4] * LU[3]
  LU[9] = (LU[9] - LU[8] * LU[1]) * LU[5]
  LU[13] = (LU[13] - LU[12] * LU[1]) * LU[5]
  LU[10] = 1 / (LU[10] - LU[8] * LU[2] - LU[9] * LU[6])
  LU[11] -= LU[8] * LU[3] + LU[9] * LU[7]
  LU[14] = (LU[14] - LU[12] * LU[2] - LU[13] * LU[6]) * LU[10]
  LU[15] = 1 / (LU[15] - LU[12] * LU[3] - LU[13] * LU[7] - LU[14] * LU[11])
}

/** X ← (I - R_BELOW W)⁻¹ X. */
function solve(): void {
  const x0 = X[0]
  const x1 = X[1] - LU[4] * x0
  const x2 = X[2] - LU[8] * x0 - LU[9] * x1
  const x3 = X[3] - LU[12] * x0 - LU[13] * x1 - LU[14] * x2
  const y3 = x3 * LU[15]
  const y2 = (x2 - LU[11] * y3) * LU[10]
  const y1 = (x1 - LU[6] * y2 - LU[7] * y3) * LU[5]
  X[0] = (x0 - LU[1] * y1 - LU[2] * y2 - LU[3] * y3) * LU[0]
  X[1] = y1
  X[2] = y2
  X[3] = y3
}

/** out = m x; out may not be x. */
function apply(m: Float64Array, x: Float64Array, out: Float64Array): void {
  out[0] = m[0] * x[0] + m[1] * x[1] + m[2] * x[2] + m[3] * x[3]
  out[1] = m[4] * x[0] + m[5] * x[1] + m[6] * x[2] + m[7] * x[3]
  out[2] = m[8] * x[0] + m[9] * x[1] + m[10] * x[2] + m[11] * x[3]
  out[3] = m[12] * x[0] + m[13] * x[1] + m[14] * x[2] + m[15] * x[3]
}
