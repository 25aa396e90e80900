import type { PlacedFault } from '../fault.js'
import { layerFields } from '../fields.js'
import type { CompareQuestion, FilmCard, Layer } from '../stack.js'
import type { Sense } from './sense.js'

/** A robust search draws the file's spreads for every film on offer: each must have the field that varies. */
export function slotSpreadFaults({ slots }: CompareQuestion, { draft: { optimize, tolerance } }: Sense): PlacedFault[] {
  if (optimize?.minimize.quantile === undefined || tolerance === undefined) return []
  return Object.keys(tolerance.vary).flatMap((path) => {
    const [id, ...field] = path.split('.')
    const cards = Object.hasOwn(slots, id) ? slots[id] : []
    const without = cards.find(({ layer }) => !hasField(layer, field.join('.')))
    return without === undefined ? [] : [missingField(path, field.join('.'), without)]
  })
}

function hasField(layer: Layer, field: string): boolean {
  return layerFields(layer).some(({ path }) => path === field)
}

function missingField(path: string, field: string, { file, layer }: FilmCard): PlacedFault {
  return {
    at: ['tolerance', 'vary', path],
    key: true,
    code: 'unknown_field',
    message: `the film ${file} in this slot has no ${field} that is one number`,
    received: path,
    allowed: layerFields(layer)
      .map((known) => known.path)
      .join(', '),
    next: 'vary a field that all films of the slot have, leave the film out, or compare without quantile',
  }
}
