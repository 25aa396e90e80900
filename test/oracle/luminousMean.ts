import { readFileSync } from 'node:fs'

/**
 * Tables beside this file (attribution in README.md): CIE 1931 ȳ, ISO/CIE 11664-1, and D65, ISO/CIE 11664-2.
 */
function tableColumn(file: string, column: string): ReadonlyMap<number, number> {
  const text = readFileSync(new URL(file, import.meta.url), 'utf8')
  const [head, ...rows] = text
    .trim()
    .split(/\r?\n/)
    .map((line) => line.split(','))
  const index = head.indexOf(column)
  return new Map(rows.map((row) => [Number(row[0]), Number(row[index])]))
}

const YBAR = tableColumn('./cie1931_2deg_5nm.csv', 'ybar')
const D65 = tableColumn('./illuminant_D65_5nm.csv', 'relative_power')

/** Mean of a spectrum under D65 as the 2° observer weighs it. Wavelengths: multiples of 5 nm, 360 to 830. */
export function luminousMean(wavelengthsNm: readonly number[], values: readonly number[]): number {
  const weights = wavelengthsNm.map((nm) => (YBAR.get(nm) ?? Number.NaN) * (D65.get(nm) ?? Number.NaN))
  const total = weights.reduce((a, b) => a + b)
  return values.reduce((mean, value, i) => mean + (weights[i] * value) / total, 0)
}
