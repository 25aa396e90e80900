import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { nelderMead } from '../../src/search/nelderMead.js'
import { quasiNewton } from '../../src/search/quasiNewton.js'
import type { ObjectiveWithGradient, SearchOptions, SearchResult } from '../../src/search/result.js'
import { Space, type Variable } from '../../src/search/variables.js'
import { STANDARD_FUNCTIONS } from './standardFunctions.js'

type Solver = (
  objective: ObjectiveWithGradient,
  variables: readonly Variable[],
  start: ArrayLike<number>,
  options?: SearchOptions,
) => SearchResult

const withoutGradient: Solver = (objective, variables, start, options) => {
  const unused = new Float64Array(variables.length)
  return nelderMead((x) => objective(x, unused), variables, start, options)
}

describe.each<[string, Solver]>([
  ['Nelder–Mead', withoutGradient],
  ['quasi-Newton', quasiNewton],
])('%s', (name, solve) => {
  it.each(STANDARD_FUNCTIONS)(
    'finds the minimum of $name',
    ({ objective, variables, start, minimum, value, nearness }) => {
      const result = solve(objective, variables, start)
      expect(result.reason).toBe('converged')
      expect(Math.abs(result.value - value)).toBeLessThan(2e-8)
      expect(new Space(variables).distance(result.x, minimum)).toBeLessThan(nearness)
      expect(result.value).toBe(objective(result.x, new Float64Array(variables.length)))
      expect(result.evaluations).toBeLessThan(name === 'quasi-Newton' ? 120 : 700)
    },
  )

  it('lands on bounds to the last digit, at corners too', () => {
    const variables = [
      { lower: 0.1, upper: 0.7 },
      { lower: -3, upper: -1 },
      { lower: 0, upper: 10 },
    ]
    const plane: ObjectiveWithGradient = ([a, b, c], gradient) => {
      gradient.set([2, -3, 2 * (c - 4)])
      return 2 * a - 3 * b + (c - 4) ** 2
    }
    const result = solve(plane, variables, [0.5, -2, 1])
    expect([...result.x.subarray(0, 2)]).toEqual([0.1, -1])
    expect(result.x[2]).toBeCloseTo(4, 4)
  })

  it('finds the minimum of random convex quadratics in boxes, where the gradient is right for it', () => {
    const component = fc.double({ min: -1, max: 1, noNaN: true })
    fc.assert(
      fc.property(fc.array(component, { minLength: 15, maxLength: 15 }), (numbers) => {
        const n = 3
        const variables = Array.from({ length: n }, () => ({ lower: -1, upper: 1 }))
        const objective: ObjectiveWithGradient = (x, gradient) => {
          let value = 0
          gradient.fill(0)
          for (let row = 0; row < n; row++) {
            const r = x.reduce((sum, c, i) => sum + c * numbers[n * row + i], -2 * numbers[9 + row])
            value += r * r
            for (let i = 0; i < n; i++) gradient[i] += 2 * r * numbers[n * row + i]
          }
          for (let i = 0; i < n; i++) {
            value += 0.1 * x[i] ** 2
            gradient[i] += 0.2 * x[i]
          }
          return value
        }
        const { x } = solve(objective, variables, numbers.slice(12))
        const gradient = new Float64Array(n)
        objective(x, gradient)
        // Karush–Kuhn–Tucker: no slope inside, no slope inwards on a bound.
        x.forEach((c, i) => {
          if (c > -1) expect(gradient[i]).toBeLessThan(1e-3)
          if (c < 1) expect(gradient[i]).toBeGreaterThan(-1e-3)
        })
      }),
      { seed: 1, numRuns: 60 },
    )
  })

  it('stays within the limit, the call to stop and the box, and keeps the best point', () => {
    const { objective, variables, start } = STANDARD_FUNCTIONS[0]
    for (const limit of [1, 2, 3, 7, 20, 41]) {
      const seen: number[] = []
      let polls = 0
      const watched: ObjectiveWithGradient = (x, gradient) => {
        x.forEach((c, i) => {
          expect(c).toBeGreaterThanOrEqual(variables[i].lower)
          expect(c).toBeLessThanOrEqual(variables[i].upper)
        })
        seen.push(objective(x, gradient))
        return seen[seen.length - 1]
      }
      const limited = solve(watched, variables, start, { maxEvaluations: limit })
      expect(limited).toMatchObject({ reason: 'limit', evaluations: limit, value: Math.min(...seen) })
      const stopped = solve(objective, variables, start, { stopped: () => ++polls > limit })
      expect(stopped).toEqual({ ...limited, reason: 'stopped' })
    }
  })

  it('walks around points where the objective is not finite', () => {
    const walled: ObjectiveWithGradient = ([x, y], gradient) => {
      gradient.set([2 * (x - 0.3), 2 * (y - 0.2)])
      return x + y > 1.4 ? Number.NaN : (x - 0.3) ** 2 + (y - 0.2) ** 2
    }
    const variables = [
      { lower: 0, upper: 1 },
      { lower: 0, upper: 1 },
    ]
    const result = solve(walled, variables, [0.7, 0.69])
    expect(result.value).toBeLessThan(1e-8)
    const lost = solve(() => Number.NaN, variables, [0.5, 0.5])
    expect(lost.reason).toBe('stalled')
    expect(lost.value).toBe(Number.POSITIVE_INFINITY)
    expect([...lost.x]).toEqual([0.5, 0.5])
  })

  it('leaves listed values and boxes of no width where they are', () => {
    const variables: Variable[] = [
      { lower: 0, upper: 3, values: [0, 1, 3] },
      { lower: -2, upper: 2 },
      { lower: 7, upper: 7 },
    ]
    const objective: ObjectiveWithGradient = ([a, b, c], gradient) => {
      gradient.set([2 * a, 2 * (b - 1), 1])
      return a * a + (b - 1) ** 2 + c
    }
    const result = solve(objective, variables, [0.9, 0, 0])
    expect([result.x[0], result.x[2]]).toEqual([1, 7])
    expect(result.x[1]).toBeCloseTo(1, 4)
    const fixed = solve(objective, [variables[0], variables[2], variables[2]], [3, 0, 0])
    expect(fixed).toMatchObject({ value: 9 + 36 + 7, evaluations: 1, reason: 'converged' })
  })
})

it('does not jam where a valley meets a bound', () => {
  const unit = fc.double({ min: 0, max: 1, noNaN: true })
  const variables = Array.from({ length: 3 }, () => ({ lower: 0, upper: 1 }))
  let [runs, evaluations] = [0, 0]
  fc.assert(
    fc.property(
      fc.array(unit, { minLength: 6, maxLength: 6 }),
      fc.double({ min: -3, max: 0, noNaN: true }),
      (u, depth) => {
        const [steep, bend, floor] = [3 + 40 * u[0], 0.3 + 2 * u[1], 10 ** depth]
        // Two coordinates in a curved valley whose floor falls toward the bound of the third.
        const valley: ObjectiveWithGradient = ([a, b, c], gradient) => {
          const side = a - b - bend * b * c
          gradient[0] = 2 * steep * side + 2 * floor * (a - u[2]) + floor * c
          gradient[1] = -2 * steep * side * (1 + bend * c) + 2 * floor * (b - u[3])
          gradient[2] = -2 * steep * side * bend * b + floor * (1 + a)
          return steep * side ** 2 + floor * ((a - u[2]) ** 2 + (b - u[3]) ** 2 + c * (1 + a))
        }
        const result = quasiNewton(valley, variables, [u[4], u[5], u[0]], { tolerance: 1e-13 })
        expect(result.reason).not.toBe('limit')
        expect(result.evaluations).toBeLessThan(200)
        runs++
        evaluations += result.evaluations
      },
    ),
    { seed: 3, numRuns: 1000 },
  )
  // A search that takes steps across the bound needs 78.
  expect(evaluations / runs).toBeLessThan(40)
})
