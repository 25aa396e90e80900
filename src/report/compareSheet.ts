import { paretoFront } from '../charts/paretoFront.js'
import { METRIC_QUANTITIES, type Quantity } from '../charts/quantity.js'
import { PAPER } from '../charts/theme.js'
import type { Stack } from '../stack/stack.js'
import type { Candidate, Comparison, FrontAxis } from '../studies/compare.js'
import type { Sheet } from './sheet.js'

/** Candidates in the first two axes of the front. */
export function compareSheet(stack: Stack, { title, candidates, front, front_axes }: Comparison): Sheet {
  const metric = stack.optimize?.minimize.metric ?? 'color_weighted_reflectance'
  const [first, second = 'thickness_nm'] = front_axes
  const axis = (name: FrontAxis) => ({ quantity: quantityOf(name, METRIC_QUANTITIES[metric]), better: betterOf(name) })
  const data = {
    title: `${title}: films compared`,
    x: axis(second),
    y: axis(first),
    candidates: candidates.map((candidate, k) => ({
      label: Object.values(candidate.films).join(' / '),
      x: onAxis(candidate, second),
      y: onAxis(candidate, first),
      onFront: front.includes(k),
      limitsMet: candidate.limits_met,
    })),
  }
  return { name: 'candidates', chart: paretoFront(data, PAPER), width: 900, height: 600 }
}

function quantityOf(axis: FrontAxis, objective: Quantity): Quantity {
  if (axis === 'objective') return objective
  if (axis === 'price_per_m2') return { label: 'price of the films per m²', unit: '', factor: 1 }
  if (axis === 'thickness_nm') return { label: 'thickness of the films', unit: 'µm', factor: 1e-3 }
  return METRIC_QUANTITIES[axis]
}

function betterOf(axis: FrontAxis): 'low' | 'high' {
  return axis === 'emission_transmittance' || axis === 'ambient_contrast' ? 'high' : 'low'
}

function onAxis(candidate: Candidate, axis: FrontAxis): number {
  if (axis === 'objective' || axis === 'thickness_nm') return candidate[axis]
  if (axis === 'price_per_m2') return candidate.price_per_m2 ?? 0
  return candidate.metrics[axis]
}
