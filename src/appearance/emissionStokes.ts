import type { EmissionStokes } from '../optics/panel.js'
import type { Emission } from '../stack/stack.js'

const UNPOLARIZED: EmissionStokes = [1, 0, 0, 0]

/**
 * State of the light that leaves the panel in azimuth `phi`, in the (p, s) frame of the solver. A given ellipse keeps its
 * axis as the viewer sees it head-on; positive ellipticity is right-handed as named from the source.
 */
export function emissionStokesAt({ polarization }: Emission, phi: number): EmissionStokes {
  if (polarization === 'none') return UNPOLARIZED
  const { axis, ellipticity, degree } = polarization
  const linear = degree * Math.cos(2 * ellipticity)
  return [
    1,
    linear * Math.cos(2 * (axis - phi)),
    -linear * Math.sin(2 * (axis - phi)),
    degree * Math.sin(2 * ellipticity),
  ]
}
