import { describe, expect, test } from 'vitest'
import { daylightChromaticity, daylightSpectrum } from '../../src/color/daylight.js'
import { type Illuminant, illuminantAt, type Lamp } from '../../src/color/illuminant.js'
import { observerAt } from '../../src/color/observer.js'
import { createColorWeights } from '../../src/color/weights.js'

/** from, from + step, …, to. */
function grid(from: number, to: number, step: number): Float64Array {
  return Float64Array.from({ length: Math.round((to - from) / step) + 1 }, (_, i) => from + i * step)
}

const VISIBLE = grid(380, 780, 5)
const WHOLE = grid(360, 830, 5)

function white(illuminant: Illuminant, observer: 2 | 10, wavelengths: Float64Array): readonly number[] {
  return createColorWeights(wavelengths, observer, illuminantAt(illuminant, wavelengths)).whiteXyz
}

function chromaticity(illuminant: Illuminant, wavelengths = VISIBLE): [number, number] {
  const [x, y, z] = white(illuminant, 2, wavelengths)
  return [x / (x + y + z), y / (x + y + z)]
}

test('the 2° luminous efficiency sums to 106.857: CIE 018:2019', () => {
  const sum = observerAt(2, WHOLE).y.reduce((total, value) => total + value, 0)
  expect(sum * 5).toBeCloseTo(106.857, 3)
})

describe('white points', () => {
  // CIE 15 and ASTM E308, table 5; Y = 100.
  test.each([
    ['D65 whole', 'D65', 2, WHOLE, 95.047, 108.897, 3],
    ['D65 380–780', 'D65', 2, VISIBLE, 95.043, 108.88, 2],
    // From memory: ASTM E308, table 5 (1 nm sums, hence fewer decimals).
    ['D65 10°', 'D65', 10, WHOLE, 94.811, 107.304, 1],
    ['A', 'A', 2, WHOLE, 109.85, 35.585, 2],
    ['A 10°', 'A', 10, WHOLE, 111.144, 35.2, 2],
    ['D50', 'D50', 2, VISIBLE, 96.42, 82.51, 1],
    // Equal energy: equal by the normalization of the color-matching functions.
    ['E', 'E', 2, WHOLE, 100, 100, 1],
  ] as const)('%s', (_, illuminant, observer, wavelengths, x, z, digits) => {
    const xyz = white(illuminant, observer, wavelengths)
    expect(xyz[0]).toBeCloseTo(x, digits)
    expect(xyz[1]).toBeCloseTo(100, 12)
    expect(xyz[2]).toBeCloseTo(z, digits)
  })

  // CIE 15, tables T.3 and following, 2° observer; the last three from memory.
  test.each([
    ['A', 0.44758, 0.40745, 4],
    ['D50', 0.34567, 0.35851, 4],
    ['FL2', 0.37207, 0.37512, 4],
    ['FL11', 0.3805, 0.3769, 3],
    ['LED-B3', 0.3756, 0.3723, 3],
    ['LED-B5', 0.3118, 0.3236, 3],
  ] as const)('chromaticity of %s', (illuminant, x, y, digits) => {
    const xy = chromaticity(illuminant)
    expect(xy[0]).toBeCloseTo(x, digits)
    expect(xy[1]).toBeCloseTo(y, digits)
  })
})

// ISO/CIE 11664-2: A is Planck's law at 2848 K with c2 = 1.435e7 nm K, 100 at 560 nm; the table has six digits.
test('illuminant A follows Planck’s law', () => {
  const planck = (nm: number) => nm ** -5 / Math.expm1(1.435e7 / (2848 * nm))
  const power = illuminantAt('A', WHOLE)
  WHOLE.forEach((nm, i) => {
    expect(power[i] / ((100 * planck(nm)) / planck(560))).toBeCloseTo(1, 5)
  })
})

describe('daylight', () => {
  // CIE 15: D65 and D50 have nominal temperatures to be multiplied by 1.4388/1.4380.
  test.each([
    ['D65', 6500],
    ['D50', 5000],
  ] as const)('%s comes out of its components', (name, nominal) => {
    const own = daylightSpectrum((nominal * 1.4388) / 1.438, VISIBLE)
    const table = illuminantAt(name, VISIBLE)
    // M1, M2 rounded to three decimals leave up to 0.0005 of S1 (46) and S2 (10).
    own.forEach((power, i) => {
      expect(Math.abs(power - table[i])).toBeLessThan(0.03)
    })
  })

  // Locus at 5500, 6500, 7500 K: G. Wyszecki, W. S. Stiles, Color Science (1982), 3.3.4 (from memory).
  test.each([
    [5500, 0.3324, 0.3474],
    [6500, 0.3127, 0.3291],
    [7500, 0.299, 0.3149],
  ])('locus at %d K', (nominal, x, y) => {
    const locus = daylightChromaticity((nominal * 1.4388) / 1.438)
    expect(locus.x).toBeCloseTo(x, 3)
    expect(locus.y).toBeCloseTo(y, 3)
  })

  test.each([4000, 4500, 6999, 7001, 10_000, 25_000])(
    'the spectrum at %d K has the chromaticity it was made for',
    (cct) => {
      const [x, y] = chromaticity({ cct }, WHOLE)
      const locus = daylightChromaticity(cct)
      expect(Math.abs(x - locus.x)).toBeLessThan(3e-4)
      expect(Math.abs(y - locus.y)).toBeLessThan(3e-4)
    },
  )

  test.each([3999, 25_001, Number.NaN])('refuses %d K', (cct) => {
    expect(() => illuminantAt({ cct }, VISIBLE)).toThrow(/4000 to 25000 K/)
  })
})

test('a lamp is linear between its points and constant outside', () => {
  const lamp: Lamp = { wavelength_nm: [400, 500], value: [1, 3] }
  expect(Array.from(illuminantAt(lamp, Float64Array.of(380, 450, 500, 700)))).toEqual([1, 2, 3, 3])
})

test('tables are linear between their rows', () => {
  const [low, middle, high] = illuminantAt('D65', Float64Array.of(550, 552.5, 555))
  expect(middle).toBeCloseTo((low + high) / 2, 12)
})
