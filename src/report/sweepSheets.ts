import { METRIC_QUANTITIES, quantityText } from '../charts/quantity.js'
import { sweepLines } from '../charts/sweepLines.js'
import { sweepMap } from '../charts/sweepMap.js'
import { PAPER } from '../charts/theme.js'
import { findParameter } from '../stack/parameters.js'
import type { Stack } from '../stack/stack.js'
import { parseMetricKey } from '../studies/metricKey.js'
import type { Sweep } from '../studies/sweep.js'
import { toPlain } from '../units/quantity.js'
import { axisQuantity } from './axisQuantity.js'
import { metricKeyLabel } from './metricKeyText.js'
import type { Sheet } from './sheet.js'

const TITLE_PX = 120
const PLOT_PX = 240

/** Lines over one axis, a map for each metric over two; nothing where too little was computed to draw. */
export function sweepSheets(stack: Stack, sweep: Sweep): Sheet[] {
  return sweep.axes.length === 1 ? linesSheet(stack, sweep) : mapSheets(stack, sweep)
}

function linesSheet(stack: Stack, sweep: Sweep): Sheet[] {
  const {
    title,
    axes: [axis],
    metrics,
  } = sweep
  const count = Math.min(...Object.values(metrics).map((values) => values.length))
  if (count < 2) return []
  const values = axis.values.slice(0, count)
  const current = currentValue(stack, axis)
  const drawn = Object.entries(metrics).map(([key, computed]) => {
    const limit = limitOf(stack, key, sweep)
    return {
      name: metricKeyLabel(key),
      quantity: METRIC_QUANTITIES[parseMetricKey(key).metric],
      values: computed.slice(0, count),
      ...(limit !== undefined && { limit }),
    }
  })
  const data = {
    title: `${title}: ${axis.path}`,
    parameter: axisQuantity(axis.path, axis.unit),
    values,
    metrics: drawn,
    ...(current !== undefined && { current }),
  }
  const plots = new Set(drawn.map(({ quantity }) => quantity.label)).size
  return [
    { name: 'sweep', chart: sweepLines(data, PAPER), width: 900, height: TITLE_PX + Math.max(2, plots) * PLOT_PX },
  ]
}

/** The first axis runs to the right, the second up. */
function mapSheets(stack: Stack, { title, axes: [x, y], metrics }: Sweep): Sheet[] {
  return Object.entries(metrics).flatMap(([key, computed]) => {
    const columns = Math.floor(computed.length / y.values.length)
    if (columns < 2) return []
    const [currentX, currentY] = [currentValue(stack, x), currentValue(stack, y)]
    const metric = METRIC_QUANTITIES[parseMetricKey(key).metric]
    const least = Math.min(...computed)
    const at = computed.indexOf(least)
    const place = [x.values[Math.floor(at / y.values.length)], y.values[at % y.values.length]]
    const data = {
      title: `${title}: ${metricKeyLabel(key)}`,
      notes: [
        `least ${quantityText(metric, least)} at ${[x, y]
          .map((axis, k) => `${axis.path} ${quantityText(axisQuantity(axis.path, axis.unit), place[k])}`)
          .join(', ')}`,
      ],
      x: { quantity: axisQuantity(x.path, x.unit), values: x.values.slice(0, columns) },
      y: { quantity: axisQuantity(y.path, y.unit), values: y.values },
      metric,
      values: y.values.map((_, row) =>
        Array.from({ length: columns }, (_unused, column) => computed[column * y.values.length + row]),
      ),
      ...(currentX !== undefined && currentY !== undefined && { current: { x: currentX, y: currentY } }),
    }
    return [{ name: `sweep-${fileName(key)}`, chart: sweepMap(data, PAPER), width: 820, height: 680 }]
  })
}

/** The stack file's value in the units of the axis, where the axis goes past it. */
function currentValue(stack: Stack, { path, unit, values }: Sweep['axes'][number]): number | undefined {
  const parameter = findParameter(stack, path)
  if (parameter === undefined) return undefined
  const plain = toPlain(parameter.value, unit)
  return plain >= values[0] && plain <= values[values.length - 1] ? plain : undefined
}

/** The file's limit on this metric from this direction, the upper one where it has both. */
function limitOf(stack: Stack, key: string, { theta_deg, phi_deg }: Sweep): number | undefined {
  const { metric, illuminanceLx, direction = { theta_deg, phi_deg } } = parseMetricKey(key)
  const found = stack.limits.find(
    (limit) =>
      limit.metric === metric &&
      limit.illuminance === illuminanceLx &&
      toPlain(limit.theta, 'angle') === direction.theta_deg &&
      toPlain(limit.phi, 'angle') === direction.phi_deg,
  )
  return found?.max ?? found?.min
}

function fileName(key: string): string {
  return key.replaceAll('_', '-').replace(/[@,/]/g, '-')
}
