import { describe, expect, test } from 'vitest'
import type { Stack, ToleranceQuestion } from '../../src/stack/stack.js'
import { evaluate } from '../../src/studies/evaluate.js'
import { tolerance } from '../../src/studies/tolerance.js'
import { DEG, darkerThan, polarizer, retarder, stackOf } from './builtStack.js'
import { boxMuller, lehmer, luminousReflectance, WAVELENGTHS_NM } from './twoFilms.js'

const LIMIT = 0.0015

const QUESTION: ToleranceQuestion = {
  samples: 3000,
  seed: 7,
  sampling: 'random',
  vary: {
    'half.slow_axis': { normal: 0.5 * DEG },
    'half.retardance': { uniform: 5 },
    'quarter.slow_axis': { triangular: 1.5 * DEG },
    'quarter.retardance': { normal: 2, limit: 3 },
  },
  together: [],
}

const STACK: Stack = stackOf([polarizer(0), retarder('half', 15, 275), retarder('quarter', 75, 137.5)], {
  conditions: {
    wavelengths: { from: 400, to: 700, step: 10 },
    observer: 2,
    illuminant: 'D65',
    directions: [{ theta: 0, phi: 0 }],
    color_weights: [1, 1, 1],
  },
  limits: [darkerThan(LIMIT)],
  tolerance: QUESTION,
})

/** The same production drawn elsewhere: luminous reflectances in ascending order. */
function independentProduction(count: number, seed: number, together = false): Float64Array {
  const uniform = lehmer(seed)
  const normal = boxMuller(uniform)
  const values = Float64Array.from({ length: count }, () => {
    let quarter = normal()
    // Cut off by throwing away: another way than by the inverse distribution.
    while (Math.abs(quarter) > 1.5) quarter = normal()
    const halfNm = 275 + 5 * (2 * uniform() - 1)
    return luminousReflectance({
      halfAxisDeg: 15 + 0.5 * normal(),
      halfNm,
      quarterAxisDeg: 75 + 1.5 * (uniform() + uniform() - 1),
      quarterNm: 137.5 + (together ? (halfNm - 275) / 2 : 2 * quarter),
    })
  })
  return values.sort()
}

const TRUTH_DRAWS = 100_000
const truth = independentProduction(TRUTH_DRAWS, 2024)

function shareUpTo(sorted: Float64Array, value: number): number {
  return sorted.filter((other) => other <= value).length / sorted.length
}

/** Largest difference of two shares that chance explains: four standard deviations. */
function chance(share: number, draws: number): number {
  return 4 * Math.sqrt(share * (1 - share) * (1 / draws + 1 / TRUTH_DRAWS))
}

test('without errors both are one laminate', () => {
  const value = evaluate(STACK).directions[0].luminous_reflectance
  const ideal = luminousReflectance({ halfAxisDeg: 15, halfNm: 275, quarterAxisDeg: 75, quarterNm: 137.5 })
  expect(Math.abs(value - ideal)).toBeLessThan(1e-6)
  expect(WAVELENGTHS_NM).toHaveLength(31)
})

describe.each(['random', 'latin_hypercube', 'sobol'] as const)(
  '%s draws of two films under four tolerances',
  (sampling) => {
    const run = tolerance(STACK, { ...QUESTION, sampling }, { drawsOnly: true })

    test('yield agrees with the independent production, its interval covers it', async () => {
      const { yield: passing, yield_interval } = await run
      const expected = shareUpTo(truth, LIMIT)
      expect(expected).toBeGreaterThan(0.5)
      expect(expected).toBeLessThan(0.95)
      expect(Math.abs((passing ?? Number.NaN) - expected)).toBeLessThan(chance(expected, QUESTION.samples))
      expect(yield_interval?.[0]).toBeLessThan(expected)
      expect(yield_interval?.[1]).toBeGreaterThan(expected)
    })

    test('percentiles, mean and standard deviation agree', async () => {
      const { metrics } = await run
      const spread = metrics.luminous_reflectance
      for (const [value, share] of [
        [spread.p05, 0.05],
        [spread.p50, 0.5],
        [spread.p95, 0.95],
      ]) {
        expect(Math.abs(shareUpTo(truth, value) - share)).toBeLessThan(chance(share, QUESTION.samples))
      }
      const mean = truth.reduce((sum, value) => sum + value, 0) / TRUTH_DRAWS
      const std = Math.sqrt(truth.reduce((sum, value) => sum + (value - mean) ** 2, 0) / TRUTH_DRAWS)
      expect(Math.abs(spread.mean - mean)).toBeLessThan((4 * std) / Math.sqrt(QUESTION.samples))
      expect(spread.std / std).toBeCloseTo(1, 1)
    })
  },
)

test('films of one roll share their error', async () => {
  const question: ToleranceQuestion = {
    ...QUESTION,
    vary: { ...QUESTION.vary, 'quarter.retardance': { uniform: 2.5 } },
    together: [['half.retardance', 'quarter.retardance']],
  }
  const { metrics } = await tolerance(STACK, question, { drawsOnly: true })
  const shared = independentProduction(TRUTH_DRAWS, 5, true)
  const { p05, p50, p95 } = metrics.luminous_reflectance
  for (const [value, share] of [
    [p05, 0.05],
    [p50, 0.5],
    [p95, 0.95],
  ]) {
    expect(Math.abs(shareUpTo(shared, value) - share)).toBeLessThan(chance(share, QUESTION.samples))
  }
})

test('in repetitions the interval covers the truth at least as often as it says', async () => {
  const expected = shareUpTo(truth, LIMIT)
  let covered = 0
  const repetitions = 60
  for (let seed = 1; seed <= repetitions; seed++) {
    const { yield_interval } = await tolerance(STACK, { ...QUESTION, samples: 100, seed }, { drawsOnly: true })
    if (yield_interval && yield_interval[0] <= expected && expected <= yield_interval[1]) covered++
  }
  // The exact interval covers in 95 % of the cases or more; 53 of 60 or fewer would happen once in 200 times.
  expect(covered).toBeGreaterThan(53)
})
