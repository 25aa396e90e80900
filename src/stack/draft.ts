import { isMapping, type PlacedFault, valueAt } from './fault.js'
import type { DraftStack, StackSchema } from './schema/stackSchema.js'
import { allowedText, schemaFaults } from './schemaFaults.js'
import type { Layer } from './stack.js'

/** What the schema made of a file; sections with faults are absent, so that the rest can still be checked. */
export interface Draft extends Partial<Omit<DraftStack, 'layers'>> {
  readonly layers: readonly (Layer | undefined)[]
}

/** Passes plain data through the schema. */
export function parseDraft(schema: StackSchema, raw: unknown): { draft: Draft; faults: PlacedFault[] } {
  const parsed = schema.safeParse(raw, { error: allowedText })
  if (parsed.success) return { draft: parsed.data, faults: [] }
  return { draft: readableSections(schema, raw), faults: schemaFaults(parsed.error.issues, raw, []) }
}

function readableSections(schema: StackSchema, raw: unknown): Draft {
  const { layers, ...sections } = schema.shape
  const readable = Object.entries(sections).flatMap(([key, section]) => {
    const parsed = section.safeParse(valueAt(raw, [key]))
    return parsed.success && parsed.data !== undefined ? [[key, parsed.data]] : []
  })
  const items = isMapping(raw) && Array.isArray(raw.layers) ? raw.layers : []
  const layer = layers.element
  return { ...Object.fromEntries(readable), layers: items.map((item) => layer.safeParse(item).data) }
}
