import { parse } from 'csv-parse/sync'
import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { csvText } from '../../src/report/csvText.js'
import { fixed, given } from '../../src/report/decimals.js'
import { jsonText } from '../../src/report/jsonText.js'
import { metricWithUnit } from '../../src/report/metricNumber.js'
import { textTable } from '../../src/report/textTable.js'

describe('text table', () => {
  const columns = [
    { heading: 'name', align: 'left' },
    { heading: 'nm', align: 'right' },
  ] as const

  test('numbers stand right, words left, lines end without blanks', () => {
    const rows = [
      ['half', '270.00'],
      ['a', '9.5'],
    ]
    expect(textTable(columns, rows)).toBe(['name      nm', 'half  270.00', 'a        9.5'].join('\n'))
  })

  test('colors take no width', () => {
    const colored = textTable(columns, [['\u001b[31mhalf\u001b[39m', '1']])
    expect(colored.replace('\u001b[31m', '').replace('\u001b[39m', '')).toBe('name  nm\nhalf   1')
  })

  test('without headings there is no heading line; a short row is a gap', () => {
    const bare = columns.map(({ align }) => ({ heading: '', align }))
    expect(textTable(bare, [['a', '1'], [], ['b', '2']])).toBe('a  1\n\nb  2')
  })
})

describe('numbers', () => {
  test('shares in percent, contrasts to three digits, a tiny negative is no negative zero', () => {
    expect(metricWithUnit('luminous_reflectance', 0.0466213)).toBe('4.662 %')
    expect(metricWithUnit('ambient_contrast', 62.857142)).toBe('62.9 : 1')
    expect(metricWithUnit('ambient_contrast', 12345.6)).toBe('12346 : 1')
    expect(metricWithUnit('b_star', -0.001)).toBe('0.00')
    expect(metricWithUnit('emission_transmittance', Number.NaN)).toBe('–')
    expect(fixed(-1.005, 1)).toBe('-1.0')
    expect(given(4.7 * 100 * 0.01)).toBe('4.7')
  })
})

describe('JSON', () => {
  test('is what JSON.parse makes the same of as of JSON.stringify', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        expect(JSON.parse(jsonText(value))).toEqual(JSON.parse(JSON.stringify(value)))
      }),
      { seed: 1, numRuns: 300 },
    )
  })

  test('keys without a value are absent; lists of numbers stand on one line', () => {
    expect(jsonText({ a: undefined, b: [1, 2.5] })).toBe('{\n  "b": [1,2.5]\n}\n')
  })
})

describe('CSV', () => {
  test('is read back by a general CSV reader (RFC 4180)', () => {
    const cell = fc.oneof(
      fc.double({ noNaN: true }),
      fc.string({ unit: fc.constantFrom('a', '"', ',', '\n', '\r', ' ', ';') }),
    )
    fc.assert(
      fc.property(fc.array(fc.tuple(cell, cell), { minLength: 1 }), (rows) => {
        const read: string[][] = parse(csvText(['x', 'y'], rows), { record_delimiter: '\r\n' })
        expect(read[0]).toEqual(['x', 'y'])
        expect(read.slice(1)).toEqual(
          rows.map((row) => row.map((c) => (typeof c === 'string' ? c.replace(/^\r/, "'\r") : String(c)))),
        )
      }),
      { seed: 1, numRuns: 300 },
    )
  })

  test('a text is never a formula to a spreadsheet; a missing value is an empty cell', () => {
    expect(csvText(['a', 'b'], [['=1+1', undefined]])).toBe("a,b\r\n'=1+1,\r\n")
  })
})
