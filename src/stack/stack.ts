import type { Illuminant, IlluminantName } from '../color/illuminant.js'
import type { IndexLaw, Spectrum, SpectrumTable } from '../materials/indexLaw.js'

export type { Illuminant, IlluminantName, IndexLaw, Spectrum, SpectrumTable }

/**
 * A checked stack file. Field names are those of the file (so that a parameter path is a path into this object);
 * every length is in nm, every angle in radians, every share a fraction. Plain data: it can be cloned, sent to a
 * worker and compared. A changed stack shares the objects that did not change with the one it came from
 * (`setParameters`), so identity of a layer object tells "nothing in this layer changed".
 */
export interface Stack {
  readonly format: 1
  readonly title: string
  readonly notes?: string
  readonly conditions: Conditions
  /** From the viewer's side to the panel. */
  readonly layers: readonly Layer[]
  readonly panel: Panel
  readonly emission: Emission
  /** Illuminances for the ambient contrast, lx. */
  readonly ambient: readonly number[]
  readonly limits: readonly Limit[]
  readonly optimize?: OptimizeQuestion
  readonly tolerance?: ToleranceQuestion
  readonly compare?: CompareQuestion
  readonly fit?: FitQuestion
}

export interface Conditions {
  readonly wavelengths: { readonly from: number; readonly to: number; readonly step: number }
  readonly observer: 2 | 10
  readonly illuminant: Illuminant
  /** Where the eye stands. At least one. */
  readonly directions: readonly Direction[]
  /** Weights of X/Xn, Y/Yn, Z/Zn in the color-weighted reflectance; not all zero. */
  readonly color_weights: readonly [number, number, number]
}

export interface Direction {
  readonly theta: number
  readonly phi: number
}

/** Two trade ratios Re(450)/Re(550) and Re(650)/Re(550), or a measured table in any scale (divided by its value at 550 nm). */
export type Dispersion = { readonly re450: number; readonly re650: number } | SpectrumTable

interface LayerBase {
  readonly id: string
  readonly thickness: number
  /** Film card it was made from, as the stack file names it. */
  readonly film?: string
  /** Joined by amplitudes (true) or by intensities (false). Fixed when the file is read: thickness < 5 um unless given. */
  readonly coherent: boolean
}

export interface IsotropicLayer extends LayerBase {
  readonly kind: 'isotropic'
  readonly index: IndexLaw
}

export interface RetarderLayer extends LayerBase {
  readonly kind: 'retarder'
  readonly index: IndexLaw
  readonly slow_axis: number
  /** (nx - ny) d at 550 nm. A table in a file is kept as this one number and a dispersion. */
  readonly retardance: Spectrum
  /** Exactly one of nz and rth is present. */
  readonly nz?: number
  readonly rth?: number
  readonly dispersion?: Dispersion
}

export interface PolarizerLayer extends LayerBase {
  readonly kind: 'polarizer'
  readonly index: IndexLaw
  readonly absorption_axis: number
  /** One pair of the three is present: in air (Ts, P), in air (K1, K2), or internal (T1, T2). */
  readonly single_transmittance?: Spectrum
  readonly polarization_efficiency?: Spectrum
  readonly k1?: Spectrum
  readonly k2?: Spectrum
  readonly transmission_axis_transmittance?: Spectrum
  readonly absorption_axis_transmittance?: Spectrum
}

export interface CrystalLayer extends LayerBase {
  readonly kind: 'crystal'
  readonly indices: readonly [IndexLaw, IndexLaw, IndexLaw]
  readonly azimuth: number
  readonly tilt: number
}

export type Layer = IsotropicLayer | RetarderLayer | PolarizerLayer | CrystalLayer

export interface MirrorPanel {
  readonly kind: 'mirror'
  /** Lossless immersion index. */
  readonly index: IndexLaw
  readonly reflectance: Spectrum
  readonly depolarized: Spectrum
}

export interface MetalPanel {
  readonly kind: 'metal'
  readonly index: IndexLaw
}

export type Panel = MirrorPanel | MetalPanel

export interface Emission {
  /** cd/m2 at the eye, on axis (0: not stated, no contrast is computed). */
  readonly luminance: number
  /** cd/m2 at the eye of the screen switched off, in the dark. */
  readonly dark_luminance: number
  readonly spectrum: Illuminant
  /** Unpolarized, or a given state: axis of the ellipse, ellipticity angle, degree of polarization. */
  readonly polarization: 'none' | { readonly axis: number; readonly ellipticity: number; readonly degree: number }
}

export const METRIC_NAMES = [
  'luminous_reflectance',
  'color_weighted_reflectance',
  'front_reflectance',
  'inner_reflectance',
  'lightness',
  'a_star',
  'b_star',
  'chroma',
  'emission_transmittance',
  'ambient_contrast',
] as const
export type MetricName = (typeof METRIC_NAMES)[number]

/** A metric seen from a direction; `illuminance` (lx) belongs to ambient_contrast alone. */
export interface MetricRequest extends Direction {
  readonly metric: MetricName
  readonly illuminance?: number
}

export interface Limit extends MetricRequest {
  readonly max?: number
  readonly min?: number
}

/** Bounds, or the values on offer. */
export type Range = { readonly from: number; readonly to: number } | { readonly values: readonly number[] }

export interface OptimizeQuestion {
  readonly vary: Readonly<Record<string, Range>>
  readonly minimize: Objective
  readonly subject_to: readonly Limit[]
}

export interface Objective {
  readonly metric: MetricName
  readonly illuminance?: number
  /** Sign of the search: `maximize` in the file becomes -1. */
  readonly sense: 1 | -1
  readonly views: readonly (Direction & { readonly weight: number })[]
  /** Robust design: this quantile of the objective under the stack's tolerances. */
  readonly quantile?: number
}

export type Spread =
  | { readonly normal: number; readonly limit?: number }
  | { readonly uniform: number }
  /** Half-width of a triangle about the file's value. */
  | { readonly triangular: number }
  /** Measured: offsets from the file's value with their relative frequency, linear between. */
  | { readonly offset: readonly number[]; readonly density: readonly number[] }

export interface ToleranceQuestion {
  readonly samples: number
  readonly seed: number
  readonly sampling: 'random' | 'latin_hypercube' | 'sobol'
  readonly vary: Readonly<Record<string, Spread>>
  /** Groups that share one draw (films from one roll): every path moves by the same quantile of its own spread. */
  readonly together: readonly (readonly string[])[]
}

export interface CompareQuestion {
  /** Layer id to film cards, read and checked; `file` as written in the stack file. */
  readonly slots: Readonly<Record<string, readonly FilmCard[]>>
  readonly optimize: boolean
}

export interface FilmCard {
  readonly name: string
  readonly file: string
  readonly price_per_m2?: number
  /** The layer's fields, checked for its kind; id, angle and coherent come from the slot. */
  readonly layer: Layer
}

export interface FitQuestion {
  readonly vary: Readonly<Record<string, Range>>
  /** Standard deviation of one measured reflectance, if known. */
  readonly noise?: number
}
