import { METRIC_QUANTITIES } from '../../../charts/quantity.js'
import type { Stack } from '../../../stack/stack.js'
import type { Comparison } from '../../../studies/compare.js'
import { isWord } from '../../../studies/frontAxis.js'
import { rankedBy } from '../../compareText.js'
import { fixed } from '../../decimals.js'
import { metricKeyLabel, metricKeyNumber, metricKeyUnit } from '../../metricKeyText.js'
import { parameterText } from '../../parameterText.js'
import { type Content, html } from '../markup.js'
import { figure, metricFigure, metricHeading, numbers, table, words } from '../table.js'

const MOST_ROWS = 15

/** The best candidates in order. */
export function candidatesSection(
  stack: Stack,
  { slots, candidates, front, front_axes, ruled_out }: Comparison,
): Content[] {
  const metric = rankedBy(stack)
  const keys = front_axes.filter((axis) => !isWord(axis))
  const paths = Object.keys(candidates[0]?.parameters ?? {})
  const texts = paths.map((path) => parameterText(stack, path))
  const rows = candidates
    .slice(0, MOST_ROWS)
    .map((candidate, k) => [
      `${k + 1}${front.includes(k) ? ' *' : ''}`,
      ...slots.map((slot) => candidate.films[slot]),
      metricFigure(metric, candidate.objective),
      ...paths.map((path, p) => figure(candidate.parameters[path], texts[p].shown(candidate.parameters[path]))),
      ...keys.map((key) => figure(candidate.metrics[key], metricKeyNumber(key, candidate.metrics[key]))),
      candidate.price_per_m2 === undefined ? '–' : figure(candidate.price_per_m2, fixed(candidate.price_per_m2, 2)),
      candidate.limits_met ? 'met' : 'missed',
    ])
  return [
    table(
      `The best of ${candidates.length} candidates, ranked by ${METRIC_QUANTITIES[metric].label}`,
      [
        words(''),
        ...slots.map(words),
        numbers(metricHeading(metric)),
        ...paths.map((path, p) => numbers(`${path} (${texts[p].unit})`)),
        ...keys.map((key) => numbers(`${metricKeyLabel(key)} (${metricKeyUnit(key)})`)),
        numbers('price per m²'),
        words('limits'),
      ],
      rows,
    ),
    html`<p class="note">* no other candidate betters it in all axes of the front. ${ruled_out > 0 && `${ruled_out} candidates were ruled out by a quick search: they would not be among the best even if it fell short by three times what it did at most where candidates were searched both ways.`}</p>`,
  ]
}
