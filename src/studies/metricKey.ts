import type { Direction, MetricName, MetricRequest } from '../stack/stack.js'
import { degrees } from './evaluate.js'

/** `chroma`, or `chroma@45,90` (θ, φ in degrees) where the question looks from more than one direction; `/lx` with it. */
export function metricKey(request: MetricRequest, among: readonly Direction[]): string {
  const one = among.every(({ theta, phi }) => theta === among[0].theta && phi === among[0].phi)
  const level = request.illuminance === undefined ? '' : `/${request.illuminance}lx`
  return `${request.metric}${level}${one ? '' : `@${degrees(request.theta)},${degrees(request.phi)}`}`
}

/** The parts of a key made by `metricKey`. */
export function parseMetricKey(key: string): {
  readonly metric: MetricName
  readonly illuminanceLx?: number
  readonly direction?: { readonly theta_deg: number; readonly phi_deg: number }
} {
  const [name, place] = key.split('@')
  const [metric, level] = name.split('/')
  const [theta_deg, phi_deg] = (place ?? '').split(',').map(Number)
  return {
    metric: metric as MetricName,
    ...(level !== undefined && { illuminanceLx: Number.parseFloat(level) }),
    ...(place !== undefined && { direction: { theta_deg, phi_deg } }),
  }
}
