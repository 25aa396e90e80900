import { compileSetter, findParameter, type ParameterInfo } from '../stack/parameters.js'
import type { Stack } from '../stack/stack.js'
import type { QuantityKind } from '../units/quantity.js'

/** Two stacks next to `base`, which differ in one parameter, by `apart` (nm, rad, fractions, numbers). */
export interface ParameterDifference {
  readonly plus: Stack
  readonly minus: Stack
  readonly apart: number
}

/**
 * Half the step of a central difference: small against a wavelength and a turn, large against the rounding of the phase of a
 * film thousands of wavelengths thick.
 */
const STEPS: Readonly<Record<Exclude<QuantityKind, 'number'>, number>> = {
  length: 5e-3,
  angle: 5e-6,
  share: 1e-6,
  illuminance: 1e-3,
  luminance: 1e-3,
  temperature: 1e-3,
}

/** Numbers come in all sizes, and the thickness of a layer whose phase does not count may move by wavelengths: shares of the usual range. */
const NUMBER_SHARE = 1e-5
const THICK_SHARE = 1e-5

/** A step goes no nearer than this to the end of what is possible, as a share of the way there: roots begin at such ends. */
const WAY_TO_END = 1e-3
/** But is never shorter than this share of itself. */
const SHORTEST = 1e-3

/** Differences along one parameter at any value; at the end of what is possible to the one side there is. */
export function compileDifference(stack: Stack, path: string): (base: Stack, value: number) => ParameterDifference {
  const parameter = findParameter(stack, path)
  if (parameter === undefined) throw new Error(`not a parameter of this stack: ${path}`)
  const { range } = parameter
  const set = compileSetter(stack, path)
  const step = stepOf(stack, parameter)
  return (base, value) => {
    const room = Math.min(value - range[0], range[1] - value)
    const half = room > 0 ? Math.min(step, Math.max(WAY_TO_END * room, SHORTEST * step)) : step
    const above = Math.min(range[1], value + half)
    const below = Math.max(range[0], value - half)
    return { plus: set(base, above), minus: set(base, below), apart: above - below }
  }
}

function stepOf({ layers }: Stack, { path, kind, usual }: ParameterInfo): number {
  const width = usual[1] - usual[0]
  if (kind === 'number') return NUMBER_SHARE * width
  const isThick = layers.some(({ id, coherent }) => !coherent && path === `${id}.thickness`)
  return isThick ? THICK_SHARE * width : STEPS[kind]
}
