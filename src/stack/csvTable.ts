import { parse } from './csvParse.js'
import type { Fault } from './fault.js'

/** A CSV file of numbers. */
export interface CsvTable {
  /** Column headings where the first row has them. */
  readonly heading?: readonly string[]
  /** 1-based line of the headings, or of the first row where there are none. */
  readonly firstLine: number
  /** Numbers as written (percent turned into fractions), with the 1-based line each row stands on. */
  readonly rows: readonly { readonly line: number; readonly values: readonly number[] }[]
}

export interface CsvFault extends Fault {
  /** 1-based; absent where the whole file is meant. */
  readonly line?: number
}

/** Largest CSV read, characters, and most rows. */
const CSV_LIMITS = { characters: 20_000_000, rows: 500_000 } as const

/**
 * Reads a table of numbers as spreadsheets and spectrophotometers write them: byte-order mark, comma, semicolon or tab
 * between the columns, decimal comma where the comma does not part columns, percent signs in cells or headings, `#` lines.
 */
export function readCsvTable(text: string): CsvTable | CsvFault {
  if (text.length > CSV_LIMITS.characters) return tooLong(text.length)
  const delimiter = delimiterOf(text)
  let records: ReturnType<typeof parse>
  try {
    records = parse(text, {
      bom: true,
      delimiter,
      comment: '#',
      comment_no_infix: true,
      trim: true,
      skip_empty_lines: true,
      skip_records_with_empty_values: true,
      relax_column_count: true,
      info: true,
      to: CSV_LIMITS.rows + 1,
    })
  } catch (error) {
    return csvFault(error)
  }
  return numbersOf(records, delimiter)
}

function numbersOf(records: ReturnType<typeof parse>, delimiter: string): CsvTable | CsvFault {
  if (records.length > CSV_LIMITS.rows) return tooManyRows()
  const decimalComma = delimiter !== ','
  const [first] = records
  const hasHeading = first?.record.some((cell) => Number.isNaN(cellValue(cell, decimalComma))) ?? false
  const heading = hasHeading ? first.record : undefined
  const body = hasHeading ? records.slice(1) : records
  if (body.length === 0) return emptyTable()
  const factors = heading?.map((name) => (name.includes('%') ? 0.01 : 1)) ?? []
  const width = heading?.length ?? body[0].record.length
  const rows: { line: number; values: number[] }[] = []
  for (const { record, info } of body) {
    if (record.length !== width) return unevenRow(info.lines, record.length, width)
    const values = record.map((cell, i) => cellValue(cell, decimalComma) * (cell.includes('%') ? 1 : (factors[i] ?? 1)))
    const bad = values.findIndex((value) => !Number.isFinite(value))
    if (bad >= 0) return badCell(info.lines, bad, record[bad])
    rows.push({ line: info.lines, values })
  }
  return { ...(heading && { heading }), firstLine: first.info.lines, rows }
}

/** NaN where the cell holds no number. */
function cellValue(cell: string, decimalComma: boolean): number {
  const match = /^([^%]*?)\s*(%?)$/.exec(decimalComma ? cell.replace(',', '.') : cell)
  if (match === null || !/^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(match[1])) return Number.NaN
  return Number(match[1]) / (match[2] === '%' ? 100 : 1)
}

function delimiterOf(text: string): string {
  const start = text.slice(0, 4000)
  const line = start.split(/\r?\n/).find((candidate) => candidate.trim() !== '' && !candidate.startsWith('#')) ?? ''
  return [';', '\t'].find((delimiter) => line.includes(delimiter)) ?? ','
}

function tooLong(length: number): CsvFault {
  const allowed = `at most ${CSV_LIMITS.characters} characters`
  return { code: 'too_large', message: 'the table is too large', received: `${length} characters`, allowed }
}

function tooManyRows(): CsvFault {
  return { code: 'too_large', message: 'the table has too many rows', allowed: `at most ${CSV_LIMITS.rows}` }
}

function emptyTable(): CsvFault {
  return { code: 'bad_table', message: 'the table has no rows of numbers', next: 'check that it is the right file' }
}

function unevenRow(line: number, received: number, width: number): CsvFault {
  return {
    code: 'bad_table',
    line,
    message: 'the row has another number of columns than the first',
    received: String(received),
    allowed: String(width),
    next: 'complete the row; a decimal comma needs semicolons or tabs between the columns',
  }
}

function badCell(line: number, column: number, cell: string): CsvFault {
  return {
    code: 'bad_table',
    line,
    message: `column ${column + 1} is not a number`,
    received: cell === '' ? 'nothing' : JSON.stringify(cell.slice(0, 40)),
    allowed: 'a number, with or without %',
  }
}

function csvFault(error: unknown): CsvFault {
  const { message, lines } = error as { message?: unknown; lines?: unknown }
  const where = typeof lines === 'number' ? { line: lines } : {}
  return { code: 'bad_table', ...where, message: `not a CSV table: ${String(message).slice(0, 160)}` }
}
