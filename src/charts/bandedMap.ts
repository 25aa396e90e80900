import { type ColorScale, colorScale, type ScaleRange } from './colorScale.js'
import { type Band, contourBands } from './contourBands.js'
import type { Quantity } from './quantity.js'

export interface BandedMap {
  readonly scale: ColorScale
  readonly bands: readonly Band[]
}

/**
 * A field over the unit square, in stored units, cut into bands of its shown unit. What a fixed range does not reach is
 * shown in the first or last color.
 */
export function bandedMap(quantity: Quantity, range: ScaleRange, valueAt: (u: number, v: number) => number): BandedMap {
  const scale = colorScale({ min: quantity.factor * range.min, max: quantity.factor * range.max })
  const lowest = scale.levels[0]
  const highest = scale.levels[scale.levels.length - 1] - 1e-9 * scale.step
  const shownAt = (u: number, v: number): number => Math.min(highest, Math.max(lowest, quantity.factor * valueAt(u, v)))
  return { scale, bands: contourBands(shownAt, scale.levels) }
}
