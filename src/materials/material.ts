import { interpolateLinear } from '../numeric/interpolate.js'
import type { PublishedMaterial } from './publishedMaterial.js'
import { PUBLISHED } from './publishedTables.js'

export interface Material {
  readonly name: string
  readonly title: string
  readonly source: string
  readonly via: string
  readonly note?: string
  /** Where the published figures hold, nm. */
  readonly rangeNm: readonly [number, number]
}

export const MATERIAL_NAMES: readonly string[] = Object.keys(PUBLISHED)

export function findMaterial(name: string): Material | undefined {
  if (!Object.hasOwn(PUBLISHED, name)) return undefined
  const { material, source, via, note, range_nm } = PUBLISHED[name]
  return {
    name,
    title: material,
    source,
    via,
    rangeNm: [range_nm[0], range_nm[1]],
    ...(note !== undefined && { note }),
  }
}

/** n and k of a published material over wavelength; tables are linear between their rows and constant outside. */
export function materialIndexAt(name: string, wavelengthsNm: Float64Array): { n: Float64Array; k: Float64Array } {
  const material = PUBLISHED[name]
  const n = new Float64Array(wavelengthsNm.length)
  const k = new Float64Array(wavelengthsNm.length)
  wavelengthsNm.forEach((nm, i) => {
    const index = indexOf(material, nm)
    n[i] = index.n
    k[i] = index.k
  })
  return { n, k }
}

function indexOf(material: PublishedMaterial, nm: number): { n: number; k: number } {
  switch (material.kind) {
    case 'table':
      return { n: columnAt(material.rows, 1, nm), k: columnAt(material.rows, 2, nm) }
    case 'sellmeier':
      return {
        n: Math.sqrt('P' in material ? singleResonance(material, nm) : sellmeier(material, nm)),
        k: extinction(material, nm),
      }
    case 'cauchy':
      return { n: powerSum(material.terms, nm), k: extinction(material, nm) }
    case 'lorentz-drude':
      return lorentzDrude(material, nm)
  }
}

/** Column of a table; rows without a value there are passed over. */
function columnAt(rows: readonly (readonly (number | null)[])[], column: number, nm: number): number {
  const known = rows.filter((row) => typeof row[column] === 'number')
  return interpolateLinear(
    known.map((row) => Number(row[0])),
    known.map((row) => Number(row[column])),
    nm,
  )
}

function extinction({ k_table, k_const }: PublishedMaterial, nm: number): number {
  if (k_table !== undefined) return columnAt(k_table, 1, nm)
  return k_const ?? 0
}

function sellmeier(law: { A: number; C_is: string; terms: readonly (readonly number[])[] }, nm: number): number {
  const l2 = (nm / 1000) ** 2
  let sum = 1 + law.A
  for (const [b, c] of law.terms) sum += (b * l2) / (l2 - (law.C_is === 'lambda0_um' ? c * c : c))
  return sum
}

function singleResonance({ P, Q, R }: { P: number; Q: number; R: number }, nm: number): number {
  return P + Q / ((nm / 1000) ** 2 - R)
}

function powerSum(terms: readonly (readonly number[])[], nm: number): number {
  return terms.reduce((sum, [a, power]) => sum + a * (nm / 1000) ** power, 0)
}

/** h c / e in eV nm (exact constants of the SI, 2019). */
const EV_NM = 1239.841984332

function lorentzDrude(
  law: Extract<PublishedMaterial, { kind: 'lorentz-drude' }>,
  nm: number,
): { n: number; k: number } {
  const energy = EV_NM / nm
  const wp2 = law.omega_p_eV ** 2
  const drude = energy * energy + law.gamma0_eV ** 2
  let re = 1 - (law.f0 * wp2) / drude
  let im = (law.f0 * wp2 * law.gamma0_eV) / (energy * drude)
  for (const [f, gamma, omega] of law.oscillators_f_gamma_omega_eV) {
    const a = omega * omega - energy * energy
    const b = energy * gamma
    const scale = (f * wp2) / (a * a + b * b)
    re += a * scale
    im += b * scale
  }
  const modulus = Math.hypot(re, im)
  return { n: Math.sqrt((modulus + re) / 2), k: Math.sqrt((modulus - re) / 2) }
}
