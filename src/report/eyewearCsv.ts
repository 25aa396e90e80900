import type { Eyewear } from '../studies/eyewear.js'
import { csvText } from './csvText.js'

/** One line a roll. */
export function eyewearCsv({ rolls }: Eyewear): string {
  const lit = rolls[0].luminance !== undefined
  return csvText(
    ['roll_deg', 'transmittance', ...(lit ? ['luminance'] : []), 'x', 'y', 'z', 'delta_uv'],
    rolls.map(({ roll_deg, transmittance, luminance, xyz, delta_uv }) => [
      roll_deg,
      transmittance,
      ...(lit ? [luminance] : []),
      ...xyz,
      delta_uv,
    ]),
  )
}
