import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { fitFromStarts } from '../../src/search/fitFromStarts.js'
import { leastSquares } from '../../src/search/leastSquares.js'
import type { ResidualProblem } from '../../src/search/residualProblem.js'
import { STRD } from './strd.js'

/** Residuals model - y of a model with one predictor. */
function residualsOf({ model, predictor, response }: (typeof STRD)[number]): ResidualProblem['residuals'] {
  return (b, out) => {
    predictor.forEach((x, k) => {
      out[k] = model(b, x) - response[k]
    })
  }
}

describe.each(STRD)('$name of the Statistical Reference Datasets', (set) => {
  const problem = { variables: set.variables, count: set.predictor.length, residuals: residualsOf(set) }

  it.each(set.starts)('from %j: certified estimates, standard deviations and sum of squares', (...start) => {
    const { x, value, certainty, reason } = leastSquares(problem, start)
    expect(reason).toBe('converged')
    expect(Math.abs((2 * value) / set.sumOfSquares - 1)).toBeLessThan(1e-9)
    set.certified.forEach(([estimate, deviation], i) => {
      expect(Math.abs(x[i] / estimate - 1)).toBeLessThan(1e-5)
      expect(Math.abs(certainty.standardErrors[i] / deviation - 1)).toBeLessThan(1e-4)
    })
    const freedom = set.predictor.length - set.certified.length
    expect(certainty.residualDeviation).toBeCloseTo(Math.sqrt(set.sumOfSquares / freedom), 6)
  })
})

/** y = X b + noise of standard deviation `noise`, 30 points of a straight line. */
function line(noise: readonly number[], options: Partial<ResidualProblem> = {}): ResidualProblem {
  return {
    variables: [
      { lower: -10, upper: 10 },
      { lower: -10, upper: 10 },
    ],
    count: noise.length,
    residuals: ([a, b], out) => {
      noise.forEach((e, k) => {
        out[k] = a + (b * k) / 10 - (1 + (2 * k) / 10 + e)
      })
    },
    ...options,
  }
}

describe('bounded least squares', () => {
  const noise = Array.from({ length: 30 }, (_, k) => 0.1 * Math.sin(7 * k * k))

  it('agrees with the normal equations of a straight line, and with its own differences', () => {
    const t = noise.map((_, k) => k / 10)
    const [n, st, stt] = [30, t.reduce((s, v) => s + v, 0), t.reduce((s, v) => s + v * v, 0)]
    const determinant = n * stt - st * st
    const analytic = line(noise, {
      jacobian: (_, out) => {
        t.forEach((v, k) => {
          out[2 * k] = 1
          out[2 * k + 1] = v
        })
      },
    })
    for (const problem of [line(noise), analytic]) {
      const { certainty } = leastSquares(problem, [0, 0])
      const variance = certainty.residualDeviation ** 2
      // (XᵀX)⁻¹ of a straight line, e.g. Draper, Smith, Applied Regression Analysis, §1.4.
      const expected = [stt, -st, -st, n].map((c) => (variance * c) / determinant)
      certainty.covariance.forEach((c, k) => {
        expect(c / expected[k]).toBeCloseTo(1, 7)
      })
      expect(certainty.correlation[1]).toBeCloseTo(-st / Math.sqrt(n * stt), 7)
      expect(certainty.correlation[0]).toBeCloseTo(1, 12)
    }
    const known = leastSquares({ ...analytic, noiseIsKnown: true }, [0, 0]).certainty
    expect(known.residualDeviation).toBe(1)
    expect(known.standardErrors[1]).toBeCloseTo(Math.sqrt(n / determinant), 9)
  })

  it('ends on a bound exactly where it is active, with the rest at its own minimum', () => {
    const problem = line(noise, {
      variables: [
        { lower: -10, upper: 0.5 },
        { lower: -10, upper: 10 },
      ],
    })
    const { x, certainty, reason } = leastSquares(problem, [-3, -3])
    expect(reason).toBe('converged')
    expect(x[0]).toBe(0.5)
    // With the intercept held, the slope is Σ t (y - a) / Σ t².
    let [top, bottom] = [0, 0]
    noise.forEach((e, k) => {
      const t = k / 10
      top += t * (1 + 2 * t + e - 0.5)
      bottom += t * t
    })
    expect(x[1]).toBeCloseTo(top / bottom, 7)
    expect(certainty.free).toEqual([1])
    expect(certainty.standardErrors[0]).toBeNaN()
    expect(certainty.standardErrors[1]).toBeCloseTo(certainty.residualDeviation / Math.sqrt(bottom), 8)
  })

  it('satisfies the conditions of Karush, Kuhn and Tucker on random curved problems in boxes', () => {
    const component = fc.double({ min: -1, max: 1, noNaN: true })
    fc.assert(
      fc.property(fc.array(component, { minLength: 12, maxLength: 12 }), (c) => {
        const problem: ResidualProblem = {
          variables: [
            { lower: -0.5, upper: 0.5 },
            { lower: -0.5, upper: 0.5 },
          ],
          count: 4,
          residuals: ([x, y], out) => {
            for (let k = 0; k < 4; k++)
              out[k] = Math.exp(c[k] * x) + Math.sin(c[4 + k] * y) + 0.2 * x * y - 2 * c[8 + k]
            out[0] += x
            out[1] += y
          },
        }
        const { x, value, reason } = leastSquares(problem, [0.1, -0.1])
        expect(reason).toBe('converged')
        const out = new Float64Array(4)
        const at = (p: Float64Array): number => {
          problem.residuals(p, out)
          return out.reduce((sum, r) => sum + r * r, 0) / 2
        }
        x.forEach((coordinate, i) => {
          const slope = (at(x.with(i, coordinate + 1e-6)) - at(x.with(i, coordinate - 1e-6))) / 2e-6
          const scale = 1e-4 * Math.sqrt(1 + value)
          if (coordinate > -0.5) expect(slope).toBeLessThan(scale)
          if (coordinate < 0.5) expect(slope).toBeGreaterThan(-scale)
        })
      }),
      { seed: 5, numRuns: 100 },
    )
  })

  it('names the combination the data do not see', () => {
    // Only the sum of the first two is seen; the third well.
    const problem: ResidualProblem = {
      variables: Array.from({ length: 3 }, () => ({ lower: 0, upper: 1 })),
      count: 20,
      residuals: ([a, b, c], out) => {
        for (let k = 0; k < 20; k++) out[k] = 100 * (Math.sin(k) * (a + b - 0.9) + Math.cos(k) * (c - 0.4)) + noise[k]
      },
      noiseIsKnown: true,
    }
    const { x, certainty } = leastSquares(problem, [0.3, 0.3, 0.3])
    expect(x[0] + x[1]).toBeCloseTo(0.9, 2)
    const [unseen, ...seen] = certainty.combinations
    expect(unseen.deviation).toBeGreaterThan(1e6)
    expect(Math.abs(unseen.direction[0] - -unseen.direction[1])).toBeLessThan(1e-6)
    expect(Math.abs(unseen.direction[2])).toBeLessThan(1e-6)
    for (const { deviation } of seen) expect(deviation).toBeLessThan(0.01)
    expect(certainty.correlation[1]).toBeCloseTo(-1, 6)
  })

  it('fits exactly where it can, keeps periods, and stops when asked', () => {
    const angle: ResidualProblem = {
      variables: [{ lower: 0, upper: Math.PI, period: Math.PI }],
      count: 2,
      residuals: ([a], out) => {
        out[0] = Math.cos(2 * a) - Math.cos(0.1)
        out[1] = Math.sin(2 * a) + Math.sin(0.1)
      },
    }
    const { x, value } = leastSquares(angle, [0.4])
    expect(x[0]).toBeCloseTo(Math.PI - 0.05, 10)
    expect(value).toBeLessThan(1e-20)
    let asked = 0
    const stopped = leastSquares(line(noise), [0, 0], { stopped: () => ++asked > 3 })
    expect(stopped).toMatchObject({ reason: 'stopped', evaluations: 3 })
    expect(leastSquares(line(noise), [0, 0], { maxEvaluations: 4 }).reason).toBe('limit')
    expect(leastSquares({ ...angle, residuals: (_, out) => out.fill(Number.NaN) }, [1]).reason).toBe('stalled')
  })

  it('finds from several starts what one start misses', () => {
    // sin(ω t) with ω = 5: neighbors in frequency are traps.
    const problem: ResidualProblem = {
      variables: [{ lower: 0.5, upper: 12 }],
      count: 60,
      residuals: ([w], out) => {
        for (let k = 0; k < 60; k++) out[k] = Math.sin((w * k) / 10) - Math.sin((5 * k) / 10)
      },
    }
    expect(leastSquares(problem, [9]).value).toBeGreaterThan(1)
    const several = fitFromStarts(problem, { start: [9], starts: 24 })
    expect(several.x[0]).toBeCloseTo(5, 8)
    expect(several.solutions[0].x).toEqual(several.x)
    expect(several.solutions.length).toBeGreaterThan(3)
    expect(fitFromStarts(problem, { start: [9], starts: 24 })).toEqual(several)
  })
})
