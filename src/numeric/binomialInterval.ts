import { inverseIncompleteBeta } from './incompleteBeta.js'

/**
 * Exact interval for the share of successes (C. J. Clopper, E. S. Pearson, Biometrika 26, 404 (1934)): it covers the true
 * share with at least probability `level`, also at 0 and at `count` successes. `count` ≥ 1.
 */
export function clopperPearson(successes: number, count: number, level: number): [low: number, high: number] {
  const tail = (1 - level) / 2
  const failures = count - successes
  return [
    successes === 0 ? 0 : inverseIncompleteBeta(tail, successes, failures + 1),
    failures === 0 ? 1 : inverseIncompleteBeta(1 - tail, successes + 1, failures),
  ]
}
