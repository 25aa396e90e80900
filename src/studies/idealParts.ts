/** Ideal parts in the place of real ones, for the light budget: each function takes away one imperfection of one layer. */
import { meanIndexOf } from '../appearance/meanIndex.js'
import { internalTransmittances, SMALLEST_TRANSMITTANCE } from '../appearance/polarizerIndices.js'
import { indexAt } from '../materials/indexAt.js'
import { retardanceAt550 } from '../stack/retardanceAt550.js'
import type {
  CrystalLayer,
  IndexLaw,
  Layer,
  Panel,
  PolarizerLayer,
  RetarderLayer,
  SpectrumTable,
} from '../stack/stack.js'

/** A film that absorbs almost all must be thick: squeezed into less, its k is so large that its own faces reflect. */
const LEAKPROOF_THICKNESS_NM = 10e6

/** The layer with another mean real index; birefringence and absorption stay. */
export function withMeanIndex(layer: Layer, mean: Float64Array, wavelengthsNm: Float64Array): Layer {
  switch (layer.kind) {
    case 'isotropic':
    case 'retarder':
      return { ...layer, index: shifted(layer.index, layer, mean, wavelengthsNm) }
    case 'polarizer': {
      const pair = internalPair(layer, wavelengthsNm)
      return { ...pair, index: shifted(layer.index, layer, mean, wavelengthsNm) }
    }
    case 'crystal':
      return {
        ...layer,
        indices: layer.indices.map((law) => shifted(law, layer, mean, wavelengthsNm)) as [...CrystalLayer['indices']],
      }
  }
}

/** The law moved by as much as brings the layer's mean to `mean`. */
function shifted(law: IndexLaw, layer: Layer, mean: Float64Array, wavelengthsNm: Float64Array): IndexLaw {
  const own = meanIndexOf(layer, wavelengthsNm)
  const { n, k } = indexAt(law, wavelengthsNm)
  return {
    n: table(
      n.map((value, i) => value + mean[i] - own[i]),
      wavelengthsNm,
    ),
    k: table(k, wavelengthsNm),
  }
}

export function withImmersion(panel: Panel, index: Float64Array, wavelengthsNm: Float64Array): Panel {
  return { ...panel, index: { n: table(index, wavelengthsNm), k: 0 } }
}

/** The polarizer with nothing passing along its absorption axis; what its transmission axis passes stays. */
export function withoutLeakage(layer: PolarizerLayer, wavelengthsNm: Float64Array): PolarizerLayer {
  return {
    ...internalPair(layer, wavelengthsNm),
    absorption_axis_transmittance: SMALLEST_TRANSMITTANCE,
    thickness: LEAKPROOF_THICKNESS_NM,
  }
}

/** Described by its internal transmittances, which hold whatever its index and thickness are. */
function internalPair(layer: PolarizerLayer, wavelengthsNm: Float64Array): PolarizerLayer {
  const { id, kind, index, absorption_axis, thickness, coherent } = layer
  const [t1, t2] = internalTransmittances(layer, indexAt(index, wavelengthsNm).n, wavelengthsNm)
  return {
    id,
    kind,
    index,
    absorption_axis,
    thickness,
    coherent,
    transmission_axis_transmittance: table(t1, wavelengthsNm),
    absorption_axis_transmittance: table(t2, wavelengthsNm),
  }
}

/** The film with another retardance at 550 nm (nm), its dispersion as it was. */
export function withRetardance(layer: RetarderLayer, retardanceNm: number): RetarderLayer {
  const { retardance } = layer
  if (typeof retardance === 'number') return { ...layer, retardance: retardanceNm }
  const scale = retardanceNm / retardanceAt550(layer)
  return { ...layer, retardance: { ...retardance, value: retardance.value.map((value) => value * scale) } }
}

/** The film with Re(λ) proportional to λ, so that it turns every wavelength by the same angle. */
export function withProportionalDispersion(layer: RetarderLayer): RetarderLayer {
  return { ...layer, retardance: retardanceAt550(layer), dispersion: { wavelength_nm: ANY_NM, value: ANY_NM } }
}

/** Ends of a straight line beyond every wavelength that is computed. */
const ANY_NM = [1, 1e5]

function table(values: Float64Array, wavelengthsNm: Float64Array): SpectrumTable {
  return { wavelength_nm: Array.from(wavelengthsNm), value: Array.from(values) }
}
