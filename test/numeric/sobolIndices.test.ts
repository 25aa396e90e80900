import { describe, expect, test } from 'vitest'
import { sobolIndices } from '../../src/numeric/sobolIndices.js'

/** T. Ishigami, T. Homma, Proc. ISUMA '90, 398 (1990), doi:10.1109/ISUMA.1990.151285, with a = 7, b = 0.1. */
function ishigami(point: Float64Array): number {
  const [x1, x2, x3] = Array.from(point, (u) => Math.PI * (2 * u - 1))
  return Math.sin(x1) + 7 * Math.sin(x2) ** 2 + 0.1 * x3 ** 4 * Math.sin(x1)
}

/**
 * Published with it: V1 = (1 + b π⁴/5)²/2, V2 = a²/8, V3 = 0, V13 = b² π⁸ (1/18 - 1/50); first-order shares 0.3139,
 * 0.4424, 0, total shares 0.5576, 0.4424, 0.2437.
 */
const FIRST = [0.3139, 0.4424, 0]
const TOTAL = [0.5576, 0.4424, 0.2437]

describe('Ishigami function', () => {
  const { first, total, variance, evaluations } = sobolIndices(ishigami, 3, { points: 1024, seed: 1 })

  test('shares agree with the published ones', () => {
    for (let i = 0; i < 3; i++) {
      expect(Math.abs(first[i].value - FIRST[i])).toBeLessThan(0.004)
      expect(Math.abs(total[i].value - TOTAL[i])).toBeLessThan(0.004)
    }
  })

  test('variance and cost', () => {
    // a²/8 + b π⁴/5 + b² π⁸/18 + 1/2 = 13.8446.
    expect(variance).toBeCloseTo(13.8446, 1)
    expect(evaluations).toBe(16 * 1024 * 5)
  })
})

test('the 95 % intervals cover the published shares about as often as they say', () => {
  let covered = 0
  const seeds = 60
  for (let seed = 1; seed <= seeds; seed++) {
    const { first, total } = sobolIndices(ishigami, 3, { points: 64, seed })
    const estimates = [...first, ...total]
    covered += [...FIRST, ...TOTAL].filter(
      (share, i) => share >= estimates[i].low - 5e-5 && share <= estimates[i].high + 5e-5,
    ).length
  }
  // 360 intervals, but six of one run hang together: from 90 to 99 %.
  expect(covered / (6 * seeds)).toBeGreaterThan(0.9)
  expect(covered / (6 * seeds)).toBeLessThan(0.995)
})

test('a product of inputs: shares by hand, whatever the mean', () => {
  // f = (1 + u1 - ½) (1 + u2 - ½) + c: V1 = V2 = 1/12, V12 = 1/144.
  const f = ([a, b]: Float64Array) => (a + 0.5) * (b + 0.5) + 1e6
  const { first, total } = sobolIndices(f, 2, { points: 256, seed: 4 })
  for (let i = 0; i < 2; i++) {
    expect(first[i].value).toBeCloseTo(12 / 25, 2)
    expect(total[i].value).toBeCloseTo(13 / 25, 2)
  }
})

test('what does not vary has no shares', () => {
  const { first, total } = sobolIndices(() => 4, 2, { points: 16, seed: 1 })
  expect([...first, ...total].map(({ value }) => value)).toEqual([0, 0, 0, 0])
})

test('more inputs than half the Sobol dimensions', () => {
  const { first } = sobolIndices((point) => point[0] + point[79], 80, { points: 64, seed: 2 })
  expect(first[0].value).toBeCloseTo(0.5, 1)
  expect(first[40].value).toBeCloseTo(0, 1)
})
