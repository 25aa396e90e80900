/** Linear between the wavelengths (nm, ascending), constant outside. */
export interface SpectrumTable {
  readonly wavelength_nm: readonly number[]
  readonly value: readonly number[]
}
/** One value at all wavelengths, or a table. */
export type Spectrum = number | SpectrumTable

/**
 * Refractive index n + ik, k >= 0, in the forms of the stack file; only {n, k} and a published material absorb. A table of
 * n and k from a file has become {n, k} when the file was read. A formula is compiled by `prepareFormula` before it is used.
 */
export type IndexLaw =
  | number
  | { readonly n: Spectrum; readonly k: Spectrum }
  /** n = A + B/λ² + C/λ⁴, λ in nm. */
  | { readonly cauchy_nm: readonly [number, number, number] }
  /** One of `MATERIAL_NAMES`. */
  | { readonly material: string }
  /** n as an expression in wavelength_nm or wavelength_um. */
  | { readonly formula: string }
