import * as z from 'zod'
import type { TableFiles } from '../tableFiles.js'
import { filmFields } from './filmFields.js'
import { indexSchema } from './refractiveIndex.js'
import { requires } from './requires.js'

/** Keys of a card that say something about the film on offer, not about its optics. */
export const CARD_KEYS = ['format', 'name', 'maker', 'price_per_m2', 'notes'] as const

/** One film on offer: the fields of a layer without id, angle and film. */
export function filmCardSchema(files: TableFiles) {
  const fields = filmFields(files, indexSchema(files))
  const head = {
    format: z.literal(1).optional().meta({ description: 'Version of this file format.' }),
    name: z
      .string()
      .min(1)
      .max(200)
      .meta({ description: 'Name of the film.', examples: ['Quarter-wave film A'] }),
    maker: z.string().max(200).optional().meta({ description: 'Who makes it.' }),
    price_per_m2: z
      .number()
      .min(0)
      .optional()
      .meta({ description: 'Price of one square meter.', examples: [38] }),
    notes: z.string().max(20_000).optional().meta({ description: 'Free text.' }),
  }
  return z
    .discriminatedUnion(
      'kind',
      [
        z.strictObject({ ...head, kind: z.literal('isotropic'), ...fields.isotropic }).meta({ title: 'Coating' }),
        z
          .strictObject({ ...head, kind: z.literal('retarder'), ...fields.retarder })
          .meta({ title: 'Retardation film', not: requires('nz', 'rth') }),
        z.strictObject({ ...head, kind: z.literal('polarizer'), ...fields.polarizer }).meta({ title: 'Polarizer' }),
        z.strictObject({ ...head, kind: z.literal('crystal'), ...fields.crystal }).meta({ title: 'Crystal' }),
      ],
      { error: () => 'isotropic, retarder, polarizer, crystal' },
    )
    .meta({ title: 'Film card', description: 'One film on offer.' })
}
