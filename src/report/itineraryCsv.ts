import type { Itinerary } from '../studies/itinerary.js'
import { csvText } from './csvText.js'

const HEADINGS = [
  'wavelength_nm',
  'direction',
  'layer',
  's0',
  's1',
  's2',
  's3',
  'azimuth_deg',
  'ellipticity_deg',
  'degree_of_polarization',
]

/** One line a pass. */
export function itineraryCsv({ passes }: Itinerary): string {
  return csvText(
    HEADINGS,
    passes.map((pass) => [
      pass.wavelength_nm,
      pass.direction,
      pass.layer,
      ...pass.stokes,
      pass.azimuth_deg,
      pass.ellipticity_deg,
      pass.degree_of_polarization,
    ]),
  )
}
