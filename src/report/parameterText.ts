import { findParameter } from '../stack/parameters.js'
import type { Stack } from '../stack/stack.js'
import { displayUnit, fromPlain, type QuantityKind, toDisplay } from '../units/quantity.js'
import { fixed } from './decimals.js'

/** Finer than films are cut or made, so that a design can be typed in again without loss that matters. */
const DECIMALS: Readonly<Record<QuantityKind, number>> = {
  length: 2,
  angle: 2,
  share: 3,
  number: 4,
  illuminance: 0,
  luminance: 1,
  temperature: 0,
}

export interface ParameterText {
  readonly unit: string
  /** The value (as a study returns it: nm, degrees, fractions) in `unit`. */
  readonly shown: (plain: number) => string
}

/** How a parameter of the stack is written in tables. */
export function parameterText(stack: Stack, path: string): ParameterText {
  const kind = findParameter(stack, path)?.kind ?? 'number'
  return {
    unit: displayUnit(kind),
    shown: (plain) => fixed(toDisplay(fromPlain(plain, kind), kind), DECIMALS[kind]),
  }
}
