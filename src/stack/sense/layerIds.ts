import { isMapping, type PlacedFault, valueAt } from '../fault.js'
import type { Sense } from './sense.js'

/** Ids as they stand in the file, whether or not the layers can be read; undefined where there is none. */
export function layerIds(raw: unknown): readonly (string | undefined)[] {
  const layers = valueAt(raw, ['layers'])
  if (!Array.isArray(layers)) return []
  return layers.map((layer) => (isMapping(layer) && typeof layer.id === 'string' ? layer.id : undefined))
}

/** Two layers of one name could not be told apart in a path. */
export function duplicateIdFaults({ raw }: Sense): PlacedFault[] {
  const ids = layerIds(raw)
  const taken = new Set(ids)
  return ids.flatMap((id, i): PlacedFault[] => {
    if (id === undefined || ids.indexOf(id) === i) return []
    let number = 2
    while (taken.has(`${id}_${number}`)) number++
    const suggestion = `${id}_${number}`
    taken.add(suggestion)
    const first = ids.indexOf(id) + 1
    const message = `the id "${id}" is that of layer ${first} already`
    const next = 'give each layer its own id'
    return [{ at: ['layers', i, 'id'], code: 'duplicate_id', message, received: id, suggestion, next }]
  })
}
