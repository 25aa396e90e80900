import type { Pass } from '../../../studies/itinerary.js'
import type { Review } from '../../../studies/review.js'
import { fixed, given } from '../../decimals.js'
import type { Content } from '../markup.js'
import { figure, numbers, table, words } from '../table.js'

const SHOWN_NM = 550

/** The states the pictures show, at 550 nm. */
export function itinerarySection({ itinerary }: Review): Content[] {
  if (itinerary === undefined) return []
  const rows = itinerary.passes.filter(({ wavelength_nm }) => wavelength_nm === SHOWN_NM).map(passRow)
  return [
    table(
      `State after each layer, ${SHOWN_NM} nm, θ ${given(itinerary.theta_deg)}° φ ${given(itinerary.phi_deg)}°`,
      [
        words('layer'),
        words(''),
        numbers('flux (%)'),
        numbers('azimuth (°)'),
        numbers('ellipticity (°)'),
        numbers('polarized (%)'),
      ],
      rows,
    ),
  ]
}

function passRow({ layer, direction, stokes, azimuth_deg, ellipticity_deg, degree_of_polarization }: Pass) {
  return [
    layer,
    direction === 'in' ? 'going in' : 'coming back',
    figure(stokes[0], fixed(100 * stokes[0], 3)),
    figure(azimuth_deg, fixed(azimuth_deg, 1)),
    figure(ellipticity_deg, fixed(ellipticity_deg, 1)),
    figure(degree_of_polarization, fixed(100 * degree_of_polarization, 2)),
  ]
}
