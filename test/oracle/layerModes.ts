/**
 * The forward and the backward pair of waves of one layer, from the four eigenvalues of its Berreman matrix Δ.
 *
 * Each eigenvalue is called forward by the sign of its decay where it decays, else by the energy flux of its
 * eigenvector. With q₁, q₂ forward and q₃, q₄ backward, the theorem of Cayley and Hamilton says that the columns of
 * (Δ − q₃)(Δ − q₄) span the forward pair, also where q₁ = q₂ (isotropic layers) and single eigenvectors mean nothing.
 * Written as (E, Y E), that pair is one 2×2 admittance Y; E then obeys E' = i k0 S E with S = Δ_EE + Δ_EH Y.
 */
import { abs, add, type Complex, conj, div, exp, I, mul, ONE, scale, sqrt, sub } from './complex.js'
import {
  addMatrix,
  adjoint,
  block,
  identity,
  inverse,
  type Matrix,
  product,
  scaleMatrix,
  subMatrix,
} from './complexMatrix.js'
import {
  characteristicPolynomial,
  polishFactors,
  polynomialRoots,
  type Quadratic,
  quadraticWithRoots,
} from './eigenvalues.js'

/** All 2×2, on (Ex', Ey'): admittances give (Hy', −Hx'); S is the generator of propagation along z'. */
export interface LayerModes {
  readonly admittanceForward: Matrix
  readonly admittanceBackward: Matrix
  readonly generatorForward: Matrix
  readonly generatorBackward: Matrix
}

/** Roots closer than this, relative to the largest, are one cluster for the question of direction. */
const CLUSTER = 1e-4
/** Im q above this share of |q| is decay, below it rounding. */
const DECAY = 1e-5

/** Throws at a critical angle, where a forward and a backward wave fall together. */
export function layerModes(delta: Matrix): LayerModes {
  const coefficients = characteristicPolynomial(delta)
  const roots = polynomialRoots(coefficients)
  const isForward = roots.map((_, i) => pointsForward(delta, roots, i))
  const forward = roots.filter((_, i) => isForward[i])
  const backward = roots.filter((_, i) => !isForward[i])
  if (forward.length !== 2) throw new Error(`${forward.length} forward waves instead of 2: a critical angle`)
  const factors = polishFactors(
    coefficients,
    quadraticWithRoots(forward[0], forward[1]),
    quadraticWithRoots(backward[0], backward[1]),
  )
  const admittanceForward = admittanceOfRange(quadraticOf(factors.second, delta))
  const admittanceBackward = admittanceOfRange(quadraticOf(factors.first, delta))
  return {
    admittanceForward,
    admittanceBackward,
    generatorForward: generator(delta, admittanceForward),
    generatorBackward: generator(delta, admittanceBackward),
  }
}

function pointsForward(delta: Matrix, roots: readonly Complex[], index: number): boolean {
  const root = roots[index]
  const largest = Math.max(...roots.map(abs))
  if (Math.abs(root.im) > DECAY * abs(root)) return root.im > 0
  const others = roots.filter((other) => abs(sub(other, root)) > CLUSTER * largest)
  const range = others.reduce<Matrix>(
    (m, other) => product(subMatrix(delta, scaleMatrix(other, identity(4))), m),
    identity(4),
  )
  return energyFlux(largestColumn(range)) > 0
}

/** Twice the time-averaged Poynting vector along z', of ψ = (Ex', Ey', Hy', −Hx'). */
const energyFlux = (psi: readonly Complex[]): number => mul(psi[0], conj(psi[2])).re + mul(psi[1], conj(psi[3])).re

function largestColumn(m: Matrix): readonly Complex[] {
  const columns = m[0].map((_, j) => m.map((row) => row[j]))
  const size = (column: readonly Complex[]) => Math.hypot(...column.map(abs))
  return columns.reduce((best, column) => (size(column) > size(best) ? column : best))
}

/** Δ² − sum·Δ + product·I. */
const quadraticOf = (q: Quadratic, delta: Matrix): Matrix =>
  addMatrix(subMatrix(product(delta, delta), scaleMatrix(q.sum, delta)), scaleMatrix(q.product, identity(delta.length)))

/** Y of a rank-2 matrix whose columns are (E, Y E): with W its upper half, Y W is the lower one. */
function admittanceOfRange(range: Matrix): Matrix {
  const upper = block(range, 0, 0, 2, 4)
  const lower = block(range, 2, 0, 2, 4)
  return product(lower, adjoint(upper), inverse(product(upper, adjoint(upper))))
}

const generator = (delta: Matrix, admittance: Matrix): Matrix =>
  addMatrix(block(delta, 0, 0, 2, 2), product(block(delta, 0, 2, 2, 2), admittance))

/** Down through the layer: E at its lower face from E of the forward pair at its upper face. */
export const passDown = (modes: LayerModes, k0TimesThickness: number): Matrix =>
  exponential(scaleMatrix(scale(k0TimesThickness, I), modes.generatorForward))

/** Up through the layer: E at its upper face from E of the backward pair at its lower face. */
export const passUp = (modes: LayerModes, k0TimesThickness: number): Matrix =>
  exponential(scaleMatrix(scale(-k0TimesThickness, I), modes.generatorBackward))

/**
 * exp of a 2×2 matrix with eigenvalues m ± h: (e⁺ + e⁻)/2 · I + (e⁺ − e⁻)/(2h) · (M − m I), e± = exp(m ± h).
 * Nothing overflows where the waves decay.
 */
function exponential(matrix: Matrix): Matrix {
  const [[a, b], [c, d]] = matrix
  const m = scale(0.5, add(a, d))
  const halfDifference = scale(0.5, sub(a, d))
  const h = sqrt(add(mul(halfDifference, halfDifference), mul(b, c)))
  const plus = exp(add(m, h))
  const minus = exp(sub(m, h))
  const centered = subMatrix(matrix, scaleMatrix(m, identity(2)))
  const slope = abs(h) < 1e-4 ? mul(exp(m), shcOfSmall(h)) : div(sub(plus, minus), scale(2, h))
  return addMatrix(scaleMatrix(scale(0.5, add(plus, minus)), identity(2)), scaleMatrix(slope, centered))
}

/** sinh(h)/h for |h| < 1e-4: the next term, h⁴/120, is below the rounding unit. */
const shcOfSmall = (h: Complex): Complex => add(ONE, scale(1 / 6, mul(h, h)))
