import { InvalidArgumentError } from 'commander'
import { formatQuantity, isFault, parseQuantity, type QuantityKind } from '../units/quantity.js'

/** Parser of an option that takes a whole number. */
export function wholeNumber(min: number, max: number): (text: string) => number {
  return (text) => {
    const value = Number(text)
    if (/^\d+$/.test(text) && value >= min && value <= max) return value
    throw new InvalidArgumentError(`It takes a whole number from ${min} to ${max}.`)
  }
}

/** Parser of an option that may be given many times. */
export function collected(text: string, before: readonly string[] = []): string[] {
  return [...before, text]
}

/** Parser of an option that takes a quantity between bounds (nm, rad, fractions), both included. */
export function quantityBetween(kind: QuantityKind, min: number, max: number): (text: string) => number {
  const [least, most] = [min, max].map((bound) => formatQuantity(bound, kind, 6))
  return (text) => {
    const value = parseQuantity(text, kind)
    if (isFault(value)) throw new InvalidArgumentError(`It takes ${value.allowed}.`)
    if (value >= min && value <= max) return value
    throw new InvalidArgumentError(`It takes a value from ${least} to ${most}.`)
  }
}
