import { interpolateOnto } from '../numeric/interpolate.js'
import type { CauchyLaw, DispersionLaw, LorentzDrudeLaw, SellmeierLaw, TableLaw } from './publishedMaterial.js'

/** Refractive index n + ik over wavelength: two arrays as long as the wavelengths, k >= 0. */
export interface IndexArrays {
  readonly n: Float64Array
  readonly k: Float64Array
}

/** A published law at each wavelength. Formulas are continued outside their range, tables hold their end values. */
export function dispersionAt(law: DispersionLaw, wavelengthsNm: Float64Array): IndexArrays {
  switch (law.kind) {
    case 'table':
      return tableAt(law, wavelengthsNm)
    case 'sellmeier':
      return { n: wavelengthsNm.map((nm) => sellmeier(law, nm / 1000)), k: extinctionAt(law, wavelengthsNm) }
    case 'cauchy':
      return { n: wavelengthsNm.map((nm) => powerSum(law, nm / 1000)), k: extinctionAt(law, wavelengthsNm) }
    case 'lorentz-drude':
      return lorentzDrudeAt(law, wavelengthsNm)
  }
}

function tableAt({ rows }: TableLaw, wavelengthsNm: Float64Array): IndexArrays {
  const withK = rows.flatMap(([nm, , k]) => (k === null ? [] : [[nm, k] as const]))
  return {
    n: interpolateRows(
      rows.map(([nm, n]) => [nm, n]),
      wavelengthsNm,
    ),
    k: interpolateRows(withK, wavelengthsNm),
  }
}

function extinctionAt({ kRows }: SellmeierLaw | CauchyLaw, wavelengthsNm: Float64Array): Float64Array {
  return kRows === undefined ? new Float64Array(wavelengthsNm.length) : interpolateRows(kRows, wavelengthsNm)
}

function interpolateRows(rows: readonly (readonly [nm: number, value: number])[], at: Float64Array): Float64Array {
  return interpolateOnto(
    rows.map(([nm]) => nm),
    rows.map(([, value]) => value),
    at,
  )
}

function sellmeier({ constant, resonance, terms }: SellmeierLaw, um: number): number {
  const l2 = um * um
  const sum = terms.reduce((n2, [b, c]) => n2 + (b * l2) / (l2 - (resonance === 'um' ? c * c : c)), 1 + constant)
  return Math.sqrt(sum)
}

function powerSum({ terms }: CauchyLaw, um: number): number {
  return terms.reduce((n, [a, power]) => n + a * um ** power, 0)
}

/** h c / e in eV nm, from the exact constants of the SI (2019). */
const EV_NM = 1239.841984332

function lorentzDrudeAt(law: LorentzDrudeLaw, wavelengthsNm: Float64Array): IndexArrays {
  const n = new Float64Array(wavelengthsNm.length)
  const k = new Float64Array(wavelengthsNm.length)
  wavelengthsNm.forEach((nm, i) => {
    const [re, im] = permittivity(law, EV_NM / nm)
    const modulus = Math.hypot(re, im)
    n[i] = Math.sqrt((modulus + re) / 2)
    k[i] = Math.sqrt((modulus - re) / 2)
  })
  return { n, k }
}

/** ε at a photon energy, written out in real and imaginary part. */
function permittivity({ plasmaEv, drude: [f0, gamma0Ev], oscillators }: LorentzDrudeLaw, energyEv: number) {
  const plasma2 = plasmaEv ** 2
  const drude = (f0 * plasma2) / (energyEv ** 2 + gamma0Ev ** 2)
  let re = 1 - drude
  let im = (drude * gamma0Ev) / energyEv
  for (const [f, gammaEv, omegaEv] of oscillators) {
    const detuning = omegaEv ** 2 - energyEv ** 2
    const damping = energyEv * gammaEv
    const scale = (f * plasma2) / (detuning ** 2 + damping ** 2)
    re += detuning * scale
    im += damping * scale
  }
  return [re, im] as const
}
