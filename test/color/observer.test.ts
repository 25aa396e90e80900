import { expect, test } from 'vitest'
import { observerAt } from '../../src/color/observer.js'

// CIE 018:2019, tables 1 and 2: from 360 to 830 nm; ȳ of the 2° observer is 1 at 555 nm, by the definition of luminance.
test('the eye sees from 360 to 830 nm, nothing beyond', () => {
  for (const observer of [2, 10] as const) {
    const { x, y, z } = observerAt(observer, Float64Array.of(200, 359.9, 360, 830, 830.1, 2500))
    expect(y[2]).toBeGreaterThan(0)
    expect(y[3]).toBeGreaterThan(0)
    for (const i of [0, 1, 4, 5]) expect([x[i], y[i], z[i]]).toEqual([0, 0, 0])
  }
})

test('the 2° observer is most sensitive at 555 nm', () => {
  const nm = Float64Array.from({ length: 95 }, (_, k) => 360 + 5 * k)
  const { y } = observerAt(2, nm)
  expect(Math.max(...y)).toBeCloseTo(1, 4)
  expect(nm[y.indexOf(Math.max(...y))]).toBe(555)
})
