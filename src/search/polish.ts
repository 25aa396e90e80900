import { augmentedLagrangian, type ConstrainedResult } from './augmentedLagrangian.js'
import { nelderMead, type SimplexOptions } from './nelderMead.js'
import { type SearchProblem, violationOf } from './problem.js'
import { quasiNewton } from './quasiNewton.js'
import { DEFAULT_TOLERANCE, type ObjectiveWithGradient } from './result.js'

/**
 * A quasi-Newton step promises little also where its model of a curved valley is still poor: it is asked for more digits than the
 * simplex, which cost it few evaluations.
 */
const QUASI_NEWTON_SHARE = 1e-4

/**
 * The local minimum next to `start`, by the method that fits what is known of the problem. Constraints are often idle: with a
 * gradient they are left aside first, and heeded where the minimum misses one.
 */
export function polish(
  problem: SearchProblem,
  start: ArrayLike<number>,
  options: SimplexOptions = {},
): ConstrainedResult {
  const { variables, objective, objectiveWithGradient, constraints } = problem
  const free = objectiveWithGradient && descend(objectiveWithGradient, problem, start, options)
  if (constraints === undefined) {
    return free ?? { ...nelderMead(objective, variables, start, options), violation: 0 }
  }
  if (free !== undefined && (free.reason === 'stopped' || violationOf(constraints(free.x)) === 0)) return free
  const heeded = augmentedLagrangian({ ...problem, constraints }, free?.x ?? start, options)
  return { ...heeded, evaluations: heeded.evaluations + (free?.evaluations ?? 0) }
}

function descend(
  objective: ObjectiveWithGradient,
  { variables }: SearchProblem,
  start: ArrayLike<number>,
  options: SimplexOptions,
): ConstrainedResult {
  const tolerance = QUASI_NEWTON_SHARE * (options.tolerance ?? DEFAULT_TOLERANCE)
  return { ...quasiNewton(objective, variables, start, { ...options, tolerance }), violation: 0 }
}
