import { METRIC_QUANTITIES } from '../charts/quantity.js'
import { searchProgress } from '../charts/searchProgress.js'
import { PAPER } from '../charts/theme.js'
import type { Optimum } from '../studies/optimize.js'
import type { Sheet } from './sheet.js'

/** Families named in the margin of the chart. */
const MOST_NAMED = 8

/** How the search came to its best design, and what else it found. */
export function searchSheet({ title, objective, start, families, history }: Optimum): Sheet {
  const data = {
    title: `${title}: search`,
    objective: METRIC_QUANTITIES[objective.metric],
    evaluations: history.map(({ evaluations }) => evaluations),
    best: history.map((step) => step.objective),
    start: start.objective,
    families: families
      .slice(0, MOST_NAMED)
      .map((family, place) => ({ label: `design ${place + 1}`, objective: family.objective })),
  }
  return { name: 'search', chart: searchProgress(data, PAPER), width: 900, height: 540 }
}
