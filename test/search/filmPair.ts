/**
 * The landscape the search is made for, in closed form: two retarders of free slow axis and retardance between an ideal
 * polarizer at 0° and an ideal mirror, normal incidence. With S3 the circular Stokes component that reaches the mirror, the
 * share `L = 1 - S3²` of the polarized light returns (Poincaré-sphere algebra, any textbook of polarized light).
 *
 * A weak fixed retarder before the pair (a protective film of 4 nm at 20°) breaks the mirror symmetry α → -α, β → -β, so that
 * designs which would be exactly as good differ a little; the front face adds 4 %.
 */
import type { Variable } from '../../src/search/variables.js'

const FRONT = 0.04
const PANEL = 0.45
const PROTECTIVE_NM = 4
const PROTECTIVE_RAD = (20 * Math.PI) / 180
/** Sixteen wavelengths, nm, and a smooth stand-in for the eye's weight (a bell of 45 nm about 557 nm). */
const WAVELENGTHS_NM = Array.from({ length: 16 }, (_, k) => 400 + 20 * k)
const WEIGHTS = WAVELENGTHS_NM.map((nm) => Math.exp(-(((nm - 557) / 45) ** 2) / 2) + 0.15)

/** Slow axes, radians, then retardances, nm. */
export const FILM_PAIR: readonly Variable[] = [
  { lower: 0, upper: Math.PI, period: Math.PI },
  { lower: 0, upper: Math.PI, period: Math.PI },
  { lower: 200, upper: 340 },
  { lower: 90, upper: 190 },
]

/** Retardances of up to more than a wave: quarter- and three-quarter-wave families side by side. */
export const WIDE_FILM_PAIR = FILM_PAIR.map((variable, i) => (i < 2 ? variable : { lower: 50, upper: 600 }))

/** Share of unpolarized light returned. */
export const filmPair = (x: ArrayLike<number>): number => reflectance(x, 1)

/** The same from every fourth wavelength. */
export const filmPairScreen = (x: ArrayLike<number>): number => reflectance(x, 4)

function reflectance(x: ArrayLike<number>, stride: number): number {
  let sum = 0
  let weights = 0
  for (let k = 0; k < WAVELENGTHS_NM.length; k += stride) {
    const s3 = circularAtMirror(x, WAVELENGTHS_NM[k])
    sum += WEIGHTS[k] * (1 - s3 * s3)
    weights += WEIGHTS[k]
  }
  return FRONT + (PANEL / 2) * (sum / weights)
}

function circularAtMirror(x: ArrayLike<number>, nm: number): number {
  const films = [
    [PROTECTIVE_RAD, PROTECTIVE_NM],
    [x[0], x[2]],
    [x[1], x[3]],
  ]
  let s = [1, 0, 0]
  for (const [axis, retardanceNm] of films) s = retarded(s, axis, (2 * Math.PI * retardanceNm) / nm)
  return s[2]
}

/** Turns (S1, S2, S3) by the retardance about the slow axis, which lies at 2 · axis on the equator. */
function retarded([s1, s2, s3]: readonly number[], axis: number, retardance: number): number[] {
  const [c, s] = [Math.cos(2 * axis), Math.sin(2 * axis)]
  const along = c * s1 + s * s2
  const across = -s * s1 + c * s2
  const turned = Math.cos(retardance) * across - Math.sin(retardance) * s3
  return [c * along - s * turned, s * along + c * turned, Math.sin(retardance) * across + Math.cos(retardance) * s3]
}
