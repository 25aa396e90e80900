import { interpolateLinear } from '../numeric/interpolate.js'
import { daylightSpectrum } from './daylight.js'
import { illuminantA } from './tables/illuminantA.js'
import { illuminantD50 } from './tables/illuminantD50.js'
import { illuminantD65 } from './tables/illuminantD65.js'
import { illuminantFL2 } from './tables/illuminantFL2.js'
import { illuminantFL11 } from './tables/illuminantFL11.js'
import { illuminantLEDB3 } from './tables/illuminantLEDB3.js'
import { illuminantLEDB5 } from './tables/illuminantLEDB5.js'

export type IlluminantName = 'D65' | 'D50' | 'A' | 'E' | 'FL2' | 'FL11' | 'LED-B3' | 'LED-B5'

/** Relative spectral power of a lamp, wavelengths ascending. */
export interface Lamp {
  readonly wavelength_nm: readonly number[]
  readonly value: readonly number[]
}

/** A standard illuminant, daylight of a correlated color temperature in K (4000 to 25000), or a lamp as a table. */
export type Illuminant = IlluminantName | { readonly cct: number } | Lamp

interface PowerTable {
  readonly fromNm: number
  readonly stepNm: number
  readonly power: readonly number[]
}

const TABLES: Readonly<Record<Exclude<IlluminantName, 'E'>, PowerTable>> = {
  D65: illuminantD65,
  D50: illuminantD50,
  A: illuminantA,
  FL2: illuminantFL2,
  FL11: illuminantFL11,
  'LED-B3': illuminantLEDB3,
  'LED-B5': illuminantLEDB5,
}

/**
 * Relative spectral power at the wavelengths, in the scale of the table (100 at 560 nm for the CIE ones but the lamps FL
 * and LED). Tables are interpolated linearly, as CIE 15 has it for illuminants, and held at their nearest value beyond their
 * ends (300 or 380, 780 or 830 nm), as it advises for missing data. Throws RangeError for daylight outside its locus.
 */
export function illuminantAt(illuminant: Illuminant, wavelengthsNm: Float64Array): Float64Array {
  if (illuminant === 'E') return new Float64Array(wavelengthsNm.length).fill(100)
  if (typeof illuminant === 'string') return tableAt(TABLES[illuminant], wavelengthsNm)
  if ('cct' in illuminant) return daylightSpectrum(illuminant.cct, wavelengthsNm)
  const { wavelength_nm, value } = illuminant
  return wavelengthsNm.map((nm) => interpolateLinear(wavelength_nm, value, nm))
}

function tableAt({ fromNm, stepNm, power }: PowerTable, wavelengthsNm: Float64Array): Float64Array {
  const table = Float64Array.from({ length: power.length }, (_, k) => fromNm + k * stepNm)
  return wavelengthsNm.map((nm) => interpolateLinear(table, power, nm))
}
