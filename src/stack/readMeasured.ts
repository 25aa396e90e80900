import { type CsvTable, readCsvTable } from './csvTable.js'
import { InputError, type Problem } from './problem.js'

/** Reflectance spectra of a sample, one per direction; nm, rad, fractions. */
export interface MeasuredSpectrum {
  readonly theta: number
  readonly phi: number
  /** Ascending. */
  readonly wavelengthNm: readonly number[]
  readonly reflectance: readonly number[]
}

/**
 * Measured spectra from CSV: long form (`wavelength_nm,theta_deg,phi_deg,reflectance`), or wide, one column a direction, its
 * heading holding θ and φ in degrees (`45/90`, `R(45, 90)`).
 * @throws InputError telling the line
 */
export function readMeasured(text: string, file: string): MeasuredSpectrum[] {
  const table = readCsvTable(text)
  if ('rows' in table) {
    const readings = isLong(table) ? fromLong(table) : fromWide(table)
    const spectra = Array.isArray(readings) ? spectraOf(readings) : readings
    if (Array.isArray(spectra)) return spectra
    throw problemAt(file, text, spectra)
  }
  throw problemAt(file, text, table)
}

const LONG_HEADINGS = ['wavelength_nm', 'theta_deg', 'phi_deg', 'reflectance'] as const
const ALLOWED_HEADINGS = `columns ${LONG_HEADINGS.join(', ')}`

/** What is wrong, on a line counted from 1 (absent where the whole file is meant). */
type Fault = Pick<Problem, 'code' | 'message' | 'received' | 'allowed' | 'next'> & { readonly line?: number }

/** One reading with the line to be told where it is wrong: its row's, or for a direction the heading's. */
interface Reading {
  readonly line: number
  readonly directionLine: number
  readonly nm: number
  readonly thetaDeg: number
  readonly phiDeg: number
  readonly reflectance: number
}

/** A wide table may have as many columns, and name both angles in one heading. */
function isLong({ heading, rows }: CsvTable): boolean {
  if (heading === undefined) return rows[0].values.length === LONG_HEADINGS.length
  const names = (word: RegExp) => heading.some((cell) => word.test(cell))
  return heading.length === LONG_HEADINGS.length && names(/^theta\D*$/i) && names(/^phi\D*$/i)
}

function fromLong({ heading, firstLine, rows }: CsvTable): Reading[] | Fault {
  const words = ['wavelength', 'theta', 'phi', 'reflectance']
  const columns = words.map((word, k) => heading?.findIndex((cell) => cell.toLowerCase().startsWith(word)) ?? k)
  const absent = columns.indexOf(-1)
  if (absent >= 0) {
    const message = `the table has no column "${words[absent]}"`
    return { code: 'bad_table', line: firstLine, message, received: heading?.join(', '), allowed: ALLOWED_HEADINGS }
  }
  return rows.map(({ line, values }) => {
    const [nm, thetaDeg, phiDeg, reflectance] = columns.map((column) => values[column])
    return { line, directionLine: line, nm, thetaDeg, phiDeg, reflectance }
  })
}

function fromWide({ heading, firstLine, rows }: CsvTable): Reading[] | Fault {
  const directions = (heading ?? []).slice(1).map(directionIn)
  const known = directions.filter((direction) => direction !== undefined)
  if (known.length === 0 || known.length < directions.length) {
    const message = 'the columns do not tell from where the spectra were measured'
    const received = heading?.join(', ') ?? 'no headings'
    const allowed = `${ALLOWED_HEADINGS}; or one column a direction, headed by theta and phi such as 45/90`
    return { code: 'bad_table', line: firstLine, message, received, allowed }
  }
  return known.flatMap(([thetaDeg, phiDeg], k) =>
    rows.map(({ line, values: [nm, ...values] }) => ({
      line,
      directionLine: firstLine,
      nm,
      thetaDeg,
      phiDeg,
      reflectance: values[k],
    })),
  )
}

/** θ and φ in degrees from `45/90`, `R(45, -90)`, `theta 45 deg, phi 90 deg`. */
function directionIn(heading: string): readonly [number, number] | undefined {
  const match = /(\d+(?:\.\d+)?)\D+?(-?\d+(?:\.\d+)?)/.exec(heading)
  return match === null ? undefined : [Number(match[1]), Number(match[2])]
}

interface Limit {
  readonly what: string
  readonly allowed: string
  readonly isWithin: (value: number) => boolean
  readonly next?: string
}

const WAVELENGTH: Limit = {
  what: 'the wavelength',
  allowed: '200 to 2500 nm',
  isWithin: (nm) => nm >= 200 && nm <= 2500,
}
const THETA: Limit = { what: 'theta', allowed: '0 to below 90 degrees', isWithin: (deg) => deg >= 0 && deg < 90 }
const PHI: Limit = { what: 'phi', allowed: '-360 to 360 degrees', isWithin: (deg) => Math.abs(deg) <= 360 }
/** Noise may push a dark reading a little below nothing, a calibration a bright one above all. */
const REFLECTANCE: Limit = {
  what: 'the reflectance',
  allowed: 'a fraction from 0 to 1',
  isWithin: (share) => share >= -0.05 && share <= 1.5,
  next: 'write percent as 4.2 %, or with % in the heading of the column',
}

function limitFault({ line, directionLine, nm, thetaDeg, phiDeg, reflectance }: Reading): Fault | undefined {
  const checks: [Limit, number, number][] = [
    [WAVELENGTH, nm, line],
    [THETA, thetaDeg, directionLine],
    [PHI, phiDeg, directionLine],
    [REFLECTANCE, reflectance, line],
  ]
  const missed = checks.find(([limit, value]) => !limit.isWithin(value))
  if (missed === undefined) return undefined
  const [{ what, allowed, next }, value, at] = missed
  const message = `${what} is out of range`
  return { code: 'out_of_range', line: at, message, received: `${value}`, allowed, ...(next !== undefined && { next }) }
}

/** Directions in the order of their first reading. */
function spectraOf(readings: readonly Reading[]): MeasuredSpectrum[] | Fault {
  const groups = new Map<string, Map<number, Reading>>()
  for (const reading of readings) {
    const fault = limitFault(reading)
    if (fault !== undefined) return fault
    const { thetaDeg, phiDeg, nm } = reading
    const key = `${thetaDeg},${phiDeg}`
    const group = groups.get(key) ?? new Map<number, Reading>()
    groups.set(key, group)
    if (group.has(nm)) return twice(reading)
    group.set(nm, reading)
  }
  return [...groups.values()].map(spectrumOf)
}

function spectrumOf(group: ReadonlyMap<number, Reading>): MeasuredSpectrum {
  const sorted = [...group.values()].sort((a, b) => a.nm - b.nm)
  return {
    theta: radians(sorted[0].thetaDeg),
    phi: radians(sorted[0].phiDeg),
    wavelengthNm: sorted.map(({ nm }) => nm),
    reflectance: sorted.map(({ reflectance }) => reflectance),
  }
}

function twice({ line, nm, thetaDeg, phiDeg }: Reading): Fault {
  return {
    code: 'measured_twice',
    line,
    message: `${nm} nm is measured twice from theta ${thetaDeg}, phi ${phiDeg} degrees`,
    allowed: 'one reading of each wavelength and direction',
    next: 'average the readings, or leave one out',
  }
}

function radians(degrees: number): number {
  return (degrees * Math.PI) / 180
}

function problemAt(file: string, text: string, { line, ...fault }: Fault): InputError {
  const width = line === undefined ? 0 : (text.split('\n')[line - 1]?.length ?? 0)
  const range = line === undefined ? {} : { range: { line, column: 1, endLine: line, endColumn: width + 1 } }
  return new InputError([{ severity: 'error', path: '', file, ...fault, ...range }], new Map([[file, text]]))
}
