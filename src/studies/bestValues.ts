import { findParameter } from '../stack/parameters.js'
import type { Stack } from '../stack/stack.js'
import { fromPlain } from '../units/quantity.js'
import type { Optimum } from './optimize.js'

/** Parameters of the best design a search found, in nm, rad, fractions, for `setParameters`. */
export function bestValues(stack: Stack, { best }: Pick<Optimum, 'best'>): Record<string, number> {
  const values = Object.entries(best.parameters).map(([path, plain]) => {
    const kind = findParameter(stack, path)?.kind ?? 'number'
    return [path, fromPlain(plain, kind)] as const
  })
  return Object.fromEntries(values)
}
