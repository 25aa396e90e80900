import fc from 'fast-check'
import { expect, test } from 'vitest'
import { addTo, createMoments, mergeInto, standardDeviation } from '../../src/numeric/moments.js'
import { quantile } from '../../src/numeric/quantile.js'
import scipy from './fixtures/fromScipy.json'

function momentsOf(values: readonly number[]) {
  const moments = createMoments()
  for (const value of values) addTo(moments, value)
  return moments
}

test('mean and standard deviation, against NumPy', () => {
  const moments = momentsOf(scipy.sample)
  expect(moments.mean).toBeCloseTo(scipy.mean, 14)
  expect(standardDeviation(moments)).toBeCloseTo(scipy.std, 14)
})

test('keeps its digits far from zero', () => {
  // Variance of 4, 7, 13, 16 is 30 wherever they lie: T. F. Chan, G. H. Golub, R. J. LeVeque (1983); example from memory.
  expect(standardDeviation(momentsOf([4, 7, 13, 16].map((v) => v + 1e9))) ** 2).toBeCloseTo(30, 9)
})

test('parts merge into the whole', () => {
  const values = fc.array(fc.double({ min: -1e3, max: 1e3, noNaN: true }), { maxLength: 20 })
  fc.assert(
    fc.property(values, values, (left, right) => {
      const merged = momentsOf(left)
      mergeInto(merged, momentsOf(right))
      const whole = momentsOf([...left, ...right])
      expect(merged.count).toBe(whole.count)
      if (whole.count === 0) {
        expect(merged.mean).toBeNaN()
        return
      }
      expect(merged.mean).toBeCloseTo(whole.mean, 9)
      expect(standardDeviation(merged)).toBeCloseTo(standardDeviation(whole), 7)
    }),
    { seed: 6, numRuns: 300 },
  )
})

test('few numbers', () => {
  expect(standardDeviation(createMoments())).toBeNaN()
  expect(standardDeviation(momentsOf([3]))).toBe(0)
  expect(quantile([], 0.5)).toBeNaN()
  expect(quantile([3], 0.2)).toBe(3)
})

test.each(scipy.quantiles)('quantile %d is %d, against NumPy (type 7)', (p, value) => {
  const sorted = Float64Array.from(scipy.sample).sort()
  expect(quantile(sorted, p)).toBeCloseTo(value, 13)
})
