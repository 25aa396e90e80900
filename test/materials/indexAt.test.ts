import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { prepareFormula } from '../../src/materials/formula.js'
import { indexAt } from '../../src/materials/indexAt.js'
import { materialIndexAt } from '../../src/materials/material.js'
import { spectrumAt } from '../../src/materials/spectrumAt.js'

const WAVELENGTHS = Float64Array.of(380, 450, 550, 650, 780)
const ZEROS = [0, 0, 0, 0, 0]

describe('indexAt', () => {
  test('a number holds at all wavelengths', () => {
    const { n, k } = indexAt(1.5, WAVELENGTHS)
    expect([...n]).toEqual([1.5, 1.5, 1.5, 1.5, 1.5])
    expect([...k]).toEqual(ZEROS)
  })

  test('n and k, each a number or a table', () => {
    const table = { wavelength_nm: [400, 500, 600], value: [1.6, 1.5, 1.46] }
    const { n, k } = indexAt({ n: table, k: 0.01 }, WAVELENGTHS)
    // By hand: constant outside, halfway between.
    ;[1.6, 1.55, 1.48, 1.46, 1.46].forEach((value, i) => {
      expect(n[i]).toBeCloseTo(value, 12)
    })
    expect([...k]).toEqual([0.01, 0.01, 0.01, 0.01, 0.01])
  })

  test('Cauchy in nm', () => {
    // By hand: 1.5 + 5000 / 250000 + 2.5e9 / 6.25e10 at 500 nm.
    const { n, k } = indexAt({ cauchy_nm: [1.5, 5000, 2.5e9] }, Float64Array.of(500))
    expect(n[0]).toBeCloseTo(1.56, 12)
    expect(k[0]).toBe(0)
  })

  test('a formula says the same in nm, in µm and as Cauchy', async () => {
    const inNm = '1.5 + 5000 / wavelength_nm^2'
    const inUm = '1.5 + 0.005 / wavelength_um^2'
    expect(await prepareFormula(inNm)).toBeUndefined()
    expect(await prepareFormula(inUm)).toBeUndefined()
    const cauchy = indexAt({ cauchy_nm: [1.5, 5000, 0] }, WAVELENGTHS).n
    for (const formula of [inNm, inUm]) {
      const { n, k } = indexAt({ formula }, WAVELENGTHS)
      n.forEach((value, i) => {
        expect(value).toBeCloseTo(cauchy[i], 12)
      })
      expect([...k]).toEqual(ZEROS)
    }
  })

  test('a formula that was not prepared and a material that is not known are errors of the program', () => {
    expect(() => indexAt({ formula: '1.5 + 0' }, WAVELENGTHS)).toThrow('not prepared')
    expect(() => indexAt({ material: 'unobtainium' }, WAVELENGTHS)).toThrow('no published material')
  })

  test('a material by its name', () => {
    expect(indexAt({ material: 'al' }, WAVELENGTHS)).toEqual(materialIndexAt('al', WAVELENGTHS))
  })
})

describe('spectrumAt', () => {
  test('stays between the values of its table, meets each of them, and is constant outside', () => {
    const points = fc.uniqueArray(
      fc.tuple(fc.integer({ min: 200, max: 2500 }), fc.double({ min: 0, max: 10, noNaN: true })),
      {
        selector: ([nm]) => nm,
        minLength: 1,
        maxLength: 30,
      },
    )
    fc.assert(
      fc.property(points, fc.double({ min: 100, max: 3000, noNaN: true }), (rows, nm) => {
        const sorted = [...rows].sort((a, b) => a[0] - b[0])
        const table = { wavelength_nm: sorted.map(([x]) => x), value: sorted.map(([, y]) => y) }
        const [value] = spectrumAt(table, Float64Array.of(nm))
        expect(value).toBeGreaterThanOrEqual(Math.min(...table.value) - 1e-12)
        expect(value).toBeLessThanOrEqual(Math.max(...table.value) + 1e-12)
        expect([...spectrumAt(table, Float64Array.from(table.wavelength_nm))]).toEqual(table.value)
        const [below, above] = spectrumAt(table, Float64Array.of(100, 3000))
        expect([below, above]).toEqual([table.value[0], table.value[table.value.length - 1]])
      }),
      { seed: 7, numRuns: 300 },
    )
  })
})
