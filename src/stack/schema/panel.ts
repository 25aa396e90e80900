import * as z from 'zod'
import { FIELD_LIMITS } from '../fieldLimits.js'
import type { Panel } from '../stack.js'
import type { TableFiles } from '../tableFiles.js'
import { DEFAULT_INDEX, type indexSchema } from './refractiveIndex.js'
import { spectrumSchema } from './spectrum.js'

const PANEL_KINDS = ['mirror', 'metal'] as const

export function panelSchema(files: TableFiles, index: ReturnType<typeof indexSchema>) {
  const mirror = z
    .strictObject({
      kind: z.literal('mirror'),
      index: index('Lossless medium the panel was measured in.').prefault(DEFAULT_INDEX.mirror),
      reflectance: spectrumSchema(FIELD_LIMITS.reflectance, files, 'Reflectance of the panel in that medium.', [
        '45 %',
        '44 %',
        '43 %',
      ]).prefault('100 %'),
      depolarized: spectrumSchema(FIELD_LIMITS.depolarized, files, 'Share of it that returns unpolarized.', [
        '1 %',
        '1 %',
        '1 %',
      ]).prefault(0),
    })
    .meta({ title: 'Mirror under a medium', description: 'How a measured panel enters.' })
  const metal = z
    .strictObject({ kind: z.literal('metal'), index: index('Complex index of the half-space.') })
    .meta({ title: 'Half-space' })
  return z
    .discriminatedUnion('kind', [mirror, metal], { error: () => PANEL_KINDS.join(', ') })
    .transform((panel): Panel => panel)
    .meta({
      description: 'What lies under all layers.',
      examples: [{ kind: 'mirror', index: 1.5, reflectance: '45 %', depolarized: '1 %' }],
    })
}
