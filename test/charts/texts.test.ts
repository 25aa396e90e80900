import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { spreadApart } from '../../src/charts/labels.js'
import {
  axisTitle,
  directionText,
  givenText,
  METRIC_QUANTITIES,
  numberText,
  quantityText,
  stepText,
} from '../../src/charts/quantity.js'
import { wrapText } from '../../src/charts/wrapText.js'

describe('numbers in charts', () => {
  it('have their unit and a true minus sign', () => {
    const percent = METRIC_QUANTITIES.luminous_reflectance
    expect(quantityText(percent, 0.04312)).toBe('4.31 %')
    expect(givenText(percent, 0.05)).toBe('5 %')
    expect(axisTitle(percent)).toBe('luminous reflectance (%)')
    expect(axisTitle(METRIC_QUANTITIES.chroma)).toBe('chroma C*ab')
    expect(numberText(-0.0123)).toBe('−0.0123')
    expect(directionText({ thetaRad: Math.PI / 4, phiRad: Math.PI / 2 })).toBe('θ\u00a045°, φ\u00a090°')
  })

  it('have the decimals of their step', () => {
    expect([0, 0.25, 0.5].map((value) => stepText(value, 0.25))).toEqual(['0.00', '0.25', '0.50'])
    expect(stepText(12500, 2500)).toBe('12\u2009500')
    expect(stepText(-1e-17, 0.1)).toBe('0.0')
    expect(stepText(-10, 5)).toBe('−10')
  })
})

describe('texts beside one another', () => {
  it('are spread at least a gap apart, in their order, about the same middle', () => {
    const positions = fc.array(fc.double({ min: 0, max: 500, noNaN: true }), { minLength: 1, maxLength: 12 })
    fc.assert(
      fc.property(positions, (unsorted) => {
        const sorted = [...unsorted].sort((a, b) => a - b)
        const spread = spreadApart(sorted, 18)
        const mean = (values: number[]): number => values.reduce((sum, value) => sum + value, 0) / values.length
        expect(mean(spread)).toBeCloseTo(mean(sorted), 6)
        for (let i = 1; i < spread.length; i++) expect(spread[i] - spread[i - 1]).toBeGreaterThan(18 - 1e-9)
      }),
      { seed: 3 },
    )
  })

  it('break at spaces only, and lose no word', () => {
    expect(wrapText('color-weighted reflectance (%)', 16)).toEqual(['color-weighted', 'reflectance (%)'])
    fc.assert(
      fc.property(fc.array(fc.stringMatching(/^[a-z]{1,9}$/), { minLength: 1 }), (words) => {
        const lines = wrapText(words.join(' '), 12)
        expect(lines.join(' ')).toBe(words.join(' '))
        for (const line of lines) expect(line.length).toBeLessThanOrEqual(12)
      }),
      { seed: 4 },
    )
  })
})
