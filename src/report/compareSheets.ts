import { type ParetoFrontData, paretoFront } from '../charts/paretoFront.js'
import { METRIC_QUANTITIES, type Quantity } from '../charts/quantity.js'
import { PAPER } from '../charts/theme.js'
import type { Stack } from '../stack/stack.js'
import type { Comparison } from '../studies/compare.js'
import { betterSide, cost, type FrontAxis, onAxis } from '../studies/frontAxis.js'
import { parseMetricKey } from '../studies/metricKey.js'
import { nondominated } from '../studies/pareto.js'
import { rankedBy } from './compareText.js'
import { metricKeyLabel } from './metricKeyText.js'
import type { Sheet } from './sheet.js'

/** The first axis of the front against each of the others. */
export function compareSheets(stack: Stack, comparison: Comparison): Sheet[] {
  const [first, ...others] = comparison.front_axes
  const across = others.length > 0 ? others : (['thickness_nm'] as const)
  return across.map((other, k) => ({
    name: k === 0 ? 'candidates' : `candidates-${k + 1}`,
    chart: paretoFront(frontData(stack, comparison, other, first), PAPER),
    width: 900,
    height: 600,
  }))
}

/** What is beaten in these two axes may be on the front of three: the chart shows the front of its own two. */
function frontData(stack: Stack, { title, candidates }: Comparison, x: FrontAxis, y: FrontAxis): ParetoFrontData {
  const sense = stack.optimize?.minimize.sense ?? 1
  const known = candidates
    .map((candidate, k) => ({ candidate, rank: k + 1 }))
    .filter(({ candidate }) => [x, y].every((axis) => Number.isFinite(cost(candidate, axis, sense))))
  const front = nondominated(known.map(({ candidate }) => [cost(candidate, x, sense), cost(candidate, y, sense)]))
  const side = (axis: FrontAxis) => betterSide(axis, sense)
  const shown = (value: number, axis: FrontAxis) => (side(axis) === 'zero' ? Math.abs(value) : value)
  const axis = (name: FrontAxis) => ({
    quantity: quantityOf(stack, name, side(name) === 'zero'),
    better: side(name) === 'high' ? ('high' as const) : ('low' as const),
  })
  return {
    title: `${title}: films compared`,
    notes: ['numbers: rank by the objective'],
    x: axis(x),
    y: axis(y),
    candidates: known.map(({ candidate, rank }, k) => ({
      label: `${rank}`,
      x: shown(onAxis(candidate, x) ?? Number.NaN, x),
      y: shown(onAxis(candidate, y) ?? Number.NaN, y),
      onFront: front.includes(k),
      limitsMet: candidate.limits_met,
    })),
  }
}

function quantityOf(stack: Stack, axis: FrontAxis, absolute: boolean): Quantity {
  if (axis === 'objective') return METRIC_QUANTITIES[rankedBy(stack)]
  if (axis === 'price_per_m2') return { label: 'price of the films per m²', unit: '', factor: 1 }
  if (axis === 'thickness_nm') return { label: 'thickness of the films', unit: 'µm', factor: 1e-3 }
  const quantity = METRIC_QUANTITIES[parseMetricKey(axis).metric]
  const label = metricKeyLabel(axis)
  return { ...quantity, label: absolute ? `|${label}|` : label }
}
