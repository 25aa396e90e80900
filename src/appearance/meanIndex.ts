import { indexAt } from '../materials/indexAt.js'
import type { Layer } from '../stack/stack.js'

/** Mean real index of a layer's three axes over wavelength. */
export function meanIndexOf(layer: Layer, wavelengthsNm: Float64Array): Float64Array {
  if (layer.kind !== 'crystal') return indexAt(layer.index, wavelengthsNm).n
  const [a, b, c] = layer.indices.map((law) => indexAt(law, wavelengthsNm).n)
  return wavelengthsNm.map((_, i) => (a[i] + b[i] + c[i]) / 3)
}
