import { budgetBars } from '../charts/budgetBars.js'
import { METRIC_QUANTITIES, quantityText } from '../charts/quantity.js'
import { PAPER } from '../charts/theme.js'
import type { Budget } from '../studies/budget.js'
import { BUDGET_LABELS } from './budgetLabels.js'
import { given } from './decimals.js'
import type { Sheet } from './sheet.js'

/** What each imperfection makes alone, and what would be gained without it. */
export function budgetSheet({ title, theta_deg, phi_deg, total, ideal, rest, terms }: Budget): Sheet {
  const metric = METRIC_QUANTITIES.luminous_reflectance
  const data = {
    title: `${title}: light budget, θ ${given(theta_deg)}° φ ${given(phi_deg)}°`,
    notes: [`ideal stack: ${quantityText(metric, ideal)}; where several act together: ${quantityText(metric, rest)}`],
    metric,
    total,
    terms: terms.map(({ name, alone, if_removed }) => ({
      name: BUDGET_LABELS[name],
      alone,
      ifRemoved: if_removed,
    })),
  }
  return {
    name: `budget-${given(theta_deg)}-${given(phi_deg)}`,
    chart: budgetBars(data, PAPER),
    width: 900,
    height: 190 + 52 * terms.length,
  }
}
