import fc from 'fast-check'
import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64'
import { xoroshiro128plusFromState } from 'pure-rand/generator/xoroshiro128plus'
import { expect, test } from 'vitest'
import { createRandom } from '../../src/numeric/random.js'
import { createRandomPoints } from '../../src/numeric/randomPoints.js'

const draw = (random: ReturnType<typeof createRandom>, count: number) => Array.from({ length: count }, random.uniform)

test('numbers lie in [0, 1) on the grid of 2^-53', () => {
  for (const value of draw(createRandom(7), 2000)) {
    expect(value).toBeGreaterThanOrEqual(0)
    expect(value).toBeLessThan(1)
    expect(Number.isInteger(value * 2 ** 53)).toBe(true)
  }
})

test('a seed or a substream gives its digits again, other seeds and streams give others', () => {
  fc.assert(
    fc.property(fc.maxSafeNat(), fc.maxSafeNat(), (seed, stream) => {
      const random = createRandom(seed)
      const before = draw(random.fork(stream), 4)
      expect(draw(createRandom(seed), 4)).toEqual(draw(random, 4))
      expect(draw(random.fork(stream), 4)).toEqual(before)
      expect(draw(random.fork(stream + 1), 4)).not.toEqual(before)
      expect(draw(createRandom(seed + 1).fork(stream), 4)).not.toEqual(before)
      expect(draw(random.fork(stream).fork(0), 4)).not.toEqual(before)
    }),
    { seed: 2, numRuns: 200 },
  )
})

test('seeds that differ only above 32 bits differ', () => {
  expect(draw(createRandom(5), 4)).not.toEqual(draw(createRandom(5 + 2 ** 32), 4))
})

// First output of xoroshiro128+ is s0 + s1: held here so that no update of a library changes published samples unseen.
test('the digits never change', () => {
  const generator = xoroshiro128plusFromState([0, 1, 0, 2])
  expect(generator.next()).toBe(3)
  expect(uniformFloat64(xoroshiro128plusFromState([0, 0, 0, 0]))).toBe(0)
  expect(draw(createRandom(1), 3)).toMatchInlineSnapshot(`
    [
      0.82954079523919,
      0.41053731772672586,
      0.1962875101152064,
    ]
  `)
  expect(draw(createRandom(1).fork(2), 3)).toMatchInlineSnapshot(`
    [
      0.033432488407152405,
      0.4178133058948741,
      0.2563521457490202,
    ]
  `)
})

test('first draws of neighboring substreams are uniform and uncorrelated', () => {
  const count = 20_000
  const out = new Float64Array(2)
  const points = createRandomPoints(2, 3)
  const cells = new Float64Array(100)
  let product = 0
  let before = 0.5
  for (let i = 0; i < count; i++) {
    points.point(i, out)
    cells[Math.floor(out[0] * 10) * 10 + Math.floor(out[1] * 10)]++
    product += (out[0] - 0.5) * (before - 0.5)
    before = out[0]
  }
  const expected = count / 100
  const chiSquare = cells.reduce((sum, n) => sum + (n - expected) ** 2 / expected, 0)
  // 99 degrees of freedom: mean 99, standard deviation √198; four of them.
  expect(Math.abs(chiSquare - 99)).toBeLessThan(4 * Math.sqrt(198))
  // Mean of the product of two independent centered uniforms: standard deviation 1/(12 √count).
  expect(Math.abs(product / count)).toBeLessThan(4 / (12 * Math.sqrt(count)))
})
