import type { Direction, MetricRequest } from '../stack/stack.js'
import { degrees } from './evaluate.js'

/** `chroma`, or `chroma@45,90` (θ, φ in degrees) where the question looks from more than one direction; `/lx` with it. */
export function metricKey(request: MetricRequest, among: readonly Direction[]): string {
  const one = among.every(({ theta, phi }) => theta === among[0].theta && phi === among[0].phi)
  const level = request.illuminance === undefined ? '' : `/${request.illuminance}lx`
  return `${request.metric}${level}${one ? '' : `@${degrees(request.theta)},${degrees(request.phi)}`}`
}
