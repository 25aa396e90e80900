import type { MetricName } from '../stack/stack.js'

/** How a number of the program is shown: `factor` × the stored value (fraction, radian, nm) is in `unit`. */
export interface Quantity {
  readonly label: string
  /** Empty for a pure number. */
  readonly unit: string
  readonly factor: number
}

export const PERCENT = { unit: '%', factor: 100 } as const
export const DEGREES = { unit: '°', factor: 180 / Math.PI } as const
export const NANOMETERS = { unit: 'nm', factor: 1 } as const
const NUMBER = { unit: '', factor: 1 } as const

export const METRIC_QUANTITIES: Readonly<Record<MetricName, Quantity>> = {
  luminous_reflectance: { label: 'luminous reflectance', ...PERCENT },
  color_weighted_reflectance: { label: 'color-weighted reflectance', ...PERCENT },
  front_reflectance: { label: 'front reflectance', ...PERCENT },
  inner_reflectance: { label: 'inner reflectance', ...PERCENT },
  lightness: { label: 'lightness L*', ...NUMBER },
  a_star: { label: 'a*', ...NUMBER },
  b_star: { label: 'b*', ...NUMBER },
  chroma: { label: 'chroma C*ab', ...NUMBER },
  emission_transmittance: { label: 'emission transmittance', ...PERCENT },
  ambient_contrast: { label: 'ambient contrast', unit: ': 1', factor: 1 },
}

/** `label (unit)`; a pure number says so. */
export function axisTitle(quantity: Quantity): string {
  return quantity.unit === '' ? quantity.label : `${quantity.label} (${quantity.unit})`
}

/** The number as a reader wants it: three significant digits, no exponent, a true minus sign. */
export function numberText(shown: number, digits = 3): string {
  if (shown === 0) return '0'
  const decimals = Math.max(0, digits - 1 - Math.floor(Math.log10(Math.abs(shown))))
  return shown.toFixed(Math.min(6, decimals)).replace('-', '−')
}

/** A number among evenly spaced ones, with the decimals the step needs. */
export function stepText(shown: number, step: number): string {
  let decimals = 0
  while (
    decimals < 9 &&
    Math.abs(step * 10 ** decimals - Math.round(step * 10 ** decimals)) > 1e-6 * 10 ** decimals * step
  ) {
    decimals++
  }
  const [whole, rest] = Math.abs(shown).toFixed(decimals).split('.')
  const text = whole.replace(/\B(?=(\d{3})+$)/g, '\u2009') + (rest ? `.${rest}` : '')
  return shown < 0 && Number(text.replace(/\u2009/g, '')) !== 0 ? `−${text}` : text
}

function withUnit(number: string, unit: string): string {
  if (unit === '') return number
  return unit === '°' ? `${number}°` : `${number} ${unit}`
}

/** Value in its unit, e.g. `4.31 %` from 0.0431; degrees stand close to the number. */
export function quantityText(quantity: Pick<Quantity, 'unit' | 'factor'>, value: number, digits = 3): string {
  return withUnit(numberText(quantity.factor * value, digits), quantity.unit)
}

/** A number somebody gave, e.g. a limit: as short as it was written. */
export function givenText(quantity: Pick<Quantity, 'unit' | 'factor'>, value: number): string {
  return withUnit(String(Number((quantity.factor * value).toPrecision(6))).replace('-', '−'), quantity.unit)
}

/** `θ 45°, φ 90°`. */
export function directionText(direction: { readonly thetaRad: number; readonly phiRad: number }): string {
  const degrees = (rad: number): string => `${Number(((rad * 180) / Math.PI).toFixed(1))}°`
  // A line does not break between a letter and its number.
  return `θ\u00a0${degrees(direction.thetaRad)}, φ\u00a0${degrees(direction.phiRad)}`
}
