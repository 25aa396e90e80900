import { METRIC_QUANTITIES } from '../charts/quantity.js'
import { parseMetricKey } from '../studies/metricKey.js'
import { given } from './decimals.js'
import { metricNumber } from './metricNumber.js'

/** A metric of a study in words: `chroma C*ab, θ 45° φ 90°`. */
export function metricKeyLabel(key: string): string {
  const { metric, illuminanceLx, direction } = parseMetricKey(key)
  const level = illuminanceLx === undefined ? '' : ` at ${given(illuminanceLx)} lx`
  const place = direction === undefined ? '' : `, θ ${given(direction.theta_deg)}° φ ${given(direction.phi_deg)}°`
  return `${METRIC_QUANTITIES[metric].label}${level}${place}`
}

export function metricKeyUnit(key: string): string {
  return METRIC_QUANTITIES[parseMetricKey(key).metric].unit
}

/** The value of such a metric in its unit, without the unit. */
export function metricKeyNumber(key: string, value: number): string {
  return metricNumber(parseMetricKey(key).metric, value)
}
