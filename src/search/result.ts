/** What every solver takes and returns. */

/**
 * f: Rⁿ → R, to be minimized. `x`, one number per variable in the variable's own unit, is lent: it must be neither kept nor
 * changed. A value that is not finite counts as the worst there is.
 */
export type Objective = (x: Float64Array) => number

/** The objective's value, returned, and its gradient, written to `gradient`: df/dx, one number per variable. */
export type ObjectiveWithGradient = (x: Float64Array, gradient: Float64Array) => number

/**
 * Why a search ended: the objective moved by less than the tolerance; the number of evaluations ran out; the caller asked;
 * no step improves the point though the tolerance is not reached (the limit of what the arithmetic resolves).
 */
export type Reason = 'converged' | 'limit' | 'stopped' | 'stalled'

export interface SearchResult {
  /** Best point evaluated, in the variables' own units, within their bounds. */
  readonly x: Float64Array
  /** Objective there; Infinity where no finite value was met. */
  readonly value: number
  readonly evaluations: number
  readonly iterations: number
  readonly reason: Reason
}

export interface SearchOptions {
  /** The search ends where the objective moves by less than `tolerance · max(1, |value|)`; default 1e-9. */
  readonly tolerance?: number
  /** Most evaluations of the objective; default 10,000. */
  readonly maxEvaluations?: number
  /** Polled before each evaluation; true ends the search with the best point so far. */
  readonly stopped?: () => boolean
}

export const DEFAULT_TOLERANCE = 1e-9
export const DEFAULT_MAX_EVALUATIONS = 10_000

/** The change of an objective near `value` that a search with this tolerance no longer follows. */
export function resolution(tolerance: number, value: number): number {
  return tolerance * Math.max(1, Math.abs(value))
}
