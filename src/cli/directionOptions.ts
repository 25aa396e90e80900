import type { Option } from 'commander'
import type { Direction, Stack } from '../stack/stack.js'
import { angleOption } from './angleOption.js'

/** rad. */
export interface DirectionOptions {
  readonly theta?: number
  readonly phi?: number
}

/** Where the eye stands, for verbs that look from one direction. */
export function directionOptions(): Option[] {
  return [
    angleOption('--theta <angle>', 'from the normal to the eye; default that of the file’s first direction', 0, 89.9),
    angleOption('--phi <angle>', 'azimuth of the eye; default that of the file’s first direction', -360, 360),
  ]
}

export function directionOf({ theta, phi }: DirectionOptions, { conditions: { directions } }: Stack): Direction {
  return { theta: theta ?? directions[0].theta, phi: phi ?? directions[0].phi }
}
