/** Linear between the wavelengths (nm, ascending), constant outside. */
export interface SpectrumTable {
  readonly wavelength_nm: readonly number[]
  readonly value: readonly number[]
}
export type Spectrum = number | SpectrumTable

/** Refractive index n + ik, k >= 0. A formula is compiled by `formula.ts` before it is used. */
export type IndexLaw =
  | number
  | { readonly n: Spectrum; readonly k: Spectrum }
  | { readonly cauchy_nm: readonly [number, number, number] }
  | { readonly material: string }
  | { readonly formula: string }
