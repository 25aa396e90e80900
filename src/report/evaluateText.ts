import { METRIC_QUANTITIES } from '../charts/quantity.js'
import type { MetricName } from '../stack/stack.js'
import type { DirectionEvaluation, Evaluation } from '../studies/evaluate.js'
import { given } from './decimals.js'
import { limitsText } from './limitsText.js'
import { metricNumber } from './metricNumber.js'
import { type Paint, PLAIN } from './paint.js'
import { type Column, textTable } from './textTable.js'

/** Said under every result a design might be signed off on. */
export const ESTIMATE_CAUTION =
  'A design estimate for plane layers: confirm it on samples, measured as the governing standard asks.'

/** Directions beside each other; more go into a further table. */
const DIRECTIONS_ABREAST = 6

/** How dark, how neutral, at what cost: a column for each direction, then the limits. */
export function evaluateText(evaluation: Evaluation, paint: Paint = PLAIN): string {
  const { title, directions, limits } = evaluation
  const tables: string[] = []
  for (let k = 0; k < directions.length; k += DIRECTIONS_ABREAST) {
    tables.push(directionsTable(directions.slice(k, k + DIRECTIONS_ABREAST)))
  }
  return `${[paint.strong(title), ...tables, limitsText(limits, paint), paint.faint(ESTIMATE_CAUTION)].join('\n\n')}\n`
}

function directionsTable(directions: readonly DirectionEvaluation[]): string {
  const columns: Column[] = [
    { heading: 'seen from θ', align: 'left' },
    { heading: '', align: 'left' },
    ...directions.map(({ theta_deg }): Column => ({ heading: `${given(theta_deg)}°`, align: 'right' })),
  ]
  const phiRow = ['          φ', '', ...directions.map(({ phi_deg }) => `${given(phi_deg)}°`)]
  return textTable(columns, [
    phiRow,
    ...METRIC_ROWS.flatMap((row) => metricRow(row, directions)),
    ...contrastRows(directions),
  ])
}

export interface MetricRow {
  readonly label?: string
  readonly metric: MetricName
  readonly of: (direction: DirectionEvaluation) => number | undefined
}

/** What is told of a direction, in this order. */
export const METRIC_ROWS: readonly MetricRow[] = [
  { metric: 'luminous_reflectance', of: (d) => d.luminous_reflectance },
  { metric: 'front_reflectance', label: '  of the front faces', of: (d) => d.front_reflectance },
  { metric: 'inner_reflectance', label: '  from inside', of: (d) => d.inner_reflectance },
  { metric: 'color_weighted_reflectance', of: (d) => d.color_weighted_reflectance },
  { metric: 'lightness', of: (d) => d.lab[0] },
  { metric: 'a_star', of: (d) => d.lab[1] },
  { metric: 'b_star', of: (d) => d.lab[2] },
  { metric: 'chroma', of: (d) => d.chroma },
  { metric: 'emission_transmittance', of: (d) => d.emission_transmittance },
]

/** No row where the metric does not apply to the stack. */
function metricRow({ metric, label, of }: MetricRow, directions: readonly DirectionEvaluation[]): string[][] {
  const values = directions.map(of)
  if (values.every((value) => value === undefined)) return []
  const { label: name, unit } = METRIC_QUANTITIES[metric]
  return [[label ?? name, unit, ...values.map((value) => metricNumber(metric, value ?? Number.NaN))]]
}

function contrastRows(directions: readonly DirectionEvaluation[]): string[][] {
  const levels = directions[0].ambient_contrast ?? []
  return levels.map(({ illuminance_lx }, k) => [
    `contrast at ${given(illuminance_lx)} lx`,
    METRIC_QUANTITIES.ambient_contrast.unit,
    ...directions.map((d) => metricNumber('ambient_contrast', d.ambient_contrast?.[k].ratio ?? Number.NaN)),
  ])
}
