import { differenceCiede2000 } from 'culori'
import fc from 'fast-check'
import { expect, test } from 'vitest'
import { ciede2000 } from '../../src/color/ciede2000.js'
import { ciede2000Pairs } from '../data/ciede2000Pairs.js'

test('all pairs of Sharma, Wu, Dalal, in both orders', () => {
  expect(ciede2000Pairs).toHaveLength(34)
  for (const [l1, a1, b1, l2, a2, b2, expected] of ciede2000Pairs) {
    expect(ciede2000([l1, a1, b1], [l2, a2, b2])).toBeCloseTo(expected, 4)
    expect(ciede2000([l2, a2, b2], [l1, a1, b1])).toBeCloseTo(expected, 4)
  }
})

const lab = fc.tuple(
  fc.double({ min: 0, max: 100, noNaN: true }),
  fc.double({ min: -100, max: 100, noNaN: true }),
  fc.double({ min: -100, max: 100, noNaN: true }),
)

test('random pairs, against culori', () => {
  const difference = differenceCiede2000()
  fc.assert(
    fc.property(lab, lab, (one, other) => {
      const [p, q] = [one, other].map(([l, a, b]) => ({ mode: 'lab65' as const, l, a, b }))
      expect(ciede2000(one, other)).toBeCloseTo(difference(p, q), 9)
    }),
    { seed: 10, numRuns: 500 },
  )
})

test('symmetric, zero for the same color', () => {
  fc.assert(
    fc.property(lab, lab, (one, other) => {
      expect(ciede2000(one, one)).toBe(0)
      expect(ciede2000(one, other)).toBeCloseTo(ciede2000(other, one), 9)
    }),
    { seed: 11, numRuns: 300 },
  )
})
