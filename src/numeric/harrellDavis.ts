import { incompleteBeta } from './incompleteBeta.js'

/**
 * Weights of `count` numbers in ascending order that make their quantile `p` (0 < p < 1): F. E. Harrell, C. E. Davis,
 * Biometrika 69, 635 (1982). All numbers near the quantile count, not two of them: it scatters less from sample to sample,
 * and moves evenly with the numbers, as a search needs it.
 */
export function harrellDavisWeights(count: number, p: number): Float64Array {
  const a = (count + 1) * p
  const b = (count + 1) * (1 - p)
  return Float64Array.from(
    { length: count },
    (_, i) => incompleteBeta((i + 1) / count, a, b) - incompleteBeta(i / count, a, b),
  )
}
