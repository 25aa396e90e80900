/**
 * Nonlinear least squares in a box: min ½ ‖r(x)‖², r: Rⁿ → Rᵐ, by the method of Levenberg and Marquardt as Moré has it (Lecture
 * Notes in Mathematics 630, 105 (1978), doi:10.1007/BFb0067700), with an active set for the bounds.
 *
 * With J = dr/dx and D the diagonal of the largest column norms of J met so far (so that units do not matter):
 * 1. A bound is active where x lies on it and the gradient g = Jᵀ r points out of the box under descent. Active variables rest.
 * 2. For the free ones the step p minimizes ‖J p + r‖² + μ ‖D p‖². J = Q R is factored once per iteration; each μ then
 *    costs the factors of the small matrix (R; √μ D). The step is cut at the bounds: p ← P[x + p] - x.
 * 3. The gain ratio of the reduction to that of the linear model, ½‖r‖² - ½‖r + J p‖², accepts the step (> 1e-4) and sets
 *    the next μ: times max(1/3, 1 - (2 gain - 1)³), or doubled ever faster after a failure (Nielsen, report IMM-REP-1999-05,
 *    Technical University of Denmark).
 *
 * It ends where the part of r in the span of the free columns, ½ ‖Qᵀ r‖², is less than the tolerance's share of ½ ‖r‖²: what
 * the linear model at most promises (the relative offset of Bates and Watts, Technometrics 23, 179 (1981)).
 */
import { Matrix, QrDecomposition } from 'ml-matrix'
import { type Certainty, certaintyOf } from './certainty.js'
import { Recorder } from './recorder.js'
import { isHeld, jacobianAt, type ResidualProblem } from './residualProblem.js'
import type { Reason, SearchOptions, SearchResult } from './result.js'
import { Space } from './variables.js'

export interface LeastSquaresOptions extends SearchOptions {
  /** Of the sum of squares, the share that a step must promise to be tried; default 1e-12. */
  readonly tolerance?: number
}

/** `value` is ½ ‖r‖². */
export interface LeastSquaresResult extends SearchResult {
  /** r at `x`. */
  readonly residuals: Float64Array
  readonly certainty: Certainty
}

const DEFAULT_SHARE = 1e-12
const SUFFICIENT_GAIN = 1e-4
const FIRST_DAMPING = 1e-3
const LARGEST_DAMPING = 1e20
/** Below this share of the first sum of squares the fit is exact. */
const EXACT = 1e-24
/**
 * Where no step helps, the search has still converged if no single variable promises more than this share: with nearly collinear
 * columns and large residuals the model promises more along their difference than there is, and what there is drowns in rounding.
 */
const UNRESOLVED = 1e-12

/** The discrete variables keep the values they have in `start`. Evaluations include those of the differences. */
export function leastSquares(
  problem: ResidualProblem,
  start: ArrayLike<number>,
  options: LeastSquaresOptions = {},
): LeastSquaresResult {
  const space = new Space(problem.variables)
  const residuals = new Float64Array(problem.count)
  const halfSquares = (x: Float64Array): number => {
    problem.residuals(x, residuals)
    return residuals.reduce((sum, r) => sum + r * r, 0) / 2
  }
  const recorder = new Recorder(halfSquares, space.nearest(start), options)
  const fit = new Fit(problem, space, recorder, residuals)
  const reason = recorder.run(() => fit.run(options.tolerance ?? DEFAULT_SHARE))
  const { bestValue: value, evaluations } = recorder
  const x = space.nearest(recorder.bestX)
  problem.residuals(x, residuals)
  const certainty = certaintyOf(problem, space, x, residuals)
  return { x, value, evaluations, iterations: fit.iterations, reason, residuals, certainty }
}

/** The linear model of the free variables at a point, its least-squares problem reduced to a square one. */
interface Model {
  readonly free: readonly number[]
  /** R of J = Q R, and Qᵀ r. */
  readonly triangle: Matrix
  readonly projected: Matrix
}

class Fit {
  iterations = 0
  private x: Float64Array
  private value = Number.POSITIVE_INFINITY
  private r = new Float64Array(0)
  private jacobian = new Matrix(0, 0)
  /** D, zero before the first linearization. */
  private readonly scale: Float64Array
  private damping = FIRST_DAMPING
  private growth = 2

  constructor(
    private readonly problem: ResidualProblem,
    private readonly space: Space,
    private readonly recorder: Recorder,
    /** r at the point evaluated last. */
    private readonly latest: Float64Array,
  ) {
    this.x = recorder.bestX.slice()
    this.scale = new Float64Array(this.x.length)
  }

  run(share: number): Reason {
    this.value = this.recorder.at(this.x)
    if (!Number.isFinite(this.value)) return 'stalled'
    this.r = this.latest.slice()
    const exact = EXACT * this.value
    while (this.value > exact) {
      const model = this.linearize()
      if (model === undefined) return 'converged'
      if (squares(model.projected) / 2 <= share * this.value) return 'converged'
      if (!this.improve(model)) return steepest(model) / 2 <= UNRESOLVED * this.value ? 'converged' : 'stalled'
      this.iterations++
    }
    return 'converged'
  }

  /** Undefined where no variable is free to move, or the residuals do not answer to any. */
  private linearize(): Model | undefined {
    this.jacobian = jacobianAt(this.problem, this.space, this.x, () => this.recorder.spend())
    for (const i of this.space.continuous) this.scale[i] = Math.max(this.scale[i], columnNorm(this.jacobian, i))
    const free = this.space.continuous.filter(
      (i) => this.scale[i] > 0 && !isHeld(this.space, i, this.x[i], this.jacobian, this.r),
    )
    if (free.length === 0) return undefined
    // Never fewer rows than columns.
    const rows = Math.max(this.r.length, free.length)
    const part = Matrix.zeros(rows, free.length)
    const right = Matrix.zeros(rows, 1)
    for (let row = 0; row < this.r.length; row++) {
      right.set(row, 0, this.r[row])
      free.forEach((i, k) => {
        part.set(row, k, this.jacobian.get(row, i))
      })
    }
    const factors = new QrDecomposition(part)
    return {
      free,
      triangle: factors.upperTriangularMatrix,
      projected: factors.orthogonalMatrix.transpose().mmul(right),
    }
  }

  /** Takes the first step that gains enough; false where none does. */
  private improve(model: Model): boolean {
    for (; this.damping <= LARGEST_DAMPING; this.damping *= this.growth, this.growth *= 2) {
      const target = this.target(model)
      const promised = this.value - this.modelValue(target)
      const value = this.recorder.at(target)
      const gain = (this.value - value) / promised
      if (!(promised > 0 && gain > SUFFICIENT_GAIN)) continue
      this.x = target
      this.value = value
      this.r = this.latest.slice()
      this.damping *= Math.max(1 / 3, 1 - (2 * gain - 1) ** 3)
      this.growth = 2
      return true
    }
    return false
  }

  /** Where the damped step leads, cut at the bounds. */
  private target({ free, triangle, projected }: Model): Float64Array {
    const n = free.length
    const stacked = Matrix.zeros(2 * n, n)
    const right = Matrix.zeros(2 * n, 1)
    stacked.setSubMatrix(triangle, 0, 0)
    free.forEach((i, k) => {
      stacked.set(n + k, k, Math.sqrt(this.damping) * this.scale[i])
      right.set(k, 0, -projected.get(k, 0))
    })
    const step = new QrDecomposition(stacked).solve(right)
    const target = this.x.slice()
    free.forEach((i, k) => {
      const { lower, upper } = this.space.variables[i]
      const moved = this.x[i] + step.get(k, 0)
      target[i] = this.space.isPeriodic(i) ? moved : Math.min(upper, Math.max(lower, moved))
    })
    return target
  }

  /** ½ ‖r + J (target - x)‖². */
  private modelValue(target: Float64Array): number {
    const step = Matrix.columnVector(target.map((component, i) => component - this.x[i]))
    return squares(Matrix.columnVector(this.r).add(this.jacobian.mmul(step))) / 2
  }
}

/** Largest (J_kᵀ r / ‖J_k‖)²: twice the reduction that one variable alone promises. */
function steepest({ triangle, projected, free }: Model): number {
  const slopes = triangle.transpose().mmul(projected)
  return Math.max(...free.map((_, k) => (slopes.get(k, 0) / columnNorm(triangle, k)) ** 2))
}

function columnNorm(matrix: Matrix, column: number): number {
  let sum = 0
  for (let row = 0; row < matrix.rows; row++) sum += matrix.get(row, column) ** 2
  return Math.sqrt(sum)
}

function squares(column: Matrix): number {
  return columnNorm(column, 0) ** 2
}
