import type { QuantityKind } from '../units/quantity.js'
import type { MetricName } from './stack.js'

interface MetricLimits {
  readonly quantity: QuantityKind
  readonly min: number
  readonly max: number
}

const share: MetricLimits = { quantity: 'share', min: 0, max: 1 }

/** What each metric measures, and where its limits can lie. */
export const METRIC_LIMITS: Readonly<Record<MetricName, MetricLimits>> = {
  luminous_reflectance: share,
  color_weighted_reflectance: share,
  front_reflectance: share,
  inner_reflectance: share,
  emission_transmittance: share,
  lightness: { quantity: 'number', min: 0, max: 100 },
  a_star: { quantity: 'number', min: -200, max: 200 },
  b_star: { quantity: 'number', min: -200, max: 200 },
  chroma: { quantity: 'number', min: 0, max: 200 },
  ambient_contrast: { quantity: 'number', min: 0, max: 1e9 },
}
