import type { Review } from '../../../studies/review.js'
import { given } from '../../decimals.js'
import { metricKeyLabel, metricKeyNumber, metricKeyUnit } from '../../metricKeyText.js'
import { REASONS } from '../../optimizeText.js'
import { parameterText } from '../../parameterText.js'
import { type Content, html } from '../markup.js'
import { figure, metricFigure, metricHeading, numbers, table, words } from '../table.js'

/** Before and after, the other designs nearly as good, and how the search ended. */
export function searchSection({ designs, optimum }: Review): Content[] {
  if (optimum === undefined) return []
  const { start, best, families, objective, evaluations, starts_screened, starts_polished, reason, seed } = optimum
  const { stack } = designs[0]
  const paths = Object.keys(best.parameters)
  const texts = paths.map((path) => parameterText(stack, path))
  const parameters = paths.map((path, k) => [
    `${path} (${texts[k].unit})`,
    ...[start, best].map((design) => figure(design.parameters[path], texts[k].shown(design.parameters[path]))),
  ])
  const metrics = Object.keys(best.metrics).map((key) => [
    `${metricKeyLabel(key)}${metricKeyUnit(key) === '' ? '' : ` (${metricKeyUnit(key)})`}`,
    ...[start, best].map((design) => figure(design.metrics[key], metricKeyNumber(key, design.metrics[key]))),
  ])
  const objectives = [start, best].map((design) => metricFigure(objective.metric, design.objective))
  const familyRows = families.map((family, place) => [
    `${place + 1}`,
    metricFigure(objective.metric, family.objective),
    figure(family.found, `${family.found}`),
    ...paths.map((path, k) => figure(family.parameters[path], texts[k].shown(family.parameters[path]))),
  ])
  const missed =
    best.violation > 0 &&
    html`<p class="missed">No design was found that meets all of subject_to: this one misses by ${figure(best.violation, given(Number(best.violation.toPrecision(3))))}.</p>`
  return [
    missed,
    table(
      'Before and after',
      [words(''), numbers('before'), numbers('after')],
      [[`objective: ${metricHeading(objective.metric)}`, ...objectives], ...parameters, ...metrics],
    ),
    table(
      `Distinct designs within ${given(100 * optimum.family_margin)} % of the best`,
      [
        words('design'),
        numbers(metricHeading(objective.metric)),
        numbers('found, times'),
        ...paths.map((path, k) => numbers(`${path} (${texts[k].unit})`)),
      ],
      familyRows,
    ),
    html`<p class="note">${evaluations} evaluations, ${starts_screened} starts screened, ${starts_polished} polished, seed ${seed}; ${REASONS[reason]}.</p>`,
  ]
}
