import type * as z from 'zod'

/** JSON Schema of a mapping that has these keys, to be named beside a schema: what the kind alone does not say. */
export function requires(...keys: string[]): z.core.JSONSchema.JSONSchema {
  return { type: 'object', properties: Object.fromEntries(keys.map((key) => [key, {}])), required: keys }
}
