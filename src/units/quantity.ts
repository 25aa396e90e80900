import { textHint, unitHint } from './quantityHint.js'
import { degreesToRad, type QuantityKind, timesTenTo, UNIT_TABLES } from './unitTables.js'

/**
 * Lengths, angles and shares as people write them, and as the program computes with them: nm, radians, fractions. Number
 * and unit are read apart and joined without a rounding of their own, so that `138 nm` is 138 and nothing else.
 */
export type { QuantityKind }

/** How each kind is spelled in a message. */
const EXAMPLES: Readonly<Record<QuantityKind, string>> = {
  length: 'a length such as 138 nm, 25 um or 0.7 mm (a bare number is nm)',
  angle: 'an angle such as 45 deg or 0.5 rad (a bare number is degrees)',
  share: 'a share such as 43.2 % or 0.432',
  number: 'a plain number',
  illuminance: 'an illuminance such as 500 lx (a bare number is lx)',
  luminance: 'a luminance such as 600 cd/m2 (a bare number is cd/m2)',
  temperature: 'a color temperature such as 5000 K (a bare number is K)',
}

export interface QuantityFault {
  readonly received: string
  readonly allowed: string
  /** Why this text in particular fails. */
  readonly hint?: string
}

const TEXT = /^\s*([+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?)\s*(\S*)\s*$/i

/** The value in nm, radians, fraction, …; or what is wrong with it. */
export function parseQuantity(raw: unknown, kind: QuantityKind): number | QuantityFault {
  const { bare, units } = UNIT_TABLES[kind]
  if (typeof raw === 'number') {
    return Number.isFinite(raw) ? units[bare](String(raw)) : fault(raw, kind, 'the number is not finite')
  }
  if (typeof raw !== 'string') return fault(raw, kind)
  const match = TEXT.exec(raw)
  if (match === null) return fault(raw, kind, textHint(raw))
  const unit = match[2] === '' ? bare : match[2]
  if (!Object.hasOwn(units, unit)) return fault(raw, kind, unitHint(unit, kind))
  const value = units[unit](match[1])
  return Number.isFinite(value) ? value : fault(raw, kind, 'the number is not finite')
}

export function isFault(value: number | QuantityFault): value is QuantityFault {
  return typeof value === 'object'
}

function fault(raw: unknown, kind: QuantityKind, hint?: string): QuantityFault {
  return { received: describe(raw), allowed: EXAMPLES[kind], ...(hint !== undefined && { hint }) }
}

function describe(raw: unknown): string {
  if (raw === null || raw === undefined) return 'nothing'
  if (Array.isArray(raw)) return 'a list'
  if (typeof raw === 'object') return 'a mapping'
  return raw === '' ? 'an empty text' : String(raw).slice(0, 60)
}

const DISPLAY_UNITS: Readonly<Record<QuantityKind, string>> = {
  length: 'nm',
  angle: 'deg',
  share: '%',
  number: '',
  illuminance: 'lx',
  luminance: 'cd/m2',
  temperature: 'K',
}

/** Unit in which a kind is shown; empty for a plain number. */
export function displayUnit(kind: QuantityKind): string {
  return DISPLAY_UNITS[kind]
}

/** Internal value in the unit it is shown in, without the rounding noise of the conversion. */
export function toDisplay(value: number, kind: QuantityKind): number {
  if (kind === 'angle') return Number(((value * 180) / Math.PI).toPrecision(14))
  return kind === 'share' ? Number(timesTenTo(2)(String(value)).toPrecision(14)) : value
}

/** The inverse of `toDisplay`. */
export function fromDisplay(shown: number, kind: QuantityKind): number {
  return UNIT_TABLES[kind].units[displayUnit(kind)](String(shown))
}

/** `138 nm`, `45 deg`, `43.2 %`: with `digits` significant digits, or as many as the value needs. */
export function formatQuantity(value: number, kind: QuantityKind, digits?: number): string {
  const shown = toDisplay(value, kind)
  const number = digits === undefined ? String(shown) : String(Number(shown.toPrecision(digits)))
  const unit = displayUnit(kind)
  return unit === '' ? number : `${number} ${unit}`
}

/** Internal value as it stands in JSON, CSV and links: degrees for angles, else nm, fractions, …; no rounding noise. */
export function toPlain(value: number, kind: QuantityKind): number {
  return kind === 'angle' ? toDisplay(value, kind) : value
}

/** The inverse of `toPlain`. */
export function fromPlain(plain: number, kind: QuantityKind): number {
  return kind === 'angle' ? degreesToRad(plain) : plain
}
