/** The distributions of a tolerance, as offsets from the value in the file (in its unit: nm, rad, fraction). */
import { inverseNormal, normalCdf } from '../numeric/normal.js'
import type { Spread } from '../stack/stack.js'

/** Half of the smallest step of a uniform double: keeps quantiles of 0 and 1 from being infinite. */
const LEAST_SHARE = 2 ** -54

/** Inverse distribution function: the offset which a share `u` (0 to 1) of production does not exceed. */
export function spreadOffset(spread: Spread): (u: number) => number {
  if ('normal' in spread) return normalOffset(spread.normal, spread.limit ?? Number.POSITIVE_INFINITY)
  if ('uniform' in spread) return (u) => spread.uniform * (2 * u - 1)
  if ('triangular' in spread) return triangularOffset(spread.triangular)
  return tabulatedOffset(spread.offset, spread.density)
}

/** One number for the width of a spread: the standard deviation before any cut, or half the width between its ends. */
export function spreadSize(spread: Spread): { readonly size: number; readonly measure: SpreadMeasure } {
  if ('normal' in spread) return { size: spread.normal, measure: 'standard deviation' }
  if ('uniform' in spread) return { size: spread.uniform, measure: 'half-width' }
  if ('triangular' in spread) return { size: spread.triangular, measure: 'half-width' }
  return { size: tabulatedDeviation(spread.offset, spread.density), measure: 'standard deviation' }
}

export type SpreadMeasure = 'standard deviation' | 'half-width'

/** Normal, and what lies beyond ± limit never leaves the factory: the shares within are scaled up. */
function normalOffset(deviation: number, limit: number): (u: number) => number {
  if (deviation === 0) return () => 0
  const cut = normalCdf(-limit / deviation)
  return (u) => {
    const share = Math.min(1 - LEAST_SHARE * 2, Math.max(LEAST_SHARE, cut + u * (1 - 2 * cut)))
    return Math.min(limit, Math.max(-limit, deviation * inverseNormal(share)))
  }
}

function triangularOffset(halfWidth: number): (u: number) => number {
  return (u) => (u < 0.5 ? halfWidth * (Math.sqrt(2 * u) - 1) : halfWidth * (1 - Math.sqrt(2 * (1 - u))))
}

/** Areas under the density, which is linear between its points, so that each piece inverts by a square root. */
function tabulatedOffset(offset: readonly number[], density: readonly number[]): (u: number) => number {
  const below = [0]
  for (let i = 1; i < offset.length; i++) {
    below.push(below[i - 1] + ((offset[i] - offset[i - 1]) * (density[i] + density[i - 1])) / 2)
  }
  const total = below[below.length - 1]
  return (u) => {
    const wanted = u * total
    let piece = 1
    while (piece < offset.length - 1 && below[piece] < wanted) piece++
    const area = wanted - below[piece - 1]
    if (area <= 0) return offset[piece - 1]
    const start = density[piece - 1]
    const slope = (density[piece] - start) / (offset[piece] - offset[piece - 1])
    // Of area = start t + slope t²/2 the root that does not cancel; the discriminant may round below 0 at the end.
    return offset[piece - 1] + (2 * area) / (start + Math.sqrt(Math.max(0, start * start + 2 * slope * area)))
  }
}

/** Simpson's rule is exact for the cubic that x² times a linear density makes. */
function tabulatedDeviation(offset: readonly number[], density: readonly number[]): number {
  const moments = [0, 0, 0]
  for (let i = 1; i < offset.length; i++) {
    const step = offset[i] - offset[i - 1]
    const middle = (offset[i] + offset[i - 1]) / 2
    for (let power = 0; power < 3; power++) {
      moments[power] +=
        (step / 6) *
        (density[i - 1] * offset[i - 1] ** power +
          2 * (density[i - 1] + density[i]) * middle ** power +
          density[i] * offset[i] ** power)
    }
  }
  const mean = moments[1] / moments[0]
  return Math.sqrt(Math.max(0, moments[2] / moments[0] - mean * mean))
}
