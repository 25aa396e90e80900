import { InvalidArgumentError } from 'commander'

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
