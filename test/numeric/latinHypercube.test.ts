import fc from 'fast-check'
import { expect, test } from 'vitest'
import { createLatinHypercube } from '../../src/numeric/latinHypercube.js'
import { permute } from '../../src/numeric/permute.js'

test('permutes any length', () => {
  fc.assert(
    fc.property(fc.integer({ min: 1, max: 700 }), fc.nat(2 ** 32 - 1), (length, key) => {
      const places = Array.from({ length }, (_, i) => permute(i, length, key)).sort((a, b) => a - b)
      expect(places).toEqual(Array.from({ length }, (_, i) => i))
    }),
    { seed: 3, numRuns: 200 },
  )
})

test('all permutations of four come equally often', () => {
  const counts = new Map<string, number>()
  const keys = 24_000
  for (let key = 0; key < keys; key++) {
    const order = [0, 1, 2, 3].map((i) => permute(i, 4, key)).join('')
    counts.set(order, (counts.get(order) ?? 0) + 1)
  }
  expect(counts.size).toBe(24)
  const chiSquare = [...counts.values()].reduce((sum, n) => sum + (n - keys / 24) ** 2 / (keys / 24), 0)
  // 23 degrees of freedom: mean 23, standard deviation √46; five of them.
  expect(chiSquare).toBeLessThan(23 + 5 * Math.sqrt(46))
})

// McKay, Beckman, Conover, Technometrics 21, 239 (1979): one point in each slice of each coordinate.
test('each slice of each coordinate holds one point', () => {
  const out = new Float64Array(6)
  for (const count of [1, 7, 64, 1000]) {
    const points = createLatinHypercube(count, 6, 9)
    const seen = Array.from({ length: 6 }, () => new Set<number>())
    for (let i = 0; i < count; i++) {
      points.point(i, out)
      out.forEach((value, d) => {
        seen[d].add(Math.floor(value * count))
      })
    }
    for (const slices of seen)
      expect([...slices].sort((a, b) => a - b)).toEqual(Array.from({ length: count }, (_, i) => i))
  }
})

test('coordinates are shuffled apart from each other', () => {
  const count = 4000
  const out = new Float64Array(2)
  const points = createLatinHypercube(count, 2, 1)
  let product = 0
  for (let i = 0; i < count; i++) {
    points.point(i, out)
    product += (out[0] - 0.5) * (out[1] - 0.5)
  }
  expect(Math.abs(product / count)).toBeLessThan(4 / (12 * Math.sqrt(count)))
})
