/**
 * Which film to buy: every combination of the film cards in the slots of a stack, each with its angles searched for (or as
 * the file has them), ranked.
 *
 * Searching every combination at every wavelength is most of the work, so it is done in two rounds. First each candidate is
 * searched on a quarter of the wavelengths, and its optimum there evaluated in full: that value is one the candidate surely
 * reaches. The differences between full and coarse objective over all candidates give the error of the coarse one; three
 * times the largest is taken as its bound. A candidate whose coarse optimum, less that bound, is still worse than what enough
 * others surely reach cannot be among the best and is not searched further. The others are searched in full from there.
 */

import { globalSearch } from '../search/globalSearch.js'
import { runSearchJob, searchInline } from '../search/searchJob.js'
import { findParameter, getParameter, setParameters } from '../stack/parameters.js'
import type { FilmCard, MetricName, OptimizeQuestion, Stack } from '../stack/stack.js'
import { wavelengthsOf } from '../stack/wavelengths.js'
import { toPlain } from '../units/quantity.js'
import { allChoices, type Choice, cardsOf, questionWithin, type Slots, slotsOf, stackOf } from './candidate.js'
import { coarseWavelengths, designProblem, designVariables } from './designProblem.js'
import { evaluate } from './evaluate.js'
import type { Hooks } from './hooks.js'
import { mapInline, type ParallelMap, type Task } from './parallel.js'
import { nondominated } from './pareto.js'
import { prepareStack } from './prepareStack.js'

export interface CompareSettings {
  readonly seed: number
  /** Candidates that must be searched in full; default 20. */
  readonly keep?: number
  /** Search every candidate in full. */
  readonly exhaustive?: boolean
  /** Columns of the Pareto front, two or three; default objective, emission transmittance and price where known. */
  readonly front?: readonly FrontAxis[]
}

export type FrontAxis = 'objective' | 'price_per_m2' | 'thickness_nm' | MetricName

/** Results in hand from an interrupted run, by key, and a place to leave new ones. */
export interface CompareStore {
  readonly known: ReadonlyMap<string, SearchedCandidate>
  readonly keep: (key: string, candidate: SearchedCandidate) => void
}

/** Parameters in nm, degrees, fractions. */
export interface Candidate {
  readonly films: Readonly<Record<string, string>>
  readonly objective: number
  readonly parameters: Readonly<Record<string, number>>
  readonly metrics: Readonly<Record<string, number>>
  readonly limits_met: boolean
  /** Sum over the slots; absent where a card has no price. */
  readonly price_per_m2?: number
  /** Of the chosen films together. */
  readonly thickness_nm: number
  /** False where the first round ruled the candidate out: its objective is then that of the coarse search. */
  readonly searched_in_full: boolean
}

export interface Comparison {
  readonly title: string
  readonly slots: readonly string[]
  readonly seed: number
  /** Best first. */
  readonly candidates: readonly Candidate[]
  readonly front_axes: readonly FrontAxis[]
  /** Indices into `candidates` of those that no other betters in every axis. */
  readonly front: readonly number[]
  readonly ruled_out: number
  /** Bound taken for the error of the coarse objective. */
  readonly coarse_error: number
  readonly interrupted: boolean
}

interface Shared {
  readonly stack: Stack
  readonly question: OptimizeQuestion | undefined
  readonly seed: number
}

interface Job {
  readonly choice: Choice
  /** Where the first round ended; absent in the first round. */
  readonly from?: readonly number[]
}

/** Optimum in internal units: nm, rad, fractions; the objective with the sign of a minimum. */
export interface SearchedCandidate {
  readonly x: readonly number[]
  /** At `x`, on the coarse wavelengths and on all. */
  readonly coarse: number
  readonly full: number
}

export const compareJob: Task<Shared, Job, SearchedCandidate> = {
  name: 'compareJob',
  prepare: async ({ stack, question, seed }) => {
    await prepareStack(stack)
    const slots = slotsOf(stack)
    for (const card of slots.cards.flat()) await prepareStack({ ...stack, layers: [card.layer] })
    return (job) => searchCandidate(stackOf(stack, slots, job.choice), question, seed, job)
  },
}

/** Smallest edge of the last simplex, tolerance and evaluations of the second round's polish. */
const POLISH = { kind: 'polish', tolerance: 1e-9, step: 0.02, maxEvaluations: 4000 } as const

async function searchCandidate(
  stack: Stack,
  question: OptimizeQuestion | undefined,
  seed: number,
  { from }: Job,
): Promise<SearchedCandidate> {
  if (question === undefined) return fixedCandidate(stack)
  const wavelengths = wavelengthsOf(stack.conditions)
  const full = designProblem(stack, question, wavelengths)
  const coarse = designProblem(stack, question, coarseWavelengths(wavelengths))
  let x: Float64Array
  if (from !== undefined) x = runSearchJob(full, { ...POLISH, start: Float64Array.from(from) }).candidates[0].x
  else {
    const start = Object.keys(question.vary).map((path) => getParameter(stack, path))
    x = (await globalSearch(designVariables(stack, question), searchInline(coarse), { seed, start })).x
  }
  return { x: Array.from(x), coarse: penalized(coarse, x), full: penalized(full, x) }
}

/** Objective of a problem; what misses a constraint is worse than all that does not. */
function penalized(problem: ReturnType<typeof designProblem>, x: Float64Array): number {
  const missed = Math.max(0, ...(problem.constraints?.(x) ?? []))
  return problem.objective(x) + (missed > 1e-7 ? 1e3 * (1 + missed) : 0)
}

/** Angles as the file has them: the objective is the file's, or the color-weighted reflectance head-on. */
function fixedCandidate(stack: Stack): SearchedCandidate {
  const minimize = stack.optimize?.minimize ?? HEAD_ON
  const value = designProblem(stack, { vary: {}, minimize, subject_to: [] }).objective(new Float64Array(0))
  return { x: [], coarse: value, full: value }
}

const HEAD_ON = {
  metric: 'color_weighted_reflectance',
  sense: 1,
  views: [{ theta: 0, phi: 0, weight: 1 }],
} as const

const DEFAULT_KEEP = 20
const SAFETY = 3

/** The stack must have `compare.slots`. */
export async function compare(
  stack: Stack,
  settings: CompareSettings,
  hooks: Hooks = {},
  map: ParallelMap = mapInline,
  store: CompareStore = { known: new Map(), keep: () => undefined },
): Promise<Comparison> {
  const slots = slotsOf(stack)
  const asked = stack.compare?.optimize === true && stack.optimize !== undefined
  const question = asked && stack.optimize !== undefined ? questionWithin(stack.optimize, slots) : undefined
  const shared: Shared = { stack, question, seed: settings.seed }
  const choices = allChoices(slots)
  const run = (jobs: readonly Job[], from: number, to: number) =>
    searchMissing(shared, slots, jobs, map, store, partOf(hooks, from, to))
  const first = await run(
    choices.map((choice) => ({ choice })),
    0,
    question === undefined ? 1 : 0.7,
  )
  const done = first.flatMap((result, k) => (result === undefined ? [] : [{ choice: choices[k], result }]))
  const coarseError = SAFETY * Math.max(0, ...done.map(({ result }) => Math.abs(result.full - result.coarse)))
  const kept = question === undefined ? [] : survivors(done, coarseError, settings)
  const second = await run(
    kept.map(({ choice, result }) => ({ choice, from: result.x })),
    0.7,
    1,
  )
  const refined = new Map(kept.map(({ choice }, k) => [choice, second[k]]))
  const candidates = done
    .map(({ choice, result }) => {
      const final = refined.get(choice)
      return describe(stack, slots, choice, question, final ?? result, question === undefined || final !== undefined)
    })
    .sort((a, b) => Number(b.ranked.searched_in_full) - Number(a.ranked.searched_in_full) || a.order - b.order)
    .map(({ ranked }) => ranked)
  const axes = settings.front ?? defaultAxes(candidates)
  const sense = stack.optimize?.minimize.sense ?? 1
  return {
    title: stack.title,
    slots: slots.ids,
    seed: settings.seed,
    candidates,
    front_axes: axes,
    front: nondominated(candidates.map((candidate) => axes.map((axis) => cost(candidate, axis, sense)))),
    ruled_out: candidates.filter((candidate) => !candidate.searched_in_full).length,
    coarse_error: coarseError,
    interrupted: done.length < choices.length || second.includes(undefined),
  }
}

interface Done {
  readonly choice: Choice
  readonly result: SearchedCandidate
}

/** Those that may be among the best `keep`: not surely worse than what that many others surely reach. */
function survivors(
  done: readonly Done[],
  coarseError: number,
  { keep = DEFAULT_KEEP, exhaustive }: CompareSettings,
): Done[] {
  if (exhaustive === true) return [...done]
  const reached = done.map(({ result }) => result.full).sort((a, b) => a - b)
  const bar = reached[Math.min(keep, reached.length) - 1]
  return done.filter(({ result }) => result.coarse - coarseError <= bar)
}

/** Runs the jobs whose results are not in hand. */
async function searchMissing(
  shared: Shared,
  slots: Slots,
  jobs: readonly Job[],
  map: ParallelMap,
  store: CompareStore,
  hooks: Hooks,
): Promise<(SearchedCandidate | undefined)[]> {
  const keys = jobs.map((job) => keyOf(slots, job))
  const results = keys.map((key) => store.known.get(key))
  const missing = jobs.map((_, k) => k).filter((k) => results[k] === undefined)
  // Handed out in portions, so that what is done is kept even if the rest is interrupted.
  for (let from = 0; from < missing.length; from += PORTION) {
    const portion = missing.slice(from, from + PORTION)
    const found = await map(
      compareJob,
      shared,
      portion.map((k) => jobs[k]),
      {
        stopped: hooks.stopped,
        progress: (done) => hooks.progress?.((from + done * portion.length) / missing.length),
      },
    )
    portion.forEach((k, index) => {
      const result = found[index]
      if (result === undefined) return
      results[k] = result
      store.keep(keys[k], result)
    })
    if (hooks.stopped?.() === true) break
  }
  return results
}

const PORTION = 16

function keyOf(slots: Slots, { choice, from }: Job): string {
  const films = cardsOf(slots, choice).map((card) => card.file)
  return `${from === undefined ? 'coarse' : 'full'}:${films.join('|')}`
}

function partOf(hooks: Hooks, from: number, to: number): Hooks {
  return { ...hooks, progress: (done, note) => hooks.progress?.(from + done * (to - from), note) }
}

function describe(
  stack: Stack,
  slots: Slots,
  choice: Choice,
  question: OptimizeQuestion | undefined,
  result: SearchedCandidate,
  inFull: boolean,
): { ranked: Candidate; order: number } {
  const cards = cardsOf(slots, choice)
  const filled = stackOf(stack, slots, choice)
  const paths = Object.keys(question?.vary ?? {})
  const design = setParameters(filled, Object.fromEntries(paths.map((path, k) => [path, result.x[k]])))
  const evaluation = evaluate(design)
  const [headOn] = evaluation.directions
  const sense = stack.optimize?.minimize.sense ?? 1
  const price = totalPrice(cards)
  const ranked: Candidate = {
    films: Object.fromEntries(slots.ids.map((id, slot) => [id, cards[slot].name])),
    objective: sense * result.full,
    parameters: Object.fromEntries(
      paths.map((path, k) => [path, toPlain(result.x[k], findParameter(filled, path)?.kind ?? 'number')]),
    ),
    metrics: {
      luminous_reflectance: headOn.luminous_reflectance,
      color_weighted_reflectance: headOn.color_weighted_reflectance,
      chroma: headOn.chroma,
      ...(headOn.emission_transmittance !== undefined && { emission_transmittance: headOn.emission_transmittance }),
    },
    limits_met: evaluation.limits.every((limit) => limit.met),
    ...(price !== undefined && { price_per_m2: price }),
    thickness_nm: cards.reduce((sum, card) => sum + card.layer.thickness, 0),
    searched_in_full: inFull,
  }
  return { ranked, order: result.full }
}

function totalPrice(cards: readonly FilmCard[]): number | undefined {
  return cards.every((card) => card.price_per_m2 !== undefined)
    ? cards.reduce((sum, card) => sum + (card.price_per_m2 ?? 0), 0)
    : undefined
}

function defaultAxes(candidates: readonly Candidate[]): FrontAxis[] {
  const [any] = candidates
  return [
    'objective',
    ...(any?.metrics.emission_transmittance !== undefined ? (['emission_transmittance'] as const) : []),
    ...(candidates.every((candidate) => candidate.price_per_m2 !== undefined) ? (['price_per_m2'] as const) : []),
  ]
}

const MORE_IS_BETTER: readonly FrontAxis[] = ['emission_transmittance', 'ambient_contrast']

/** Less is better; what is not known is worst. */
function cost(candidate: Candidate, axis: FrontAxis, sense: 1 | -1): number {
  if (axis === 'objective') return sense * candidate.objective
  const value = axis === 'price_per_m2' || axis === 'thickness_nm' ? candidate[axis] : candidate.metrics[axis]
  if (value === undefined) return Number.POSITIVE_INFINITY
  return MORE_IS_BETTER.includes(axis) ? -value : value
}
