import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { Distribution, EXACT_VALUES } from '../../src/numeric/distribution.js'
import { inverseNormal } from '../../src/numeric/normal.js'
import { permute } from '../../src/numeric/permute.js'
import scipy from './fixtures/fromScipy.json'

function distributionOf(values: Iterable<number>): Distribution {
  const distribution = new Distribution()
  for (const value of values) distribution.add(value)
  return distribution
}

/** Quantiles of the normal distribution at even shares, in mixed order. */
function* normalValues(count: number): Generator<number> {
  for (let k = 0; k < count; k++) yield inverseNormal((permute(k, count, 5) + 0.5) / count)
}

test('a small sample, against NumPy', () => {
  const distribution = distributionOf(scipy.sample)
  expect(distribution.mean).toBeCloseTo(scipy.mean, 14)
  expect(distribution.standardDeviation).toBeCloseTo(scipy.std, 14)
  expect(distribution.quantileError).toBe(0)
})

test('quantiles may be asked for in between', () => {
  const distribution = distributionOf([3, 1, 2])
  expect(distribution.quantile(0.5)).toBe(2)
  distribution.add(0)
  expect(distribution.quantile(0.5)).toBe(1.5)
  expect([distribution.min, distribution.max]).toEqual([0, 3])
})

describe('more values than are kept', () => {
  const count = 3 * EXACT_VALUES
  const distribution = distributionOf(normalValues(count))

  test('quantiles are those of the normal distribution within the stated error', () => {
    expect(distribution.quantileError).toBeGreaterThan(0)
    expect(distribution.quantileError).toBeLessThan(1e-3)
    // NIST/SEMATECH e-Handbook of Statistical Methods 1.3.6.7.1 by interpolation: Φ(1.64485) = 0.95, Φ(2.32635) = 0.99.
    for (const [share, deviations] of [
      [0.95, 1.64485],
      [0.99, 2.32635],
      [0.5, 0],
    ]) {
      expect(Math.abs(distribution.quantile(share) - deviations)).toBeLessThan(distribution.quantileError + 1e-5)
      expect(Math.abs(distribution.quantile(1 - share) + deviations)).toBeLessThan(distribution.quantileError + 1e-5)
    }
    expect([distribution.quantile(0), distribution.quantile(1)]).toEqual([distribution.min, distribution.max])
  })

  test('every value stands in the histogram', () => {
    const { edges, counts } = distribution.histogram(40, 1)
    expect(counts.reduce((sum, n) => sum + n, 0)).toBe(count)
    // Φ(1) = 0.84134, the table named above; the edge lies at 1 within a bin of the sketch, φ(1) = 0.24.
    const below = counts.filter((_, k) => edges[k + 1] <= 1 + 1e-9).reduce((sum, n) => sum + n, 0)
    expect(below / count).toBeCloseTo(0.84134, 3)
  })
})

describe('histogram', () => {
  test('divides at the anchor, misses no value', () => {
    const value = fc.double({ min: -50, max: 50, noNaN: true })
    fc.assert(
      fc.property(
        fc.array(value, { minLength: 1, maxLength: 60 }),
        value,
        fc.integer({ min: 1, max: 40 }),
        (values, anchor, bins) => {
          const distribution = distributionOf(values)
          const { edges, counts } = distribution.histogram(bins, anchor)
          expect(counts.reduce((sum, n) => sum + n, 0)).toBe(values.length)
          expect(counts).toHaveLength(edges.length - 1)
          expect(counts.length).toBeLessThanOrEqual(bins + 1)
          const inside = distribution.min < anchor && anchor < distribution.max
          const nearest = Math.min(...edges.map((edge) => Math.abs(edge - anchor)))
          if (inside) expect(nearest).toBeLessThan(1e-9)
        },
      ),
      { seed: 3, numRuns: 300 },
    )
  })

  test('a single value has a bin of its own', () => {
    const { edges, counts } = distributionOf([4, 4, 4]).histogram(20)
    expect(counts).toEqual([3])
    expect(edges[0]).toBeLessThan(4)
    expect(edges[1]).toBeGreaterThan(4)
  })
})
