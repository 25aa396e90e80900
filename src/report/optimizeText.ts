import { METRIC_QUANTITIES } from '../charts/quantity.js'
import type { Stack } from '../stack/stack.js'
import type { LimitEvaluation } from '../studies/evaluate.js'
import type { Optimum } from '../studies/optimize.js'
import { given } from './decimals.js'
import { ESTIMATE_CAUTION } from './evaluateText.js'
import { limitsText } from './limitsText.js'
import { metricKeyLabel, metricKeyNumber, metricKeyUnit } from './metricKeyText.js'
import { metricNumber } from './metricNumber.js'
import { type Paint, PLAIN } from './paint.js'
import { parameterText } from './parameterText.js'
import { type Column, textTable } from './textTable.js'

/** Before and after, the families, how the search ended; `limits` are those of the file for the best design. */
export function optimizeText(
  stack: Stack,
  optimum: Optimum,
  limits: readonly LimitEvaluation[],
  paint: Paint = PLAIN,
): string {
  const parts = [
    `${paint.strong(optimum.title)}\n${questionText(optimum)}`,
    beforeAndAfter(stack, optimum),
    constraintText(optimum, paint),
    limitsText(limits, paint),
    familiesText(stack, optimum, paint),
    searchText(optimum),
    paint.faint(ESTIMATE_CAUTION),
  ]
  return `${parts.filter((part) => part !== '').join('\n\n')}\n`
}

export function questionText({ objective: { metric, sense, views, quantile } }: Optimum): string {
  const { label } = METRIC_QUANTITIES[metric]
  const share = quantile === undefined ? '' : `, ${given(100 * quantile)} % quantile under the tolerances`
  const weights = new Set(views.map(({ weight }) => weight))
  const places = views.map(({ theta_deg, phi_deg, weight }) => {
    const place = `θ ${given(theta_deg)}° φ ${given(phi_deg)}°`
    return weights.size > 1 ? `${place} (weight ${given(weight)})` : place
  })
  return `${sense} ${label}${share}; views: ${places.join(', ')}`
}

const BEFORE_AFTER: readonly Column[] = [
  { heading: '', align: 'left' },
  { heading: '', align: 'left' },
  { heading: 'before', align: 'right' },
  { heading: 'after', align: 'right' },
]

function beforeAndAfter(stack: Stack, { objective: { metric }, start, best }: Optimum): string {
  const objective = [start.objective, best.objective].map((value) => metricNumber(metric, value))
  const parameters = Object.keys(best.parameters).map((path) => {
    const { unit, shown } = parameterText(stack, path)
    return [path, unit, shown(start.parameters[path]), shown(best.parameters[path])]
  })
  const metrics = Object.keys(best.metrics).map((key) => [
    metricKeyLabel(key),
    metricKeyUnit(key),
    ...[start, best].map(({ metrics: values }) => metricKeyNumber(key, values[key])),
  ])
  const rows = [['objective', METRIC_QUANTITIES[metric].unit, ...objective], [], ...parameters, [], ...metrics]
  return textTable(BEFORE_AFTER, rows)
}

function constraintText({ best }: Optimum, paint: Paint): string {
  if (best.violation === 0) return ''
  const missed = given(Number(best.violation.toPrecision(3)))
  return paint.bad(`No design was found that meets all of subject_to: this one misses by ${missed}.`)
}

function familiesText(stack: Stack, { families, family_margin, objective: { metric } }: Optimum, paint: Paint): string {
  const paths = Object.keys(families[0]?.parameters ?? {})
  const texts = paths.map((path) => parameterText(stack, path))
  const columns: Column[] = [
    '',
    METRIC_QUANTITIES[metric].unit,
    'found',
    ...paths.map((path, k) => `${path} ${texts[k].unit}`),
  ].map((heading) => ({ heading, align: 'right' }))
  const rows = families.map(({ objective, found, parameters }, place) => [
    `${place + 1}.`,
    metricNumber(metric, objective),
    `${found}×`,
    ...paths.map((path, k) => texts[k].shown(parameters[path])),
  ])
  const heading = paint.strong(`families: distinct designs within ${given(100 * family_margin)} % of the best`)
  return `${heading}\n${textTable(columns, rows)}`
}

export const REASONS: Readonly<Record<Optimum['reason'], string>> = {
  converged: 'ended where the objective no longer moves',
  stalled: 'ended where no step improves the objective',
  limit: 'ended at the allowed number of evaluations',
  stopped: 'interrupted: this is the best so far',
}

function searchText({ evaluations, starts_screened, starts_polished, reason, seed }: Optimum): string {
  return `search: ${evaluations} evaluations, ${starts_screened} starts screened, ${starts_polished} polished, seed ${seed}; ${REASONS[reason]}`
}
