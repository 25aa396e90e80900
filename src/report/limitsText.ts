import { METRIC_QUANTITIES } from '../charts/quantity.js'
import type { AskedLimit, LimitEvaluation } from '../studies/evaluate.js'
import { given } from './decimals.js'
import { metricWithUnit } from './metricNumber.js'
import type { Paint } from './paint.js'
import { textTable } from './textTable.js'

const COLUMNS = (['left', 'left', 'left', 'right', 'left'] as const).map((align) => ({ heading: '', align }))

/** One line a limit: what is asked, what came, met or not and by how much; and how many are met. */
export function limitsText(limits: readonly LimitEvaluation[], paint: Paint): string {
  if (limits.length === 0) return 'no limits in the file'
  const met = limits.filter((limit) => limit.met).length
  const count = `limits: ${met} of ${limits.length} met`
  const rows = limits.map((limit) => [
    ...limitCells(limit),
    metricWithUnit(limit.metric, limit.value),
    verdictText(limit, paint),
  ])
  return `${met === limits.length ? paint.strong(count) : paint.bad(count)}\n${textTable(COLUMNS, rows)}`
}

/** What is limited, from where, to what. */
export function limitCells(limit: AskedLimit): [name: string, direction: string, asked: string] {
  return [
    `  ${METRIC_QUANTITIES[limit.metric].label}${levelText(limit)}`,
    `θ ${given(limit.theta_deg)}° φ ${given(limit.phi_deg)}°`,
    askedText(limit),
  ]
}

export function levelText({ illuminance_lx }: AskedLimit): string {
  return illuminance_lx === undefined ? '' : ` at ${given(illuminance_lx)} lx`
}

/** `at most 4.5 %`. */
export function askedText({ metric, max, min }: AskedLimit): string {
  const { unit, factor } = METRIC_QUANTITIES[metric]
  const shown = (value: number): string => `${given(factor * value)}${unit === '' ? '' : ` ${unit}`}`
  const parts = [
    ...(min !== undefined ? [`at least ${shown(min)}`] : []),
    ...(max !== undefined ? [`at most ${shown(max)}`] : []),
  ]
  return parts.join(', ')
}

/** `met, 0.2 % to spare`, `missed by 0.2 %`. */
export function verdictText({ metric, margin, met, value }: LimitEvaluation, paint: Paint): string {
  if (Number.isNaN(value)) return paint.bad('missed: does not apply to this stack')
  const amount = metricWithUnit(metric, Math.abs(margin))
  return met ? paint.good(`met, ${amount} to spare`) : paint.bad(`missed by ${amount}`)
}
