/** Spectra kept in CSV files beside the stack file. */
import type { SpectrumTable } from '../materials/indexLaw.js'
import { type CsvFault, type CsvTable, readCsvTable } from './csvTable.js'
import type { Fault } from './fault.js'
import { nearestName } from './nearestName.js'
import type { Problem } from './problem.js'
import type { StackFiles } from './stackFiles.js'

/** Points of one spectrum at most. */
export const MOST_POINTS = 20_000

/** In a heading; not the letters within a word such as spectrum. */
const MICROMETERS = /(?<![a-z])(um|µm|μm)(?![a-z])/i

/** A file that cannot be used, with the line in it where one is to blame. */
export interface TableFault extends Fault {
  readonly inFile?: Pick<Problem, 'file' | 'range'>
}

export type TableResult<T> = { readonly table: T } | { readonly fault: TableFault }

/** Reads each CSV file once, however often the stack names it. */
export class TableFiles {
  private readonly read = new Map<string, TableResult<CsvTable>>()
  /** Texts of the files with faults, by the name shown. */
  readonly texts = new Map<string, string>()

  constructor(
    private readonly files: StackFiles,
    /** How a file is named to the user. */
    private readonly shown: (path: string) => string,
  ) {}

  /** Two columns: wavelength and value. */
  spectrum(path: string): TableResult<SpectrumTable> {
    const columns = this.columns(path, 2, 'two columns, wavelength and value')
    if ('fault' in columns) return columns
    const [wavelength_nm, value] = columns.table
    return { table: { wavelength_nm, value } }
  }

  /** Two or three columns: wavelength, n, and k where the medium absorbs. */
  index(path: string): TableResult<{ n: SpectrumTable; k: SpectrumTable | 0 }> {
    const columns = this.columns(path, 3, 'two or three columns, wavelength, n and k')
    if ('fault' in columns) return columns
    const [wavelength_nm, n, k] = columns.table
    return { table: { n: { wavelength_nm, value: n }, k: k === undefined ? 0 : { wavelength_nm, value: k } } }
  }

  private columns(path: string, most: number, allowed: string): TableResult<number[][]> {
    const result = this.table(path)
    if ('fault' in result) return result
    const { heading, rows } = result.table
    const width = rows[0].values.length
    const reject = (fault: Fault, line: number) => ({ fault: this.placed(path, fault, line) })
    if (width < 2 || width > most) {
      return reject(
        { code: 'bad_table', message: 'wrong number of columns', received: `${width}`, allowed },
        rows[0].line,
      )
    }
    if (rows.length > MOST_POINTS) {
      const received = `${rows.length} rows`
      return reject(
        { code: 'too_large', message: 'too many points', received, allowed: `${MOST_POINTS}` },
        rows[0].line,
      )
    }
    const scale = MICROMETERS.test(heading?.[0] ?? '') ? 1000 : 1
    const sorted = [...rows].sort((a, b) => a.values[0] - b.values[0])
    for (let i = 0; i < sorted.length; i++) {
      const fault = wavelengthFault(sorted[i].values[0] * scale, i > 0 ? sorted[i - 1].values[0] * scale : 0)
      if (fault !== undefined) return reject(fault, sorted[i].line)
    }
    const columns = sorted[0].values.map((_, c) => sorted.map(({ values }) => values[c] * (c === 0 ? scale : 1)))
    return { table: columns }
  }

  private table(path: string): TableResult<CsvTable> {
    let result = this.read.get(path)
    if (result === undefined) {
      result = this.load(path)
      this.read.set(path, result)
    }
    return result
  }

  private load(path: string): TableResult<CsvTable> {
    const text = this.files.read(path)
    if (text === undefined) return { fault: missingFile(path, this.files) }
    const table = readCsvTable(text)
    if ('rows' in table) return { table }
    const { line, ...fault } = table satisfies CsvFault
    this.texts.set(this.shown(path), text)
    return { fault: this.placed(path, fault, line) }
  }

  private placed(path: string, fault: Fault, line: number | undefined): TableFault {
    const file = this.shown(path)
    const text = this.files.read(path) ?? ''
    this.texts.set(file, text)
    if (line === undefined) return { ...fault, inFile: { file } }
    const length = text.split('\n')[line - 1]?.trimEnd().length ?? 0
    return { ...fault, inFile: { file, range: { line, column: 1, endLine: line, endColumn: length + 1 } } }
  }
}

function wavelengthFault(nm: number, beforeNm: number): Fault | undefined {
  if (nm === beforeNm) {
    const next = 'keep one row for each wavelength'
    return { code: 'bad_table', message: 'the same wavelength stands twice', received: `${nm} nm`, next }
  }
  if (nm >= 100 && nm <= 50_000) return undefined
  return {
    code: 'bad_table',
    message: 'this is no wavelength in nm',
    received: `${nm}`,
    allowed: 'from 100 to 50000 nm',
    next: 'give the wavelength in the first column in nm, or head it wavelength_um',
  }
}

/** A file that is not there, with the nearest name in its folder. */
export function missingFile(path: string, files: StackFiles): Fault {
  const folder = path.slice(0, path.lastIndexOf('/') + 1)
  const suggestion = nearestName(path, files.list(`${folder}*`))
  return {
    code: 'missing_file',
    message: 'the file cannot be read',
    received: path,
    allowed: 'a path relative to the file that names it',
    ...(suggestion !== undefined && { suggestion }),
    next: 'check the name and the folder',
  }
}
