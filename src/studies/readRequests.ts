/** `--metric name[/illuminance][@theta,phi]`: metrics from text, written as the keys they have in the answers. */
import type { Fault } from '../stack/fault.js'
import { shortList } from '../stack/fault.js'
import { nearestName } from '../stack/nearestName.js'
import { InputError, type Problem } from '../stack/problem.js'
import { applicationFaults } from '../stack/sense/metrics.js'
import { type Direction, METRIC_NAMES, type MetricName, type MetricRequest, type Stack } from '../stack/stack.js'
import { isFault, parseQuantity } from '../units/quantity.js'
import { optionProblem } from './readVary.js'

const FORM = 'name[/illuminance][@theta,phi], e.g. chroma@45deg,90deg or ambient_contrast/500lx'
const METRIC_OPTION = { option: '--metric', words: [] } as const
const GRAZING = Math.PI / 2

/**
 * Metrics without a direction of their own look from `direction`. What is told of wrong ones names the option, and the words that
 * it takes besides metrics.
 * @throws InputError with every problem found
 */
export function readRequests(
  stack: Stack,
  texts: readonly string[],
  direction: Direction,
  { option, words }: { readonly option: string; readonly words: readonly string[] } = METRIC_OPTION,
): MetricRequest[] {
  const problems: Problem[] = []
  const requests = texts.flatMap((text) => {
    const request = readRequest(stack, text, direction, words)
    if (!('code' in request)) return [request]
    problems.push(optionProblem(`${option} ${text}`, request))
    return []
  })
  if (problems.length > 0) throw new InputError(problems)
  return requests
}

function readRequest(
  stack: Stack,
  text: string,
  elsewhere: Direction,
  words: readonly string[],
): MetricRequest | Fault {
  const match = /^\s*([a-z_*0-9]+)(?:\/([^@]+))?(?:@([^,]+),(.+))?$/i.exec(text)
  if (match === null) return { code: 'bad_option', message: 'this names no metric', received: text, allowed: FORM }
  const [, name, level, theta, phi] = match
  if (!isMetricName(name)) return unknownMetric(name, words)
  const illuminance = level === undefined ? undefined : parseQuantity(level, 'illuminance')
  const angles = theta === undefined ? [] : [parseQuantity(theta, 'angle'), parseQuantity(phi, 'angle')]
  for (const value of [illuminance, ...angles]) {
    if (value === undefined || !isFault(value)) continue
    const { hint, received, allowed } = value
    return { code: 'bad_quantity', message: hint ?? 'this is no such quantity', received, allowed }
  }
  const [thetaRad, phiRad] = theta === undefined ? [elsewhere.theta, elsewhere.phi] : (angles as number[])
  if (!(thetaRad >= 0 && thetaRad < GRAZING)) {
    return {
      code: 'out_of_range',
      message: 'the eye stands in front of the screen',
      received: text,
      allowed: 'theta from 0 to below 90 deg',
    }
  }
  const lx = (illuminance as number | undefined) ?? (name === 'ambient_contrast' ? stack.ambient[0] : undefined)
  const request = {
    metric: name,
    theta: thetaRad,
    phi: phiRad,
    ...(lx !== undefined && { illuminance: lx }),
  }
  const { layers, panel, emission, ambient } = stack
  const [fault] = applicationFaults(request, [], {
    draft: { layers, panel, emission, ambient: [...ambient] },
    raw: stack,
  })
  return fault ?? request
}

function isMetricName(name: string): name is MetricName {
  return (METRIC_NAMES as readonly string[]).includes(name)
}

function unknownMetric(received: string, words: readonly string[]): Fault {
  const names = [...words, ...METRIC_NAMES]
  const suggestion = nearestName(received, names)
  return {
    code: 'unknown_metric',
    message: `there is no metric "${received.slice(0, 60)}"`,
    received: received.slice(0, 60),
    allowed: shortList(names),
    ...(suggestion !== undefined && { suggestion }),
  }
}
