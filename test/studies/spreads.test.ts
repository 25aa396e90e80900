import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import type { Spread } from '../../src/stack/stack.js'
import { spreadOffset, spreadSize } from '../../src/studies/spreads.js'

const STEPS = 20_000

/** Midpoints of equal shares of production: integrals over a distribution by its quantiles. */
function offsetsOf(spread: Spread): number[] {
  const offset = spreadOffset(spread)
  return Array.from({ length: STEPS }, (_, k) => offset((k + 0.5) / STEPS))
}

function deviationOf(values: readonly number[]): number {
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length
  return Math.sqrt(values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / values.length)
}

describe('quantiles of a spread', () => {
  test('normal: the table of the normal distribution', () => {
    const offset = spreadOffset({ normal: 2 })
    // NIST/SEMATECH e-Handbook of Statistical Methods 1.3.6.7.1: Φ(1.96) = 0.97500, Φ(1) = 0.84134.
    expect(offset(0.975)).toBeCloseTo(2 * 1.96, 3)
    expect(offset(0.84134)).toBeCloseTo(2 * 1, 4)
    expect(offset(0.5)).toBe(0)
  })

  test('normal: finite for the first and the last number a generator can draw', () => {
    const offset = spreadOffset({ normal: 1 })
    expect(offset(0)).toBeLessThan(-8)
    expect(offset(1 - 2 ** -53)).toBeGreaterThan(8)
    expect(Number.isFinite(offset(0)) && Number.isFinite(offset(1))).toBe(true)
  })

  test.each([0.5, 1, 2.5])(
    'cut normal at %f standard deviations: ends at the cut, with the published variance',
    (cut) => {
      const values = offsetsOf({ normal: 3, limit: 3 * cut })
      expect(Math.max(...values)).toBeLessThanOrEqual(3 * cut)
      expect(Math.max(...values)).toBeGreaterThan(3 * cut * 0.99)
      // N. L. Johnson, S. Kotz, N. Balakrishnan, Continuous Univariate Distributions 1, 2nd ed., section 13.10.1, from memory:
      // variance of the doubly truncated standard normal, 1 - 2 a φ(a) / (2 Φ(a) - 1). Φ from the NIST table named above.
      const cdf = { 0.5: 0.69146, 1: 0.84134, 2.5: 0.99379 }[cut] ?? Number.NaN
      const density = Math.exp((-cut * cut) / 2) / Math.sqrt(2 * Math.PI)
      expect(deviationOf(values)).toBeCloseTo(3 * Math.sqrt(1 - (2 * cut * density) / (2 * cdf - 1)), 3)
    },
  )

  test('uniform and triangular: half-width over √3 and √6 (ISO/IEC Guide 98-3:2008, 4.3.7 and 4.3.9)', () => {
    expect(deviationOf(offsetsOf({ uniform: 0.7 }))).toBeCloseTo(0.7 / Math.sqrt(3), 6)
    expect(deviationOf(offsetsOf({ triangular: 0.7 }))).toBeCloseTo(0.7 / Math.sqrt(6), 6)
  })

  test('a triangle written as a table is the triangle', () => {
    const tabulated = spreadOffset({ offset: [-4, 0, 4], density: [0, 7, 0] })
    const triangular = spreadOffset({ triangular: 4 })
    for (let u = 0; u <= 1; u += 1 / 64) expect(tabulated(u)).toBeCloseTo(triangular(u), 12)
  })

  test('a table with a gap: nothing is drawn from the gap, shares go with the areas', () => {
    // Two triangles of area 1 and 3 with nothing between.
    const values = offsetsOf({ offset: [-3, -2, -1, 1, 2, 3], density: [0, 1, 0, 0, 3, 0] })
    expect(values.filter((value) => Math.abs(value) < 0.999)).toEqual([])
    expect(values.filter((value) => value < 0).length / STEPS).toBeCloseTo(0.25, 3)
  })

  test('every spread rises with the share', () => {
    const positive = fc.double({ min: 0.01, max: 10, noNaN: true })
    const spread: fc.Arbitrary<Spread> = fc.oneof(
      fc.record({ normal: positive }),
      fc.record({ normal: positive, limit: positive }),
      fc.record({ uniform: positive }),
      fc.record({ triangular: positive }),
      fc
        .array(positive, { minLength: 3, maxLength: 8 })
        .map((density) => ({ offset: density.map((_, i) => i - 1), density })),
    )
    const share = fc.double({ min: 0, max: 1, noNaN: true })
    fc.assert(
      fc.property(spread, share, share, (drawn, a, b) => {
        const offset = spreadOffset(drawn)
        expect(offset(Math.min(a, b))).toBeLessThanOrEqual(offset(Math.max(a, b)) + 1e-12)
      }),
      { seed: 11, numRuns: 300 },
    )
  })
})

test('the size of a table is its standard deviation', () => {
  const table: Spread = { offset: [-2, -1, 0, 3], density: [0.2, 1, 2, 0.1] }
  expect(spreadSize(table).measure).toBe('standard deviation')
  expect(spreadSize(table).size).toBeCloseTo(deviationOf(offsetsOf(table)), 5)
})
