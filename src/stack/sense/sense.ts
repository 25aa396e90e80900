import type { Draft } from '../draft.js'
import type { PathKey, PlacedFault } from '../fault.js'

/** What the sense checks look at: a file as far as the schema could read it, and the plain data behind it. */
export interface Sense {
  readonly draft: Draft
  readonly raw: unknown
}

export type SenseCheck = (sense: Sense) => PlacedFault[]

/** A fault at a place. */
export function at(path: readonly PathKey[], fault: Omit<PlacedFault, 'at'>): PlacedFault {
  return { at: path, ...fault }
}
