import * as z from 'zod'
import { DAYLIGHT_KELVIN } from '../../color/daylight.js'
import type { Illuminant } from '../../color/illuminant.js'
import type { TableFiles } from '../tableFiles.js'
import { quantitySchema } from './quantity.js'
import { fileTable, inlineTable } from './spectrum.js'

const NAMES = ['D65', 'D50', 'A', 'E', 'FL2', 'FL11', 'LED-B3', 'LED-B5'] as const
const POWER = { quantity: 'number', min: 0, max: 1e12 } as const
const TEMPERATURE = { quantity: 'temperature', min: DAYLIGHT_KELVIN.from, max: DAYLIGHT_KELVIN.to } as const

const daylight = z
  .strictObject({ cct: quantitySchema(TEMPERATURE, 'Correlated color temperature of the daylight.', '5000 K') })
  .meta({ title: 'Daylight', description: 'CIE daylight of a color temperature.', examples: [{ cct: 5000 }] })

export function illuminantSchema(files: TableFiles, description: string) {
  return z
    .union(
      [
        z.enum(NAMES).meta({ description: 'Standard illuminant.' }),
        daylight,
        fileTable(POWER, files),
        inlineTable(POWER, ['1', '2', '1']),
      ],
      { error: () => `${NAMES.join(', ')}, {cct: 5000} or {file: lamp.csv}` },
    )
    .transform((illuminant): Illuminant => illuminant)
    .meta({ description })
}
