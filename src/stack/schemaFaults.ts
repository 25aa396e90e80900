/** The issues of a schema as faults: what came, what is allowed, the nearest known name. */
import type * as z from 'zod'
import { describeReceived, type Fault, isMapping, type PathKey, type PlacedFault, shortList, valueAt } from './fault.js'
import { nearestName } from './nearestName.js'

type Issue = z.core.$ZodIssue
type RawIssue = z.core.$ZodRawIssue

/**
 * What is allowed, as the text of an issue where the schema itself does not say it. Only here the schema at fault is known:
 * its keys are passed on as a list.
 */
export function allowedText(issue: RawIssue): string | undefined {
  switch (issue.code) {
    case 'unrecognized_keys':
      return knownKeys(issue.inst).join(', ')
    case 'invalid_type':
      return EXPECTED[issue.expected] ?? issue.expected
    case 'invalid_value':
      return shortList(issue.values.map(String))
    case 'too_big':
      return `at most ${issue.maximum} ${UNITS[issue.origin] ?? ''}`.trim()
    case 'too_small':
      return `at least ${issue.minimum} ${UNITS[issue.origin] ?? ''}`.trim()
    default:
      return undefined
  }
}

const EXPECTED: Readonly<Record<string, string>> = {
  string: 'a text',
  number: 'a number',
  boolean: 'true or false',
  array: 'a list',
  tuple: 'a list',
  object: 'a mapping of keys to values',
  record: 'a mapping of keys to values',
}

const UNITS: Readonly<Record<string, string>> = { array: 'entries', string: 'characters' }

/** Keys of the object schema at fault. */
function knownKeys(schema: unknown): readonly string[] {
  const shape = (schema as { _zod?: { def?: { shape?: object } } } | undefined)?._zod?.def?.shape
  return shape === undefined ? [] : Object.keys(shape)
}

/** Faults of the value `raw` that stands at `at`. */
export function schemaFaults(issues: readonly Issue[], raw: unknown, at: readonly PathKey[]): PlacedFault[] {
  const faults = issues.flatMap((issue) => faultsOf(issue, raw, at))
  const meant = new Set(faults.flatMap((fault) => (fault.code === 'unknown_key' ? [keyMeant(fault)] : [])))
  return faults.filter((fault) => fault.code !== 'missing_key' || !meant.has(fault.at.join('.')))
}

/** Path of the key that a mistyped one stands for: it is not missing besides. */
function keyMeant({ at, suggestion }: PlacedFault): string {
  return [...at.slice(0, -1), suggestion].join('.')
}

function faultsOf(issue: Issue, raw: unknown, base: readonly PathKey[]): PlacedFault[] {
  const inner = issue.path as PathKey[]
  const at = [...base, ...inner]
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({ at: [...at, key], key: true, ...unknownKey(key, issue.message.split(', ')) }))
  }
  if (isMissing(raw, inner)) return [{ at, ...missingKey(String(inner.at(-1)), issue.message) }]
  if (issue.code === 'custom') return [customFault(issue, at)]
  const received = valueAt(raw, inner)
  if (issue.code === 'invalid_union') return unionFaults(issue, received, at)
  return [{ at, ...valueFault(issue, received) }]
}

function isMissing(raw: unknown, path: readonly PathKey[]): boolean {
  if (path.length === 0) return false
  const parent = valueAt(raw, path.slice(0, -1))
  return isMapping(parent) && !Object.hasOwn(parent, path[path.length - 1])
}

function customFault(issue: Issue & { code: 'custom' }, at: readonly PathKey[]): PlacedFault {
  const { fault, inFile } = (issue.params ?? {}) as { fault?: Fault; inFile?: PlacedFault['inFile'] }
  return { at, code: 'wrong_value', message: issue.message, ...fault, ...(inFile && { inFile }) }
}

function unknownKey(key: string, known: readonly string[]): Fault {
  const suggestion = nearestName(key, known)
  const hint = key === '<<' ? { next: 'merge keys are not read: write the fields out, or use a film card' } : {}
  return {
    code: 'unknown_key',
    message: `the key "${key.slice(0, 60)}" is not known here`,
    received: key.slice(0, 60),
    allowed: known.join(', '),
    ...(suggestion !== undefined && { suggestion }),
    next: 'correct the key or remove it',
    ...hint,
  }
}

function missingKey(key: string, allowed: string): Fault {
  return { code: 'missing_key', message: `the key "${key}" is missing`, allowed, next: `add ${key}` }
}

function valueFault(issue: Issue, received: unknown): Fault {
  const fault: Fault = {
    code: 'wrong_type',
    message: 'the value has the wrong form',
    received: describeReceived(received),
    allowed: issue.message,
    next: 'write it in the allowed form',
  }
  if (issue.code === 'too_big' || issue.code === 'too_small') {
    const [code, size] = issue.code === 'too_big' ? ['too_large', 'long'] : ['wrong_length', 'short']
    const what = issue.origin === 'string' ? 'text' : 'list'
    return { ...fault, code, message: `the ${what} is too ${size}`, next: `make the ${what} fit` }
  }
  return issue.code === 'invalid_value' ? unknownName(received, issue.values.map(String), issue.message) : fault
}

function unknownName(received: unknown, known: readonly string[], allowed: string): Fault {
  const suggestion = typeof received === 'string' ? nearestName(received, known) : undefined
  return {
    code: 'unknown_name',
    message: 'the value is none of those known',
    received: describeReceived(received),
    allowed: known.length > 8 && known.length <= 20 ? known.join(', ') : allowed,
    ...(suggestion !== undefined && { suggestion }),
    next: 'choose one of those allowed',
  }
}

/** Of several forms, the one the value seems to be meant as tells what is wrong. */
function unionFaults(
  issue: Issue & { code: 'invalid_union' },
  received: unknown,
  at: readonly PathKey[],
): PlacedFault[] {
  const forms = issue.errors.filter((issues) => issues.length > 0)
  const meant = forms.filter((issues) => !issues.some(isOfOtherForm)).sort((a, b) => weight(a) - weight(b))[0]
  if (meant !== undefined) return schemaFaults(meant, received, at)
  const names = forms.flat().flatMap((inner) => (inner.code === 'invalid_value' ? inner.values.map(String) : []))
  const known = issue.errors.length === 0 ? issue.message.split(', ') : names
  if (typeof received === 'string' && known.length > 0) return [{ at, ...unknownName(received, known, issue.message) }]
  return [{ at, ...valueFault(issue, received) }]
}

function isOfOtherForm({ code, path }: Issue): boolean {
  return path.length === 0 && (code === 'invalid_type' || code === 'invalid_value' || code === 'invalid_union')
}

function weight(issues: readonly Issue[]): number {
  return issues.reduce((sum, issue) => sum + (issue.code === 'unrecognized_keys' ? 2 * issue.keys.length : 1), 0)
}
