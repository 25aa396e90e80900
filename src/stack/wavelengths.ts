import type { Conditions } from './stack.js'

/** The wavelengths of the conditions, nm: from, from + step, … up to `to` (a step that does not divide ends short of it). */
export function wavelengthsOf({ wavelengths: { from, to, step } }: Conditions): Float64Array {
  const count = Math.floor((to - from) / step + 1e-9) + 1
  return Float64Array.from({ length: count }, (_, i) => from + i * step)
}
