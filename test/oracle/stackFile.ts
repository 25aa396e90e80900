/** The plain form of a stack file that the oracle reads: what `test/check-values/` uses, checked by nobody. */

/** A number with its unit, or bare: nm, degrees or a fraction. */
export type Quantity = number | string
/** Linear between the wavelengths, constant outside. */
export type PlainSpectrum = Quantity | { readonly wavelength_nm: readonly number[]; readonly value: readonly number[] }
export type PlainIndex =
  | number
  | { readonly n: PlainSpectrum; readonly k?: PlainSpectrum }
  | { readonly cauchy_nm: readonly [number, number, number] }

interface PlainLayerBase {
  readonly id: string
  readonly thickness: Quantity
  readonly coherent?: boolean
}
interface PlainIsotropic extends PlainLayerBase {
  readonly kind: 'isotropic'
  readonly index: PlainIndex
}
export interface PlainRetarder extends PlainLayerBase {
  readonly kind: 'retarder'
  readonly index: PlainIndex
  readonly retardance: PlainSpectrum
  readonly slow_axis?: Quantity
  readonly nz?: number
  readonly rth?: Quantity
  readonly dispersion?: { readonly re450: number; readonly re650: number } | Exclude<PlainSpectrum, Quantity>
}
export interface PlainPolarizer extends PlainLayerBase {
  readonly kind: 'polarizer'
  readonly index: PlainIndex
  readonly absorption_axis: Quantity
  readonly single_transmittance?: PlainSpectrum
  readonly polarization_efficiency?: PlainSpectrum
  readonly k1?: PlainSpectrum
  readonly k2?: PlainSpectrum
  readonly transmission_axis_transmittance?: PlainSpectrum
  readonly absorption_axis_transmittance?: PlainSpectrum
}
interface PlainCrystal extends PlainLayerBase {
  readonly kind: 'crystal'
  readonly indices: readonly [PlainIndex, PlainIndex, PlainIndex]
  readonly azimuth?: Quantity
  readonly tilt?: Quantity
}
export type PlainLayer = PlainIsotropic | PlainRetarder | PlainPolarizer | PlainCrystal

export type PlainPanel =
  | {
      readonly kind: 'mirror'
      readonly index: PlainIndex
      readonly reflectance: PlainSpectrum
      readonly depolarized?: PlainSpectrum
    }
  | { readonly kind: 'metal'; readonly index: PlainIndex }

export interface PlainStack {
  readonly title: string
  readonly layers: readonly PlainLayer[]
  readonly panel: PlainPanel
}
