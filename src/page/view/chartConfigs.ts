/** Charts of the page from what the engine said: the same builders as on paper. */
import type { ChartConfiguration } from 'chart.js'
import { rangeOf, type ScaleRange } from '../../charts/colorScale.js'
import { offStateColor } from '../../charts/offStateColor.js'
import { METRIC_QUANTITIES, type Quantity } from '../../charts/quantity.js'
import { reflectanceSpectrum } from '../../charts/reflectanceSpectrum.js'
import type { Theme } from '../../charts/theme.js'
import { viewingCone } from '../../charts/viewingCone.js'
import { colorData, type NamedEvaluation, spectrumData } from '../../report/appearanceSheets.js'
import type { Stack } from '../../stack/stack.js'
import type { PlainCone } from '../engine/messages.js'

export function spectrumConfig(
  stack: Stack,
  designs: readonly NamedEvaluation[],
  k: number,
  theme: Theme,
): ChartConfiguration {
  return reflectanceSpectrum({ ...spectrumData(stack, designs, k), title: 'Reflectance' }, theme)
}

export function colorConfig(stack: Stack, designs: readonly NamedEvaluation[], theme: Theme): ChartConfiguration {
  const config = offStateColor({ ...colorData(stack, designs), title: 'Color of the off-state' }, theme)
  // Before and after need to be told apart, a single design needs no legend.
  Object.assign(config.options?.plugins?.legend ?? {}, { display: designs.length > 1 })
  return config
}

export const CONE_METRICS = ['luminous_reflectance', 'chroma'] as const
export type ConeMetric = (typeof CONE_METRICS)[number]

export function coneConfig(
  cone: PlainCone,
  metric: ConeMetric,
  { title, range }: { readonly title: string; readonly range: ScaleRange },
  theme: Theme,
): ChartConfiguration {
  const quantity: Quantity = METRIC_QUANTITIES[metric]
  const radians = (degrees: readonly number[]): number[] => degrees.map((value) => (value * Math.PI) / 180)
  const field = { thetaRad: radians(cone.theta_deg), phiRad: radians(cone.phi_deg), values: coneValues(cone, metric) }
  return viewingCone({ title, quantity, field, range }, theme)
}

/** One scale for all the cones shown. */
export function coneRange(cones: readonly PlainCone[], metric: ConeMetric): ScaleRange {
  return rangeOf(cones.flatMap((cone) => coneValues(cone, metric).flat()))
}

function coneValues(cone: PlainCone, metric: ConeMetric): readonly (readonly number[])[] {
  if (metric === 'luminous_reflectance') return cone.luminous_reflectance
  return cone.lab.map((row) => row.map(([, a, b]) => Math.hypot(a, b)))
}
