import { indexAt } from '../../src/materials/indexAt.js'
import type { IndexLaw, Layer, Panel, Stack } from '../../src/stack/stack.js'
import type { PlainIndex, PlainLayer, PlainPanel, PlainStack } from '../oracle/stackFile.js'

/**
 * A checked stack in the plain form that the oracle reads. Published materials and formulas become tables at the
 * wavelengths, for the oracle knows none (they have tests of their own); all that turns trade parameters into indices
 * is left to the oracle.
 */
export function plainStack(stack: Stack, wavelengthsNm: readonly number[]): PlainStack {
  const index = (law: IndexLaw): PlainIndex => plainIndex(law, wavelengthsNm)
  return {
    title: stack.title,
    layers: stack.layers.map((layer) => plainLayer(layer, index)),
    panel: plainPanel(stack.panel, index),
  }
}

type ToPlain = (law: IndexLaw) => PlainIndex

function plainLayer(layer: Layer, index: ToPlain): PlainLayer {
  switch (layer.kind) {
    case 'isotropic':
      return { ...layer, index: index(layer.index) }
    case 'retarder':
      return { ...layer, index: index(layer.index), slow_axis: inDegrees(layer.slow_axis) }
    case 'polarizer':
      return { ...layer, index: index(layer.index), absorption_axis: inDegrees(layer.absorption_axis) }
    case 'crystal': {
      const [a, b, c] = layer.indices
      const angles = { azimuth: inDegrees(layer.azimuth), tilt: inDegrees(layer.tilt) }
      return { ...layer, ...angles, indices: [index(a), index(b), index(c)] }
    }
  }
}

function plainPanel(panel: Panel, index: ToPlain): PlainPanel {
  return { ...panel, index: index(panel.index) }
}

function plainIndex(law: IndexLaw, wavelengthsNm: readonly number[]): PlainIndex {
  if (typeof law === 'number' || 'cauchy_nm' in law || 'n' in law) return law
  const { n, k } = indexAt(law, Float64Array.from(wavelengthsNm))
  const table = (value: Float64Array) => ({ wavelength_nm: wavelengthsNm, value: [...value] })
  return { n: table(n), k: table(k) }
}

function inDegrees(rad: number): string {
  return `${(rad * 180) / Math.PI} deg`
}
