import * as z from 'zod'
import type { IndexLaw } from '../../materials/indexLaw.js'
import { MATERIAL_NAMES } from '../../materials/material.js'
import { FIELD_LIMITS } from '../fieldLimits.js'
import type { TableFiles } from '../tableFiles.js'
import { numberSchema } from './quantity.js'
import { reportTable, spectrumSchema } from './spectrum.js'

/** Where the file is silent. */
export const DEFAULT_INDEX = { retarder: 1.55, polarizer: 1.5, mirror: 1.5 } as const

const FORMS = 'a number, {n, k}, {cauchy_nm: [A, B, C]}, {material: name}, {formula: "…"} or {file: nk.csv}'

/** Every way to say a refractive index; the one schema is used under many descriptions. */
export function indexSchema(files: TableFiles) {
  const law = z
    .union(
      [
        numberSchema(FIELD_LIMITS.index, 'The same index at all wavelengths.', 1.5),
        complexSchema(files),
        cauchySchema,
        materialSchema,
        formulaSchema,
        fileSchema(files),
      ],
      { error: () => FORMS },
    )
    .transform((law): IndexLaw => law)
  return (description: string) => law.meta({ description })
}

const MATERIALS = `one of ${MATERIAL_NAMES.length} published materials: offblack materials lists them`

function complexSchema(files: TableFiles) {
  return z
    .strictObject({
      n: spectrumSchema(FIELD_LIMITS.n, files, 'Real part.', ['1.52', '1.50', '1.49']),
      k: spectrumSchema(FIELD_LIMITS.k, files, 'Extinction coefficient; positive absorbs.', ['0.01']).prefault(0),
    })
    .meta({ title: 'n and k', description: 'Complex index n + ik.', examples: [{ n: 1.9, k: 0.01 }] })
}

const cauchySchema = z
  .strictObject({
    cauchy_nm: z
      .tuple([
        numberSchema(FIELD_LIMITS.cauchy_nm, 'A.', 1.48),
        numberSchema(FIELD_LIMITS.cauchy_nm, 'B in nm².', 4000),
        numberSchema(FIELD_LIMITS.cauchy_nm, 'C in nm⁴.', 0),
      ])
      .meta({ description: 'A, B in nm², C in nm⁴.' }),
  })
  .meta({
    title: 'Cauchy’s formula',
    description: 'n = A + B/λ² + C/λ⁴ with λ in nm.',
    examples: [{ cauchy_nm: [1.48, 4000, 0] }],
  })

const materialSchema = z
  .strictObject({
    material: z
      .enum(MATERIAL_NAMES as [string, ...string[]], { error: () => MATERIALS })
      .meta({ description: 'Name of the material.' }),
  })
  .meta({
    title: 'Published material',
    description: 'Published data with their source.',
    examples: [{ material: 'tac' }],
  })

const formulaSchema = z.strictObject({ formula: z.string().min(1).meta({ description: 'n over wavelength.' }) }).meta({
  title: 'Formula',
  description: 'Expression for n in wavelength_nm or wavelength_um.',
  examples: [{ formula: '1.5 + 4500 / wavelength_nm^2' }],
})

function fileSchema(files: TableFiles) {
  return z
    .strictObject({ file: z.string().min(1).meta({ description: 'Path of the CSV file, relative to this file.' }) })
    .transform(({ file }, context): IndexLaw => {
      const result = files.index(file)
      if ('table' in result) return result.table
      reportTable(context, result.fault)
      return z.NEVER
    })
    .meta({ title: 'Table in a file', description: 'CSV of wavelength, n, k.', examples: [{ file: 'nk.csv' }] })
}
