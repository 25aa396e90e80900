import { residuals } from '../charts/residuals.js'
import { PAPER } from '../charts/theme.js'
import type { Fit } from '../studies/fit.js'
import { given } from './decimals.js'
import type { Sheet } from './sheet.js'

/** Measured points on the fitted model, and what is left between them. */
export function fitSheet({ title, directions, noise, noise_is_stated }: Fit): Sheet {
  const data = {
    title: `${title}: measured sample`,
    directions: directions.map(({ theta_deg, phi_deg, wavelength_nm, measured, model }) => ({
      label: `θ ${given(theta_deg)}° φ ${given(phi_deg)}°`,
      wavelengthNm: wavelength_nm,
      measured,
      model,
    })),
    ...(noise_is_stated && { noise }),
  }
  return { name: 'residuals', chart: residuals(data, PAPER), width: 900, height: 640 }
}
