import * as z from 'zod'
import { CONDITION_LIMITS } from '../fieldLimits.js'
import type { TableFiles } from '../tableFiles.js'
import { conditionsSchema } from './conditions.js'
import { emissionSchema } from './emission.js'
import { layerSchema } from './layer.js'
import { limitSchema } from './metric.js'
import { panelSchema } from './panel.js'
import { quantitySchema } from './quantity.js'
import { compareSchema, fitSchema, optimizeSchema, toleranceSchema } from './questions.js'
import { indexSchema } from './refractiveIndex.js'

const MOST_LAYERS = 2000
const MOST_LEVELS = 20

/** Sections of the file. */
export const STACK_KEYS: readonly string[] = [
  'format',
  'title',
  'notes',
  'conditions',
  'layers',
  'panel',
  'emission',
  'ambient',
  'limits',
  'optimize',
  'tolerance',
  'compare',
  'fit',
]

/** The stack file. CSV files it names are read while it is parsed; film cards are laid under their layers before. */
export function stackSchema(files: TableFiles) {
  const index = indexSchema(files)
  return z
    .strictObject({
      format: z.literal(1).meta({ description: 'Version of this file format.', examples: [1] }),
      title: z
        .string()
        .max(200)
        .prefault('Untitled laminate')
        .meta({ description: 'Heads reports and charts.', examples: ['Wrist dive computer, 1.4 inch OLED'] }),
      notes: z.string().max(20_000).optional().meta({ description: 'Free text.' }),
      conditions: conditionsSchema(files),
      layers: z
        .array(layerSchema(files, index))
        .max(MOST_LAYERS)
        .meta({ description: 'From the viewer’s side to the panel.' }),
      panel: panelSchema(files, index),
      emission: emissionSchema(files),
      ambient: z
        .array(quantitySchema(CONDITION_LIMITS.illuminance, 'Illuminance.', '500 lx'))
        .max(MOST_LEVELS)
        .prefault([])
        .meta({ description: 'Illuminances for the ambient contrast.', examples: [[500, 10000, 50000]] }),
      limits: z.array(limitSchema).max(200).prefault([]).meta({ description: 'What the design must meet.' }),
      optimize: optimizeSchema.optional(),
      tolerance: toleranceSchema.optional(),
      compare: compareSchema.optional(),
      fit: fitSchema.optional(),
    })
    .meta({ title: 'Stack file', description: 'One laminate and the questions asked of it.' })
}

export type StackSchema = ReturnType<typeof stackSchema>
/** A stack whose questions still name files and paths unchecked. */
export type DraftStack = z.output<StackSchema>
