import { createExperiment } from '../appearance/experiment.js'
import { Scene } from '../appearance/scene.js'
import { findParameter, setParameters } from '../stack/parameters.js'
import type { FilmCard, MetricName, MetricRequest, OptimizeQuestion, Stack } from '../stack/stack.js'
import { toPlain } from '../units/quantity.js'
import { type Choice, cardsOf, type Slots, stackOf } from './candidate.js'
import type { FoundCandidate } from './compareRounds.js'
import { evaluateLimit } from './evaluate.js'
import { metricKey } from './metricKey.js'

/** Parameters in nm, degrees, fractions. */
export interface Candidate {
  /** Names of the cards, by slot. */
  readonly films: Readonly<Record<string, string>>
  /** Their files, as the stack file finds them. */
  readonly files: Readonly<Record<string, string>>
  readonly objective: number
  readonly parameters: Readonly<Record<string, number>>
  /** Largest constraint of the search missed, in its metric's unit; 0 where all are met. */
  readonly violation: number
  /** By `metricKey`, from the file's directions, and what else the front is about. */
  readonly metrics: Readonly<Record<string, number>>
  /** Those of the file's `limits`. */
  readonly limits_met: boolean
  /** Sum over the slots; absent where a card has no price. */
  readonly price_per_m2?: number
  /** Of the chosen films together. */
  readonly thickness_nm: number
  /** False where the candidate was ruled out: its parameters are then those of the quick search. */
  readonly searched_in_full: boolean
}

const TOLD: readonly MetricName[] = [
  'luminous_reflectance',
  'color_weighted_reflectance',
  'chroma',
  'emission_transmittance',
]

/** Metrics told of every candidate: of the file's directions, and those asked for. */
export function candidateRequests(stack: Stack, asked: readonly MetricRequest[]): MetricRequest[] {
  const metrics = TOLD.filter((metric) => metric !== 'emission_transmittance' || stack.panel.kind === 'mirror')
  const ofFile = stack.conditions.directions.flatMap(({ theta, phi }) =>
    metrics.map((metric) => ({ metric, theta, phi })),
  )
  return [...new Map([...ofFile, ...asked].map((request) => [JSON.stringify(request), request])).values()]
}

/** What a candidate is told by, once it is searched. */
export function describeCandidate(
  stack: Stack,
  { slots, question, requests }: { slots: Slots; question?: OptimizeQuestion; requests: readonly MetricRequest[] },
  choice: Choice,
  { x, value, violation, inFull }: FoundCandidate,
): Candidate {
  const cards = cardsOf(slots, choice)
  const filled = stackOf(stack, slots, choice)
  const paths = Object.keys(question?.vary ?? {})
  const design = setParameters(filled, Object.fromEntries(paths.map((path, k) => [path, x[k]])))
  const scene = new Scene(design)
  const price = totalPrice(cards)
  return {
    films: Object.fromEntries(slots.ids.map((id, slot) => [id, cards[slot].name])),
    files: Object.fromEntries(slots.ids.map((id, slot) => [id, cards[slot].file])),
    objective: (stack.optimize?.minimize.sense ?? 1) * value,
    parameters: Object.fromEntries(
      paths.map((path, k) => [path, toPlain(x[k], findParameter(filled, path)?.kind ?? 'number')]),
    ),
    violation,
    metrics: metricsOf(design, requests),
    limits_met: design.limits.every((limit) => evaluateLimit(scene, design, limit).met),
    ...(price !== undefined && { price_per_m2: price }),
    thickness_nm: cards.reduce((sum, card) => sum + card.layer.thickness, 0),
    searched_in_full: inFull,
  }
}

function metricsOf(design: Stack, requests: readonly MetricRequest[]): Record<string, number> {
  const values = new Float64Array(requests.length)
  createExperiment(design, [], requests)([], values)
  return Object.fromEntries(requests.map((request, k) => [metricKey(request, requests), values[k]]))
}

function totalPrice(cards: readonly FilmCard[]): number | undefined {
  return cards.every((card) => card.price_per_m2 !== undefined)
    ? cards.reduce((sum, card) => sum + (card.price_per_m2 ?? 0), 0)
    : undefined
}
