import fc from 'fast-check'
import { expect, test } from 'vitest'
import { findMaterial, MATERIAL_NAMES } from '../../src/materials/material.js'
import { outsideRange } from '../../src/materials/outsideRange.js'

test('a formula continued below its range', () => {
  expect(outsideRange({ material: 'tac' }, 380, 780)).toBe(
    '"tac" is published for 436.8 to 1052 nm; from 380 to 436.8 nm its formula is continued',
  )
})

test('both ends at once', () => {
  expect(outsideRange({ material: 'lc_5cb_no' }, 380, 780)).toBe(
    '"lc_5cb_no" is published for 450 to 656 nm; from 380 to 450 nm and from 656 to 780 nm its formula is continued',
  )
})

test('a table holds its end values', () => {
  expect(outsideRange({ material: 'al_mathewson' }, 380, 780)).toContain(
    'from 380 to 495.94 nm its end values are held',
  )
})

test('the tables of n and k in a stack are looked at too', () => {
  const table = { wavelength_nm: [400, 700], value: [1.5, 1.5] }
  const message = 'covers 400 to 700 nm; from 380 to 400 nm and from 700 to 780 nm its end values are held'
  expect(outsideRange({ n: table, k: 0 }, 380, 780)).toBe(`the table of n ${message}`)
  expect(outsideRange({ n: 1.5, k: table }, 380, 780)).toBe(`the table of k ${message}`)
  expect(outsideRange({ n: table, k: 0 }, 400, 700)).toBeUndefined()
})

test('wholly outside: the part asked for is named', () => {
  expect(outsideRange({ material: 'ag' }, 900, 1000)).toContain('from 900 to 1000 nm')
  expect(outsideRange({ material: 'ag' }, 250, 300)).toContain('from 250 to 300 nm')
})

test('half a nanometer at the end of a table is not worth a word', () => {
  expect(findMaterial('ito')?.rangeNm[0]).toBe(380.5)
  expect(outsideRange({ material: 'ito' }, 380, 780)).toBeUndefined()
})

test('what holds everywhere is never warned of', () => {
  for (const law of [1.5, { n: 1.5, k: 0.1 }, { cauchy_nm: [1.5, 0, 0] as const }, { formula: '1.5' }]) {
    expect(outsideRange(law, 200, 2500)).toBeUndefined()
  }
})

test('silent inside the range of any material, and only there', () => {
  fc.assert(
    fc.property(
      fc.constantFrom(...MATERIAL_NAMES),
      fc.double({ min: 0, max: 1, noNaN: true }),
      fc.double({ min: 0, max: 1, noNaN: true }),
      fc.double({ min: 2, max: 50, noNaN: true }),
      (name, a, b, beyondNm) => {
        const [low, high] = findMaterial(name)?.rangeNm ?? [0, 0]
        const [from, to] = [a, b].sort((x, y) => x - y).map((share) => low + share * (high - low))
        expect(outsideRange({ material: name }, from, to)).toBeUndefined()
        expect(outsideRange({ material: name }, low - beyondNm, to)).toContain(name)
        expect(outsideRange({ material: name }, from, high + beyondNm)).toContain(name)
      },
    ),
    { seed: 11, numRuns: 300 },
  )
})
