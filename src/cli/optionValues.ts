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

/** The same for values that `parse` makes of the texts. */
export function collectedAs<Value>(parse: (text: string) => Value) {
  return (text: string, before: readonly Value[] = []): Value[] => [...before, parse(text)]
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

/** Parser of an option that takes names of a list, separated by commas. */
export function namesAmong<Name extends string>(allowed: readonly Name[]): (text: string) => Name[] {
  return (text) => {
    const names = text.split(',').map((name) => name.trim())
    const found = allowed.filter((name) => names.includes(name))
    if (names.every((name) => found.some((one) => one === name))) return found
    throw new InvalidArgumentError(`It takes names among ${allowed.join(', ')}, separated by commas.`)
  }
}
