import type { ColorWeights } from './weights.js'

/** X, Y, Z of a reflectance (fractions, at the wavelengths of the weights), Y = 100 for the perfect reflecting diffuser. */
export function spectrumToXyz(
  weights: ColorWeights,
  spectrum: Float64Array,
  out: [number, number, number] = [0, 0, 0],
): [number, number, number] {
  let x = 0
  let y = 0
  let z = 0
  for (let i = 0; i < spectrum.length; i++) {
    const value = spectrum[i]
    x += weights.x[i] * value
    y += weights.y[i] * value
    z += weights.z[i] * value
  }
  out[0] = x
  out[1] = y
  out[2] = z
  return out
}
