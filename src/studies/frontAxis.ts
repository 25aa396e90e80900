import type { MetricName, MetricRequest, Stack } from '../stack/stack.js'
import type { Candidate } from './describeCandidate.js'
import { metricKey, parseMetricKey } from './metricKey.js'
import { readRequests } from './readRequests.js'

const WORDS = ['objective', 'price_per_m2', 'thickness_nm'] as const

/** What candidates are weighed by: one of the words, or a metric. */
export type FrontRequest = (typeof WORDS)[number] | MetricRequest

/** The same in an answer: one of the words, or the `metricKey` of one of the candidates' metrics. */
export type FrontAxis = (typeof WORDS)[number] | (string & {})

/**
 * Axes from text: `objective`, `price_per_m2`, `thickness_nm`, or a metric as in `readRequests`, from the file's first
 * direction where it names none.
 * @throws InputError with every problem found
 */
export function readFront(stack: Stack, texts: readonly string[]): FrontRequest[] {
  const named = (text: string) => WORDS.find((word) => word === text.trim())
  const [direction] = stack.conditions.directions
  const metrics = readRequests(
    stack,
    texts.filter((text) => named(text) === undefined),
    direction,
    { option: '--front', words: WORDS },
  )
  return texts.map((text) => named(text) ?? (metrics.shift() as MetricRequest))
}

/** Objective, emission transmittance from the file's first direction, and price, as far as they apply. */
export function defaultFront(stack: Stack, pricesKnown: boolean): FrontRequest[] {
  const [{ theta, phi }] = stack.conditions.directions
  return [
    'objective',
    ...(stack.panel.kind === 'mirror' ? [{ metric: 'emission_transmittance', theta, phi } as const] : []),
    ...(pricesKnown ? (['price_per_m2'] as const) : []),
  ]
}

export function isMetric(axis: FrontRequest): axis is MetricRequest {
  return typeof axis === 'object'
}

export function axisOf(request: FrontRequest, requests: readonly MetricRequest[]): FrontAxis {
  return isMetric(request) ? metricKey(request, requests) : request
}

/** Whether the axis is an own one of comparisons, not a metric's. */
export function isWord(axis: FrontAxis): axis is (typeof WORDS)[number] {
  return (WORDS as readonly string[]).includes(axis)
}

/** Value of a candidate on an axis; undefined where it is not known. */
export function onAxis(candidate: Candidate, axis: FrontAxis): number | undefined {
  return isWord(axis) ? candidate[axis] : candidate.metrics[axis]
}

/** On which side of an axis the better candidates are: low, high, or near zero. */
export function betterSide(axis: FrontAxis, sense: 1 | -1): 'low' | 'high' | 'zero' {
  if (axis === 'objective') return sense === 1 ? 'low' : 'high'
  return isWord(axis) ? 'low' : METRIC_SIDES[parseMetricKey(axis).metric]
}

const METRIC_SIDES: Readonly<Record<MetricName, 'low' | 'high' | 'zero'>> = {
  luminous_reflectance: 'low',
  color_weighted_reflectance: 'low',
  front_reflectance: 'low',
  inner_reflectance: 'low',
  lightness: 'low',
  a_star: 'zero',
  b_star: 'zero',
  chroma: 'low',
  emission_transmittance: 'high',
  ambient_contrast: 'high',
}

/** Less is better; what is not known is worst. */
export function cost(candidate: Candidate, axis: FrontAxis, sense: 1 | -1): number {
  const value = onAxis(candidate, axis) ?? Number.NaN
  if (Number.isNaN(value)) return Number.POSITIVE_INFINITY
  const side = betterSide(axis, sense)
  return side === 'low' ? value : side === 'high' ? -value : Math.abs(value)
}
