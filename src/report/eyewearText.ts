import type { Eyewear, EyewearRoll } from '../studies/eyewear.js'
import { fixed, given } from './decimals.js'
import { type Paint, PLAIN } from './paint.js'
import { type Column, textTable } from './textTable.js'

const LEGEND =
  "transmittance: the share of the screen's luminance that passes a lens which is clear along its axis (½ of unpolarized light);\n" +
  "the roll is that of the lens's transmission axis, counter-clockwise from three o’clock; Δu'v' from the screen without the lens"

/** What the lens leaves of the lit screen, roll by roll, and where it is worst. */
export function eyewearText(eyewear: Eyewear, paint: Paint = PLAIN): string {
  const { title, theta_deg, phi_deg, rolls } = eyewear
  const parts = [
    `${paint.strong(title)}\nthrough polarized eyewear, seen from θ ${given(theta_deg)}° φ ${given(phi_deg)}°`,
    rollsTable(rolls),
    summaryText(eyewear),
    paint.faint(LEGEND),
  ]
  return `${parts.join('\n\n')}\n`
}

function rollsTable(rolls: readonly EyewearRoll[]): string {
  const lit = rolls[0].luminance !== undefined
  const headings = ['roll', 'transmittance %', ...(lit ? ['cd/m²'] : []), "Δu'v'"]
  const rows = rolls.map(({ roll_deg, transmittance, luminance, delta_uv }) => [
    `${given(roll_deg)}°`,
    fixed(100 * transmittance, 2),
    ...(luminance === undefined ? [] : [fixed(luminance, 1)]),
    shiftText(delta_uv),
  ])
  return textTable(
    headings.map((heading): Column => ({ heading, align: 'right' })),
    rows,
  )
}

/** Black has no color. */
function shiftText(delta: number | undefined): string {
  return delta === undefined ? '–' : fixed(delta, 4)
}

function summaryText({ summary: { darkest, brightest, largest_color_shift } }: Eyewear): string {
  const light = ({ transmittance, luminance }: EyewearRoll): string =>
    `${fixed(100 * transmittance, 2)} %${luminance === undefined ? '' : ` (${fixed(luminance, 1)} cd/m²)`}`
  const lines = [
    `darkest: ${light(darkest)} at a roll of ${given(darkest.roll_deg)}°`,
    `brightest: ${light(brightest)} at a roll of ${given(brightest.roll_deg)}°`,
    `largest color shift: Δu'v' ${shiftText(largest_color_shift.delta_uv)} at a roll of ${given(largest_color_shift.roll_deg)}°`,
  ]
  return lines.join('\n')
}
