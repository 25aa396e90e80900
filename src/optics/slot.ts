import { fillDiagonalModes } from './diagonalModes.js'
import { createLayerModes, type LayerModes } from './layerModes.js'
import type { Medium } from './opticalLayer.js'
import { fillPlanarModes } from './planarModes.js'
import { fillTiltedModes } from './tiltedModes.js'

/** A medium's matrices and what they were computed from. */
export interface Slot {
  medium: Medium | undefined
  thicknessNm: number
  relativeAzimuthRad: number
  tiltRad: number
  xi: number
  readonly modes: LayerModes
  /** Recomputed in the call at hand. */
  changed: boolean
}

export function createSlot(count: number): Slot {
  return {
    medium: undefined,
    thicknessNm: Number.NaN,
    relativeAzimuthRad: Number.NaN,
    tiltRad: Number.NaN,
    xi: Number.NaN,
    modes: createLayerModes(count),
    changed: true,
  }
}

/**
 * Computes the matrices where anything they depend on differs from what they were computed from; an azimuth that the layer
 * does not notice is no difference. `azimuthRad` is counted from the plane of incidence.
 */
export function fillSlot(
  slot: Slot,
  medium: Medium,
  azimuthRad: number,
  tilt: number,
  thicknessNm: number,
  xi: number,
  waveNumbers: Float64Array,
): void {
  const tiltRad = medium.isotropic ? 0 : tilt
  const relativeAzimuthRad = medium.inPlaneIsotropic && tiltRad === 0 ? 0 : azimuthRad
  slot.changed =
    slot.medium !== medium ||
    slot.xi !== xi ||
    slot.thicknessNm !== thicknessNm ||
    slot.relativeAzimuthRad !== relativeAzimuthRad ||
    slot.tiltRad !== tiltRad
  if (!slot.changed) return
  slot.medium = medium
  slot.xi = xi
  slot.thicknessNm = thicknessNm
  slot.relativeAzimuthRad = relativeAzimuthRad
  slot.tiltRad = tiltRad
  const { modes } = slot
  if (tiltRad !== 0) fillTiltedModes(modes, medium, relativeAzimuthRad, tiltRad, thicknessNm, xi, waveNumbers)
  else if (medium.inPlaneIsotropic) fillDiagonalModes(modes, medium, thicknessNm, xi, waveNumbers)
  else fillPlanarModes(modes, medium, relativeAzimuthRad, thicknessNm, xi, waveNumbers)
}
