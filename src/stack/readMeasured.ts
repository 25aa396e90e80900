import { type CsvTable, readCsvTable } from './csvTable.js'
import { InputError, type Problem } from './problem.js'

/** Reflectance spectra of a sample, one per direction; nm, rad, fractions. */
export interface MeasuredSpectrum {
  readonly theta: number
  readonly phi: number
  readonly wavelengthNm: readonly number[]
  readonly reflectance: readonly number[]
}

const LONG_HEADINGS = ['wavelength_nm', 'theta_deg', 'phi_deg', 'reflectance'] as const

/** Readings a sample can have: noise may push a dark one a little below nothing. */
const SANE: readonly [number, number] = [-0.05, 1.5]

/**
 * Measured spectra from CSV: long form (`wavelength_nm,theta_deg,phi_deg,reflectance`), or wide, one column a direction, its
 * heading holding θ and φ in degrees (`45/90`, `R(45, 90)`).
 * @throws InputError telling the line
 */
export function readMeasured(text: string, file: string): MeasuredSpectrum[] {
  const table = readCsvTable(text)
  if (!('rows' in table)) {
    const { line, ...fault } = table
    throw problemAt(file, text, fault, line)
  }
  const spectra = isLong(table) ? fromLong(table, file, text) : fromWide(table, file, text)
  return spectra.map(sorted)
}

function isLong({ heading, rows }: CsvTable): boolean {
  if (heading === undefined) return rows[0].values.length === 4
  return (
    heading.some((name) => /theta/i.test(name)) && heading.some((name) => /phi/i.test(name)) && heading.length === 4
  )
}

function fromLong({ heading, rows }: CsvTable, file: string, text: string): MeasuredSpectrum[] {
  const column = (name: string, place: number) => {
    const found = heading?.findIndex((cell) => cell.toLowerCase().startsWith(name)) ?? place
    if (found >= 0) return found
    const message = `the table has no column "${name}"`
    const allowed = `columns ${LONG_HEADINGS.join(', ')}`
    throw problemAt(file, text, { code: 'bad_table', message, received: heading?.join(', '), allowed }, 1)
  }
  const [wavelength, theta, phi, reflectance] = ['wavelength', 'theta', 'phi', 'reflectance'].map(column)
  const groups = new Map<string, { theta: number; phi: number; wavelengthNm: number[]; reflectance: number[] }>()
  for (const { line, values } of rows) {
    checkReading(file, text, line, values[wavelength], values[theta], values[reflectance])
    const key = `${values[theta]},${values[phi]}`
    let group = groups.get(key)
    if (group === undefined) {
      group = { theta: radians(values[theta]), phi: radians(values[phi]), wavelengthNm: [], reflectance: [] }
      groups.set(key, group)
    }
    group.wavelengthNm.push(values[wavelength])
    group.reflectance.push(values[reflectance])
  }
  return [...groups.values()]
}

function fromWide({ heading, rows }: CsvTable, file: string, text: string): MeasuredSpectrum[] {
  const directions = (heading ?? [])
    .slice(1)
    .map((cell) => /(\d+(?:\.\d+)?)\D+?(-?\d+(?:\.\d+)?)/.exec(cell.replace(/%/g, '')))
  if (directions.length === 0 || directions.includes(null)) {
    const message = 'the columns do not tell from where the spectra were measured'
    const allowed = `columns ${LONG_HEADINGS.join(', ')}; or one column a direction, headed by theta and phi such as 45/90`
    throw problemAt(
      file,
      text,
      { code: 'bad_table', message, received: heading?.join(', ') ?? 'no headings', allowed },
      1,
    )
  }
  for (const { line, values } of rows) {
    directions.forEach((direction, k) => {
      checkReading(file, text, line, values[0], Number(direction?.[1]), values[k + 1])
    })
  }
  return directions.map((direction, k) => ({
    theta: radians(Number(direction?.[1])),
    phi: radians(Number(direction?.[2])),
    wavelengthNm: rows.map(({ values }) => values[0]),
    reflectance: rows.map(({ values }) => values[k + 1]),
  }))
}

function checkReading(
  file: string,
  text: string,
  line: number,
  nm: number,
  thetaDeg: number,
  reflectance: number,
): void {
  if (!(nm >= 200 && nm <= 2500)) {
    throw problemAt(
      file,
      text,
      { code: 'out_of_range', message: 'the wavelength is out of range', received: `${nm}`, allowed: '200 to 2500 nm' },
      line,
    )
  }
  if (!(thetaDeg >= 0 && thetaDeg < 90)) {
    throw problemAt(
      file,
      text,
      {
        code: 'out_of_range',
        message: 'theta is out of range',
        received: `${thetaDeg}`,
        allowed: '0 to below 90 degrees',
      },
      line,
    )
  }
  if (!(reflectance >= SANE[0] && reflectance <= SANE[1])) {
    const next = 'write percent as 4.2 %, or with % in the heading of the column'
    throw problemAt(
      file,
      text,
      {
        code: 'out_of_range',
        message: 'the reflectance is out of range',
        received: `${reflectance}`,
        allowed: 'a fraction from 0 to 1',
        next,
      },
      line,
    )
  }
}

function sorted({ wavelengthNm, reflectance, ...direction }: MeasuredSpectrum): MeasuredSpectrum {
  const order = wavelengthNm.map((_, k) => k).sort((a, b) => wavelengthNm[a] - wavelengthNm[b])
  return {
    ...direction,
    wavelengthNm: order.map((k) => wavelengthNm[k]),
    reflectance: order.map((k) => reflectance[k]),
  }
}

function radians(degrees: number): number {
  return (degrees * Math.PI) / 180
}

function problemAt(
  file: string,
  text: string,
  fault: Pick<Problem, 'code' | 'message' | 'received' | 'allowed' | 'next'>,
  line?: number,
): InputError {
  const width = line === undefined ? 0 : (text.split('\n')[line - 1]?.length ?? 0)
  const range = line === undefined ? {} : { range: { line, column: 1, endLine: line, endColumn: width + 1 } }
  return new InputError([{ severity: 'error', path: '', file, ...fault, ...range }], new Map([[file, text]]))
}
