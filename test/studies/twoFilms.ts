/**
 * Production of an ideal laminate, computed apart from the project: ideal polarizer, two flat films, ideal mirror, no faces.
 * Poincaré-sphere algebra of any textbook of polarized light: with S3 the circular Stokes component that reaches the mirror,
 * the share ½ (1 - S3²) of unpolarized light comes back.
 */
import { luminousMean } from '../oracle/luminousMean.js'

export interface TwoFilms {
  readonly halfAxisDeg: number
  readonly halfNm: number
  readonly quarterAxisDeg: number
  readonly quarterNm: number
}

export const WAVELENGTHS_NM = Array.from({ length: 31 }, (_, k) => 400 + 10 * k)

type Stokes = readonly [s1: number, s2: number, s3: number]

/** Luminous reflectance behind a polarizer whose transmission axis is at 0°. */
export function luminousReflectance({ halfAxisDeg, halfNm, quarterAxisDeg, quarterNm }: TwoFilms): number {
  const spectrum = WAVELENGTHS_NM.map((nm) => {
    const between = turned([1, 0, 0], halfAxisDeg, (360 * halfNm) / nm)
    const [, , s3] = turned(between, quarterAxisDeg, (360 * quarterNm) / nm)
    return (1 - s3 * s3) / 2
  })
  return luminousMean(WAVELENGTHS_NM, spectrum)
}

/** Rotation of the sphere about a retarder's axis by its retardance (Rodrigues' formula). */
function turned([s1, s2, s3]: Stokes, axisDeg: number, retardanceDeg: number): Stokes {
  const [a1, a2] = [Math.cos((axisDeg * Math.PI) / 90), Math.sin((axisDeg * Math.PI) / 90)]
  const [cos, sin] = [Math.cos((retardanceDeg * Math.PI) / 180), Math.sin((retardanceDeg * Math.PI) / 180)]
  const along = (a1 * s1 + a2 * s2) * (1 - cos)
  return [
    s1 * cos + a2 * s3 * sin + a1 * along,
    s2 * cos - a1 * s3 * sin + a2 * along,
    s3 * cos + (a1 * s2 - a2 * s1) * sin,
  ]
}

/** Linear congruential generator (D. H. Lehmer's, modulus 2^31 - 1; multiplier 48271 of S. K. Park, K. W. Miller, P. K. Stockmeyer, 1993). */
export function lehmer(seed: number): () => number {
  let state = seed
  return () => {
    state = (state * 48271) % 2147483647
    return state / 2147483647
  }
}

/** Standard normal numbers by the method of G. E. P. Box, M. E. Muller, Ann. Math. Stat. 29, 610 (1958). */
export function boxMuller(uniform: () => number): () => number {
  return () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform())
}
