import { beyondEnd, cubicBetween } from './cubicBetween.js'

/** Values on a polar grid: `values[iTheta][iPhi]`. */
export interface PolarField {
  /** Evenly spaced, ascending from 0. */
  readonly thetaRad: readonly number[]
  /** Evenly spaced, ascending from 0 to below 2π. */
  readonly phiRad: readonly number[]
  readonly values: readonly (readonly number[])[]
}

/** Cubic in φ, which is periodic. */
function alongRow(row: readonly number[], phi: number): number {
  const n = row.length
  const turns = phi / (2 * Math.PI)
  const position = (turns - Math.floor(turns)) * n
  const i = Math.floor(position) % n
  const sample = (offset: number): number => row[(i + offset + n) % n]
  return cubicBetween([sample(-1), sample(0), sample(1), sample(2)], position - Math.floor(position))
}

/** Cubic in θ and φ through the samples; across the center the way goes on at φ + π; where there is no sample beyond the largest θ, as the last three run. */
export function valueInPolarField({ thetaRad, values }: PolarField, theta: number, phi: number): number {
  const last = thetaRad.length - 1
  if (last === 0) return alongRow(values[0], phi)
  const position = Math.min(last, (theta / thetaRad[last]) * last)
  const i = Math.min(last - 1, Math.floor(position))
  const sample = (row: number): number => {
    if (row < 0) return alongRow(values[-row], phi + Math.PI)
    if (row <= last) return alongRow(values[row], phi)
    return beyondEnd(sample(last), sample(last - 1), sample(last - 2))
  }
  return cubicBetween([sample(i - 1), sample(i), sample(i + 1), sample(i + 2)], position - i)
}

/** Where the field is largest. */
export function worstOf({ thetaRad, phiRad, values }: PolarField): { thetaRad: number; phiRad: number; value: number } {
  let worst = { thetaRad: thetaRad[0], phiRad: phiRad[0], value: Number.NEGATIVE_INFINITY }
  values.forEach((row, i) => {
    row.forEach((value, j) => {
      if (value > worst.value) worst = { thetaRad: thetaRad[i], phiRad: phiRad[j], value }
    })
  })
  return worst
}
