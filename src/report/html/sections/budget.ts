import type { Budget } from '../../../studies/budget.js'
import { BUDGET_MEANING } from '../../../studies/budget.js'
import type { Review } from '../../../studies/review.js'
import { given } from '../../decimals.js'
import { type Content, html, type Markup } from '../markup.js'
import { metricFigure, numbers, table, words } from '../table.js'

/** Where the remaining reflection comes from, from each direction looked at. */
export function budgetSection({ budgets = [] }: Review): Content[] {
  if (budgets.length === 0) return []
  const notes = new Set(budgets.flatMap((entry) => entry.notes))
  return [
    ...budgets.map(budgetTable),
    html`<p class="note">${BUDGET_MEANING}</p>`,
    ...[...notes].map((note) => html`<p class="note">Left out: ${note}.</p>`),
  ]
}

function budgetTable({ theta_deg, phi_deg, total, ideal, terms, rest }: Budget): Markup {
  const share = (value: number) => metricFigure('luminous_reflectance', value)
  const rows = [
    ['ideal stack', share(ideal), ''],
    ...terms.map(({ name, alone, if_removed }) => [name.replaceAll('_', ' '), share(alone), share(if_removed)]),
    ['rest: several together', share(rest), ''],
    ['whole stack', share(total), ''],
  ]
  return table(
    `Light budget, θ ${given(theta_deg)}° φ ${given(phi_deg)}°: luminous reflectance (%)`,
    [words(''), numbers('alone'), numbers('gained if removed')],
    rows,
  )
}
