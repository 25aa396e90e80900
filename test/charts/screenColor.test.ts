import { converter, formatHex } from 'culori'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { labToHex, lightToHex, xyzToHex } from '../../src/charts/screenColor.js'

const bytes = (hex: string): number[] => [1, 3, 5].map((i) => Number.parseInt(hex.slice(i, i + 2), 16))

describe('colors of light on a screen', () => {
  it('agree with culori inside the gamut, to one step of 8 bits', () => {
    const channel = fc.integer({ min: 0, max: 255 })
    fc.assert(
      fc.property(channel, channel, channel, (r, g, b) => {
        const color = { mode: 'rgb' as const, r: r / 255, g: g / 255, b: b / 255 }
        const { x, y, z } = converter('xyz65')(color)
        const { l, a, b: bStar } = converter('lab65')(color)
        for (const hex of [xyzToHex([x, y, z]), labToHex([l, a, bStar])]) {
          for (const [i, byte] of bytes(hex).entries()) {
            expect(Math.abs(byte - bytes(formatHex(color))[i])).toBeLessThanOrEqual(1)
          }
        }
      }),
      { seed: 1 },
    )
  })

  it('bring a spectral light into the gamut with its hue: 520 nm is green, 460 nm blue, 620 nm red', () => {
    // x̄, ȳ, z̄ of the CIE 1931 observer at these wavelengths (ISO/CIE 11664-1).
    const brightest = (xyz: [number, number, number]) => bytes(lightToHex(xyz)).indexOf(255)
    expect(brightest([0.0633, 0.71, 0.0782])).toBe(1)
    expect(brightest([0.2908, 0.06, 1.6692])).toBe(2)
    expect(brightest([0.8544, 0.381, 0.0002])).toBe(0)
    expect(lightToHex([0.8544, 0.381, 0.0002], 0)).toBe('#000000')
  })
})
