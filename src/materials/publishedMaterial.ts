/** A published material as its file states it; wavelengths nm in tables, µm in formulas. */
export type PublishedMaterial = PublishedBase &
  (TableLaw | SellmeierLaw | SingleResonanceLaw | CauchyLaw | LorentzDrudeLaw)

interface PublishedBase {
  readonly material: string
  readonly range_nm: readonly number[]
  readonly source: string
  readonly via: string
  readonly note?: string
  /** Extinction beside a formula for n: rows of [nm, k], or one value. */
  readonly k_table?: readonly (readonly number[])[]
  readonly k_const?: number
}

interface TableLaw {
  readonly kind: 'table'
  /** [nm, n, k]; k may be missing where the source gives none. */
  readonly rows: readonly (readonly (number | null)[])[]
}

/** n² = 1 + A + Σ B L²/(L² - c), L in µm. */
interface SellmeierLaw {
  readonly kind: 'sellmeier'
  readonly A: number
  readonly C_is: string
  readonly terms: readonly (readonly number[])[]
}

/** n² = P + Q/(L² - R), L in µm. */
interface SingleResonanceLaw {
  readonly kind: 'sellmeier'
  readonly P: number
  readonly Q: number
  readonly R: number
}

/** n = Σ a L^p, L in µm; terms [a, p]. */
interface CauchyLaw {
  readonly kind: 'cauchy'
  readonly terms: readonly (readonly number[])[]
}

/** ε(E) = 1 - f0 ωp²/(E (E + i γ0)) + Σ f ωp²/(ω² - E² - i E γ), E in eV; n + ik = √ε. */
interface LorentzDrudeLaw {
  readonly kind: 'lorentz-drude'
  readonly omega_p_eV: number
  readonly f0: number
  readonly gamma0_eV: number
  readonly oscillators_f_gamma_omega_eV: readonly (readonly number[])[]
}
