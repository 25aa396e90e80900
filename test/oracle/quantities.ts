import type { Complex } from './complex.js'
import type { PlainIndex, PlainSpectrum, Quantity } from './stackFile.js'

const UNITS: Readonly<Record<string, number>> = {
  nm: 1,
  um: 1e3,
  mm: 1e6,
  deg: Math.PI / 180,
  '%': 0.01,
}

/** In nm, radians or fractions; `bareUnit` is that of a number without one. */
function quantity(value: Quantity, bareUnit: number): number {
  if (typeof value === 'number') return value * bareUnit
  const [, digits, unit] = /^\s*(\S+?)\s*([a-z%]*)\s*$/.exec(value) ?? []
  const factor = unit === '' ? bareUnit : UNITS[unit]
  if (factor === undefined || Number.isNaN(Number(digits))) throw new Error(`not a quantity: ${value}`)
  return Number(digits) * factor
}

export const lengthNm = (value: Quantity): number => quantity(value, 1)
export const angleRad = (value: Quantity): number => quantity(value, Math.PI / 180)

/** A length in nm or a fraction at the wavelength. */
export function spectrumAt(spectrum: PlainSpectrum, wavelengthNm: number): number {
  if (typeof spectrum !== 'object') return quantity(spectrum, 1)
  const { wavelength_nm: x, value: y } = spectrum
  if (wavelengthNm <= x[0]) return y[0]
  const right = x.findIndex((w) => w >= wavelengthNm)
  if (right < 0) return y[y.length - 1]
  const share = (wavelengthNm - x[right - 1]) / (x[right] - x[right - 1])
  return y[right - 1] + share * (y[right] - y[right - 1])
}

export function indexAt(index: PlainIndex, wavelengthNm: number): Complex {
  if (typeof index === 'number') return { re: index, im: 0 }
  if ('cauchy_nm' in index) {
    const [a, b, c] = index.cauchy_nm
    return { re: a + b / wavelengthNm ** 2 + c / wavelengthNm ** 4, im: 0 }
  }
  return { re: spectrumAt(index.n, wavelengthNm), im: index.k === undefined ? 0 : spectrumAt(index.k, wavelengthNm) }
}
