import { Option } from 'commander'
import { quantityBetween } from './optionValues.js'

const DEGREE = Math.PI / 180

/** An option that takes an angle, `leastDeg` to `mostDeg`; its value is in rad. */
export function angleOption(
  flags: string,
  text: string,
  leastDeg: number,
  mostDeg: number,
  defaultDeg?: number,
): Option {
  const option = new Option(flags, text).argParser(quantityBetween('angle', leastDeg * DEGREE, mostDeg * DEGREE))
  return defaultDeg === undefined ? option : option.default(defaultDeg * DEGREE, `${defaultDeg}deg`)
}
