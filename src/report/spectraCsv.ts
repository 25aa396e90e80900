import type { Evaluation } from '../studies/evaluate.js'
import { csvText } from './csvText.js'

const HEADINGS = [
  'wavelength_nm',
  'theta_deg',
  'phi_deg',
  'reflectance',
  'front_reflectance',
  'emission_transmittance',
] as const

/** The spectra of an evaluation in long form; its first four columns are those of a measured file. */
export function spectraCsv({ directions }: Evaluation): string {
  const rows = directions.flatMap(({ theta_deg, phi_deg, spectrum }) =>
    spectrum.wavelength_nm.map((nm, i) => [
      nm,
      theta_deg,
      phi_deg,
      spectrum.reflectance[i],
      spectrum.front_reflectance[i],
      spectrum.emission_transmittance?.[i],
    ]),
  )
  return csvText(HEADINGS, rows)
}
