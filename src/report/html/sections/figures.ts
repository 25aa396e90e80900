import { METRIC_QUANTITIES } from '../../../charts/quantity.js'
import type { DirectionEvaluation, LimitEvaluation } from '../../../studies/evaluate.js'
import type { Review, ReviewedDesign } from '../../../studies/review.js'
import { given } from '../../decimals.js'
import { METRIC_ROWS } from '../../evaluateText.js'
import { askedText, levelText, verdictText } from '../../limitsText.js'
import { PLAIN } from '../../paint.js'
import { type Content, html, type Markup } from '../markup.js'
import { metricFigure, metricHeading, numbers, type TableColumn, table, words } from '../table.js'

/** The file's limits, met or missed and by how much; then the figures from every direction. */
export function figuresSection({ designs }: Review): Content[] {
  const { evaluation } = designs[0]
  return [
    evaluation.limits.length > 0
      ? limitsTable(designs)
      : html`<p>The file sets no limits; the figures stand for themselves.</p>`,
    ...designs.map((design) => directionsTable(design, designs.length > 1)),
  ]
}

function limitsTable(designs: readonly ReviewedDesign[]): Markup {
  const columns: TableColumn[] = [
    words('limit'),
    words('seen from'),
    words('asked'),
    ...designs.flatMap(({ name }) => [numbers(designs.length > 1 ? DESIGN_NAMES[name] : 'value'), words('')]),
  ]
  const rows = designs[0].evaluation.limits.map((limit, k) => [
    `${metricHeading(limit.metric)}${levelText(limit)}`,
    `θ ${given(limit.theta_deg)}° φ ${given(limit.phi_deg)}°`,
    askedText(limit),
    ...designs.flatMap(({ evaluation }) => limitCells(evaluation.limits[k])),
  ])
  return table('Limits', columns, rows)
}

/** As the charts name them; the search lies between. */
export const DESIGN_NAMES: Readonly<Record<ReviewedDesign['name'], string>> = {
  file: 'before',
  search: 'after',
}

function limitCells(limit: LimitEvaluation): Content[] {
  const mark = html`<span class="${limit.met ? 'met' : 'missed'}">${verdictText(limit, PLAIN)}</span>`
  return [metricFigure(limit.metric, limit.value), mark]
}

function directionsTable({ name, evaluation: { directions } }: ReviewedDesign, several: boolean): Markup {
  const columns: TableColumn[] = [
    words(''),
    ...directions.map(({ theta_deg, phi_deg }) => numbers(`θ ${given(theta_deg)}° φ ${given(phi_deg)}°`)),
  ]
  const rows = METRIC_ROWS.flatMap(({ metric, label, of }) => {
    if (directions.every((direction) => of(direction) === undefined)) return []
    const { unit } = METRIC_QUANTITIES[metric]
    const heading = label === undefined ? metricHeading(metric) : `– ${label.trim()}${unit === '' ? '' : ` (${unit})`}`
    return [[heading, ...directions.map((direction) => metricFigure(metric, of(direction)))]]
  })
  const caption = several ? `Figures ${DESIGN_NAMES[name]} the search` : 'Figures'
  return table(caption, columns, [...rows, ...contrastRows(directions)])
}

function contrastRows(directions: readonly DirectionEvaluation[]): Content[][] {
  const levels = directions[0].ambient_contrast ?? []
  return levels.map(({ illuminance_lx }, k) => [
    `contrast at ${given(illuminance_lx)} lx (: 1)`,
    ...directions.map((direction) => metricFigure('ambient_contrast', direction.ambient_contrast?.[k].ratio)),
  ])
}
