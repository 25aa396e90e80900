/** Film cards: read, checked, and laid under the layers that name them. */
import type * as z from 'zod'
import { exclusiveFaults, partnersOf, rivalsOf } from './exclusiveFields.js'
import { isMapping, type PathKey } from './fault.js'
import { treeFaults } from './plainTree.js'
import type { Problem } from './problem.js'
import { CARD_KEYS, filmCardSchema } from './schema/filmCard.js'
import { allowedText, schemaFaults } from './schemaFaults.js'
import { Source } from './source.js'
import { besideFile, type StackFiles } from './stackFiles.js'
import type { TableFiles } from './tableFiles.js'

/** A card as it stands in its file. */
export interface RawCard {
  readonly source: Source
  /** Fields of the layer, files in them relative to the stack file. */
  readonly fields: Readonly<Record<string, unknown>>
  readonly name: string
  readonly price_per_m2?: number
  /** Faults of the card itself, placed in its file. */
  readonly problems: readonly Problem[]
}

/** Reads each card once. */
export class FilmCards {
  private readonly cards = new Map<string, RawCard | undefined>()
  private schema: ReturnType<typeof filmCardSchema> | undefined

  constructor(
    private readonly files: StackFiles,
    private readonly tables: TableFiles,
    private readonly shown: (path: string) => string,
  ) {}

  /** The card at a path relative to the stack file; undefined where there is no such file. */
  card(path: string): RawCard | undefined {
    if (!this.cards.has(path)) {
      const text = this.files.read(path)
      this.cards.set(path, text === undefined ? undefined : this.readCard(path, text))
    }
    return this.cards.get(path)
  }

  /** All cards read so far. */
  *all(): Iterable<RawCard> {
    for (const card of this.cards.values()) if (card !== undefined) yield card
  }

  private readCard(path: string, text: string): RawCard {
    const { source, problems } = Source.parse(this.shown(path), text)
    const { raw, problems: plainProblems } = problems.length > 0 ? { raw: undefined, problems } : source.plain()
    if (plainProblems.length > 0) return { source, fields: {}, name: path, problems: plainProblems }
    const deep = treeFaults(raw)
    const own = deep.length > 0 || !isMapping(raw) ? {} : (filesBeside(path, raw) as Record<string, unknown>)
    const faults = deep.length > 0 ? deep : [...this.schemaFaultsOf(own, raw), ...exclusiveFaults(own, [])]
    const fields = Object.fromEntries(
      Object.entries(own).filter(([key]) => !(CARD_KEYS as readonly string[]).includes(key)),
    )
    return {
      source,
      fields,
      name: typeof own.name === 'string' ? own.name : path,
      ...(typeof own.price_per_m2 === 'number' && { price_per_m2: own.price_per_m2 }),
      problems: faults.map(({ at, key, inFile, ...fault }) => ({ ...source.problem(fault, at, key), ...inFile })),
    }
  }

  private schemaFaultsOf(own: unknown, raw: unknown) {
    this.schema ??= filmCardSchema(this.tables)
    const parsed: z.ZodSafeParseResult<unknown> = this.schema.safeParse(isMapping(raw) ? own : raw, {
      error: allowedText,
    })
    return parsed.success ? [] : schemaFaults(parsed.error.issues, own, [])
  }
}

/** `{file: x.csv}` in a card is meant from the card's folder. */
function filesBeside(card: string, raw: unknown): unknown {
  if (Array.isArray(raw)) return raw.map((item) => filesBeside(card, item))
  if (!isMapping(raw)) return raw
  const entries = Object.entries(raw).map(([key, value]): [string, unknown] =>
    key === 'file' && typeof value === 'string' ? [key, besideFile(card, value)] : [key, filesBeside(card, value)],
  )
  return Object.fromEntries(entries)
}

/**
 * The layer with the card's fields under its own. A field of the layer puts out of force the card's fields that say the same
 * in another way; its partners from the card stay. A measured retardance that the layer replaces by a number leaves its
 * dispersion.
 */
export function layOver(
  card: Readonly<Record<string, unknown>>,
  layer: Readonly<Record<string, unknown>>,
): Record<string, unknown> {
  const own = Object.keys(layer)
  const dropped = new Set(own.flatMap((field) => [...rivalsOf(field)]))
  for (const field of own) for (const partner of partnersOf(field)) dropped.delete(partner)
  const kept = Object.fromEntries(Object.entries(card).filter(([key]) => !dropped.has(key)))
  const { retardance } = card
  const leaves = isMapping(retardance) && Object.hasOwn(layer, 'retardance') && !Object.hasOwn(layer, 'dispersion')
  return { ...(leaves && !isMapping(layer.retardance) && { dispersion: retardance }), ...kept, ...layer }
}

/** Whether the layer's own text says something about the value at the path, or leaves it to the card. */
export function isFromCard(layer: unknown, card: Readonly<Record<string, unknown>>, path: readonly PathKey[]): boolean {
  const [field] = path
  return isMapping(layer) && field !== undefined && !Object.hasOwn(layer, field) && Object.hasOwn(card, field)
}
