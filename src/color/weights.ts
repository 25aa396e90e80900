import { observerAt } from './observer.js'

/**
 * Weights over wavelength that turn a reflectance into tristimulus values, Y = 100 for the perfect reflecting diffuser:
 * the sums of CIE 15 and ASTM E308 at the wavelengths given, without bandpass correction.
 */
export interface ColorWeights {
  readonly x: Float64Array
  readonly y: Float64Array
  readonly z: Float64Array
  /** X, Y, Z of the perfect reflecting diffuser. */
  readonly whiteXyz: readonly [number, number, number]
}

/** `illuminant` is relative spectral power at the wavelengths, evenly spaced. */
export function createColorWeights(
  wavelengthsNm: Float64Array,
  observer: 2 | 10,
  illuminant: Float64Array,
): ColorWeights {
  const { x, y, z } = observerAt(observer, wavelengthsNm)
  const scale = 100 / total(y.map((value, i) => value * illuminant[i]))
  const weigh = (cmf: Float64Array) => cmf.map((value, i) => value * illuminant[i] * scale)
  const weights = { x: weigh(x), y: weigh(y), z: weigh(z) }
  return { ...weights, whiteXyz: [total(weights.x), total(weights.y), total(weights.z)] }
}

function total(values: Float64Array): number {
  let sum = 0
  for (const value of values) sum += value
  return sum
}
