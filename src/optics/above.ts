/**
 * Everything above a thick medium as one block: what unpolarized light sends down (v), what reaches the eye of light
 * coming up (tUp), what is turned back down (rBelow), and the reflectance of the block by itself (r0). With it a change
 * far down the stack does not climb through the layers that did not change. Grown downward, packet by packet:
 *
 *   v ← t G v,  r0 ← r0 + u r G v,  tUp ← tUp H tUp',  rBelow ← rBelow' + t rBelow H tUp',
 *   G = (I - rBelow r)⁻¹,  H = (I - r rBelow)⁻¹ = I + r G rBelow,  u = (1/cos²θ, 1, 0, 0) tUp,
 *
 * where t, r, tUp', rBelow' are the packet's. All on the coherency vector of `coherency.ts`.
 */
import type { Below } from './adding.js'
import { coherencyMatrix } from './coherency.js'
import { apply, multiply4, RoundTrips } from './matrix4.js'
import type { Packet } from './packet.js'

export interface Above {
  /** Lowest packet in the block; counted from the panel. */
  from: number
  readonly v: Float64Array
  readonly tUp: Float64Array
  readonly rBelow: Float64Array
  readonly r0: Float64Array
}

export function createAbove(count: number): Above {
  return {
    from: -1,
    v: new Float64Array(4 * count),
    tUp: new Float64Array(16 * count),
    rBelow: new Float64Array(16 * count),
    r0: new Float64Array(count),
  }
}

const R = new Float64Array(16)
const T = new Float64Array(16)
const R_BELOW = new Float64Array(16)
const T_UP = new Float64Array(16)
const BLOCK_T_UP = new Float64Array(16)
const BLOCK_R = new Float64Array(16)
const A = new Float64Array(16)
const B = new Float64Array(16)
const X = new Float64Array(4)
const V = new Float64Array(4)
const TRIPS = new RoundTrips()

/** The block of the topmost packet alone; `c2` is cos²θ in air. */
export function startAbove(above: Above, packet: Packet, from: number, c2: number, n: number): void {
  above.from = from
  for (let i = 0; i < n; i++) {
    coherencyMatrix(packet.r, i, n, R)
    above.r0[i] = (R[0] * c2 + R[1]) / (2 * c2) + (R[4] * c2 + R[5]) / 2
    coherencyMatrix(packet.t, i, n, T)
    for (let row = 0; row < 4; row++) above.v[row * n + i] = (T[4 * row] * c2 + T[4 * row + 1]) / 2
    coherencyMatrix(packet.tUp, i, n, T_UP)
    coherencyMatrix(packet.rBelow, i, n, R_BELOW)
    for (let c = 0; c < 16; c++) {
      above.tUp[c * n + i] = T_UP[c]
      above.rBelow[c * n + i] = R_BELOW[c]
    }
  }
}

/** Takes the next packet below into the block. */
export function extendAbove(above: Above, packet: Packet, c2: number, n: number): void {
  above.from--
  for (let i = 0; i < n; i++) {
    coherencyMatrix(packet.r, i, n, R)
    coherencyMatrix(packet.t, i, n, T)
    coherencyMatrix(packet.rBelow, i, n, R_BELOW)
    coherencyMatrix(packet.tUp, i, n, T_UP)
    for (let c = 0; c < 16; c++) {
      BLOCK_T_UP[c] = above.tUp[c * n + i]
      BLOCK_R[c] = above.rBelow[c * n + i]
    }
    for (let c = 0; c < 4; c++) X[c] = above.v[c * n + i]
    TRIPS.factor(BLOCK_R, R)
    TRIPS.solve(X)
    apply(R, X, V)
    let r0 = above.r0[i]
    for (let c = 0; c < 4; c++) r0 += (BLOCK_T_UP[c] / c2 + BLOCK_T_UP[4 + c]) * V[c]
    above.r0[i] = r0
    apply(T, X, V)
    for (let c = 0; c < 4; c++) above.v[c * n + i] = V[c]
    // A = G rBelow tUp' column by column; tUp H tUp' = tUp tUp' + tUp r A.
    multiply4(BLOCK_R, T_UP, A)
    for (let column = 0; column < 4; column++) {
      for (let row = 0; row < 4; row++) X[row] = A[4 * row + column]
      TRIPS.solve(X)
      for (let row = 0; row < 4; row++) A[4 * row + column] = X[row]
    }
    multiply4(T, A, B)
    for (let c = 0; c < 16; c++) above.rBelow[c * n + i] = R_BELOW[c] + B[c]
    multiply4(R, A, B)
    for (let c = 0; c < 16; c++) T_UP[c] += B[c]
    multiply4(BLOCK_T_UP, T_UP, B)
    for (let c = 0; c < 16; c++) above.tUp[c * n + i] = B[c]
  }
}

/**
 * The same where neither block nor packet mixes p and s: |Ex'|², |Ey'|² and Ex'Ey'* each go their own way, as two real
 * numbers and a complex one.
 */
export function extendAboveDiagonal(above: Above, packet: Packet, c2: number, n: number): void {
  above.from--
  extendPower(above, packet, 0, 1 / c2, n)
  extendPower(above, packet, 1, 1, n)
  extendCross(above, packet, n)
}

/** |Ex'|² (axis 0) or |Ey'|² (axis 1); `weight` is that axis's share in what leaves to the eye. */
function extendPower(above: Above, packet: Packet, axis: number, weight: number, n: number): void {
  const re = 6 * axis * n
  const im = re + n
  const at = 5 * axis * n
  for (let i = 0; i < n; i++) {
    const r = packet.r[re + i] ** 2 + packet.r[im + i] ** 2
    const t = packet.t[re + i] ** 2 + packet.t[im + i] ** 2
    const rBelow = packet.rBelow[re + i] ** 2 + packet.rBelow[im + i] ** 2
    const tUp = packet.tUp[re + i] ** 2 + packet.tUp[im + i] ** 2
    const blockR = above.rBelow[at + i]
    const blockT = above.tUp[at + i]
    const trips = 1 / (1 - blockR * r)
    const down = trips * above.v[axis * n + i]
    above.r0[i] += weight * blockT * r * down
    above.v[axis * n + i] = t * down
    above.tUp[at + i] = blockT * trips * tUp
    above.rBelow[at + i] = rBelow + t * blockR * trips * tUp
  }
}

/** Ex'Ey'* as a complex number; unpolarized light going in has none. */
function extendCross(above: Above, packet: Packet, n: number): void {
  const { r, t, rBelow, tUp } = packet
  for (let i = 0; i < n; i++) {
    const rRe = crossRe(r, i, n)
    const rIm = crossIm(r, i, n)
    const tRe = crossRe(t, i, n)
    const tIm = crossIm(t, i, n)
    const uRe = crossRe(tUp, i, n)
    const uIm = crossIm(tUp, i, n)
    const bRe = above.rBelow[10 * n + i]
    const bIm = above.rBelow[14 * n + i]
    const oneRe = 1 - (bRe * rRe - bIm * rIm)
    const oneIm = -(bRe * rIm + bIm * rRe)
    const scale = 1 / (oneRe * oneRe + oneIm * oneIm)
    // h = trips × tUp'
    const hRe = (uRe * oneRe + uIm * oneIm) * scale
    const hIm = (uIm * oneRe - uRe * oneIm) * scale
    const pRe = above.tUp[10 * n + i]
    const pIm = above.tUp[14 * n + i]
    setCross(above.tUp, i, n, pRe * hRe - pIm * hIm, pRe * hIm + pIm * hRe)
    const qRe = tRe * bRe - tIm * bIm
    const qIm = tRe * bIm + tIm * bRe
    setCross(
      above.rBelow,
      i,
      n,
      crossRe(rBelow, i, n) + qRe * hRe - qIm * hIm,
      crossIm(rBelow, i, n) + qRe * hIm + qIm * hRe,
    )
  }
}

/** m00 m11* of a diagonal 2×2. */
function crossRe(m: Float64Array, i: number, n: number): number {
  return m[i] * m[6 * n + i] + m[n + i] * m[7 * n + i]
}

function crossIm(m: Float64Array, i: number, n: number): number {
  return m[n + i] * m[6 * n + i] - m[i] * m[7 * n + i]
}

function setCross(m: Float64Array, i: number, n: number, re: number, im: number): void {
  m[10 * n + i] = re
  m[11 * n + i] = -im
  m[14 * n + i] = im
  m[15 * n + i] = re
}

/**
 * The block on what lies below it: R = r0 + u W (I - rBelow W)⁻¹ v, and the light emitted to the eye (`4 n` numbers on the
 * coherency vector in air), tUp (e + W (I - rBelow W)⁻¹ rBelow e).
 */
export function closeStack(
  above: Above,
  below: Below,
  c2: number,
  reflectance: Float64Array,
  emitted: Float64Array,
  n: number,
): void {
  for (let i = 0; i < n; i++) {
    for (let c = 0; c < 16; c++) {
      A[c] = below.w[c * n + i]
      BLOCK_R[c] = above.rBelow[c * n + i]
      BLOCK_T_UP[c] = above.tUp[c * n + i]
    }
    TRIPS.factor(BLOCK_R, A)
    for (let c = 0; c < 4; c++) X[c] = above.v[c * n + i]
    TRIPS.solve(X)
    apply(A, X, V)
    let sum = above.r0[i]
    for (let c = 0; c < 4; c++) sum += (BLOCK_T_UP[c] / c2 + BLOCK_T_UP[4 + c]) * V[c]
    reflectance[i] = sum
    for (let c = 0; c < 4; c++) V[c] = below.e[c * n + i]
    apply(BLOCK_R, V, X)
    TRIPS.solve(X)
    apply(A, X, V)
    for (let c = 0; c < 4; c++) V[c] += below.e[c * n + i]
    apply(BLOCK_T_UP, V, X)
    for (let c = 0; c < 4; c++) emitted[c * n + i] = X[c]
  }
}
