/**
 * Eigenvalues of a 4×4 complex matrix as the roots of its characteristic polynomial
 * `q⁴ + c₃q³ + c₂q² + c₁q + c₀`: coefficients by Faddeev and LeVerrier, all roots at once by Durand and Kerner.
 *
 * A double root comes out only to about the square root of the rounding unit; sum and product of the pair that
 * contains it are good to all digits once `polishFactors` has been there.
 */
import { abs, add, type Complex, div, mul, neg, ONE, scale, sub, sum, ZERO } from './complex.js'
import { addMatrix, identity, type Matrix, product, scaleMatrix, solveLinear, trace } from './complexMatrix.js'

/** A monic quadratic q² − sum·q + product. */
export interface Quadratic {
  readonly sum: Complex
  readonly product: Complex
}

/** [c₀, c₁, c₂, c₃]; the leading coefficient is 1. */
export function characteristicPolynomial(a: Matrix): readonly Complex[] {
  const size = a.length
  const coefficients: Complex[] = []
  let m = identity(size)
  for (let k = 1; k <= size; k++) {
    const am = product(a, m)
    const c = scale(-1 / k, trace(am))
    coefficients.unshift(c)
    m = addMatrix(am, scaleMatrix(c, identity(size)))
  }
  return coefficients
}

const valueAt = (coefficients: readonly Complex[], q: Complex): Complex =>
  coefficients.reduceRight((value, c) => add(mul(value, q), c), ONE)

/** What rounding may leave of the value at a root. */
const roundingAt = (coefficients: readonly Complex[], q: Complex): number =>
  8 * Number.EPSILON * coefficients.reduceRight((value, c) => value * abs(q) + abs(c), 1)

/** Simple roots are there after a dozen rounds; those of a double one halve their distance in each. */
const MOST_ROUNDS = 200

/**
 * All roots of the monic polynomial, in no order. A root rests once the polynomial vanishes there to rounding: two
 * approximations of one double root would otherwise throw each other about.
 */
export function polynomialRoots(coefficients: readonly Complex[]): readonly Complex[] {
  const start: Complex = { re: 0.4, im: 0.9 }
  let roots: Complex[] = [ONE]
  while (roots.length < coefficients.length) roots.push(mul(roots[roots.length - 1], start))
  for (let round = 0; round < MOST_ROUNDS; round++) {
    const values = roots.map((root) => valueAt(coefficients, root))
    const rests = roots.map((root, i) => abs(values[i]) <= roundingAt(coefficients, root))
    if (rests.every(Boolean)) return roots
    roots = roots.map((root, i) => {
      if (rests[i]) return root
      const others = roots.filter((_, j) => j !== i).map((other) => sub(root, other))
      return sub(root, div(values[i], others.reduce(mul, ONE)))
    })
  }
  throw new Error('the roots of the characteristic polynomial were not found')
}

export const quadraticWithRoots = (a: Complex, b: Complex): Quadratic => ({ sum: add(a, b), product: mul(a, b) })

/**
 * Newton steps on the factors of `q⁴ + c₃q³ + c₂q² + c₁q + c₀ = (q² − s q + p)(q² − t q + u)`. Well conditioned as
 * long as the two factors have no root in common, however close the two roots of one factor may be.
 */
export function polishFactors(coefficients: readonly Complex[], first: Quadratic, second: Quadratic) {
  const [c0, c1, c2, c3] = coefficients
  let { sum: s, product: p } = first
  let { sum: t, product: u } = second
  for (let step = 0; step < 3; step++) {
    const residual = [
      add(c3, add(s, t)),
      sub(c2, sum([p, u, mul(s, t)])),
      add(c1, add(mul(s, u), mul(t, p))),
      sub(c0, mul(p, u)),
    ]
    const slopes: Matrix = [
      [neg(ONE), ZERO, neg(ONE), ZERO],
      [t, ONE, s, ONE],
      [neg(u), neg(t), neg(p), neg(s)],
      [ZERO, u, ZERO, p],
    ]
    const change = solveLinear(
      slopes,
      residual.map((r) => [r]),
    ).map((row) => row[0])
    s = add(s, change[0])
    p = add(p, change[1])
    t = add(t, change[2])
    u = add(u, change[3])
  }
  return { first: { sum: s, product: p }, second: { sum: t, product: u } }
}
