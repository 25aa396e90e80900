import type { Cone } from '../studies/cone.js'
import { csvText } from './csvText.js'

/** One line a direction: degrees and fractions. */
export function coneCsv(cone: Cone): string {
  const { theta_deg, phi_deg, lab, emission_transmittance, ambient_contrast = [] } = cone
  const headings = [
    'theta_deg',
    'phi_deg',
    'luminous_reflectance',
    'lightness',
    'a_star',
    'b_star',
    'chroma',
    'delta_e00',
    ...(emission_transmittance ? ['emission_transmittance'] : []),
    ...ambient_contrast.map(({ illuminance_lx }) => `ambient_contrast/${illuminance_lx}lx`),
  ]
  const rows = theta_deg.flatMap((theta, t) =>
    phi_deg.map((phi, p) => [
      theta,
      phi,
      cone.luminous_reflectance[t][p],
      ...lab[t][p],
      cone.chroma[t][p],
      cone.delta_e00[t][p],
      ...(emission_transmittance ? [emission_transmittance[t][p]] : []),
      ...ambient_contrast.map(({ ratio }) => ratio[t][p]),
    ]),
  )
  return csvText(headings, rows)
}
