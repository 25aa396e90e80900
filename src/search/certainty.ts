/**
 * How well a fit determines its variables, from the linear model at its end: with J the Jacobian of the free variables and s²
 * the variance of a residual, the covariance is s² (JᵀJ)⁻¹ (e.g. Seber, Wild, Nonlinear Regression, Wiley 1989, §2.1).
 *
 * It is taken from the singular values of the Jacobian in scaled coordinates, J W = U Σ Vᵀ with W the widths of the variables'
 * boxes: column k of V is a combination of variables that the data see only through σ_k, so that its standard deviation is
 * s/σ_k of the box. One comparable with the whole box is not resolved.
 */
import { Matrix, SingularValueDecomposition } from 'ml-matrix'
import { isHeld, jacobianAt, type ResidualProblem } from './residualProblem.js'
import type { Space } from './variables.js'

export interface Certainty {
  /** Variables the covariance is about: continuous, and not held at a bound by the data. Rows and columns below follow it. */
  readonly free: readonly number[]
  /** s, the standard deviation of a residual: 1 where the noise is known, else √(‖r‖²/(m - p)); NaN for m <= p. */
  readonly residualDeviation: number
  /** p × p, row-major, in the variables' own units. */
  readonly covariance: Float64Array
  /** p × p, row-major, in [-1, 1]. */
  readonly correlation: Float64Array
  /** One per variable of the problem, in its own unit; NaN for those not free. */
  readonly standardErrors: Float64Array
  /** What the data see in combinations of variables, least certain first. */
  readonly combinations: readonly Combination[]
}

export interface Combination {
  /** Direction in scaled coordinates, a unit vector, one number per free variable. */
  readonly direction: Float64Array
  /** σ of J W. */
  readonly singularValue: number
  /** s/σ: standard deviation along the direction, as a share of the box. */
  readonly deviation: number
}

/** At x, where the residuals are r. */
export function certaintyOf(problem: ResidualProblem, space: Space, x: Float64Array, r: Float64Array): Certainty {
  const jacobian = jacobianAt(problem, space, x, () => undefined)
  const free = space.continuous.filter((i) => !isHeld(space, i, x[i], jacobian, r))
  const freedom = r.length - free.length
  const sum = r.reduce((total, component) => total + component * component, 0)
  const estimated = freedom > 0 ? Math.sqrt(sum / freedom) : Number.NaN
  const residualDeviation = problem.noiseIsKnown ? 1 : estimated
  const combinations = combinationsOf(space, free, jacobian, residualDeviation)
  const covariance = covarianceOf(space, free, combinations)
  const p = free.length
  const deviation = free.map((_, k) => Math.sqrt(covariance[k * p + k]))
  const standardErrors = new Float64Array(x.length).fill(Number.NaN)
  free.forEach((i, k) => {
    standardErrors[i] = deviation[k]
  })
  const correlation = covariance.map((c, at) =>
    Math.min(1, Math.max(-1, c / (deviation[Math.floor(at / p)] * deviation[at % p]))),
  )
  return { free, residualDeviation, covariance, correlation, standardErrors, combinations }
}

function combinationsOf(space: Space, free: readonly number[], jacobian: Matrix, s: number): Combination[] {
  if (free.length === 0) return []
  const rows = Math.max(jacobian.rows, free.length)
  const scaled = Matrix.zeros(rows, free.length)
  for (let row = 0; row < jacobian.rows; row++) {
    free.forEach((i, k) => {
      scaled.set(row, k, jacobian.get(row, i) * space.width[i])
    })
  }
  const { diagonal, rightSingularVectors } = new SingularValueDecomposition(scaled)
  // What rounding leaves of a zero is taken for what it can hide: a combination the data do not see is very uncertain, not certain.
  const floor = Math.max(Number.MIN_VALUE ** 0.5, Number.EPSILON * rows * diagonal[0])
  return diagonal
    .map((singularValue, k) => ({
      direction: Float64Array.from(rightSingularVectors.getColumn(k)),
      singularValue,
      deviation: s / Math.max(floor, singularValue),
    }))
    .reverse()
}

/** W V (s/Σ)² Vᵀ W. */
function covarianceOf(space: Space, free: readonly number[], combinations: readonly Combination[]): Float64Array {
  const p = free.length
  const covariance = new Float64Array(p * p)
  for (const { direction, deviation } of combinations) {
    for (let a = 0; a < p; a++) {
      for (let b = 0; b < p; b++) {
        const share = direction[a] * deviation * (direction[b] * deviation)
        covariance[a * p + b] += share * space.width[free[a]] * space.width[free[b]]
      }
    }
  }
  return covariance
}
