import type { Problem } from './problem.js'

/** A problem whose place is not known yet. */
export type Fault = Pick<Problem, 'code' | 'message' | 'received' | 'allowed' | 'suggestion' | 'next'>

/** A fault of the value at a path of the stack file, as keys and list positions. */
export interface PlacedFault extends Fault {
  readonly at: readonly PathKey[]
  /** Point at the key instead of its value. */
  readonly key?: boolean
  readonly severity?: 'warning'
  /** Another file, named at the path, that holds the fault. */
  readonly inFile?: Pick<Problem, 'file' | 'range'>
}

export type PathKey = string | number

/** What stands at a place, short enough for a message. */
export function describeReceived(raw: unknown): string {
  if (raw === undefined || raw === null) return 'nothing'
  if (Array.isArray(raw)) return `a list of ${raw.length}`
  if (typeof raw === 'object') return `a mapping with ${shortList(Object.keys(raw)) || 'no keys'}`
  const text = typeof raw === 'string' ? JSON.stringify(raw) : String(raw)
  return text.length > LONGEST_SHOWN ? `${text.slice(0, LONGEST_SHOWN)}…` : text
}

const LONGEST_SHOWN = 60

/** At most eight names, then an ellipsis. */
export function shortList(names: readonly string[]): string {
  const shown = names.slice(0, 8).map((name) => name.slice(0, 40))
  return shown.join(', ') + (names.length > shown.length ? ', …' : '')
}

export function isMapping(raw: unknown): raw is Record<string, unknown> {
  return typeof raw === 'object' && raw !== null && !Array.isArray(raw)
}

/** What stands at a path of plain data; undefined where the path leads nowhere. */
export function valueAt(raw: unknown, path: readonly PathKey[]): unknown {
  let value = raw
  for (const key of path) {
    if (typeof value !== 'object' || value === null || !Object.hasOwn(value, key)) return undefined
    value = (value as Record<PathKey, unknown>)[key]
  }
  return value
}
