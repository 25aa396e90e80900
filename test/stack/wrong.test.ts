import { readdirSync, readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { filesFrom, problemsOf } from './reading.js'

const folder = new URL('./wrong/', import.meta.url)

/** Each file has one fault: its code, the line it stands on, what is suggested. */
const WRONG: readonly (readonly [file: string, code: string, line: number, suggestion?: string])[] = [
  ['absorbing-mirror-medium', 'not_applicable', 7],
  ['camel-case-id', 'bad_id', 4, 'hard_coat'],
  ['contrast-without-luminance', 'not_applicable', 8],
  ['dark-lamp', 'out_of_range', 4],
  ['descending-table', 'not_ascending', 7],
  ['duplicate-id', 'duplicate_id', 6, 'quarter_2'],
  ['duplicate-key', 'duplicate_key', 6],
  ['emission-over-metal', 'not_applicable', 7],
  ['empty-range', 'empty_range', 8],
  ['empty', 'wrong_type', 1],
  ['formula-calls', 'bad_formula', 4],
  ['formula-negative', 'out_of_range', 4],
  ['grazing-direction', 'out_of_range', 6],
  ['invisible-band', 'out_of_range', 4],
  ['limit-elsewhere', 'direction_not_computed', 10],
  ['limit-without-bound', 'missing_key', 7],
  ['list-at-top', 'wrong_type', 1],
  ['missing-csv', 'missing_file', 7, 'spectra/panel.csv'],
  ['missing-film', 'missing_file', 4],
  ['missing-panel', 'missing_key', 1],
  ['missing-thickness', 'missing_key', 5],
  ['negative-extinction', 'out_of_range', 4],
  ['negative-thickness', 'out_of_range', 4],
  ['nothing-varies', 'out_of_range', 6],
  ['nz-and-rth', 'exclusive', 8],
  ['path-not-numeric', 'not_numeric', 8],
  ['path-unknown-field', 'unknown_field', 8, 'quarter.slow_axis'],
  ['path-unknown-layer', 'unknown_id', 8, 'quarter.slow_axis'],
  ['percent-forgotten', 'out_of_range', 7, '45 %'],
  ['polarizer-half-a-pair', 'missing_partner', 7],
  ['polarizer-perfect', 'faces', 8],
  ['polarizer-too-clear', 'faces', 7],
  ['prototype-key', 'unknown_key', 8],
  ['quantile-without-spreads', 'missing_key', 8],
  ['reserved-id', 'reserved_id', 4, 'panel_layer'],
  ['tab-in-layer', 'yaml', 5],
  ['tab-indent', 'yaml', 4],
  ['together-not-varied', 'unknown_id', 11, 'quarter.slow_axis'],
  ['too-many-wavelengths', 'too_large', 4],
  ['two-aims', 'exclusive', 9],
  ['unclosed-flow', 'yaml', 5],
  ['under-without-quantile', 'not_applicable', 8],
  ['units-mixed-up', 'out_of_range', 4],
  ['unknown-illuminant', 'unknown_name', 4, 'D65'],
  ['unknown-kind', 'unknown_name', 4, 'retarder'],
  ['unknown-layer-key', 'unknown_key', 6, 'retardance'],
  ['unknown-material', 'unknown_name', 4, 'pmma'],
  ['unknown-section', 'unknown_key', 6, 'limits'],
  ['unknown-slot', 'unknown_id', 8, 'quarter'],
  ['unknown-tag', 'yaml', 4],
  ['value-outside', 'out_of_range', 8],
  ['wrong-format', 'unknown_name', 1],
  ['wrong-unit', 'wrong_unit', 6],
]

describe('a wrong stack file', () => {
  it.each(WRONG)('%s: %s on line %i', async (name, code, line, suggestion) => {
    const file = `${name}.yaml`
    const text = readFileSync(new URL(file, folder), 'utf8')
    const problems = await problemsOf(text, { file, files: filesFrom({ 'spectra/panel.csv': '550,45' }) })
    expect(problems).toHaveLength(1)
    const [problem] = problems
    expect({ code: problem.code, line: problem.range?.line, suggestion: problem.suggestion }).toEqual({
      code,
      line,
      suggestion,
    })
    expect(problem).toMatchObject({ severity: 'error', file })
    expect(problem.message).toMatch(/^[^\n]+$/)
    expect(problem.allowed ?? problem.next).toBeTruthy()
  })

  it('is in the table', () => {
    const files = readdirSync(folder).map((name) => name.replace('.yaml', ''))
    expect(files.sort()).toEqual(WRONG.map(([file]) => file).sort())
  })
})
