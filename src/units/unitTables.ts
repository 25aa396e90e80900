export type QuantityKind = 'length' | 'angle' | 'share' | 'number' | 'illuminance' | 'luminance' | 'temperature'

/** Reads a decimal number as nm, radians, fraction, …. */
type Reading = (decimal: string) => number

interface UnitTable {
  /** Meaning of a bare number. */
  readonly bare: string
  readonly units: Readonly<Record<string, Reading>>
}

/** Moves the decimal point of the text, so that the result is rounded once: 1.2e-3 mm is exactly 1200 nm. */
export const timesTenTo =
  (power: number): Reading =>
  (decimal) => {
    const [digits, exponent = '0'] = decimal.toLowerCase().split('e')
    return Number(`${digits}e${Number(exponent) + power}`)
  }

/** Value first, then π/180, so that 45 deg is exactly 45 π / 180. */
export function degreesToRad(degrees: number): number {
  return (degrees * Math.PI) / 180
}

const one = timesTenTo(0)
const thousand = timesTenTo(3)
const degrees: Reading = (decimal) => degreesToRad(Number(decimal))

/** The units of each kind. Both signs for micro occur: U+00B5, the micro sign, and U+03BC, the Greek letter. */
export const UNIT_TABLES: Readonly<Record<QuantityKind, UnitTable>> = {
  length: { bare: 'nm', units: { nm: one, um: thousand, '\u00b5m': thousand, '\u03bcm': thousand, mm: timesTenTo(6) } },
  angle: { bare: 'deg', units: { deg: degrees, '°': degrees, rad: one } },
  share: { bare: '', units: { '': one, '%': timesTenTo(-2) } },
  number: { bare: '', units: { '': one } },
  illuminance: { bare: 'lx', units: { lx: one, klx: thousand } },
  luminance: { bare: 'cd/m2', units: { 'cd/m2': one, 'cd/m²': one } },
  temperature: { bare: 'K', units: { K: one } },
}

/** Units that people write out or spell otherwise, in lower case. */
export const OTHER_SPELLINGS: Readonly<Record<string, string>> = {
  nanometer: 'nm',
  nanometers: 'nm',
  micron: 'um',
  microns: 'um',
  micrometer: 'um',
  micrometers: 'um',
  mcm: 'um',
  degree: 'deg',
  degrees: 'deg',
  radian: 'rad',
  radians: 'rad',
  percent: '%',
  pct: '%',
  lux: 'lx',
  nit: 'cd/m2',
  nits: 'cd/m2',
  'cd/m^2': 'cd/m2',
  kelvin: 'K',
  '°k': 'K',
}
