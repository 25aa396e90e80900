import { augmentedLagrangian, type ConstrainedResult } from './augmentedLagrangian.js'
import { nelderMead, type SimplexOptions } from './nelderMead.js'
import type { SearchProblem } from './problem.js'
import { quasiNewton } from './quasiNewton.js'
import { DEFAULT_TOLERANCE } from './result.js'

/**
 * A quasi-Newton step promises little also where its model of a curved valley is still poor: it is asked for more digits than the
 * simplex, which cost it few evaluations.
 */
const QUASI_NEWTON_SHARE = 1e-4

/** The local minimum next to `start`, by the method that fits what is known of the problem. */
export function polish(
  problem: SearchProblem,
  start: ArrayLike<number>,
  options: SimplexOptions = {},
): ConstrainedResult {
  const { variables, objective, objectiveWithGradient, constraints } = problem
  if (constraints !== undefined) return augmentedLagrangian({ ...problem, constraints }, start, options)
  const result =
    objectiveWithGradient === undefined
      ? nelderMead(objective, variables, start, options)
      : quasiNewton(objectiveWithGradient, variables, start, {
          ...options,
          tolerance: QUASI_NEWTON_SHARE * (options.tolerance ?? DEFAULT_TOLERANCE),
        })
  return { ...result, violation: 0 }
}
