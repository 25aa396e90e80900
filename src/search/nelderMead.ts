/**
 * Minimization without derivatives: the downhill simplex of Nelder and Mead (Comput. J. 7, 308 (1965), doi:10.1093/comjnl/7.4.308)
 * as `fmin` has it, restarted from the best point until that no longer helps.
 *
 * What `fmin` 0.0.2 does that its caller must know, and what is done about it:
 * - the first simplex is `x0` with one coordinate after the other multiplied by `nonZeroDelta`: each run gets coordinates
 *   v = 1 + side (u - u0) of its own, in which x0 is (1, …, 1) and the simplex a right-angled one of the wanted size;
 * - `minTolerance` is ignored: `minErrorDelta` limits both the spread of the values and the distance of the two best corners.
 *   The values handed over are therefore scaled such that one number serves both;
 * - only the two best corners are compared, so that it can end too early: a restart follows in any case;
 * - it knows no bounds, no stop, no limit of evaluations: `Space` and `Recorder` do.
 */
/// <reference path="./fmin.d.ts" />
import { nelderMead as fmin } from 'fmin'
import { Recorder } from './recorder.js'
import {
  DEFAULT_TOLERANCE,
  type Objective,
  type Reason,
  resolution,
  type SearchOptions,
  type SearchResult,
} from './result.js'
import { Space, type Variable } from './variables.js'

export interface SimplexOptions extends SearchOptions {
  /** Edge of the first simplex as a share of each variable's range; default 0.1. */
  readonly step?: number
}

/**
 * How near the two best corners must be, as a share of the range, for a value to be settled to the tolerance: near a minimum
 * the value moves with the square of the distance.
 */
const cornerDistance = (tolerance: number): number => Math.min(1e-2, 0.5 * Math.sqrt(tolerance))
/** Edge of a restart's simplex relative to the one before. */
const RESTART_SHRINKAGE = 0.4
const SMALLEST_STEP = 1e-3
/** For values that are not finite: worse than any, and still comparable. */
const WORST = 1e300

/** The discrete variables keep the values they have in `start`. */
export function nelderMead(
  objective: Objective,
  variables: readonly Variable[],
  start: ArrayLike<number>,
  options: SimplexOptions = {},
): SearchResult {
  const space = new Space(variables)
  const tolerance = options.tolerance ?? DEFAULT_TOLERANCE
  const recorder = new Recorder(objective, space.nearest(start), options)
  let iterations = 0
  const reason = recorder.run((): Reason => {
    recorder.at(recorder.bestX.slice())
    if (space.continuous.length === 0) return 'converged'
    let step = options.step ?? 0.1
    for (;;) {
      const before = recorder.bestValue
      runSimplex(recorder, space, step, tolerance, iterations % 2 === 1)
      iterations++
      if (!(before - recorder.bestValue > resolution(tolerance, recorder.bestValue))) break
      step = Math.max(SMALLEST_STEP, step * RESTART_SHRINKAGE)
    }
    return Number.isFinite(recorder.bestValue) ? 'converged' : 'stalled'
  })
  const { bestX, bestValue, evaluations } = recorder
  return { x: bestX, value: bestValue, evaluations, iterations, reason }
}

/** One run from the best point so far; `backward`: towards lower coordinates where there is room. */
function runSimplex(recorder: Recorder, space: Space, step: number, tolerance: number, backward: boolean): void {
  const x = recorder.bestX.slice()
  const origin = space.continuous.map((i) => space.toUnit(i, x[i]))
  const side = space.continuous.map((i, k) => {
    if (space.isPeriodic(i)) return backward ? -1 : 1
    if (backward) return origin[k] - step < 0 ? 1 : -1
    return origin[k] + step > 1 ? -1 : 1
  })
  const distance = cornerDistance(tolerance)
  const scale = distance / resolution(tolerance, Number.isFinite(recorder.bestValue) ? recorder.bestValue : 0)
  const scaled = (v: number[]): number => {
    space.continuous.forEach((i, k) => {
      x[i] = space.fromUnit(i, origin[k] + side[k] * (v[k] - 1))
    })
    return Math.min(WORST, scale * recorder.at(x))
  }
  fmin(scaled, new Array(origin.length).fill(1), {
    maxIterations: Number.MAX_SAFE_INTEGER,
    nonZeroDelta: 1 + step,
    minErrorDelta: distance,
  })
}
