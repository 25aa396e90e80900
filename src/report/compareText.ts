import { METRIC_QUANTITIES } from '../charts/quantity.js'
import type { Stack } from '../stack/stack.js'
import type { Candidate, Comparison } from '../studies/compare.js'
import { fixed } from './decimals.js'
import { ESTIMATE_CAUTION } from './evaluateText.js'
import { metricNumber } from './metricNumber.js'
import { type Paint, PLAIN } from './paint.js'
import { parameterText } from './parameterText.js'
import { type Column, textTable } from './textTable.js'

const MOST_ROWS = 20

/** The best candidates in order, those on the front marked. */
export function compareText(stack: Stack, comparison: Comparison, paint: Paint = PLAIN): string {
  const { title, slots, candidates, front, front_axes, ruled_out } = comparison
  const metric = stack.optimize?.minimize.metric ?? 'color_weighted_reflectance'
  const parts = [
    `${paint.strong(title)}\n${candidates.length} candidates for ${slots.join(', ')}, ranked by ${METRIC_QUANTITIES[metric].label}`,
    rankingText(stack, comparison),
    `* on the front of ${front_axes.join(', ')}: ${front.length} candidates that no other betters in all of these`,
    ruled_out > 0 ? `${ruled_out} candidates were ruled out on fewer wavelengths: they cannot be among the best` : '',
    paint.faint(ESTIMATE_CAUTION),
  ]
  return `${parts.filter((part) => part !== '').join('\n\n')}\n`
}

function rankingText(stack: Stack, { slots, candidates, front }: Comparison): string {
  const metric = stack.optimize?.minimize.metric ?? 'color_weighted_reflectance'
  const paths = Object.keys(candidates[0]?.parameters ?? {})
  const columns: Column[] = [
    { heading: '', align: 'right' },
    ...slots.map((slot): Column => ({ heading: slot, align: 'left' })),
    { heading: `objective ${METRIC_QUANTITIES[metric].unit}`, align: 'right' },
    ...paths.map((path): Column => ({ heading: `${path} ${parameterText(stack, path).unit}`, align: 'right' })),
    { heading: 'emission %', align: 'right' },
    { heading: 'price/m2', align: 'right' },
    { heading: 'µm', align: 'right' },
    { heading: 'limits', align: 'left' },
  ]
  const rows = candidates
    .slice(0, MOST_ROWS)
    .map((candidate, k) => [
      `${front.includes(k) ? '* ' : ''}${k + 1}`,
      ...slots.map((slot) => candidate.films[slot]),
      metricNumber(metric, candidate.objective),
      ...paths.map((path) => parameterText(stack, path).shown(candidate.parameters[path])),
      emissionText(candidate),
      candidate.price_per_m2 === undefined ? '–' : fixed(candidate.price_per_m2, 2),
      fixed(candidate.thickness_nm / 1000, 1),
      candidate.limits_met ? 'met' : 'missed',
    ])
  return textTable(columns, rows)
}

function emissionText({ metrics }: Candidate): string {
  const { emission_transmittance } = metrics
  return emission_transmittance === undefined ? '–' : metricNumber('emission_transmittance', emission_transmittance)
}
