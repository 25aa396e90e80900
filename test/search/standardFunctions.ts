/** Test functions of the optimization literature, each with its gradient; forms and minima from memory unless said otherwise. */
import type { ObjectiveWithGradient } from '../../src/search/result.js'
import type { Variable } from '../../src/search/variables.js'

export interface StandardFunction {
  readonly name: string
  readonly variables: readonly Variable[]
  readonly start: readonly number[]
  readonly objective: ObjectiveWithGradient
  readonly minimum: readonly number[]
  readonly value: number
  /** How near a point must come: the flatter the function, the less. */
  readonly nearness: number
}

const box = (lower: number, upper: number, count: number): Variable[] =>
  Array.from({ length: count }, () => ({ lower, upper }))

/** H. H. Rosenbrock, Comput. J. 3, 175 (1960). */
const rosenbrock: ObjectiveWithGradient = ([x, y], gradient) => {
  gradient[0] = -400 * x * (y - x * x) - 2 * (1 - x)
  gradient[1] = 200 * (y - x * x)
  return 100 * (y - x * x) ** 2 + (1 - x) ** 2
}

/** M. J. D. Powell's singular function, Comput. J. 5, 147 (1962): the Hessian at the minimum has rank 2 of 4. */
const powellSingular: ObjectiveWithGradient = ([a, b, c, d], gradient) => {
  const [p, q, r, s] = [a + 10 * b, c - d, b - 2 * c, a - d]
  gradient[0] = 2 * p + 40 * s ** 3
  gradient[1] = 20 * p + 4 * r ** 3
  gradient[2] = 10 * q - 8 * r ** 3
  gradient[3] = -10 * q - 40 * s ** 3
  return p * p + 5 * q * q + r ** 4 + 10 * s ** 4
}

/** E. M. L. Beale's function, as in Moré, Garbow, Hillstrom, ACM Trans. Math. Softw. 7, 17 (1981), no. 5. */
const beale: ObjectiveWithGradient = ([x, y], gradient) => {
  gradient.fill(0)
  return [1.5, 2.25, 2.625].reduce((sum, constant, k) => {
    const r = constant - x * (1 - y ** (k + 1))
    gradient[0] -= 2 * r * (1 - y ** (k + 1))
    gradient[1] += 2 * r * x * (k + 1) * y ** k
    return sum + r * r
  }, 0)
}

/** D. M. Himmelblau, Applied Nonlinear Programming (1972): four minima of value 0. */
export const himmelblau: ObjectiveWithGradient = ([x, y], gradient) => {
  const [p, q] = [x * x + y - 11, x + y * y - 7]
  gradient[0] = 4 * x * p + 2 * q
  gradient[1] = 2 * p + 4 * y * q
  return p * p + q * q
}
export const HIMMELBLAU_MINIMA = [
  [3, 2],
  [-2.805118, 3.131312],
  [-3.77931, -3.283186],
  [3.584428, -1.848126],
] as const

/** Rastrigin's function: a minimum near every integer point, the least at 0. */
export const rastrigin: ObjectiveWithGradient = (x, gradient) =>
  x.reduce((sum, component, i) => {
    gradient[i] = 2 * component + 20 * Math.PI * Math.sin(2 * Math.PI * component)
    return sum + component ** 2 + 10 * (1 - Math.cos(2 * Math.PI * component))
  }, 0)

/** Periodic in both angles; minima where cos(a - 1) = 1 and cos(2 (b + 0.05)) = 1, so that the second lies across the seam. */
const torus: ObjectiveWithGradient = ([a, b], gradient) => {
  gradient[0] = Math.sin(a - 1)
  gradient[1] = 2 * Math.sin(2 * (b + 0.05))
  return 2 - Math.cos(a - 1) - Math.cos(2 * (b + 0.05))
}

export const STANDARD_FUNCTIONS: readonly StandardFunction[] = [
  {
    name: 'Rosenbrock',
    variables: box(-5, 5, 2),
    start: [-1.2, 1],
    objective: rosenbrock,
    minimum: [1, 1],
    value: 0,
    nearness: 1e-3,
  },
  {
    // The unbounded minimum is cut off: with x <= 0.5 the least value is (1 - 0.5)² on y = x² (by hand).
    name: 'Rosenbrock, bounded above',
    variables: [
      { lower: -5, upper: 0.5 },
      { lower: -5, upper: 5 },
    ],
    start: [-1.2, 1],
    objective: rosenbrock,
    minimum: [0.5, 0.25],
    value: 0.25,
    nearness: 1e-4,
  },
  {
    // With y >= 1.5 the minimum of 100 (1.5 - x²)² + (1 - x)² on the bound: the root of 400 x³ - 598 x - 2 near √1.5 (by hand).
    name: 'Rosenbrock, bounded below',
    variables: [
      { lower: -2, upper: 2 },
      { lower: 1.5, upper: 5 },
    ],
    start: [1.9, 4],
    objective: rosenbrock,
    minimum: [1.2243707487363527, 1.5],
    value: 0.050426187,
    nearness: 1e-4,
  },
  {
    name: 'Powell singular',
    variables: box(-5, 5, 4),
    start: [3, -1, 0, 1],
    objective: powellSingular,
    minimum: [0, 0, 0, 0],
    value: 0,
    nearness: 2e-2,
  },
  {
    name: 'Beale',
    variables: box(-4.5, 4.5, 2),
    start: [1, 1],
    objective: beale,
    minimum: [3, 0.5],
    value: 0,
    nearness: 1e-3,
  },
  {
    name: 'two angles',
    variables: [
      { lower: 0, upper: 2 * Math.PI, period: 2 * Math.PI },
      { lower: 0, upper: Math.PI, period: Math.PI },
    ],
    start: [2.5, 0.6],
    objective: torus,
    minimum: [1, Math.PI - 0.05],
    value: 0,
    nearness: 1e-4,
  },
]
