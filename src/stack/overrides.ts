/** `--set path=value`: changes to the plain data of a stack file before the schema sees it, so that all forms work. */
import { rivalsOf } from './exclusiveFields.js'
import { describeReceived, type Fault, isMapping, type PathKey, shortList, valueAt } from './fault.js'
import { nearestName } from './nearestName.js'
import type { Problem } from './problem.js'
import { DEFAULT_INDEX } from './schema/refractiveIndex.js'
import { STACK_KEYS } from './schema/stackSchema.js'
import { Source } from './source.js'

/** An option as data: where in the file it sets what. */
export interface Override {
  /** As the user wrote it, behind `--set `. */
  readonly text: string
  readonly at: readonly PathKey[]
  readonly value: unknown
}

export function nameOfOverride(text: string): string {
  return `--set ${text}`
}

/** Reads `path=value`; layers are found by their id in the plain data. */
export function readOverrides(texts: readonly string[], raw: unknown): { overrides: Override[]; problems: Problem[] } {
  const overrides: Override[] = []
  const problems: Problem[] = []
  for (const text of texts) {
    const result = readOverride(text, raw)
    if ('at' in result) overrides.push(result)
    else problems.push(overrideProblem(text, result))
  }
  return { overrides, problems }
}

export function overrideProblem(text: string, fault: Fault): Problem {
  const path = text.slice(0, Math.max(0, text.indexOf('=')))
  return { severity: 'error', file: nameOfOverride(text), path, ...fault }
}

function readOverride(text: string, raw: unknown): Override | Fault {
  const split = text.indexOf('=')
  if (split < 1) return formFault(text)
  const at = placeOf(text.slice(0, split).trim().split('.'), raw)
  if (!Array.isArray(at)) return at as Fault
  const { source, problems } = Source.parse(nameOfOverride(text), text.slice(split + 1))
  const { raw: value, problems: plainProblems } = problems.length > 0 ? { raw: undefined, problems } : source.plain()
  const [problem] = plainProblems
  if (problem !== undefined) return { code: problem.code, message: problem.message, received: text.slice(split + 1) }
  return value === null || value === undefined ? formFault(text) : { text, at, value }
}

function formFault(received: string): Fault {
  const next = 'give a path, an equals sign and a value'
  return { code: 'bad_option', message: 'this sets nothing', received, allowed: 'half.slow_axis=12deg', next }
}

/** Path in the plain data of a path that begins with a layer’s id or a section. */
export function placeOf([first, ...rest]: readonly string[], raw: unknown): PathKey[] | Fault {
  const ids = layersOf(raw).map((layer) => (isMapping(layer) ? String(layer.id) : ''))
  const place = ids.indexOf(first)
  const keys = rest.map((key) => (/^\d+$/.test(key) ? Number(key) : key))
  if ([first, ...rest].includes('__proto__')) return unknownFirst('__proto__', ids)
  if (place >= 0 && rest.length > 0) return ['layers', place, ...keys]
  return STACK_KEYS.includes(first) ? [first, ...keys] : unknownFirst(first, ids)
}

function unknownFirst(received: string, ids: readonly string[]): Fault {
  const suggestion = nearestName(received, [...ids, ...STACK_KEYS])
  return {
    code: 'unknown_id',
    message: `there is no layer or section "${received.slice(0, 60)}"`,
    received: received.slice(0, 60),
    allowed: shortList([...ids, ...STACK_KEYS]),
    ...(suggestion !== undefined && { suggestion }),
    next: 'begin the path with a layer’s id, or with a section of the file',
  }
}

function layersOf(raw: unknown): readonly unknown[] {
  return isMapping(raw) && Array.isArray(raw.layers) ? raw.layers : []
}

/** Copy of the plain data with the value set; data that other parts share through an alias stay as they are. */
export function applyOverride(raw: unknown, { at, value }: Override): { raw: unknown } | { fault: Fault } {
  const isLayer = at[0] === 'layers' && at.length >= 3
  const seeded = isLayer || at[0] === 'panel' || at[0] === 'emission' ? seedParent(raw, at) : raw
  try {
    const changed = setAt(isLayer ? keepDispersion(seeded, at, value) : seeded, at, value)
    return { raw: isLayer && at.length === 3 ? withoutRivals(changed, at) : changed }
  } catch (error) {
    if (error instanceof NoPlace) return { fault: error.fault }
    throw error
  }
}

class NoPlace extends Error {
  constructor(readonly fault: Fault) {
    super(fault.message)
  }
}

function setAt(node: unknown, [key, ...rest]: readonly PathKey[], value: unknown): unknown {
  if (key === undefined) return value
  const isNew = node === undefined || node === null
  if (Array.isArray(node) || (isNew && typeof key === 'number')) {
    const copy = isNew ? [] : [...(node as unknown[])]
    if (typeof key !== 'number' || key > copy.length) throw new NoPlace(listFault(key, copy.length))
    copy[key] = setAt(copy[key], rest, value)
    return copy
  }
  if (isNew) return { [key]: setAt(undefined, rest, value) }
  if (!isMapping(node)) throw new NoPlace(scalarFault(key, node))
  return { ...node, [key]: setAt(Object.hasOwn(node, key) ? node[key] : undefined, rest, value) }
}

function listFault(key: PathKey, length: number): Fault {
  const allowed = length === 0 ? '0, to begin the list' : `from 0 to ${length}`
  return { code: 'unknown_field', message: 'the list has no such place', received: String(key), allowed }
}

function scalarFault(key: PathKey, node: unknown): Fault {
  const next = 'set the whole value instead'
  return {
    code: 'unknown_field',
    message: `there is no "${key}" in a single value`,
    received: describeReceived(node),
    next,
  }
}

/**
 * Gives a path into a field that stands as a plain value (or not at all) the mapping it means: `index.k` where the index is
 * a number, a dispersion ratio of a flat film, the axis of an emission that was unpolarized.
 */
function seedParent(raw: unknown, at: readonly PathKey[]): unknown {
  const parentAt = at.slice(0, -1)
  const [owner, key] = [at.at(-2), at.at(-1)]
  const parent = valueAt(raw, parentAt)
  const isIndex = owner === 'index' || at.at(-3) === 'indices'
  if (isIndex && (key === 'n' || key === 'k')) {
    const law = parent ?? defaultIndex(valueAt(raw, at.slice(0, -2)))
    return typeof law === 'number' ? setAt(raw, parentAt, { n: law, k: 0 }) : raw
  }
  if (owner === 'dispersion' && parent === undefined) return setAt(raw, parentAt, { re450: 1, re650: 1 })
  return owner === 'polarization' && parent === 'none' ? setAt(raw, parentAt, {}) : raw
}

function defaultIndex(owner: unknown): number | undefined {
  const kind = isMapping(owner) ? String(owner.kind) : ''
  return Object.hasOwn(DEFAULT_INDEX, kind) ? DEFAULT_INDEX[kind as keyof typeof DEFAULT_INDEX] : undefined
}

/** A number in place of a measured retardance leaves the film its dispersion. */
function keepDispersion(raw: unknown, at: readonly PathKey[], value: unknown): unknown {
  const layer = valueAt(raw, at.slice(0, 2))
  const isMeasured = at.length === 3 && at[2] === 'retardance' && isMapping(layer) && isMapping(layer.retardance)
  if (!isMeasured || isMapping(value) || Object.hasOwn(layer, 'dispersion')) return raw
  return setAt(raw, [...at.slice(0, 2), 'dispersion'], layer.retardance)
}

/** Setting rth puts nz out of force, and so on. */
function withoutRivals(raw: unknown, at: readonly PathKey[]): unknown {
  const rivals = rivalsOf(String(at[2]))
  const layer = valueAt(raw, at.slice(0, 2))
  if (rivals.length === 0 || !isMapping(layer)) return raw
  const kept = Object.fromEntries(Object.entries(layer).filter(([field]) => !rivals.includes(field)))
  return setAt(raw, at.slice(0, 2), kept)
}
