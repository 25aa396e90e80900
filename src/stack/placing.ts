/** Where a fault of the stack stands for the user: in the stack file, in a film card, or in an option. */
import type { PathKey, PlacedFault } from './fault.js'
import { isFromCard, type RawCard } from './filmCards.js'
import { nameOfOverride, type Override } from './overrides.js'
import type { Problem } from './problem.js'
import type { Source } from './source.js'

export interface Origins {
  readonly source: Source
  readonly overrides: readonly Override[]
  /** By position of the layer: its own text and the card under it. */
  readonly filmed: ReadonlyMap<number, FilmedLayer>
}

export interface FilmedLayer {
  readonly layer: unknown
  readonly card: RawCard
}

/** Undefined where the card at fault tells it itself. */
export function placeFault({ at, key, inFile, ...fault }: PlacedFault, origins: Origins): Problem | undefined {
  const path = at.join('.')
  const severity = fault.severity ?? 'error'
  const override = origins.overrides.findLast((option) => startsWith(at, option.at))
  if (inFile !== undefined) return { ...fault, severity, path, ...inFile }
  if (override !== undefined) return { ...fault, severity, path, file: nameOfOverride(override.text) }
  const [section, place, ...inner] = at
  const filmed = section === 'layers' && typeof place === 'number' ? origins.filmed.get(place) : undefined
  if (filmed !== undefined && isFromCard(filmed.layer, filmed.card.fields, inner)) {
    if (filmed.card.problems.length > 0) return undefined
    return { ...filmed.card.source.problem(fault, inner, key), path }
  }
  return { ...origins.source.problem(fault, at, key), severity, path }
}

function startsWith(path: readonly PathKey[], start: readonly PathKey[]): boolean {
  return start.every((key, i) => String(path[i]) === String(key))
}
