import { describe, expect, it } from 'vitest'
import { InputError, type Problem } from '../../src/stack/problem.js'
import { readMeasured } from '../../src/stack/readMeasured.js'

const DEG = Math.PI / 180

const LONG = `wavelength_nm,theta_deg,phi_deg,reflectance
400,8,0,0.053
500,8,0,0.041
400,45,90,0.088
500,45,90,0.079
`

const EXPECTED = [
  { theta: 8 * DEG, phi: 0, wavelengthNm: [400, 500], reflectance: [0.053, 0.041] },
  { theta: 45 * DEG, phi: 90 * DEG, wavelengthNm: [400, 500], reflectance: [0.088, 0.079] },
]

function read(text: string) {
  return readMeasured(text, 'sample.csv')
}

function problemOf(text: string): Problem {
  try {
    read(text)
  } catch (error) {
    if (error instanceof InputError) return error.problems[0]
    throw error
  }
  throw new Error('it was read')
}

describe('the long form', () => {
  it('is one reading a row', () => {
    expect(read(LONG)).toEqual(EXPECTED)
  })

  it.each([
    ['a byte-order mark', `\uFEFF${LONG}`],
    ['Windows line ends', LONG.replaceAll('\n', '\r\n')],
    ['semicolons', LONG.replaceAll(',', ';')],
    ['semicolons and decimal commas', LONG.replaceAll(',', ';').replaceAll('.', ',')],
    ['tabs', LONG.replaceAll(',', '\t')],
    ['comments and empty lines', `# instrument 7\n\n${LONG.replace('\n', '\n# begin\n')}\n\n`],
    ['no heading', LONG.slice(LONG.indexOf('\n') + 1)],
    ['other headings', LONG.replace(/^.*\n/, 'Wavelength (nm),Theta (deg),Phi (deg),Reflectance\n')],
    ['percent in the heading', LONG.replace('reflectance', 'reflectance %').replace(/0\.0(\d)(\d)$/gm, '$1.$2')],
    ['percent in the cells', LONG.replace(/0\.0(\d)(\d)$/gm, '$1.$2 %')],
    ['columns in another order', swapColumns(LONG)],
    ['rows in another order', `${LONG.split('\n')[0]}\n${LONG.trim().split('\n').slice(1).reverse().join('\n')}`],
  ])('is understood with %s', (_, text) => {
    const byTheta = read(text).sort((a, b) => a.theta - b.theta)
    byTheta.forEach(({ theta, phi, wavelengthNm, reflectance }, k) => {
      expect([theta, phi, wavelengthNm]).toEqual([EXPECTED[k].theta, EXPECTED[k].phi, EXPECTED[k].wavelengthNm])
      reflectance.forEach((value, i) => {
        expect(value).toBeCloseTo(EXPECTED[k].reflectance[i], 12)
      })
    })
    expect(byTheta).toHaveLength(2)
  })
})

function swapColumns(text: string): string {
  return text.replace(/^([^,\n]*),([^,\n]*),([^,\n]*),([^,\n]*)$/gm, '$4,$2,$1,$3')
}

describe('the wide form', () => {
  const WIDE = 'nm,8/0,45/90\n400,0.053,0.088\n500,0.041,0.079\n'

  it.each([
    ['plain', WIDE],
    ['as a call', WIDE.replace('8/0,45/90', '"R(8, 0)","R(45, 90)"')],
    ['with units', WIDE.replace('8/0,45/90', '8 deg / 0 deg,45 deg / 90 deg')],
    ['with names', WIDE.replace('8/0,45/90', 'theta 8 phi 0,theta 45 phi 90')],
    ['with semicolons and decimal commas', WIDE.replaceAll(',', ';').replaceAll('.', ',')],
    ['in percent', 'nm,8/0 %,45/90 %\n400,5.3,8.8\n500,4.1,7.9\n'],
    ['falling wavelengths', 'nm,8/0,45/90\n500,0.041,0.079\n400,0.053,0.088\n'],
  ])('is one column a direction, headings %s', (_, text) => {
    const spectra = read(text)
    expect(spectra).toHaveLength(2)
    spectra.forEach(({ theta, phi, wavelengthNm, reflectance }, k) => {
      expect([theta, phi, wavelengthNm]).toEqual([EXPECTED[k].theta, EXPECTED[k].phi, EXPECTED[k].wavelengthNm])
      reflectance.forEach((value, i) => {
        expect(value).toBeCloseTo(EXPECTED[k].reflectance[i], 12)
      })
    })
  })

  it('may have three directions, as many columns as the long form', () => {
    expect(read('nm,0/0,30/0,30/90\n500,0.04,0.05,0.06\n').map(({ reflectance }) => reflectance)).toEqual([
      [0.04],
      [0.05],
      [0.06],
    ])
  })

  it('takes negative and fractional angles', () => {
    const [{ theta, phi }] = read('nm,12.5/-45\n500,0.04\n')
    expect(theta).toBeCloseTo(12.5 * DEG, 12)
    expect(phi).toBeCloseTo(-45 * DEG, 12)
  })
})

describe('what is wrong is told with its line', () => {
  it.each<[string, string, number, RegExp]>([
    ['a reflectance in percent without the sign', LONG.replace('0.041', '4.1'), 3, /reflectance is out of range/],
    ['a wavelength in micrometers', LONG.replace('500,45', '0.5,45'), 5, /wavelength is out of range/],
    ['theta at grazing', LONG.replace('400,45', '400,90'), 4, /theta is out of range/],
    ['theta below zero', LONG.replace('400,45', '400,-45'), 4, /theta is out of range/],
    ['phi beyond a turn', LONG.replace('400,45,90', '400,45,900'), 4, /phi is out of range/],
    ['a word for a number', LONG.replace('0.041', 'n.a.'), 3, /column 4 is not a number/],
    ['an empty cell', LONG.replace('0.041', ''), 3, /column 4 is not a number/],
    ['a short row', LONG.replace('500,8,0,0.041', '500,8,0'), 3, /another number of columns/],
    ['one reading twice', LONG.replace('500,8', '400,8'), 3, /measured twice/],
    ['a wide table without directions', 'nm,R1,R2\n500,0.04,0.05\n', 1, /columns do not tell/],
    ['the same direction in two columns', 'nm,8/0,8/0\n500,0.04,0.05\n', 2, /measured twice/],
    ['theta at grazing in a heading', 'nm,8/0,90/0\n500,0.04,0.05\n', 1, /theta is out of range/],
    ['a heading below comments', `# a\n# b\n${LONG.replace('reflectance', 'R')}`, 3, /no column/],
    ['two columns of numbers', '500,0.04\n600,0.05\n', 1, /columns do not tell/],
    ['a heading of the long form with one misspelled', LONG.replace('reflectance', 'R'), 1, /no column "reflectance"/],
  ])('%s', (_, text, line, message) => {
    const problem = problemOf(text)
    expect(problem.message).toMatch(message)
    expect([problem.file, problem.range?.line]).toEqual(['sample.csv', line])
    expect(problem.allowed ?? problem.next).toBeDefined()
  })

  it.each([
    ['nothing', ''],
    ['a heading alone', 'wavelength_nm,theta_deg,phi_deg,reflectance\n'],
    ['comments alone', '# no data\n'],
  ])('%s is no table', (_, text) => {
    expect(problemOf(text).message).toMatch(/no rows of numbers/)
  })
})
