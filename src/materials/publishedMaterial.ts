/** A published material: where its figures come from, where they hold, and the law that gives n + ik over wavelength. */
export type PublishedMaterial = Provenance & DispersionLaw

export interface Provenance {
  readonly title: string
  readonly source: string
  /** Who gathered the figures, and on what terms. */
  readonly via: string
  readonly note?: string
  /** Where both n and k hold, nm. */
  readonly rangeNm: readonly [from: number, to: number]
}

export type DispersionLaw = TableLaw | SellmeierLaw | CauchyLaw | LorentzDrudeLaw

/** Linear between the rows, constant outside. k is null where the source gives none: the nearest value given is held. */
export interface TableLaw {
  readonly kind: 'table'
  readonly rows: readonly (readonly [nm: number, n: number, k: number | null])[]
}

/** n² = 1 + constant + Σ b L²/(L² - c), L in µm; c is the square of a resonance, or the resonance itself where `resonance` says 'um'. */
export interface SellmeierLaw extends Extinction {
  readonly kind: 'sellmeier'
  readonly constant: number
  readonly resonance: 'um' | 'um2'
  readonly terms: readonly (readonly [b: number, c: number])[]
}

/** n = Σ a L^power, L in µm. */
export interface CauchyLaw extends Extinction {
  readonly kind: 'cauchy'
  readonly terms: readonly (readonly [a: number, power: number])[]
}

interface Extinction {
  /** k beside a formula for n, linear between the rows and constant outside; transparent where absent. */
  readonly kRows?: readonly (readonly [nm: number, k: number])[]
}

/**
 * ε(E) = 1 - f₀ωp²/(E(E + iγ₀)) + Σ fωp²/(ω² - E² - iEγ), all energies in eV; n + ik = √ε. Equations 1 to 5 of
 * A. D. Rakic et al., Appl. Opt. 37, 5271-5283 (1998), in the sign convention of k ≥ 0.
 */
export interface LorentzDrudeLaw {
  readonly kind: 'lorentz-drude'
  readonly plasmaEv: number
  readonly drude: readonly [f0: number, gamma0Ev: number]
  readonly oscillators: readonly (readonly [f: number, gammaEv: number, omegaEv: number])[]
}
