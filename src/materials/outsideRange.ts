import type { IndexLaw, Spectrum } from './indexLaw.js'
import { findMaterial } from './material.js'

/** Instruments put the first and last row of a table at broken wavelengths (380.5 nm): so near an end nothing is lost, nm. */
const ALLOWANCE_NM = 1

/**
 * The sentence of the warning that a calculation from `fromNm` to `toNm` leaves the wavelengths where an index is known;
 * undefined where it does not. Plain numbers and the user's own formulas hold everywhere.
 */
export function outsideRange(law: IndexLaw, fromNm: number, toNm: number): string | undefined {
  if (typeof law === 'number') return undefined
  if ('material' in law) return outsideMaterial(law.material, fromNm, toNm)
  if (!('n' in law)) return undefined
  return outsideTable('n', law.n, fromNm, toNm) ?? outsideTable('k', law.k, fromNm, toNm)
}

function outsideMaterial(name: string, fromNm: number, toNm: number): string | undefined {
  const material = findMaterial(name)
  if (material === undefined) return undefined
  const parts = partsOutside(material.rangeNm, fromNm, toNm)
  if (parts === undefined) return undefined
  const what = material.outside === 'end values held' ? 'its end values are held' : 'its formula is continued'
  return `"${name}" is published for ${between(material.rangeNm)}; ${parts} ${what}`
}

function outsideTable(what: string, spectrum: Spectrum, fromNm: number, toNm: number): string | undefined {
  if (typeof spectrum === 'number') return undefined
  const rangeNm = [spectrum.wavelength_nm[0], spectrum.wavelength_nm[spectrum.wavelength_nm.length - 1]] as const
  const parts = partsOutside(rangeNm, fromNm, toNm)
  return parts && `the table of ${what} covers ${between(rangeNm)}; ${parts} its end values are held`
}

function partsOutside([low, high]: readonly [number, number], fromNm: number, toNm: number): string | undefined {
  const below = fromNm < low - ALLOWANCE_NM && `from ${fromNm} to ${Math.min(low, toNm)} nm`
  const above = toNm > high + ALLOWANCE_NM && `from ${Math.max(high, fromNm)} to ${toNm} nm`
  const parts = [below, above].filter((part) => part !== false)
  return parts.length === 0 ? undefined : parts.join(' and ')
}

function between([low, high]: readonly [number, number]): string {
  return `${low} to ${high} nm`
}
