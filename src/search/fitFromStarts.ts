import { Families } from './families.js'
import { type LeastSquaresOptions, type LeastSquaresResult, leastSquares } from './leastSquares.js'
import type { ResidualProblem } from './residualProblem.js'
import { StartPoints } from './startPoints.js'
import { Space } from './variables.js'

export interface StartsOptions extends LeastSquaresOptions {
  /** A point in hand, from which the first fit begins. */
  readonly start?: ArrayLike<number>
  /** Fits from Sobol' points besides; default 8. */
  readonly starts?: number
  /** Of the Sobol' points; default 1. */
  readonly seed?: number
  /** Share of a variable's range below which two solutions are one; default 0.02. */
  readonly separation?: number
}

/** The best of the fits, `evaluations` and `iterations` of all of them together. */
export interface StartsResult extends LeastSquaresResult {
  /** Distinct solutions, best first: what else would explain the data, and how well. */
  readonly solutions: readonly { readonly x: Float64Array; readonly value: number; readonly hits: number }[]
}

/** Bounded least squares from several starts; the tolerance and the limit of evaluations hold for each. */
export function fitFromStarts(problem: ResidualProblem, options: StartsOptions = {}): StartsResult {
  const space = new Space(problem.variables)
  const startPoints = new StartPoints(space, options.seed ?? 1)
  const spread = Array.from({ length: options.starts ?? 8 }, (_, k) => startPoints.point(k))
  const starts = options.start === undefined ? spread : [space.nearest(options.start), ...spread]
  const solutions = new Families(space, options.separation ?? 0.02)
  let best: LeastSquaresResult | undefined
  let [evaluations, iterations] = [0, 0]
  for (const start of starts) {
    const fit = leastSquares(problem, start, options)
    evaluations += fit.evaluations
    iterations += fit.iterations
    solutions.add({ ...fit, violation: 0 })
    if (best === undefined || fit.value < best.value) best = fit
    if (fit.reason === 'stopped') {
      best = { ...best, reason: 'stopped' }
      break
    }
  }
  if (best === undefined) throw new RangeError('A fit needs at least one start.')
  return { ...best, evaluations, iterations, solutions: solutions.within(Number.POSITIVE_INFINITY) }
}
