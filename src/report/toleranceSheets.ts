import { histogram } from '../charts/histogram.js'
import { METRIC_QUANTITIES } from '../charts/quantity.js'
import { sensitivityBars } from '../charts/sensitivityBars.js'
import { PAPER } from '../charts/theme.js'
import { parseMetricKey } from '../studies/metricKey.js'
import type { Tolerance } from '../studies/tolerance.js'
import { metricKeyLabel } from './metricKeyText.js'
import type { Sheet } from './sheet.js'

/** How the limited metrics spread (all told ones where the file has no limit), and which spread moves the costliest. */
export function toleranceSheets(tolerance: Tolerance): Sheet[] {
  const limits = limitsByKey(tolerance)
  const keys = Object.keys(tolerance.histograms).filter((key) => limits.size === 0 || limits.has(key))
  const histograms = keys.flatMap((key) => histogramSheet(tolerance, key, limits.get(key)))
  return [...histograms, ...sensitivitySheets(tolerance)]
}

type Bound = { readonly max: number } | { readonly min: number }

function limitsByKey({ limits = [], metrics }: Tolerance): Map<string, Bound> {
  const found = new Map<string, Bound>()
  for (const { metric, theta_deg, phi_deg, illuminance_lx, max, min } of limits) {
    const key = Object.keys(metrics).find((name) => {
      const { metric: named, illuminanceLx, direction } = parseMetricKey(name)
      const here = direction === undefined || (direction.theta_deg === theta_deg && direction.phi_deg === phi_deg)
      return named === metric && illuminanceLx === illuminance_lx && here
    })
    if (key !== undefined && max !== undefined) found.set(key, { max })
    else if (key !== undefined && min !== undefined) found.set(key, { min })
  }
  return found
}

function histogramSheet({ title, histograms, metrics, draws }: Tolerance, key: string, limit?: Bound): Sheet[] {
  const { edges, counts } = histograms[key]
  const { p05, p50, p95 } = metrics[key]
  // A metric that the tolerances do not move has no histogram worth drawing.
  if (edges.length < 2 || edges[edges.length - 1] <= edges[0]) return []
  const data = {
    title: `${title}: ${metricKeyLabel(key)}`,
    notes: [`${draws} draws of the tolerances`],
    metric: METRIC_QUANTITIES[parseMetricKey(key).metric],
    edges,
    counts,
    percentiles: { p05, p50, p95 },
    ...(limit && { limit }),
  }
  return [{ name: `spread-${fileName(key)}`, chart: histogram(data, PAPER), width: 900, height: 460 }]
}

function sensitivitySheets({ title, sensitivity, sensitivity_of }: Tolerance): Sheet[] {
  if (sensitivity === undefined || sensitivity_of === undefined) return []
  const data = {
    title: `${title}: what moves ${metricKeyLabel(sensitivity_of)}`,
    parameters: sensitivity.map((entry) => ({
      name: entry.parameter,
      firstOrder: { value: entry.share, low: entry.share_low, high: entry.share_high },
      total: { value: entry.total, low: entry.total_low, high: entry.total_high },
    })),
  }
  return [
    { name: 'sensitivity', chart: sensitivityBars(data, PAPER), width: 900, height: 180 + 52 * sensitivity.length },
  ]
}

function fileName(key: string): string {
  return key.replaceAll(/[^a-z0-9]+/gi, '-')
}
