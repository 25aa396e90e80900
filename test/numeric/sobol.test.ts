import fc from 'fast-check'
import { expect, test } from 'vitest'
import { createSobol, SOBOL_DIMENSIONS } from '../../src/numeric/sobol.js'
import scipy from './fixtures/fromScipy.json'

test('the points are those of SciPy, from the same published direction numbers', () => {
  const { dimensions, first, at1000 } = scipy.sobol
  expect(SOBOL_DIMENSIONS).toBe(dimensions)
  const sobol = createSobol(dimensions)
  const digits = (index: number) => {
    const out = new Float64Array(dimensions)
    sobol.point(index, out)
    return Array.from(out, (value) => value * 2 ** 32)
  }
  for (const [index, point] of first.entries()) expect(digits(index)).toEqual(point)
  expect(digits(1000)).toEqual(at1000)
})

test('scrambled or not, any aligned block of 2^m points has one in each of 2^m slices of every coordinate', () => {
  const dimensions = 40
  const out = new Float64Array(dimensions)
  fc.assert(
    fc.property(
      fc.option(fc.nat(1e9), { nil: undefined }),
      fc.integer({ min: 1, max: 8 }),
      fc.nat(50),
      (seed, m, block) => {
        const sobol = createSobol(dimensions, seed)
        const seen = Array.from({ length: dimensions }, () => new Set<number>())
        for (let i = 0; i < 2 ** m; i++) {
          sobol.point(block * 2 ** m + i, out)
          out.forEach((value, d) => {
            seen[d].add(Math.floor(value * 2 ** m))
          })
        }
        for (const slices of seen) expect(slices.size).toBe(2 ** m)
      },
    ),
    { seed: 1, numRuns: 25 },
  )
})

// The first two Sobol' dimensions form a (0, m, 2)-net: H. Niederreiter, Random Number Generation and Quasi-Monte Carlo
// Methods, SIAM (1992), chapter 4.
test('in two dimensions every elementary box of area 2^-m holds one of 2^m points, scrambled too', () => {
  const m = 8
  const out = new Float64Array(2)
  for (const seed of [undefined, 1, 2, 3, 2 ** 40 + 5]) {
    const sobol = createSobol(2, seed)
    for (let across = 0; across <= m; across++) {
      const boxes = new Set<number>()
      for (let i = 0; i < 2 ** m; i++) {
        sobol.point(i, out)
        boxes.add(Math.floor(out[0] * 2 ** across) * 2 ** (m - across) + Math.floor(out[1] * 2 ** (m - across)))
      }
      expect(boxes.size).toBe(2 ** m)
    }
  }
})

test('one scrambled point is uniform over the seeds, strictly inside the cube', () => {
  const out = new Float64Array(3)
  const counts = new Float64Array(10)
  const seeds = 5000
  for (let seed = 0; seed < seeds; seed++) {
    createSobol(3, seed).point(5, out)
    expect(Math.min(...out)).toBeGreaterThan(0)
    expect(Math.max(...out)).toBeLessThan(1)
    counts[Math.floor(out[2] * 10)]++
  }
  // χ² with 9 degrees of freedom exceeds 33.7 in one case of 10 000 (from memory).
  const expected = seeds / 10
  expect(counts.reduce((sum, n) => sum + (n - expected) ** 2 / expected, 0)).toBeLessThan(33.7)
})

test('integrates a smooth function far better than random points would', () => {
  // ∏ (1 + (x_d - ½)) over the unit cube is 1; random points of this number miss by about 7e-3.
  const dimensions = 5
  const out = new Float64Array(dimensions)
  for (const seed of [11, 12, 13]) {
    const sobol = createSobol(dimensions, seed)
    let sum = 0
    for (let i = 0; i < 8192; i++) {
      sobol.point(i, out)
      sum += out.reduce((product, x) => product * (0.5 + x), 1)
    }
    expect(Math.abs(sum / 8192 - 1)).toBeLessThan(1e-4)
  }
})

test('refuses more dimensions than there are direction numbers for', () => {
  expect(() => createSobol(SOBOL_DIMENSIONS + 1)).toThrow(/1 to 128 dimensions/)
  expect(() => createSobol(0)).toThrow(RangeError)
})
