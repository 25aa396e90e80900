import { interpolateLinear } from '../numeric/interpolate.js'
import { daylightComponents } from './tables/daylightComponents.js'

/** Correlated color temperatures for which the daylight locus is defined, K (CIE 15). */
export const DAYLIGHT_KELVIN = { from: 4000, to: 25000 } as const

/**
 * Relative spectral power of daylight of a correlated color temperature, S = S0 + M1 S1 + M2 S2 with M1 and M2 rounded to
 * three decimals (CIE 15). `cct` in K, 4000 to 25000. For the named phases multiply nominal temperatures by 1.4388/1.4380
 * (D65: 6504 K). Throws RangeError outside the locus.
 */
export function daylightSpectrum(cct: number, wavelengthsNm: Float64Array): Float64Array {
  const { x, y } = daylightChromaticity(cct)
  const m = 0.0241 + 0.2562 * x - 0.7341 * y
  const m1 = roundTo3((-1.3515 - 1.7703 * x + 5.9114 * y) / m)
  const m2 = roundTo3((0.03 - 31.4424 * x + 30.0717 * y) / m)
  const { fromNm, stepNm, s0, s1, s2 } = daylightComponents
  const table = Float64Array.from({ length: s0.length }, (_, k) => fromNm + k * stepNm)
  return wavelengthsNm.map(
    (nm) =>
      interpolateLinear(table, s0, nm) + m1 * interpolateLinear(table, s1, nm) + m2 * interpolateLinear(table, s2, nm),
  )
}

/** Chromaticity on the daylight locus of CIE 15; throws RangeError outside 4000 to 25000 K. */
export function daylightChromaticity(cct: number): { x: number; y: number } {
  const { from, to } = DAYLIGHT_KELVIN
  if (!(cct >= from && cct <= to)) throw new RangeError(`Daylight is defined from ${from} to ${to} K, not at ${cct} K`)
  const t = 1000 / cct
  const x =
    cct <= 7000
      ? 0.244063 + t * (0.09911 + t * (2.9678 - t * 4.607))
      : 0.23704 + t * (0.24748 + t * (1.9018 - t * 2.0064))
  return { x, y: -3 * x * x + 2.87 * x - 0.275 }
}

function roundTo3(value: number): number {
  return Math.round(value * 1000) / 1000
}
