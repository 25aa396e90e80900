/**
 * A checked stack as the optics want it. Media are kept per layer while nothing they depend on changes, so that turning
 * a film leaves its medium (and all that the solver derived from it) as it is.
 */
import { indexAt } from '../materials/indexAt.js'
import { spectrumAt } from '../materials/spectrumAt.js'
import {
  createMedium,
  type IndexSpectrum,
  type Medium,
  type OpticalLayer,
  type PanelEnd,
} from '../optics/opticalLayer.js'
import type { CrystalLayer, IndexLaw, Layer, Panel, PolarizerLayer, RetarderLayer, Stack } from '../stack/stack.js'
import { polarizerIndices } from './polarizerIndices.js'
import { retarderIndices } from './retarderIndices.js'

interface Kept {
  layer: Layer
  optical: OpticalLayer
}

export class OpticalStack {
  private readonly kept: Kept[] = []
  private readonly laws: { law: IndexLaw; index: IndexSpectrum }[] = []
  private readonly optical: OpticalLayer[] = []
  private panel: Panel | undefined
  private end: PanelEnd | undefined

  constructor(readonly wavelengthsNm: Float64Array) {}

  /** Optical layers of the stack, top first; the array is reused by the next call. */
  layersOf(stack: Stack): readonly OpticalLayer[] {
    const { layers } = stack
    this.optical.length = layers.length
    for (let k = 0; k < layers.length; k++) this.optical[k] = this.opticalLayer(layers[k], k)
    return this.optical
  }

  /**
   * Layers and panel of a stack that differs from `base` (the one last asked for) in a few places, without touching what is
   * kept: where nothing changed the very objects of `base`.
   */
  variantOf(stack: Stack, base: Stack): { layers: OpticalLayer[]; panel: PanelEnd } {
    return {
      layers: stack.layers.map((layer, k) =>
        layer === base.layers[k] ? this.optical[k] : this.turnedFrom(this.kept[k], layer),
      ),
      panel: stack.panel === base.panel ? this.panelOf(base) : this.panelEnd(stack.panel),
    }
  }

  panelOf({ panel }: Stack): PanelEnd {
    if (this.panel === panel && this.end !== undefined) return this.end
    this.panel = panel
    this.end = this.panelEnd(panel)
    return this.end
  }

  private opticalLayer(layer: Layer, k: number): OpticalLayer {
    const kept = this.kept[k]
    if (kept?.layer === layer) return kept.optical
    const optical = this.turnedFrom(kept, layer)
    this.kept[k] = { layer, optical }
    return optical
  }

  /** The layer's optics, with the medium of what was kept where only angles changed. */
  private turnedFrom(kept: Kept | undefined, layer: Layer): OpticalLayer {
    return {
      medium: kept !== undefined && sameMedium(kept.layer, layer) ? kept.optical.medium : this.mediumOf(layer),
      azimuthRad: azimuthOf(layer),
      tiltRad: layer.kind === 'crystal' ? layer.tilt : 0,
      thicknessNm: layer.thickness,
      coherent: layer.coherent,
    }
  }

  private mediumOf(layer: Layer): Medium {
    switch (layer.kind) {
      case 'isotropic': {
        const index = this.indexOf(layer.index)
        return createMedium(index, index, index)
      }
      case 'retarder':
        return createMedium(...retarderIndices(layer, this.indexOf(layer.index), this.wavelengthsNm))
      case 'polarizer': {
        const { absorption, transmission } = polarizerIndices(layer, this.indexOf(layer.index), this.wavelengthsNm)
        return createMedium(absorption, transmission, transmission)
      }
      case 'crystal':
        return createMedium(
          ...(layer.indices.map((law) => this.indexOf(law)) as [IndexSpectrum, IndexSpectrum, IndexSpectrum]),
        )
    }
  }

  private panelEnd(panel: Panel): PanelEnd {
    const index = this.indexOf(panel.index)
    if (panel.kind === 'metal') return { kind: 'metal', medium: createMedium(index, index, index) }
    return {
      kind: 'mirror',
      index: index.n,
      reflectance: spectrumAt(panel.reflectance, this.wavelengthsNm),
      depolarized: spectrumAt(panel.depolarized, this.wavelengthsNm),
    }
  }

  /** Index over wavelength; the last few laws are kept, as most layers keep theirs while others change. */
  private indexOf(law: IndexLaw): IndexSpectrum {
    for (const known of this.laws) if (known.law === law) return known.index
    const index = indexAt(law, this.wavelengthsNm)
    if (this.laws.length >= LAWS_KEPT) this.laws.shift()
    this.laws.push({ law, index })
    return index
  }
}

const LAWS_KEPT = 64

function azimuthOf(layer: Layer): number {
  switch (layer.kind) {
    case 'isotropic':
      return 0
    case 'retarder':
      return layer.slow_axis
    case 'polarizer':
      return layer.absorption_axis
    case 'crystal':
      return layer.azimuth
  }
}

/** Whether two layers consist of the same medium (they may be turned, and some may differ in thickness). */
function sameMedium(a: Layer, b: Layer): boolean {
  if (a.kind !== b.kind) return false
  switch (a.kind) {
    case 'isotropic':
      return a.index === (b as typeof a).index
    case 'crystal':
      return (b as CrystalLayer).indices.every((law, axis) => law === a.indices[axis])
    case 'retarder':
      return RETARDER_FIELDS.every((field) => a[field] === (b as RetarderLayer)[field])
    case 'polarizer':
      return POLARIZER_FIELDS.every((field) => a[field] === (b as PolarizerLayer)[field])
  }
}

const RETARDER_FIELDS = ['index', 'thickness', 'retardance', 'nz', 'rth', 'dispersion'] as const
const POLARIZER_FIELDS = [
  'index',
  'thickness',
  'single_transmittance',
  'polarization_efficiency',
  'k1',
  'k2',
  'transmission_axis_transmittance',
  'absorption_axis_transmittance',
] as const
