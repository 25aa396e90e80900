/**
 * Variance-based sensitivity of f: [0, 1]^k → R under uniform independent inputs (I. M. Sobol', Math. Comput. Simul. 55, 271
 * (2001)): the share S_i of the variance of f that goes when input i is known, and the share T_i that stays when all but
 * input i are known (i with all its interactions). Estimators over the points A, B and A with coordinate i from B (A_B):
 *
 *   V S_i = mean f(B) (f(A_B) - f(A))        A. Saltelli et al., Comput. Phys. Commun. 181, 259 (2010), table 2 (b)
 *   V T_i = mean (f(A) - f(A_B))² / 2        M. J. W. Jansen, Comput. Phys. Commun. 117, 35 (1999); ibid. (f)
 *
 * A and B are the halves of scrambled Sobol' points in 2k dimensions. Several independent scramblings, each a replicate,
 * tell the uncertainty: a delete-one jackknife of the ratio of sums (B. Efron, C. Stein, Ann. Stat. 9, 586 (1981)).
 */
import { createRandomPoints } from './randomPoints.js'
import { createSobol, SOBOL_DIMENSIONS } from './sobol.js'

export interface Estimate {
  readonly value: number
  /** 95 % interval. */
  readonly low: number
  readonly high: number
}

export interface SobolIndices {
  /** S_i by input. */
  readonly first: readonly Estimate[]
  /** T_i by input. */
  readonly total: readonly Estimate[]
  readonly variance: number
  readonly evaluations: number
}

/** What one replicate adds up to: plain data, so that it can be computed anywhere. */
export interface SobolReplicate {
  readonly variance: number
  /** V S_i and V T_i by input. */
  readonly first: readonly number[]
  readonly total: readonly number[]
  readonly evaluations: number
}

/** Replicates the interval is made for. */
export const REPLICATES = 16
/** Student's t at 97.5 % with 15 degrees of freedom (NIST/SEMATECH e-Handbook of Statistical Methods, 1.3.6.7.2). */
const STUDENT_T = 2.131

/** All replicates of `points` base points each (a power of two is best); the cost is REPLICATES points (k + 2) calls. */
export function sobolIndices(
  f: (point: Float64Array) => number,
  dimensions: number,
  { points, seed }: { readonly points: number; readonly seed: number },
): SobolIndices {
  const replicates = Array.from({ length: REPLICATES }, (_, k) =>
    sobolReplicate(f, dimensions, { points, seed: replicateSeed(seed, k) }),
  )
  return indicesOf(replicates)
}

/** Seed of a replicate's scrambling. */
export function replicateSeed(seed: number, replicate: number): number {
  return seed * REPLICATES + replicate
}

export function sobolReplicate(
  f: (point: Float64Array) => number,
  dimensions: number,
  { points, seed }: { readonly points: number; readonly seed: number },
): SobolReplicate {
  const width = 2 * dimensions
  const set = width <= SOBOL_DIMENSIONS ? createSobol(width, seed) : createRandomPoints(width, seed)
  const both = new Float64Array(width)
  const atA = new Float64Array(points)
  const atB = new Float64Array(points)
  const mixed = Array.from({ length: dimensions }, () => new Float64Array(points))
  for (let n = 0; n < points; n++) {
    set.point(n, both)
    const a = both.slice(0, dimensions)
    const b = both.subarray(dimensions)
    atB[n] = f(b)
    atA[n] = f(a)
    for (let i = 0; i < dimensions; i++) {
      const own = a[i]
      a[i] = b[i]
      mixed[i][n] = f(a)
      a[i] = own
    }
  }
  return sumUp(atA, atB, mixed)
}

/** f about its mean: the estimator of S_i loses no digits to a large mean. */
function sumUp(atA: Float64Array, atB: Float64Array, mixed: readonly Float64Array[]): SobolReplicate {
  const points = atA.length
  const mean = (sum(atA) + sum(atB)) / (2 * points)
  const squares = [...atA, ...atB].reduce((total, value) => total + (value - mean) ** 2, 0)
  const average = (term: (n: number) => number) => {
    let total = 0
    for (let n = 0; n < points; n++) total += term(n)
    return total / points
  }
  return {
    variance: squares / (2 * points - 1),
    first: mixed.map((values) => average((n) => (atB[n] - mean) * (values[n] - atA[n]))),
    total: mixed.map((values) => average((n) => (atA[n] - values[n]) ** 2 / 2)),
    evaluations: points * (mixed.length + 2),
  }
}

/** Indices with their intervals; all 0 where f does not vary. Fewer replicates than REPLICATES make the intervals too narrow. */
export function indicesOf(replicates: readonly SobolReplicate[]): SobolIndices {
  const variances = replicates.map(({ variance }) => variance)
  const inputs = replicates[0]?.first.map((_, i) => i) ?? []
  return {
    first: inputs.map((i) =>
      jackknife(
        replicates.map(({ first }) => first[i]),
        variances,
      ),
    ),
    total: inputs.map((i) =>
      jackknife(
        replicates.map(({ total }) => total[i]),
        variances,
      ),
    ),
    variance: sum(variances) / replicates.length,
    evaluations: replicates.reduce((count, { evaluations }) => count + evaluations, 0),
  }
}

/** Ratio of two sums over replicates. */
function jackknife(parts: readonly number[], wholes: readonly number[]): Estimate {
  const count = parts.length
  const part = sum(parts)
  const whole = sum(wholes)
  if (whole === 0) return { value: 0, low: 0, high: 0 }
  const without = parts.map((value, r) => (part - value) / (whole - wholes[r]))
  const mean = sum(without) / count
  const squares = without.reduce((total, value) => total + (value - mean) ** 2, 0)
  const reach = STUDENT_T * Math.sqrt(((count - 1) / count) * squares)
  const value = part / whole
  return { value, low: value - reach, high: value + reach }
}

function sum(values: ArrayLike<number>): number {
  let total = 0
  for (let i = 0; i < values.length; i++) total += values[i]
  return total
}
