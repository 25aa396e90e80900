/** The schemas of stack files and film cards as JSON Schema, so that editors complete and check. */
import * as z from 'zod'
import { filmCardSchema } from './schema/filmCard.js'
import { requires } from './schema/requires.js'
import { stackSchema } from './schema/stackSchema.js'
import { NO_FILES } from './stackFiles.js'
import { TableFiles } from './tableFiles.js'

export type JsonSchema = z.core.JSONSchema.JSONSchema

const noTables = new TableFiles(NO_FILES, (path) => path)

export function stackJsonSchema(): JsonSchema {
  const schema = asJsonSchema(stackSchema(noTables))
  const layers = (schema.properties?.layers ?? {}) as JsonSchema
  const { oneOf, ...items } = layers.items as JsonSchema
  const kinds = (oneOf ?? items.anyOf ?? []) as JsonSchema[]
  return {
    ...schema,
    properties: { ...schema.properties, layers: { ...layers, items: { ...items, anyOf: kinds.map(orFromCard) } } },
  }
}

export function filmJsonSchema(): JsonSchema {
  return asJsonSchema(filmCardSchema(noTables))
}

/** What the file may hold, before units are read. Examples are those of the file, so they are kept where zod drops them. */
function asJsonSchema(schema: z.ZodType): JsonSchema {
  return z.toJSONSchema(schema, {
    io: 'input',
    override: ({ zodSchema, jsonSchema }) => {
      const examples = z.globalRegistry.get(zodSchema)?.examples
      if (Array.isArray(examples)) jsonSchema.examples = examples
    },
  })
}

/** A layer that names a film card needs to say nothing that the card says. */
function orFromCard({ required, ...kind }: JsonSchema): JsonSchema {
  return { ...kind, anyOf: [requires(...(required ?? [])), requires('id', 'film')] }
}
