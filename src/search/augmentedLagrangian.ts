/**
 * Minimization under inequality constraints c(x) <= 0, without derivatives: the augmented Lagrangian of Powell, Hestenes and
 * Rockafellar (Rockafellar, J. Optim. Theory Appl. 12, 555 (1973), doi:10.1007/BF00934777),
 *
 *   L(x) = f(x) + Σ_i [max(0, λ_i + μ c_i)² - λ_i²] / 2μ,     then     λ_i ← max(0, λ_i + μ c_i),
 *
 * each L minimized by Nelder–Mead from the point before, μ raised tenfold where the constraints came less than fourfold nearer to
 * being met (Birgin, Martínez, Practical Augmented Lagrangian Methods, SIAM 2014, ch. 4).
 *
 * The constraints are asked a hair tighter than stated, and the best point that meets them as stated is kept from all those
 * evaluated: the answer meets them to the last digit, at a cost of multiplier × hair.
 */

import { nelderMead, type SimplexOptions } from './nelderMead.js'
import { type Candidate, isBetter, type SearchProblem, violationOf } from './problem.js'
import { DEFAULT_MAX_EVALUATIONS, DEFAULT_TOLERANCE, type Reason, resolution, type SearchResult } from './result.js'

export interface ConstrainedResult extends SearchResult {
  /** Largest constraint missed; 0 where all are met. */
  readonly violation: number
}

/** How much tighter the constraints are asked, in their own units; and how near they are then to be met. */
const HAIR = 1e-8
const GROWTH = 10
const WANTED_PROGRESS = 0.25
const ROUNDS = 40

export function augmentedLagrangian(
  problem: SearchProblem & { readonly constraints: NonNullable<SearchProblem['constraints']> },
  start: ArrayLike<number>,
  options: SimplexOptions = {},
): ConstrainedResult {
  const lagrangian = new Lagrangian(problem, start)
  const tolerance = options.tolerance ?? DEFAULT_TOLERANCE
  const limit = options.maxEvaluations ?? DEFAULT_MAX_EVALUATIONS
  let x: Float64Array = Float64Array.from(start)
  let evaluations = 0
  let step = options.step
  let missed = Number.POSITIVE_INFINITY
  const finish = (iterations: number, reason: Reason): ConstrainedResult => ({
    ...lagrangian.best,
    evaluations,
    iterations,
    reason,
  })
  for (let round = 1; round <= ROUNDS; round++) {
    const inner = nelderMead(lagrangian.at, problem.variables, x, {
      ...options,
      step,
      maxEvaluations: limit - evaluations,
    })
    evaluations += inner.evaluations
    if (inner.reason === 'limit' || inner.reason === 'stopped') return finish(round, inner.reason)
    const moved = Math.abs(lagrangian.update(inner.x, missed))
    missed = lagrangian.missed
    x = inner.x
    // Later rounds begin near their end.
    step = 0.02
    if (missed <= HAIR / 2 && moved <= resolution(tolerance, inner.value)) return finish(round, 'converged')
  }
  return finish(ROUNDS, 'stalled')
}

class Lagrangian {
  best: Candidate
  /** Largest of max(c, -λ/μ): how far the constraints, and the rule that a slack one has no multiplier, are from being met. */
  missed = Number.POSITIVE_INFINITY
  private multipliers: number[] = []
  private weight = 0

  constructor(
    private readonly problem: SearchProblem & { readonly constraints: NonNullable<SearchProblem['constraints']> },
    start: ArrayLike<number>,
  ) {
    this.best = {
      x: Float64Array.from(start),
      value: Number.POSITIVE_INFINITY,
      violation: Number.POSITIVE_INFINITY,
    }
  }

  /** L at x; every point passes here, so the best is kept here too. */
  readonly at = (x: Float64Array): number => {
    const value = this.problem.objective(x)
    const constraints = this.problem.constraints(x)
    const violation = violationOf(constraints)
    if (Number.isFinite(value) && isBetter({ value, violation }, this.best)) {
      this.best = { x: x.slice(), value, violation }
    }
    if (this.weight === 0) this.begin(value, constraints)
    return constraints.reduce((sum, c, i) => sum + this.term(c + HAIR, i), value)
  }

  /** Takes the multipliers from the minimum just found; returns by how much L changes there. */
  update(x: Float64Array, missedBefore: number): number {
    const constraints = this.problem.constraints(x).map((c) => c + HAIR)
    const before = constraints.reduce((sum, c, i) => sum + this.term(c, i), 0)
    this.missed = constraints.reduce(
      (worst, c, i) => Math.max(worst, Math.abs(Math.max(c, -this.multipliers[i] / this.weight))),
      0,
    )
    this.multipliers = constraints.map((c, i) => Math.max(0, this.multipliers[i] + this.weight * c))
    if (this.missed > WANTED_PROGRESS * missedBefore) this.weight *= GROWTH
    return constraints.reduce((sum, c, i) => sum + this.term(c, i), 0) - before
  }

  private term(c: number, i: number): number {
    const shifted = Math.max(0, this.multipliers[i] + this.weight * c)
    return (shifted * shifted - this.multipliers[i] ** 2) / (2 * this.weight)
  }

  /** The first weight balances objective and constraints at the first point. */
  private begin(value: number, constraints: readonly number[]): void {
    const squares = constraints.reduce((sum, c) => sum + Math.max(0, c) ** 2, 0)
    const balance = (2 * Math.abs(value)) / squares
    this.weight = Number.isFinite(balance) ? Math.min(1e6, Math.max(1, balance)) : 10
    this.multipliers = constraints.map(() => 0)
  }
}
