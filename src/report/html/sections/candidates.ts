import { METRIC_QUANTITIES } from '../../../charts/quantity.js'
import type { Stack } from '../../../stack/stack.js'
import type { Comparison } from '../../../studies/compare.js'
import { fixed } from '../../decimals.js'
import { parameterText } from '../../parameterText.js'
import { html, type Markup } from '../markup.js'
import { figure, metricFigure, metricHeading, numbers, table, words } from '../table.js'

const MOST_ROWS = 15

/** The best candidates in order. */
export function candidatesSection(stack: Stack, { slots, candidates, front, ruled_out }: Comparison): Markup {
  const metric = stack.optimize?.minimize.metric ?? 'color_weighted_reflectance'
  const paths = Object.keys(candidates[0]?.parameters ?? {})
  const texts = paths.map((path) => parameterText(stack, path))
  const rows = candidates
    .slice(0, MOST_ROWS)
    .map((candidate, k) => [
      `${k + 1}${front.includes(k) ? ' *' : ''}`,
      ...slots.map((slot) => candidate.films[slot]),
      metricFigure(metric, candidate.objective),
      ...paths.map((path, p) => figure(candidate.parameters[path], texts[p].shown(candidate.parameters[path]))),
      metricFigure('emission_transmittance', candidate.metrics.emission_transmittance),
      candidate.price_per_m2 === undefined ? '–' : figure(candidate.price_per_m2, fixed(candidate.price_per_m2, 2)),
      candidate.limits_met ? 'met' : 'missed',
    ])
  return html`${table(
    `The best of ${candidates.length} candidates, ranked by ${METRIC_QUANTITIES[metric].label}`,
    [
      words(''),
      ...slots.map(words),
      numbers(metricHeading(metric)),
      ...paths.map((path, p) => numbers(`${path} (${texts[p].unit})`)),
      numbers(metricHeading('emission_transmittance')),
      numbers('price per m²'),
      words('limits'),
    ],
    rows,
  )}
<p class="note">* no other candidate betters it in all axes of the front. ${ruled_out > 0 && `${ruled_out} candidates were ruled out on fewer wavelengths: they cannot be among the best.`}</p>`
}
