/**
 * Stokes vectors and Mueller matrices from coherency vectors (ExEx*, ExEy*, EyEx*, EyEy*) of the tangential field.
 *
 * In a medium where the wave makes the angle θ with the normal, Ep = Ex' / cos θ and Es = Ey', for the light that
 * goes in and for the light that comes back. So the axes p and s look the same in the plane of the display for both
 * (x' at the azimuth φ, y' at φ − 90°), and an ideal mirror leaves S1 and S2 as they are.
 *
 *   S0 = |Ep|² + |Es|²,  S1 = |Ep|² − |Es|²,  S2 = 2 Re(Ep Es*),
 *   S3 = −2 Im(Ep Es*) going in,  S3 = +2 Im(Ep Es*) coming out.
 *
 * S3 > 0 is right-handed, named from the source with the thumb along the propagation: with exp(−iωt), Es = i Ep turns
 * from x' to y', which is right-handed about z', the way in. (p, s, k) is right-handed going in and left-handed coming
 * out, hence the two signs. An ideal mirror at normal incidence is diag(1, 1, 1, −1): it turns the hand over.
 */
import { type Complex, I, mul, neg, ONE, real, scale, ZERO } from './complex.js'
import { inverse, type Matrix, product } from './complexMatrix.js'

type Direction = 'in' | 'out'
export type Stokes = readonly [number, number, number, number]
export type Mueller = readonly [Stokes, Stokes, Stokes, Stokes]

/** 4×4: (S0, S1, S2, S3) of a coherency vector. */
function stokesOfCoherency(cosTheta: number, direction: Direction): Matrix {
  const pp = real(1 / (cosTheta * cosTheta))
  const ps = real(1 / cosTheta)
  const hand: Complex = direction === 'in' ? I : neg(I)
  return [
    [pp, ZERO, ZERO, ONE],
    [pp, ZERO, ZERO, neg(ONE)],
    [ZERO, ps, ps, ZERO],
    [ZERO, mul(hand, ps), neg(mul(hand, ps)), ZERO],
  ]
}

/** The coherency vector of unpolarized light with |Ep|² + |Es|² = 1, as a column. */
export const unpolarizedCoherency = (cosTheta: number): Matrix => [
  [real((cosTheta * cosTheta) / 2)],
  [ZERO],
  [ZERO],
  [real(0.5)],
]

/** Of an outgoing coherency vector (a column), times `factor`. */
export function outgoingStokes(coherency: Matrix, cosTheta: number, factor: number): Stokes {
  const [s0, s1, s2, s3] = product(stokesOfCoherency(cosTheta, 'out'), coherency).map((row) => scale(factor, row[0]).re)
  return [s0, s1, s2, s3]
}

/** Of a 4×4 map from the incoming to the outgoing coherency vector, both in one medium. */
export function reflectionMueller(map: Matrix, cosTheta: number): Mueller {
  const matrix = product(stokesOfCoherency(cosTheta, 'out'), map, inverse(stokesOfCoherency(cosTheta, 'in')))
  const row = (i: number): Stokes => [matrix[i][0].re, matrix[i][1].re, matrix[i][2].re, matrix[i][3].re]
  return [row(0), row(1), row(2), row(3)]
}

/** Share of unpolarized light that a map of coherency vectors returns, both in one medium. */
export const unpolarizedShare = (map: Matrix, cosTheta: number): number => reflectionMueller(map, cosTheta)[0][0]
