import { readdirSync, readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { parse } from 'yaml'
import * as z from 'zod'
import { filmJsonSchema, stackJsonSchema } from '../../src/stack/jsonSchema.js'
import { STARTER_FILE } from '../../src/stack/starterFile.js'

const checkValues = new URL('../check-values/', import.meta.url)
/** As a reader of JSON Schema understands it; this one knows no `not`, which only forbids pairs of fields and reserved ids. */
function readBack(schema: unknown): z.ZodType {
  return z.fromJSONSchema(JSON.parse(JSON.stringify(schema), (key, value) => (key === 'not' ? undefined : value)))
}

const stackSchema = readBack(stackJsonSchema())
const filmSchema = readBack(filmJsonSchema())

describe('the JSON Schema', () => {
  it('holds for the starter file', () => {
    expect(stackSchema.safeParse(parse(STARTER_FILE)).error?.issues).toBeUndefined()
  })

  it.each(readdirSync(checkValues).filter((name) => name.endsWith('.yaml')))('holds for %s', (name) => {
    const raw = parse(readFileSync(new URL(name, checkValues), 'utf8'))
    expect(stackSchema.safeParse(raw).error?.issues).toBeUndefined()
  })

  it.each([
    ['unknown key', { format: 1, layers: [], panel: { kind: 'metal', index: 1.5 }, pannel: 1 }],
    ['missing panel', { format: 1, layers: [] }],
    ['wrong unit', { format: 1, layers: [], panel: { kind: 'mirror', reflectance: '45 deg' } }],
    [
      'layer without thickness',
      { format: 1, layers: [{ id: 'a', kind: 'isotropic', index: 1.5 }], panel: { kind: 'metal', index: 1 } },
    ],
  ])('refuses: %s', (_, raw) => {
    expect(stackSchema.safeParse(raw).success).toBe(false)
  })

  it('lets a film card stand in for what a layer lacks', () => {
    const raw = {
      format: 1,
      layers: [{ id: 'a', film: 'a.film.yaml', slow_axis: '4 deg' }],
      panel: { kind: 'metal', index: 1 },
    }
    expect(stackSchema.safeParse(raw).error?.issues).toBeUndefined()
  })

  it('of film cards wants a name and no id', () => {
    const card = { name: 'A', kind: 'retarder', retardance: '138 nm', thickness: '25 um' }
    expect(filmSchema.safeParse(card).error?.issues).toBeUndefined()
    expect(filmSchema.safeParse({ ...card, id: 'a' }).success).toBe(false)
    expect(filmSchema.safeParse({ ...card, name: undefined }).success).toBe(false)
  })

  it('describes every field, and gives an example of every text and number', () => {
    const [bare, plain] = [new Set<string>(), new Set<string>()]
    visit(stackJsonSchema())
    visit(filmJsonSchema())
    expect([...bare]).toEqual([])
    expect([...plain]).toEqual([])

    function visit(node: unknown): void {
      if (typeof node !== 'object' || node === null) return
      const schema = node as { additionalProperties?: unknown; properties?: Record<string, Record<string, unknown>> }
      // Others than strict ones only require keys.
      for (const [key, field] of Object.entries(
        schema.additionalProperties === false ? (schema.properties ?? {}) : {},
      )) {
        if (field.description === undefined && field.const === undefined) bare.add(key)
        const isQuantity = JSON.stringify(field.anyOf ?? field).includes('"pattern"')
        if (isQuantity && field.examples === undefined && !JSON.stringify(field).includes('"examples"')) plain.add(key)
      }
      for (const child of Object.values(node)) visit(child)
    }
  })
})
