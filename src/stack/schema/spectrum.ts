import * as z from 'zod'
import type { Spectrum, SpectrumTable } from '../../materials/indexLaw.js'
import { type Fault, shortList } from '../fault.js'
import { CONDITION_LIMITS } from '../fieldLimits.js'
import type { Problem } from '../problem.js'
import { MOST_POINTS, type TableFault, type TableFiles } from '../tableFiles.js'
import { type Limits, quantitySchema, rangeFault, report } from './quantity.js'

/** Wavelengths of tables may reach beyond those of the conditions. */
const TABLE_WAVELENGTH: Limits = { ...CONDITION_LIMITS.wavelength, min: 100, max: 50_000 }

/** A table written in the stack file: wavelengths in ascending order and as many values. */
export function inlineTable(limits: Limits, example: readonly string[]) {
  return z
    .strictObject({
      wavelength_nm: z
        .array(quantitySchema(TABLE_WAVELENGTH, 'Wavelength.', '550 nm'))
        .min(1)
        .max(MOST_POINTS)
        .meta({ description: 'Wavelengths, ascending.' }),
      value: z
        .array(quantitySchema(limits, 'Value at the wavelength of the same position.', example[0]))
        .min(1)
        .meta({ description: 'As many values.' }),
    })
    .transform((table, context): SpectrumTable => {
      const { fault, path } = tableFault(table)
      if (fault !== undefined) report(context, fault, path)
      return table
    })
    .meta({
      title: 'Spectrum',
      description: 'Linear between the wavelengths, constant outside.',
      examples: [{ wavelength_nm: [450, 550, 650], value: example }],
    })
}

function tableFault({ wavelength_nm, value }: SpectrumTable): { fault?: Fault; path?: PropertyKey[] } {
  if (wavelength_nm.length !== value.length) {
    const received = `${wavelength_nm.length} wavelengths, ${value.length} values`
    const message = 'there must be as many values as wavelengths'
    return { fault: { code: 'wrong_length', message, received }, path: ['value'] }
  }
  const index = wavelength_nm.findIndex((nm, i) => i > 0 && nm <= wavelength_nm[i - 1])
  if (index < 0) return {}
  const received = `${wavelength_nm[index]} after ${wavelength_nm[index - 1]}`
  const message = 'the wavelengths must ascend'
  return { fault: { code: 'not_ascending', message, received, next: 'sort the table' }, path: ['wavelength_nm', index] }
}

/** `{file: x.csv}`: two columns, wavelength and value. */
export function fileTable(limits: Limits, files: TableFiles) {
  return z
    .strictObject({ file: z.string().min(1).meta({ description: 'Path of the CSV file, relative to this file.' }) })
    .transform(({ file }, context): SpectrumTable => {
      const result = files.spectrum(file)
      if ('fault' in result) {
        reportTable(context, result.fault)
        return z.NEVER
      }
      const { wavelength_nm, value } = result.table
      const bad = value.findIndex((entry) => rangeFault(entry, entry, limits) !== undefined)
      if (bad >= 0) {
        const fault = rangeFault(value[bad], value[bad], limits) as Fault
        report(context, { ...fault, message: `${fault.message} at ${wavelength_nm[bad]} nm in ${file}` }, ['file'])
      }
      return result.table
    })
    .meta({
      title: 'Spectrum in a file',
      description: 'CSV of wavelength and value.',
      examples: [{ file: 'film.csv' }],
    })
}

/** Reports a fault of a file, which may point into that file. */
export function reportTable(context: Parameters<typeof report>[0], { inFile, ...fault }: TableFault): void {
  const place: { inFile?: Pick<Problem, 'file' | 'range'> } = inFile === undefined ? {} : { inFile }
  context.addIssue({ code: 'custom', message: fault.message, path: ['file'], params: { fault, ...place } })
}

/** A value for all wavelengths, a table, or a file with one. */
export function spectrumSchema(limits: Limits, files: TableFiles, description: string, example: readonly string[]) {
  const forms = ['a value', '{wavelength_nm: […], value: […]}', '{file: x.csv}']
  return z
    .union([quantitySchema(limits, description, example[0]), inlineTable(limits, example), fileTable(limits, files)], {
      error: () => shortList(forms),
    })
    .transform((spectrum): Spectrum => spectrum)
    .meta({ description })
}
