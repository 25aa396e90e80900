/**
 * Lengths, angles and shares as people write them, and as the program computes with them: nm, radians, fractions. Number
 * and unit are read apart and multiplied by an exact factor, so that `138 nm` is 138 and nothing else.
 */
export type QuantityKind = 'length' | 'angle' | 'share' | 'number' | 'illuminance' | 'luminance' | 'temperature'

interface UnitTable {
  /** Meaning of a bare number. */
  readonly bare: string
  readonly units: Readonly<Record<string, (value: number) => number>>
}

const scale = (factor: number) => (value: number) => value * factor
const same = scale(1)
/** Value first, then π/180, so that 45 deg is exactly 45 π / 180. */
const degreesToRad = (value: number) => (value * Math.PI) / 180

const TABLES: Readonly<Record<QuantityKind, UnitTable>> = {
  length: { bare: 'nm', units: { nm: same, um: scale(1e3), µm: scale(1e3), μm: scale(1e3), mm: scale(1e6) } },
  angle: { bare: 'deg', units: { deg: degreesToRad, '°': degreesToRad, rad: same } },
  share: { bare: '', units: { '': same, '%': (value) => value / 100 } },
  number: { bare: '', units: { '': same } },
  illuminance: { bare: 'lx', units: { lx: same, klx: scale(1e3) } },
  luminance: { bare: 'cd/m2', units: { 'cd/m2': same, 'cd/m²': same } },
  temperature: { bare: 'K', units: { K: same } },
}

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
  const { bare, units } = TABLES[kind]
  if (typeof raw === 'number') {
    return Number.isFinite(raw) ? units[bare](raw) : fault(raw, kind, 'the number is not finite')
  }
  if (typeof raw !== 'string') return fault(raw, kind)
  const match = TEXT.exec(raw)
  if (match === null) return fault(raw, kind, textHint(raw))
  const value = Number(match[1])
  const unit = match[2] === '' ? bare : match[2]
  if (!Number.isFinite(value)) return fault(raw, kind, 'the number is not finite')
  return Object.hasOwn(units, unit) ? units[unit](value) : fault(raw, kind, unitHint(unit, kind))
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
  return String(raw).slice(0, 60)
}

function textHint(raw: string): string | undefined {
  if (/^\s*[+-]?\d+,\d/.test(raw)) return 'write the decimal point as a dot'
  return raw.trim() === '' ? 'the value is empty' : undefined
}

function unitHint(unit: string, kind: QuantityKind): string {
  const other = (Object.keys(TABLES) as QuantityKind[]).find(
    (name) => name !== kind && Object.hasOwn(TABLES[name].units, unit),
  )
  return other === undefined ? `"${unit}" is not a unit known here` : `"${unit}" is a unit of ${other}`
}

/** Unit in which a kind is shown, and the factor from the internal value. */
const DISPLAY: Readonly<Record<QuantityKind, { readonly unit: string; readonly of: (value: number) => number }>> = {
  length: { unit: 'nm', of: same },
  angle: { unit: 'deg', of: (rad) => (rad * 180) / Math.PI },
  share: { unit: '%', of: scale(100) },
  number: { unit: '', of: same },
  illuminance: { unit: 'lx', of: same },
  luminance: { unit: 'cd/m2', of: same },
  temperature: { unit: 'K', of: same },
}

export function displayUnit(kind: QuantityKind): string {
  return DISPLAY[kind].unit
}

/** Internal value in the unit it is shown in, without the rounding noise of the conversion. */
export function toDisplay(value: number, kind: QuantityKind): number {
  return kind === 'angle' || kind === 'share' ? Number(DISPLAY[kind].of(value).toPrecision(14)) : value
}

/** `138 nm`, `45 deg`, `43.2 %`: with `digits` significant digits, or as many as the value needs. */
export function formatQuantity(value: number, kind: QuantityKind, digits?: number): string {
  const shown = toDisplay(value, kind)
  const number = digits === undefined ? String(shown) : String(Number(shown.toPrecision(digits)))
  const { unit } = DISPLAY[kind]
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
