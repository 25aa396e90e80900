import { convertXyz50ToRgb, convertXyz65ToLab65, convertXyz65ToRgb } from 'culori'
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { chroma, labToXyz, xyzToLab } from '../../src/color/cielab.js'
import { illuminantAt } from '../../src/color/illuminant.js'
import { linearRgbToSrgb, SRGB_WHITE, srgbToHex, xyzToLinearRgb } from '../../src/color/srgb.js'
import { createColorWeights } from '../../src/color/weights.js'
import { spectrumToXyz } from '../../src/color/xyz.js'
import bareGlass from '../check-values/bare-glass.expected.json'

const unit = fc.double({ min: 0, max: 1, noNaN: true })
const triple = fc.tuple(unit, unit, unit)
/** D50 as culori and CSS have it: x = 0.3457, y = 0.3585. */
const D50_WHITE = [0.3457 / 0.3585, 1, (1 - 0.3457 - 0.3585) / 0.3585] as const

describe('bare glass under D65, of an independent program', () => {
  test.each(bareGlass.directions)('θ = $theta_deg', ({ spectrum, xyz, lab }) => {
    const wavelengths = Float64Array.from(spectrum.wavelength_nm)
    const weights = createColorWeights(wavelengths, 2, illuminantAt('D65', wavelengths))
    const out: [number, number, number] = [0, 0, 0]
    expect(spectrumToXyz(weights, Float64Array.from(spectrum.reflectance), out)).toBe(out)
    // Ten digits are printed.
    out.forEach((value, i) => {
      expect(Math.abs(value / xyz[i] - 1)).toBeLessThan(1e-9)
    })
    xyzToLab(out, weights.whiteXyz).forEach((value, i) => {
      expect(value).toBeCloseTo(lab[i], 7)
    })
  })
})

test('the perfect reflecting diffuser is white under every light', () => {
  const wavelengths = Float64Array.from({ length: 41 }, (_, i) => 380 + 10 * i)
  const diffuser = new Float64Array(41).fill(1)
  for (const illuminant of ['D65', 'A', 'FL11', 'LED-B3', { cct: 9000 }] as const) {
    const weights = createColorWeights(wavelengths, 10, illuminantAt(illuminant, wavelengths))
    const lab = xyzToLab(spectrumToXyz(weights, diffuser), weights.whiteXyz)
    expect(lab[0]).toBeCloseTo(100, 10)
    expect(chroma(lab)).toBeCloseTo(0, 10)
  }
})

describe('CIELAB', () => {
  test('against culori', () => {
    fc.assert(
      fc.property(triple, (xyz) => {
        const [x, y, z] = xyz
        const expected = convertXyz65ToLab65({ x, y, z })
        const lab = xyzToLab(xyz, SRGB_WHITE)
        // culori has the rounded constants 903.3 and 0.008856 of CIE 15 before 2004.
        expect(lab[0]).toBeCloseTo(expected.l, 4)
        expect(lab[1]).toBeCloseTo(expected.a, 4)
        expect(lab[2]).toBeCloseTo(expected.b, 4)
      }),
      { seed: 12, numRuns: 300 },
    )
  })

  // ISO/CIE 11664-4: below (6/29)³ lightness is (29/3)³ Y/Yn.
  test('is linear for near-black', () => {
    expect(xyzToLab([0.4, 0.4, 0.4], [100, 100, 100])[0]).toBeCloseTo(((29 / 3) ** 3 * 0.4) / 100, 12)
    expect(xyzToLab([0, 0, 0], [95, 100, 109])).toEqual([0, 0, 0].map((v) => expect.closeTo(v, 12)))
  })

  test('there and back', () => {
    fc.assert(
      fc.property(triple, (xyz) => {
        const back = labToXyz(xyzToLab(xyz, D50_WHITE), D50_WHITE)
        back.forEach((value, i) => {
          expect(value).toBeCloseTo(xyz[i], 12)
        })
      }),
      { seed: 13, numRuns: 300 },
    )
  })

  test('chroma is the distance from gray', () => {
    expect(chroma([50, 3, -4])).toBe(5)
  })
})

describe('sRGB', () => {
  /** Clipped to [0, 1] as here; culori’s Bradford matrices have seven decimals, and the curve is steep near black. */
  function expectNear(srgb: readonly number[], { r, g, b }: { r: number; g: number; b: number }): void {
    ;[r, g, b].forEach((value, i) => {
      expect(Math.abs(srgb[i] - Math.min(1, Math.max(0, value)))).toBeLessThan(5e-5)
    })
  }

  test('under its own white, against culori', () => {
    fc.assert(
      fc.property(triple, (xyz) => {
        const [x, y, z] = xyz
        expectNear(linearRgbToSrgb(xyzToLinearRgb(xyz, SRGB_WHITE)), convertXyz65ToRgb({ x, y, z }))
      }),
      { seed: 14, numRuns: 300 },
    )
  })

  test('under D50, adapted, against culori', () => {
    fc.assert(
      fc.property(triple, (xyz) => {
        const [x, y, z] = xyz
        expectNear(linearRgbToSrgb(xyzToLinearRgb(xyz, D50_WHITE)), convertXyz50ToRgb({ x, y, z }))
      }),
      { seed: 15, numRuns: 300 },
    )
  })

  test('any white is white, whatever the scale', () => {
    for (const white of [[109.85, 100, 35.585], D50_WHITE, SRGB_WHITE] as const) {
      expect(srgbToHex(linearRgbToSrgb(xyzToLinearRgb(white, white)))).toBe('#ffffff')
    }
    expect(srgbToHex(linearRgbToSrgb([0, 0, -1]))).toBe('#000000')
  })

  // IEC 61966-2-1: linear 0.214 is about half the code range; 8-bit 188 is half the light (0.5028).
  test('transfer function', () => {
    expect(srgbToHex(linearRgbToSrgb([0.5028, 0.0031308, 0.214]))).toBe('#bc0a7f')
  })
})
