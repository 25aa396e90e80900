import { interpolateOnto } from '../numeric/interpolate.js'
import type { Spectrum } from './indexLaw.js'

/** A spectrum at each wavelength (nm): an array as long as the wavelengths. */
export function spectrumAt(spectrum: Spectrum, wavelengthsNm: Float64Array): Float64Array {
  if (typeof spectrum === 'number') return new Float64Array(wavelengthsNm.length).fill(spectrum)
  return interpolateOnto(spectrum.wavelength_nm, spectrum.value, wavelengthsNm)
}
