/** `compare.slots`: file patterns become film cards, each laid into its slot's layer and checked like any layer. */
import { exclusiveFaults } from './exclusiveFields.js'
import { isMapping, type PlacedFault } from './fault.js'
import { type FilmCards, layOver, type RawCard } from './filmCards.js'
import { nearestName } from './nearestName.js'
import type { Problem } from './problem.js'
import type { RawCompare } from './schema/questions.js'
import type { StackSchema } from './schema/stackSchema.js'
import { allowedText, schemaFaults } from './schemaFaults.js'
import { layerIds } from './sense/layerIds.js'
import type { FilmCard, Layer } from './stack.js'
import { besideFile, type StackFiles } from './stackFiles.js'

/** Fields of the slot's layer that a card does not bring: what is laid, and how it is turned. */
const SLOT_FIELDS = ['id', 'slow_axis', 'absorption_axis', 'azimuth', 'coherent']

const MOST_CARDS = 10_000

export interface SlotReading {
  readonly slots: Record<string, FilmCard[]>
  readonly faults: PlacedFault[]
  /** Placed in the cards' files. */
  readonly problems: Problem[]
}

export function readSlots(
  compare: RawCompare,
  raw: unknown,
  { cards, files, schema }: { cards: FilmCards; files: StackFiles; schema: StackSchema },
): SlotReading {
  const ids = layerIds(raw)
  const reading: SlotReading = { slots: {}, faults: [], problems: [] }
  for (const [id, globs] of Object.entries(compare.slots)) {
    const layer = isMapping(raw) && Array.isArray(raw.layers) ? raw.layers[ids.indexOf(id)] : undefined
    if (!isMapping(layer)) {
      reading.faults.push(unknownSlot(id, ids))
      continue
    }
    // A card that two patterns find is one candidate.
    const found = globs.flatMap((glob, g) => readGlob(id, glob, g, layer))
    reading.slots[id] = [...new Map(found.map((card) => [card.file, card])).values()]
  }
  return reading

  function readGlob(id: string, glob: string, g: number, layer: Record<string, unknown>): FilmCard[] {
    const paths = files.list(besideFile('', glob))
    if (paths.length === 0) reading.faults.push(noCards(id, g, glob))
    if (paths.length > MOST_CARDS) reading.faults.push(tooManyCards(id, g, paths.length))
    return paths.slice(0, MOST_CARDS).flatMap((path): FilmCard[] => {
      const card = cards.card(path)
      if (card === undefined) reading.faults.push(noCards(id, g, path))
      else if (card.problems.length > 0) reading.problems.push(...card.problems)
      else {
        const filled = fill(card, layer)
        if ('id' in filled) return [asFilmCard(card, path, filled)]
        reading.problems.push(...filled.problems)
      }
      return []
    })
  }

  /** The layer of the slot with this card's film in it. */
  function fill(card: RawCard, layer: Record<string, unknown>): Layer | { problems: Problem[] } {
    const slot = Object.fromEntries(Object.entries(layer).filter(([key]) => SLOT_FIELDS.includes(key)))
    if (card.fields.kind !== layer.kind) return { problems: [card.source.problem(otherKind(card, layer), ['kind'])] }
    const merged = layOver(card.fields, slot)
    const parsed = schema.shape.layers.element.safeParse(merged, { error: allowedText })
    if (parsed.success) return parsed.data
    const faults = [...schemaFaults(parsed.error.issues, merged, []), ...exclusiveFaults(merged, [])]
    return { problems: faults.map(({ at, key, inFile: _, ...fault }) => card.source.problem(fault, at, key)) }
  }
}

function asFilmCard({ name, price_per_m2 }: RawCard, file: string, layer: Layer): FilmCard {
  return { name, file, ...(price_per_m2 !== undefined && { price_per_m2 }), layer }
}

function unknownSlot(id: string, ids: readonly (string | undefined)[]): PlacedFault {
  const known = ids.filter((name) => name !== undefined)
  const suggestion = nearestName(id, known)
  return {
    at: ['compare', 'slots', id],
    key: true,
    code: 'unknown_id',
    message: `there is no layer "${id.slice(0, 60)}"`,
    received: id.slice(0, 60),
    allowed: known.join(', '),
    ...(suggestion !== undefined && { suggestion }),
    next: 'name the layer that the films are to fill',
  }
}

function noCards(id: string, g: number, received: string): PlacedFault {
  const at = ['compare', 'slots', id, g]
  const next = 'check the folder and the pattern; it is relative to the stack file'
  return { at, code: 'missing_file', message: 'no film card is found there', received, next }
}

function tooManyCards(id: string, g: number, count: number): PlacedFault {
  const at = ['compare', 'slots', id, g]
  const message = 'the pattern finds too many films'
  return { at, code: 'too_large', message, received: `${count}`, allowed: `at most ${MOST_CARDS}` }
}

function otherKind({ fields }: RawCard, layer: Record<string, unknown>) {
  return {
    code: 'wrong_kind',
    message: `the film is of another kind than the layer "${String(layer.id)}" it is to fill`,
    received: String(fields.kind),
    allowed: String(layer.kind),
    next: 'narrow the file pattern, or move the card',
  }
}
