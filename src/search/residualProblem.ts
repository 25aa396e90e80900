import { Matrix } from 'ml-matrix'
import type { Space, Variable } from './variables.js'

/** A least-squares problem: r: Rⁿ → Rᵐ whose sum of squares is to be small. */
export interface ResidualProblem {
  readonly variables: readonly Variable[]
  /** m, the number of residuals. */
  readonly count: number
  /** r(x), each divided by its standard deviation where that is known; written to `out`. */
  readonly residuals: (x: Float64Array, out: Float64Array) => void
  /** dr/dx, m rows of n, row-major, written to `out`; absent: central differences of the residuals. */
  readonly jacobian?: (x: Float64Array, out: Float64Array) => void
  /** The residuals are in units of their standard deviations; else that is estimated from what remains of them. */
  readonly noiseIsKnown?: boolean
}

/** Of a central difference: the cube root of the rounding error, times the size of x or a thousandth of its range. */
const DIFFERENCE_SHARE = 6e-6

/** dr/dx at x, m × n; columns of discrete variables are zero. `spend` is called before each evaluation of residuals. */
export function jacobianAt(problem: ResidualProblem, space: Space, x: Float64Array, spend: () => void): Matrix {
  const { count, variables } = problem
  if (problem.jacobian !== undefined) {
    const flat = new Float64Array(count * variables.length)
    problem.jacobian(x, flat)
    return Matrix.from1DArray(count, variables.length, flat)
  }
  const jacobian = Matrix.zeros(count, variables.length)
  const [plus, minus] = [new Float64Array(count), new Float64Array(count)]
  for (const i of space.continuous) {
    const [above, below] = differencePoints(space, i, x[i])
    spend()
    problem.residuals(x.with(i, above), plus)
    spend()
    problem.residuals(x.with(i, below), minus)
    for (let row = 0; row < count; row++) jacobian.set(row, i, (plus[row] - minus[row]) / (above - below))
  }
  return jacobian
}

/** Either side of the value, within the box. */
function differencePoints(space: Space, i: number, value: number): [number, number] {
  const step = DIFFERENCE_SHARE * Math.max(Math.abs(value), 1e-3 * space.width[i])
  if (space.isPeriodic(i)) return [value + step, value - step]
  const { lower, upper } = space.variables[i]
  return [Math.min(upper, value + step), Math.max(lower, value - step)]
}

/** Whether a variable lies on a bound that the residuals press it against. */
export function isHeld(space: Space, i: number, value: number, jacobian: Matrix, r: Float64Array): boolean {
  if (space.isPeriodic(i)) return false
  const { lower, upper } = space.variables[i]
  let slope = 0
  for (let row = 0; row < r.length; row++) slope += jacobian.get(row, i) * r[row]
  return (value <= lower && slope > 0) || (value >= upper && slope < 0)
}
