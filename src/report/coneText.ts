import { METRIC_QUANTITIES } from '../charts/quantity.js'
import type { Cone } from '../studies/cone.js'
import type { ConeSummary } from '../studies/coneSummary.js'
import { fixed, given } from './decimals.js'
import { ESTIMATE_CAUTION } from './evaluateText.js'
import { metricNumber, metricWithUnit } from './metricNumber.js'
import { type Paint, PLAIN } from './paint.js'
import { type Column, textTable } from './textTable.js'

/** The cone ring by ring, over all azimuths, and what it comes to. */
export function coneText(cone: Cone, paint: Paint = PLAIN): string {
  const parts = [
    `${paint.strong(cone.title)}\n${LEGEND}`,
    ringsTable(cone),
    summaryText(cone, paint),
    paint.faint(ESTIMATE_CAUTION),
  ]
  return `${parts.join('\n\n')}\n`
}

const LEGEND =
  'over all azimuths: luminous reflectance in %, least, mean and most; the worst chroma, ΔE00 from head-on, emission and contrast'

interface Ring {
  readonly heading: string
  readonly of: (row: number) => string
}

/** A line for each θ. */
function ringsTable(cone: Cone): string {
  const reflectance = cone.luminous_reflectance
  const shown = (value: number): string => metricNumber('luminous_reflectance', value)
  const mostOf = (table: readonly (readonly number[])[], row: number): number => Math.max(...table[row])
  const rings: Ring[] = [
    { heading: 'θ', of: (row) => `${given(cone.theta_deg[row])}°` },
    { heading: 'least', of: (row) => shown(Math.min(...reflectance[row])) },
    { heading: 'mean', of: (row) => shown(meanOf(reflectance[row])) },
    { heading: 'most', of: (row) => shown(mostOf(reflectance, row)) },
    { heading: 'at φ', of: (row) => azimuthOfMost(cone, row) },
    { heading: 'C*ab', of: (row) => metricNumber('chroma', mostOf(cone.chroma, row)) },
    { heading: 'ΔE00', of: (row) => fixed(mostOf(cone.delta_e00, row), 2) },
    ...emissionRings(cone),
  ]
  const columns = rings.map(({ heading }): Column => ({ heading, align: 'right' }))
  return textTable(
    columns,
    cone.theta_deg.map((_, row) => rings.map(({ of }) => of(row))),
  )
}

/** Nothing head-on, where every azimuth is the same direction. */
function azimuthOfMost({ theta_deg, phi_deg, luminous_reflectance }: Cone, row: number): string {
  if (theta_deg[row] === 0) return '–'
  const reflectance = luminous_reflectance[row]
  return azimuth(phi_deg[reflectance.indexOf(Math.max(...reflectance))])
}

/** To a tenth of a degree: a step that does not divide the circle gives endless decimals. */
function azimuth(degrees: number): string {
  return `${given(Math.round(10 * degrees) / 10)}°`
}

function emissionRings({ emission_transmittance, ambient_contrast }: Cone): Ring[] {
  const emission = emission_transmittance && {
    heading: 'emission %',
    of: (row: number) => metricNumber('emission_transmittance', Math.min(...emission_transmittance[row])),
  }
  const contrasts = (ambient_contrast ?? []).map(({ illuminance_lx, ratio }) => ({
    heading: `${given(illuminance_lx)} lx`,
    of: (row: number) => metricNumber('ambient_contrast', Math.min(...ratio[row])),
  }))
  return [...(emission ? [emission] : []), ...contrasts]
}

function meanOf(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length
}

function summaryText({ summary, interrupted }: Cone, paint: Paint): string {
  const { worst, diffuse_reflectance, half_turn_symmetry } = summary
  const reflectance = (value: number): string => metricWithUnit('luminous_reflectance', value)
  const lines = [
    `worst: ${reflectance(worst.luminous_reflectance)} at θ ${given(worst.theta_deg)}° φ ${azimuth(worst.phi_deg)}`,
    ...limitLines(summary, paint),
    `under uniform diffuse light: ${reflectance(diffuse_reflectance)} ${METRIC_QUANTITIES.luminous_reflectance.label}`,
    half_turn_symmetry
      ? 'half the azimuths computed: the stack is its own image under half a turn (checked)'
      : 'every azimuth computed: half a turn changes this stack, or the azimuths do not pair',
    ...(interrupted ? [paint.bad('interrupted: the wider angles are missing')] : []),
  ]
  return lines.join('\n')
}

function limitLines({ limit, share_within_limit, theta_within_limit_deg }: ConeSummary, paint: Paint): string[] {
  if (limit === undefined) return ['no limit on the luminous reflectance: none in the file, none given with --limit']
  const asked = metricWithUnit('luminous_reflectance', limit)
  const share = `${fixed(100 * (share_within_limit ?? 0), 1)} % of the cone's solid angle is within ${asked}`
  const reach =
    theta_within_limit_deg === undefined
      ? paint.bad(`even head-on is above ${asked}`)
      : `every azimuth is within ${asked} up to θ ${given(theta_within_limit_deg)}°`
  return [share, reach]
}
