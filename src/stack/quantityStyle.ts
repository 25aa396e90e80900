import { displayUnit, isFault, parseQuantity, type QuantityKind } from '../units/quantity.js'
import type { FieldLimits } from './fieldLimits.js'

/** How near a written value comes to the one it was made from, relative. */
const PRECISION = 1e-12

/** Thicknesses are written in um from here on, nm. */
const MICROMETERS_FROM_NM = 1000

/**
 * A value as the file writes it: in the unit, and with the space before it, of what stood there (`old`, as YAML gave it); a
 * bare number stays bare. As few digits as give the value back to 1e-12.
 */
export function styledQuantity(
  value: number,
  { quantity }: Pick<FieldLimits, 'quantity'>,
  old: unknown,
): number | string {
  if (typeof old === 'number') return Number(shortestNumber(value, quantity, ''))
  const match = typeof old === 'string' ? /^\s*[+-]?[\d.]+(?:e[+-]?\d+)?(\s*)(\S*)\s*$/i.exec(old) : null
  const [space, unit] = match === null ? [' ', newUnit(value, quantity)] : [match[1], match[2]]
  const number = shortestNumber(value, quantity, unit)
  return quantity === 'number' && match === null ? Number(number) : `${number}${unit === '' ? '' : space}${unit}`
}

function newUnit(value: number, quantity: QuantityKind): string {
  return quantity === 'length' && Math.abs(value) >= MICROMETERS_FROM_NM ? 'um' : displayUnit(quantity)
}

function shortestNumber(value: number, quantity: QuantityKind, unit: string): string {
  const read = (text: string): number => {
    const parsed = parseQuantity(`${text} ${unit}`, quantity)
    return isFault(parsed) ? Number.NaN : parsed
  }
  const inUnit = value / read('1')
  for (let digits = 1; digits < 17; digits++) {
    const text = String(Number(inUnit.toPrecision(digits)))
    if (Math.abs(read(text) - value) <= PRECISION * Math.abs(value)) return text
  }
  return String(inUnit)
}
