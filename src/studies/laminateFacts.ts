/** What a laminate is made of, as plain figures at the wavelength the trade quotes them at (550 nm). */
import { meanIndexOf } from '../appearance/meanIndex.js'
import { indexAt } from '../materials/indexAt.js'
import type { IndexLaw } from '../materials/indexLaw.js'
import { findMaterial } from '../materials/material.js'
import { spectrumAt } from '../materials/spectrumAt.js'
import { REFERENCE_NM, retardanceAt550, rthAt550 } from '../stack/retardanceAt550.js'
import type { Layer, Panel, PolarizerLayer, Spectrum, Stack } from '../stack/stack.js'
import { degrees } from './evaluate.js'

/** nm, degrees, fractions; spectral figures at 550 nm. */
export interface LayerFacts {
  readonly id: string
  readonly kind: Layer['kind']
  readonly thickness_nm: number
  readonly coherent: boolean
  /** Mean of the three axes. */
  readonly index: number
  /** Slow axis, absorption axis, or the first axis of a crystal: [0, 180). */
  readonly axis_deg?: number
  readonly tilt_deg?: number
  readonly re_nm?: number
  readonly rth_nm?: number
  /** As the file describes the polarizer: in air Ts and P, or K1 and K2; inside it T1 and T2. */
  readonly transmittances?: Readonly<Record<string, number>>
  readonly film?: string
}

export interface PanelFacts {
  readonly kind: Panel['kind']
  readonly index: number
  readonly extinction: number
  readonly reflectance?: number
  readonly depolarized?: number
}

export interface MaterialFacts {
  readonly name: string
  readonly title: string
  readonly source: string
  readonly via: string
  readonly range_nm: readonly [number, number]
}

export interface LaminateFacts {
  readonly wavelength_nm: number
  /** From the viewer's side. */
  readonly layers: readonly LayerFacts[]
  readonly panel: PanelFacts
  /** Published materials the file names, each once. */
  readonly materials: readonly MaterialFacts[]
}

const AT = Float64Array.of(REFERENCE_NM)

export function laminateFacts({ layers, panel }: Stack): LaminateFacts {
  const laws = [...layers.flatMap((layer) => (layer.kind === 'crystal' ? layer.indices : [layer.index])), panel.index]
  return {
    wavelength_nm: REFERENCE_NM,
    layers: layers.map(layerFacts),
    panel: panelFacts(panel),
    materials: materialsOf(laws),
  }
}

function layerFacts(layer: Layer): LayerFacts {
  return {
    id: layer.id,
    kind: layer.kind,
    thickness_nm: layer.thickness,
    coherent: layer.coherent,
    index: meanIndexOf(layer, AT)[0],
    ...kindFacts(layer),
    ...(layer.film !== undefined && { film: layer.film }),
  }
}

function kindFacts(layer: Layer): Partial<LayerFacts> {
  if (layer.kind === 'isotropic') return {}
  if (layer.kind === 'polarizer')
    return { axis_deg: axis(layer.absorption_axis), transmittances: transmittances(layer) }
  if (layer.kind === 'crystal') return { axis_deg: axis(layer.azimuth), tilt_deg: degrees(layer.tilt) }
  const re_nm = retardanceAt550(layer)
  // A film without in-plane retardance has no slow axis to show.
  return { ...(re_nm !== 0 && { axis_deg: axis(layer.slow_axis) }), re_nm, rth_nm: rthAt550(layer) }
}

const TRANSMITTANCES = [
  'single_transmittance',
  'polarization_efficiency',
  'k1',
  'k2',
  'transmission_axis_transmittance',
  'absorption_axis_transmittance',
] as const

function transmittances(layer: PolarizerLayer): Record<string, number> {
  const given = TRANSMITTANCES.filter((name) => layer[name] !== undefined)
  return Object.fromEntries(given.map((name) => [name, at550(layer[name] ?? 0)]))
}

function panelFacts(panel: Panel): PanelFacts {
  const { n, k } = indexAt(panel.index, AT)
  return {
    kind: panel.kind,
    index: n[0],
    extinction: k[0],
    ...(panel.kind === 'mirror' && {
      reflectance: at550(panel.reflectance),
      depolarized: at550(panel.depolarized),
    }),
  }
}

function materialsOf(laws: readonly IndexLaw[]): MaterialFacts[] {
  const names = laws.flatMap((law) => (typeof law === 'object' && 'material' in law ? [law.material] : []))
  return [...new Set(names)].flatMap((name) => {
    const found = findMaterial(name)
    return found === undefined
      ? []
      : [{ name, title: found.title, source: found.source, via: found.via, range_nm: found.rangeNm }]
  })
}

function at550(spectrum: Spectrum): number {
  return spectrumAt(spectrum, AT)[0]
}

function axis(rad: number): number {
  return ((degrees(rad) % 180) + 180) % 180
}
