import { describe, expect, test } from 'vitest'
import { findMaterial, MATERIAL_NAMES, materialIndexAt } from '../../src/materials/material.js'
import handbook from '../data/material-handbook.json'

const at = (name: string, nm: number) => {
  const { n, k } = materialIndexAt(name, Float64Array.of(nm))
  return { n: n[0], k: k[0] }
}

/** Fresnel, normal incidence from air. */
function reflectance({ n, k }: { n: number; k: number }): number {
  return ((n - 1) ** 2 + k * k) / ((n + 1) ** 2 + k * k)
}

describe('against the handbook (sources stand in test/data/material-handbook.json)', () => {
  test.each(handbook.bulk)('n, k and reflectance of $material at $nm nm', ({ material, nm, ...expected }) => {
    const index = at(material, nm)
    // The listed figures are rounded to five decimals.
    expect(Math.abs(index.n - expected.n)).toBeLessThan(6e-6)
    expect(Math.abs(index.k - expected.k)).toBeLessThan(6e-6)
    expect(Math.abs(reflectance(index) - expected.reflectance)).toBeLessThan(6e-6)
  })

  test.each(handbook.index)('index of $material at $nm nm', ({ material, nm, value, handbook: usual }) => {
    const { n, k } = at(material, nm)
    expect(Math.abs(n - value)).toBeLessThan(6e-6)
    // The usual figures were measured on other specimens: they agree to the fourth decimal.
    expect(Math.abs(n - usual)).toBeLessThan(3e-4)
    expect(k).toBeLessThan(1e-7)
  })

  test.each(handbook.birefringence)('birefringence of $crystal at $nm nm', ({ crystal, nm, value }) => {
    const birefringence = at(`${crystal}_ne`, nm).n - at(`${crystal}_no`, nm).n
    expect(Math.abs(birefringence - value)).toBeLessThan(6e-6)
  })
})

describe('against other published figures', () => {
  test('a quarter-wave plate of quartz at 589 nm is 16.18 µm thick for a birefringence rounded to 0.0091', () => {
    // d = λ / 4Δn. The coefficients give 0.00910; rounding moves the thickness by less than half a percent.
    const thicknessUm = 0.589 / (4 * (at('quartz_ne', 589).n - at('quartz_no', 589).n))
    expect(Math.abs(thicknessUm / 16.18 - 1)).toBeLessThan(5e-3)
  })

  test('calcite is the most birefringent of the crystals: ne - no = -0.172 at 589.3 nm', () => {
    // From memory, the usual handbook figure.
    expect(at('calcite_ne', 589.3).n - at('calcite_no', 589.3).n).toBeCloseTo(-0.172, 3)
  })

  test('aluminum of four determinations agrees: 0.911 at 600 nm within 0.007', () => {
    // 0.91103 follows from n + ik = 1.26232 + 7.1855i, a published determination that is none of those here.
    expect(reflectance({ n: 1.26232, k: 7.1855 })).toBeCloseTo(0.91103, 5)
    for (const name of ['al', 'al_mathewson', 'al_lorentz_drude']) {
      expect(Math.abs(reflectance(at(name, 600)) - 0.91103), name).toBeLessThan(7e-3)
    }
  })

  test.each([
    // nd and Abbe number stand in the title of the glass: (nd - 1) / (nF - nC), lines at 587.56, 486.13, 656.27 nm (ISO 7944).
    ['glass_crown', 1.5168, 64.17, 0.01],
    // From memory: fused silica 67.8.
    ['fused_silica', 1.4585, 67.8, 0.05],
    // From memory: PMMA 1.491 / 57, cyclo-olefin polymer 1.53 / 56. The published one-term fits run to 1052 nm and disperse
    // up to 8 % more between the blue and the red line than that.
    ['pmma', 1.491, 57, 4.5],
    ['cyclo_olefin', 1.53, 56, 4.5],
  ])('%s: index %d and Abbe number %d', (name, nd, abbe, tolerance) => {
    const [d, f, c] = [587.56, 486.13, 656.27].map((nm) => at(name, nm).n)
    expect(Math.abs(d - nd)).toBeLessThan(1.5e-3)
    expect(Math.abs((d - 1) / (f - c) - abbe)).toBeLessThan(tolerance)
  })

  test.each([
    // From memory, the textbook order of magnitude of optical films: each within a few percent.
    ['glass', 1.52],
    ['tac', 1.47],
    ['pet', 1.57],
    ['polycarbonate', 1.586],
    ['pva', 1.48],
    ['sio2_film', 1.47],
    ['mgf2', 1.42],
    ['si3n4', 2.02],
    ['tio2', 2.42],
    ['nb2o5', 2.34],
    ['ito', 1.83],
  ])('%s is near %d at 589 nm', (name, n) => {
    expect(Math.abs(at(name, 589).n / n - 1)).toBeLessThan(0.03)
  })

  test('the metals in order of their reflectance at 550 nm', () => {
    // From memory: silver 0.98, aluminum 0.91, magnesium 0.9, copper 0.6, molybdenum, chromium and titanium 0.5 to 0.6.
    const of = (name: string) => reflectance(at(name, 550))
    expect(of('ag')).toBeGreaterThan(of('al'))
    expect(of('al')).toBeGreaterThan(of('mg'))
    expect(of('mg')).toBeGreaterThan(of('cu'))
    for (const name of ['cu', 'mo', 'cr', 'ti']) {
      expect(of(name), name).toBeGreaterThan(0.48)
      expect(of(name), name).toBeLessThan(0.68)
    }
  })
})

describe('every published material', () => {
  const VISIBLE = Float64Array.from({ length: 401 }, (_, i) => 380 + i)
  const WIDE = Float64Array.from({ length: 2301 }, (_, i) => 200 + i)

  test.each(MATERIAL_NAMES)('%s names its source, terms and range', (name) => {
    const material = findMaterial(name)
    expect(material?.name).toBe(name)
    expect(name).toMatch(/^[a-z][a-z0-9]*(_[a-z0-9]+)*$/)
    expect(material?.source).toMatch(/\(\d{4}\)|2017 edition/)
    expect(material?.via).toContain('CC0')
    const [from, to] = material?.rangeNm ?? [0, 0]
    expect(to).toBeGreaterThan(from)
  })

  test.each(MATERIAL_NAMES)('%s is finite and passive from 200 to 2500 nm', (name) => {
    const { n, k } = materialIndexAt(name, WIDE)
    expect(n.every((value) => Number.isFinite(value) && value > 0)).toBe(true)
    expect(k.every((value) => Number.isFinite(value) && value >= 0)).toBe(true)
  })

  test.each(MATERIAL_NAMES)('%s does not jump in the visible', (name) => {
    // Silicon's band edge and silver's low k are the steepest: a tenth per nanometer at most.
    const { n, k } = materialIndexAt(name, VISIBLE)
    for (let i = 1; i < VISIBLE.length; i++) {
      expect(Math.abs(n[i] - n[i - 1])).toBeLessThan(0.1)
      expect(Math.abs(k[i] - k[i - 1])).toBeLessThan(0.1)
    }
  })

  test.each(['ag', 'al', 'mg', 'cu', 'cr', 'mo', 'ti'])(
    '%s covers the visible, as the bare name of a metal must',
    (name) => {
      const [from, to] = findMaterial(name)?.rangeNm ?? [0, 0]
      expect(from).toBeLessThan(381)
      expect(to).toBeGreaterThan(779)
    },
  )

  test('each ordinary index has its extraordinary one', () => {
    const stems = (ending: string) =>
      MATERIAL_NAMES.filter((name) => name.endsWith(ending)).map((name) => name.slice(0, -ending.length))
    expect(stems('_no')).toEqual(stems('_ne'))
    expect(stems('_no').length).toBeGreaterThan(5)
  })

  test('the stand-in for triacetate says so', () => {
    expect(findMaterial('tac')?.note).toContain('stand-in')
  })

  test('a table with no k at its short end holds the first k it gives, and does not claim that part', () => {
    expect(at('polyimide', 400).k).toBe(at('polyimide', 480).k)
    expect(at('polyimide', 400).n).toBeGreaterThan(at('polyimide', 480).n)
    expect(findMaterial('polyimide')?.rangeNm[0]).toBe(480)
  })

  test('names of the language itself are no materials', () => {
    for (const name of ['constructor', '__proto__', 'toString', '']) {
      expect(findMaterial(name)).toBeUndefined()
      expect(() => materialIndexAt(name, VISIBLE)).toThrow('no published material')
    }
  })
})
