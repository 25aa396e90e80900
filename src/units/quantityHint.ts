import { OTHER_SPELLINGS, type QuantityKind, UNIT_TABLES } from './unitTables.js'

/** Why a text is no number with a unit, where the slip is a common one. */
export function textHint(text: string): string | undefined {
  const value = text.trim()
  if (value === '') return 'the value is empty'
  if (/^[+-]?\d+,\d/.test(value)) return 'write the decimal point as a dot'
  if (/^[+-]?\d+[ \u00a0\u202f]\d/.test(value)) return 'write the number without spaces'
  if (/^[\u2212\u2012-\u2014]/.test(value)) return 'write the minus sign as a plain hyphen'
  if (/^[+-]?\.?(nan|inf(inity)?)\b/i.test(value)) return 'the number is not finite'
  return isUnit(value) ? 'the number is missing' : undefined
}

/** Why a unit does not fit the kind. */
export function unitHint(unit: string, kind: QuantityKind): string {
  const meant = OTHER_SPELLINGS[unit.toLowerCase()] ?? otherCase(unit)
  if (meant !== undefined && Object.hasOwn(UNIT_TABLES[kind].units, meant))
    return `the unit "${unit}" is written ${meant}`
  const other = kindOf(meant ?? unit)
  return other === undefined ? `"${unit}" is not a unit known here` : `"${unit}" is a unit of ${other}`
}

function isUnit(text: string): boolean {
  return kindOf(OTHER_SPELLINGS[text.toLowerCase()] ?? text) !== undefined
}

function kindOf(unit: string): QuantityKind | undefined {
  return kinds().find((kind) => Object.hasOwn(UNIT_TABLES[kind].units, unit))
}

function otherCase(unit: string): string | undefined {
  const units = kinds().flatMap((kind) => Object.keys(UNIT_TABLES[kind].units))
  return units.find((known) => known !== unit && known.toLowerCase() === unit.toLowerCase())
}

function kinds(): QuantityKind[] {
  return Object.keys(UNIT_TABLES) as QuantityKind[]
}
