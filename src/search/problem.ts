import type { Objective, ObjectiveWithGradient } from './result.js'
import type { Variable } from './variables.js'

/** What a search is asked: functions of x, one number per variable in the variable's own unit. */
export interface SearchProblem {
  readonly variables: readonly Variable[]
  readonly objective: Objective
  /** Used by the polish as long as the constraints are met where it ends, where given. */
  readonly objectiveWithGradient?: ObjectiveWithGradient
  /** One number per constraint, in a unit of its own: met where <= 0, else how far it is missed. Always the same count. */
  readonly constraints?: (x: Float64Array) => readonly number[]
  /** A cheaper stand-in for the objective, by which starts are chosen and nothing else. */
  readonly screen?: Objective
  /** A cheaper stand-in for the first polish of each start; where that ends the problem itself is evaluated. */
  readonly rough?: Pick<SearchProblem, 'objective' | 'objectiveWithGradient' | 'constraints'>
}

/** A point with what is known of it. */
export interface Candidate {
  readonly x: Float64Array
  readonly value: number
  /** Largest constraint missed; 0 where all are met. */
  readonly violation: number
}

type Merit = Pick<Candidate, 'value' | 'violation'>

/** Whatever its value, a point that misses a constraint never beats one that meets them all. */
export function isBetter(a: Merit, b: Merit): boolean {
  return byMerit(a, b) < 0
}

/** Comparator of a sort, best first. */
export function byMerit(a: Merit, b: Merit): number {
  if (a.violation !== b.violation) return a.violation - b.violation
  return a.value - b.value || 0
}

export function violationOf(constraints: readonly number[]): number {
  // A constraint that is not a number is not met.
  return constraints.reduce((worst, c) => (Number.isNaN(c) ? Number.POSITIVE_INFINITY : Math.max(worst, c)), 0)
}
