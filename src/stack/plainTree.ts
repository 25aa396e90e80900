import type { PathKey, PlacedFault } from './fault.js'
import { depthFault } from './source.js'

/** Values of a file with its aliases written out, at most. */
const MOST_VALUES = 500_000
const DEEPEST = 40

/** Bounds on plain data before any schema walks it: how deep, how much, and no key that JavaScript treats apart. */
export function treeFaults(raw: unknown): PlacedFault[] {
  if (raw === null || raw === undefined) return [{ at: [], ...emptyFile() }]
  const pending: { value: unknown; at: readonly PathKey[] }[] = [{ value: raw, at: [] }]
  const faults: PlacedFault[] = []
  let count = 0
  for (let item = pending.pop(); item !== undefined; item = pending.pop()) {
    const { value, at } = item
    if (++count > MOST_VALUES) return [{ at: [], ...tooManyValues() }]
    if (typeof value !== 'object' || value === null) continue
    if (at.length >= DEEPEST) return [{ at, ...depthFault() }]
    const isList = Array.isArray(value)
    for (const [key, child] of Object.entries(value)) {
      if (key === '__proto__') faults.push({ at: [...at, key], key: true, ...forbiddenKey(key) })
      pending.push({ value: child, at: [...at, isList ? Number(key) : key] })
    }
  }
  return faults
}

function emptyFile(): Omit<PlacedFault, 'at'> {
  return {
    code: 'wrong_type',
    message: 'the file is empty, or all of it is comment',
    next: 'check the name; offblack new starts a stack file, with comments',
  }
}

function tooManyValues(): Omit<PlacedFault, 'at'> {
  return {
    code: 'too_large',
    message: 'the file holds too many values',
    allowed: `at most ${MOST_VALUES}, with aliases written out`,
    next: 'keep long spectra in CSV files and name them with {file: …}',
  }
}

function forbiddenKey(key: string): Omit<PlacedFault, 'at'> {
  return { code: 'unknown_key', message: `the key "${key}" cannot be used`, received: key, next: 'remove it' }
}
