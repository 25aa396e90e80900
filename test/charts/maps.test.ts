import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { colorScale, rangeOf } from '../../src/charts/colorScale.js'
import { contourBands } from '../../src/charts/contourBands.js'
import { beyondEnd, cubicBetween } from '../../src/charts/cubicBetween.js'
import { type PolarField, valueInPolarField, worstOf } from '../../src/charts/polarField.js'
import { DEGREE, steps } from './steps.js'

describe('color scale', () => {
  it('has round even levels around any range', () => {
    const value = fc.double({ min: -1e4, max: 1e4, noNaN: true })
    fc.assert(
      fc.property(value, fc.double({ min: 1e-6, max: 1e4, noNaN: true }), (min, span) => {
        const { levels, step } = colorScale({ min, max: min + span })
        expect(levels[0]).toBeLessThanOrEqual(min + 1e-6 * step)
        expect(levels[levels.length - 1]).toBeGreaterThanOrEqual(min + span - 1e-6 * step)
        expect(levels.length).toBeGreaterThan(3)
        expect(levels.length).toBeLessThan(13)
        expect([1, 2, 2.5, 5]).toContain(Number((step / 10 ** Math.floor(Math.log10(step) + 1e-9)).toPrecision(6)))
      }),
      { seed: 2 },
    )
  })

  it('is the same for two designs given the same range, and bears a constant field', () => {
    expect(colorScale({ min: 4, max: 22 }).levels).toEqual([4, 6, 8, 10, 12, 14, 16, 18, 20, 22])
    expect(colorScale({ min: 5, max: 5 }).levels.length).toBeGreaterThan(1)
    expect(rangeOf([3, Number.NaN, 1])).toEqual({ min: 1, max: 3 })
  })
})

describe('contours', () => {
  it('are circles where the field is a cone', () => {
    const [band] = contourBands((u, v) => 1 - Math.hypot(u - 0.5, v - 0.4), [0.75])
    expect(band.rings).toHaveLength(1)
    for (const [u, v] of band.rings[0]) expect(Math.hypot(u - 0.5, v - 0.4)).toBeCloseTo(0.25, 4)
  })

  it('leave the map where the field does, without a line along its edge', () => {
    const [band] = contourBands((u) => u, [0.3])
    const inside = band.rings[0].filter(([u, v]) => u > -0.001 && u < 1.001 && v > -0.001 && v < 1.001)
    expect(inside.length).toBeGreaterThan(100)
    for (const [u] of inside) expect(u).toBeCloseTo(0.3, 9)
  })
})

describe('polar field', () => {
  const thetaRad = steps(0, 60, 10).map((deg) => deg * DEGREE)
  const phiRad = steps(0, 345, 15).map((deg) => deg * DEGREE)
  const law = (theta: number, phi: number): number =>
    1 + Math.sin(theta) ** 2 * Math.cos(2 * phi) + 0.3 * Math.sin(theta) * Math.sin(phi)
  const field: PolarField = { thetaRad, phiRad, values: thetaRad.map((t) => phiRad.map((p) => law(t, p))) }

  it('gives the samples back, whole turns aside', () => {
    for (const t of thetaRad)
      for (const p of phiRad) expect(valueInPolarField(field, t, p - 2 * Math.PI)).toBeCloseTo(law(t, p), 10)
  })

  it('is smooth between them, across the center too', () => {
    for (const t of [3, 17, 44]) {
      for (const p of [8, 100, 353]) {
        expect(Math.abs(valueInPolarField(field, t * DEGREE, p * DEGREE) - law(t * DEGREE, p * DEGREE))).toBeLessThan(
          0.005,
        )
      }
    }
  })

  it('knows its worst direction', () => {
    expect(worstOf(field).thetaRad).toBeCloseTo(60 * DEGREE)
    expect(
      worstOf({
        thetaRad: [0, 1],
        phiRad: [0, 2],
        values: [
          [1, 1],
          [2, 3],
        ],
      }),
    ).toEqual({ thetaRad: 1, phiRad: 2, value: 3 })
  })

  it('rests on a cubic that straight lines and parabolas pass unchanged', () => {
    for (const t of [0, 0.25, 0.9]) {
      expect(cubicBetween([-1, 0, 1, 2], t)).toBeCloseTo(t)
      expect(cubicBetween([1, 0, 1, 4], t)).toBeCloseTo(t * t)
    }
  })

  it('is continued beyond an edge as lines and parabolas run', () => {
    expect(beyondEnd(2, 1, 0)).toBe(3)
    expect(beyondEnd(4, 1, 0)).toBe(9)
    // In the outermost ring too.
    expect(valueInPolarField(field, 57 * DEGREE, 0.2)).toBeCloseTo(law(57 * DEGREE, 0.2), 2)
  })
})
