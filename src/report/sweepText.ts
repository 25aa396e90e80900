import { METRIC_QUANTITIES, quantityText } from '../charts/quantity.js'
import type { Sweep } from '../studies/sweep.js'
import { axisQuantity } from './axisQuantity.js'
import { given } from './decimals.js'
import { ESTIMATE_CAUTION } from './evaluateText.js'
import { metricKeyLabel, metricKeyNumber, metricKeyUnit } from './metricKeyText.js'
import { type Paint, PLAIN } from './paint.js'
import { type Column, textTable } from './textTable.js'

/** Larger tables are for a file. */
const MOST_ROWS = 100
const MOST_COLUMNS = 14

/** The metrics along one axis or over two, where they fit; and the least and most of each, with its place. */
export function sweepText(sweep: Sweep, paint: Paint = PLAIN): string {
  const parts = [
    `${paint.strong(sweep.title)}\n${questionText(sweep)}`,
    ...(isEmpty(sweep) ? [] : [...tables(sweep), extremesText(sweep)]),
    ...(sweep.interrupted ? [paint.bad('interrupted: the last points are missing')] : []),
    paint.faint(ESTIMATE_CAUTION),
  ]
  return `${parts.join('\n\n')}\n`
}

/** Stopped before the first point. */
function isEmpty({ metrics }: Sweep): boolean {
  return Object.values(metrics).every((values) => values.length === 0)
}

function questionText({ axes, theta_deg, phi_deg }: Sweep): string {
  const ranges = axes.map(
    (axis) => `${axis.path} from ${shown(axis, axis.values[0])} to ${shown(axis, axis.values[axis.values.length - 1])}`,
  )
  const direction = [
    ...(theta_deg === undefined ? [] : [`θ ${given(theta_deg)}°`]),
    ...(phi_deg === undefined ? [] : [`φ ${given(phi_deg)}°`]),
  ]
  return `${ranges.join(' and ')}${direction.length > 0 ? `, seen from ${direction.join(' ')}` : ''}`
}

type Axis = Sweep['axes'][number]

function shown({ path, unit }: Axis, value: number): string {
  return quantityText(axisQuantity(path, unit), Number(value.toPrecision(6)), 6)
    .replace(/(\.\d*?)0+(?=\D|$)/, '$1')
    .replace(/\.(?=\D|$)/, '')
}

function tables({ axes, metrics }: Sweep): string[] {
  const [first, second] = axes
  if (first.values.length > MOST_ROWS || (second?.values.length ?? 0) > MOST_COLUMNS) {
    return ['The table is large: --out writes it as CSV, --json prints it.']
  }
  return second === undefined ? [lineTable(first, metrics)] : gridTables(first, second, metrics)
}

function lineTable(axis: Axis, metrics: Sweep['metrics']): string {
  const keys = Object.keys(metrics)
  const headings = [axis.path, ...keys.map(labelWithUnit)]
  const rows = metrics[keys[0]].map((_, k) => [
    shown(axis, axis.values[k]),
    ...keys.map((key) => metricKeyNumber(key, metrics[key][k])),
  ])
  return textTable(rightAligned(headings), rows)
}

/** A table for each metric: the first axis down, the second across. */
function gridTables(down: Axis, across: Axis, metrics: Sweep['metrics']): string[] {
  const columns = rightAligned([
    `${down.path} \\ ${across.path}`,
    ...across.values.map((value) => shown(across, value)),
  ])
  return Object.entries(metrics).map(([key, values]) => {
    const rows = down.values.map((value, row) => [
      shown(down, value),
      ...values
        .slice(row * across.values.length, (row + 1) * across.values.length)
        .map((computed) => metricKeyNumber(key, computed)),
    ])
    return `${labelWithUnit(key)}\n${textTable(columns, rows)}`
  })
}

function rightAligned(headings: readonly string[]): Column[] {
  return headings.map((heading) => ({ heading, align: 'right' }))
}

/** A contrast needs no unit beside its name. */
function labelWithUnit(key: string): string {
  const unit = metricKeyUnit(key)
  return unit === '' || unit === METRIC_QUANTITIES.ambient_contrast.unit
    ? metricKeyLabel(key)
    : `${metricKeyLabel(key)}, ${unit}`
}

function extremesText({ axes, metrics }: Sweep): string {
  const placeOf = (point: number): string => {
    const across = axes[1]?.values.length ?? 1
    const at = [Math.floor(point / across), point % across]
    return axes.map((axis, k) => `${axis.path} ${shown(axis, axis.values[at[k]])}`).join(', ')
  }
  const lines = Object.entries(metrics).flatMap(([key, values]) =>
    [Math.min(...values), Math.max(...values)].map((value, k) => {
      const place = Number.isNaN(value) ? 'does not apply' : `at ${placeOf(values.indexOf(value))}`
      return [
        k === 0 ? metricKeyLabel(key) : '',
        k === 0 ? 'least' : 'most',
        metricKeyNumber(key, value),
        metricKeyUnit(key),
        place,
      ]
    }),
  )
  return textTable(
    (['left', 'left', 'right', 'left', 'left'] as const).map((align) => ({ heading: '', align })),
    lines,
  )
}
