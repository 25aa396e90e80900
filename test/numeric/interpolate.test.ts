import fc from 'fast-check'
import { expect, test } from 'vitest'
import { interpolateLinear, interpolateOnto } from '../../src/numeric/interpolate.js'

test('linear between the points, constant outside', () => {
  const x = [400, 500, 700]
  const y = [1, 3, -1]
  const at = Float64Array.of(300, 400, 450, 500, 600, 700, 900)
  expect(Array.from(interpolateOnto(x, y, at))).toEqual([1, 1, 2, 3, 1, -1, -1])
  expect(interpolateLinear([550], [7], 123)).toBe(7)
})

test('a straight line stays one on any grid, and table points are met exactly', () => {
  const grid = fc.uniqueArray(fc.integer({ min: -1000, max: 1000 }), { minLength: 2, maxLength: 30 })
  fc.assert(
    fc.property(grid, fc.double({ min: 0, max: 1, noNaN: true }), (points, share) => {
      const x = points.sort((a, b) => a - b)
      const y = x.map((value) => 3 * value - 7)
      const at = x[0] + share * (x[x.length - 1] - x[0])
      expect(interpolateLinear(x, y, at)).toBeCloseTo(3 * at - 7, 8)
      x.forEach((value, i) => {
        expect(interpolateLinear(x, y, value)).toBe(y[i])
      })
    }),
    { seed: 7, numRuns: 200 },
  )
})
