import { describe, expect, it } from 'vitest'
import { augmentedLagrangian } from '../../src/search/augmentedLagrangian.js'
import { globalSearch } from '../../src/search/globalSearch.js'
import { isBetter, violationOf } from '../../src/search/problem.js'
import { searchInline } from '../../src/search/searchJob.js'
import type { Variable } from '../../src/search/variables.js'
import { FILM_PAIR, filmPair } from './filmPair.js'

const box = (lower: number, upper: number, count: number): Variable[] =>
  Array.from({ length: count }, () => ({ lower, upper }))

/**
 * Problems, starts and values of W. Hock, K. Schittkowski, Test Examples for Nonlinear Programming Codes, Lecture Notes in
 * Economics and Mathematical Systems 187 (Springer, 1981), by number; from memory. Where the book leaves a variable unbounded,
 * the box is wide. Constraints there are g(x) >= 0, here -g(x) <= 0.
 */
const HOCK_SCHITTKOWSKI = [
  {
    number: 24,
    variables: box(0, 10, 2),
    start: [1, 0.5],
    objective: ([x, y]: Float64Array) => (((x - 3) ** 2 - 9) * y ** 3) / (27 * Math.sqrt(3)),
    constraints: ([x, y]: Float64Array) => {
      const root = Math.sqrt(3)
      return [y - x / root, -x - root * y, x + root * y - 6]
    },
    value: -1,
    x: [3, Math.sqrt(3)],
  },
  {
    number: 35,
    variables: box(0, 10, 3),
    start: [0.5, 0.5, 0.5],
    objective: ([x, y, z]: Float64Array) =>
      9 - 8 * x - 6 * y - 4 * z + 2 * x * x + 2 * y * y + z * z + 2 * x * y + 2 * x * z,
    constraints: ([x, y, z]: Float64Array) => [x + y + 2 * z - 3],
    value: 1 / 9,
    x: [4 / 3, 7 / 9, 4 / 9],
  },
  {
    // Rosen and Suzuki.
    number: 43,
    variables: box(-10, 10, 4),
    start: [0, 0, 0, 0],
    objective: ([a, b, c, d]: Float64Array) => a * a + b * b + 2 * c * c + d * d - 5 * a - 5 * b - 21 * c + 7 * d,
    constraints: ([a, b, c, d]: Float64Array) => [
      a * a + b * b + c * c + d * d + a - b + c - d - 8,
      a * a + 2 * b * b + c * c + 2 * d * d - a - d - 10,
      2 * a * a + b * b + c * c + 2 * a - b - d - 5,
    ],
    value: -44,
    x: [0, 1, 2, -1],
  },
  {
    number: 76,
    variables: box(0, 10, 4),
    start: [0.5, 0.5, 0.5, 0.5],
    objective: ([a, b, c, d]: Float64Array) =>
      a * a + 0.5 * b * b + c * c + 0.5 * d * d - a * c + c * d - a - 3 * b + c - d,
    constraints: ([a, b, c, d]: Float64Array) => [a + 2 * b + c + d - 5, 3 * a + b + 2 * c - d - 4, 1.5 - b - 4 * c],
    value: -4.681818181,
    x: [0.2727273, 2.090909, 0, 0.5454545],
  },
]

describe('the augmented Lagrangian', () => {
  it.each(HOCK_SCHITTKOWSKI)('solves problem $number of Hock and Schittkowski', ({ start, value, x, ...problem }) => {
    const result = augmentedLagrangian(problem, start, { tolerance: 1e-10, maxEvaluations: 20_000 })
    expect(result.violation).toBe(0)
    expect(problem.constraints(result.x).every((c) => c <= 0)).toBe(true)
    expect(result.value).toBe(problem.objective(result.x))
    // Not better than the optimum by more than the hair of the constraints could give.
    expect(result.value).toBeGreaterThan(value - 1e-6)
    expect(result.value).toBeLessThan(value + 1e-5)
    result.x.forEach((component, i) => {
      expect(component).toBeCloseTo(x[i], 2)
    })
    expect(result.evaluations).toBeLessThan(12_000)
  })

  it('returns the least violation where no point meets the constraints, and the best so far when stopped', () => {
    const impossible = {
      variables: box(0, 1, 2),
      objective: ([x, y]: Float64Array) => x + y,
      constraints: ([x]: Float64Array) => [2 - x],
    }
    const result = augmentedLagrangian(impossible, [0.2, 0.2])
    expect(result.violation).toBe(1)
    expect(result.reason).not.toBe('converged')
    const { start, value: _, x: __, ...problem } = HOCK_SCHITTKOWSKI[2]
    let asked = 0
    const stopped = augmentedLagrangian(problem, start, { stopped: () => ++asked > 300 })
    expect(stopped).toMatchObject({ reason: 'stopped', evaluations: 300, violation: 0 })
    expect(stopped.value).toBeLessThan(0)
  })
})

describe('feasible before good', () => {
  it('ranks by violation first', () => {
    expect(isBetter({ value: 5, violation: 0 }, { value: 1, violation: 1e-12 })).toBe(true)
    expect(isBetter({ value: 1, violation: 0 }, { value: 5, violation: 0 })).toBe(true)
    expect(isBetter({ value: 1, violation: 0.2 }, { value: 5, violation: 0.1 })).toBe(false)
    expect(violationOf([-1, 0.25, 0])).toBe(0.25)
    expect(violationOf([-1, -2])).toBe(0)
    expect(violationOf([Number.NaN])).toBe(Number.POSITIVE_INFINITY)
  })

  it('finds the best film pair that meets a constraint, with every seed, from a screen and without', async () => {
    // Two films may not add up to more than 380 nm; the slow way is the same landscape on that face.
    const problem = {
      variables: FILM_PAIR,
      objective: filmPair,
      constraints: (p: Float64Array) => [(p[2] + p[3] - 380) / 100],
    }
    const face = FILM_PAIR.slice(0, 3)
    const onFace = await globalSearch(
      face,
      searchInline({
        variables: face,
        objective: ([a, b, c]) => filmPair([a, b, c, Math.min(190, Math.max(90, 380 - c))]),
      }),
    )
    for (const seed of [1, 2, 3]) {
      const result = await globalSearch(FILM_PAIR, searchInline(problem), { seed, maxEvaluations: 40_000 })
      expect(result.violation).toBe(0)
      expect(result.x[2] + result.x[3]).toBeLessThanOrEqual(380)
      expect(result.value).toBeLessThan(onFace.value + 1e-8)
      for (const family of result.families) expect(family.violation).toBe(0)
    }
  })
})
