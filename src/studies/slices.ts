import { indexAt } from '../materials/indexAt.js'
import { retardanceAt550, rthAt550 } from '../stack/retardanceAt550.js'
import type { CrystalLayer, Layer, RetarderLayer } from '../stack/stack.js'

/** Turn of the state of polarization within one slice, and slices of one layer at most (two full turns). */
const TURN_RAD = Math.PI / 18
const MOST_SLICES = 72

/**
 * A layer cut into equal slices that together are the layer, thin enough that one turns light of `wavelengthNm` by about 10°
 * at most (the dispersion of a retarder is not asked); the layer itself where nothing turns, or where it turns more than twice round.
 */
export function slicesOf(layer: Layer, wavelengthNm: number): Layer[] {
  const turn = (2 * Math.PI * pathDifferenceNm(layer, wavelengthNm)) / wavelengthNm
  const count = Math.ceil(turn / TURN_RAD)
  if (count <= 1 || count > MOST_SLICES) return [layer]
  const slice = layer.kind === 'retarder' ? retarderSlice(layer, count) : layer
  return new Array<Layer>(count).fill({ ...slice, thickness: layer.thickness / count })
}

/** The largest there is in any direction, about. */
function pathDifferenceNm(layer: Layer, wavelengthNm: number): number {
  if (layer.kind === 'retarder') return Math.max(Math.abs(retardanceAt550(layer)), Math.abs(rthAt550(layer)))
  return layer.kind === 'crystal' ? crystalDifference(layer, wavelengthNm) * layer.thickness : 0
}

function crystalDifference({ indices }: CrystalLayer, wavelengthNm: number): number {
  const axes = indices.map((law) => indexAt(law, Float64Array.of(wavelengthNm)).n[0])
  return Math.max(...axes) - Math.min(...axes)
}

/** Retardances go with the thickness; the dispersion is a ratio and stays. */
function retarderSlice(layer: RetarderLayer, count: number): RetarderLayer {
  const { retardance, rth } = layer
  return {
    ...layer,
    retardance:
      typeof retardance === 'number'
        ? retardance / count
        : { ...retardance, value: retardance.value.map((value) => value / count) },
    ...(rth !== undefined && { rth: rth / count }),
  }
}
