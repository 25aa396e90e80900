import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { Space } from '../../src/search/variables.js'

const HALF_TURN = Math.PI
const space = new Space([
  { lower: 0, upper: HALF_TURN, period: HALF_TURN },
  { lower: -1, upper: 1, period: HALF_TURN },
  { lower: 90, upper: 190 },
  { lower: 0, upper: 75, values: [15, 45, 75] },
  { lower: 2, upper: 2 },
])

describe('the space of a search', () => {
  it('knows which variables move, and which close on themselves', () => {
    expect(space.continuous).toEqual([0, 1, 2])
    expect(space.discrete).toEqual([3, 4])
    expect([0, 1, 2, 3].map((i) => space.isPeriodic(i))).toEqual([true, false, false, false])
    expect(new Space([{ lower: 0, upper: 7, period: 2 }]).width[0]).toBe(2)
  })

  it('returns every scaled coordinate to the box, and values to themselves', () => {
    fc.assert(
      fc.property(fc.double({ min: -5, max: 5, noNaN: true }), fc.constantFrom(0, 1, 2), (u, i) => {
        const { lower, upper } = space.variables[i]
        const value = space.fromUnit(i, u)
        expect(value).toBeGreaterThanOrEqual(lower)
        expect(value).toBeLessThanOrEqual(upper)
        const again = [0, 0, 90, 15, 2].with(i, space.fromUnit(i, space.toUnit(i, value)))
        expect(space.distance(again, [0, 0, 90, 15, 2].with(i, value))).toBeLessThan(1e-12)
        if (i === 0) expect(Math.cos(2 * value)).toBeCloseTo(Math.cos(2 * u * HALF_TURN), 10)
      }),
      { seed: 2 },
    )
    expect(space.fromUnit(2, 1.3)).toBe(190)
    expect(space.fromUnit(2, -0.2)).toBe(90)
  })

  it('takes the nearest allowed point', () => {
    expect([...space.nearest([HALF_TURN + 0.25, 4, 10, 31, 9])]).toEqual([expect.closeTo(0.25, 12), 1, 90, 45, 2])
  })

  it('measures around the period, and keeps listed values apart', () => {
    const at = (angle: number, listed: number): number[] => [angle, 0, 100, listed, 2]
    expect(space.distance(at(0.01 * HALF_TURN, 15), at(0.98 * HALF_TURN, 15))).toBeCloseTo(0.03, 12)
    expect(space.distance(at(0, 15), at(0, 45))).toBe(1)
  })
})
