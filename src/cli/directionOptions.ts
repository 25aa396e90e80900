import { Option } from 'commander'
import type { Direction, Stack } from '../stack/stack.js'
import { quantityBetween } from './optionValues.js'

export interface DirectionOptions {
  readonly theta?: number
  readonly phi?: number
}

/** rad; at 90° nothing is seen. */
export const WIDEST_RAD = (89.9 * Math.PI) / 180

/** Where the eye stands, for verbs that look from one direction. */
export function directionOptions(): Option[] {
  return [
    new Option('--theta <angle>', 'from the normal to the eye; default that of the file’s first direction').argParser(
      quantityBetween('angle', 0, WIDEST_RAD),
    ),
    new Option('--phi <angle>', 'azimuth of the eye; default that of the file’s first direction').argParser(
      quantityBetween('angle', -2 * Math.PI, 2 * Math.PI),
    ),
  ]
}

export function directionOf({ theta, phi }: DirectionOptions, { conditions: { directions } }: Stack): Direction {
  return { theta: theta ?? directions[0].theta, phi: phi ?? directions[0].phi }
}
