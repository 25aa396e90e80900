import { METRIC_QUANTITIES } from '../charts/quantity.js'
import type { MetricName } from '../stack/stack.js'
import { fixed } from './decimals.js'

/** Decimals in the unit shown: finer than any sample is measured, coarse enough to read. */
const PERCENT_DECIMALS = 3
const COLOR_DECIMALS = 2

/** The value in the metric's unit (percent for shares), without the unit; `–` where it does not apply. */
export function metricNumber(metric: MetricName, value: number): string {
  if (Number.isNaN(value)) return '–'
  const { unit, factor } = METRIC_QUANTITIES[metric]
  if (metric === 'ambient_contrast') return contrastNumber(value)
  return fixed(factor * value, unit === '%' ? PERCENT_DECIMALS : COLOR_DECIMALS)
}

/** With its unit, e.g. `4.662 %`. */
export function metricWithUnit(metric: MetricName, value: number): string {
  const { unit } = METRIC_QUANTITIES[metric]
  return unit === '' || Number.isNaN(value) ? metricNumber(metric, value) : `${metricNumber(metric, value)} ${unit}`
}

/** Three significant digits; large contrasts as whole numbers. */
function contrastNumber(ratio: number): string {
  if (!Number.isFinite(ratio)) return 'infinite'
  return ratio >= 999.5 ? String(Math.round(ratio)) : ratio.toPrecision(3)
}
