/**
 * Which film to buy: every combination of the film cards in the slots of a stack, each with its angles searched for (or as
 * the file has them), ranked. Where there are many, most are ruled out by a quick search: see `compareRounds.ts`.
 */
import { byMerit } from '../search/problem.js'
import type { OptimizeQuestion, Stack } from '../stack/stack.js'
import { allChoices, cardsOf, questionWithin, type Slots, slotsOf } from './candidate.js'
import { type CompareJob, type CompareShared, compareJob, type SearchedCandidate } from './compareJob.js'
import { type Margins, type RunJobs, searchInRounds } from './compareRounds.js'
import { type Candidate, candidateRequests, describeCandidate } from './describeCandidate.js'
import { axisOf, cost, defaultFront, type FrontAxis, type FrontRequest, isMetric } from './frontAxis.js'
import type { Hooks } from './hooks.js'
import { mapInline, type ParallelMap } from './parallel.js'
import { nondominated } from './pareto.js'

export interface CompareSettings {
  readonly seed: number
  /** How many of the best must each have been searched by itself; default 20. */
  readonly keep?: number
  /** Search every candidate by itself. */
  readonly exhaustive?: boolean
  /** Axes of the Pareto front; default `defaultFront`. */
  readonly front?: readonly FrontRequest[]
}

/** Results in hand from an interrupted run, by key, and a place to leave new ones. */
export interface CompareStore {
  readonly known: ReadonlyMap<string, SearchedCandidate>
  readonly keep: (key: string, candidate: SearchedCandidate) => void
}

export interface Comparison {
  readonly title: string
  readonly slots: readonly string[]
  readonly seed: number
  /** Whether angles were searched for. */
  readonly optimized: boolean
  /** Best first. */
  readonly candidates: readonly Candidate[]
  readonly front_axes: readonly FrontAxis[]
  /** Indices into `candidates` of those that no other betters in every axis. */
  readonly front: readonly number[]
  readonly ruled_out: number
  /** Absent where none was ruled out. */
  readonly margins?: Margins
  readonly interrupted: boolean
}

const DEFAULT_KEEP = 20

/** The stack must have `compare.slots`. */
export async function compare(
  stack: Stack,
  { seed, keep = DEFAULT_KEEP, exhaustive = false, front }: CompareSettings,
  hooks: Hooks = {},
  map: ParallelMap = mapInline,
  store: CompareStore = { known: new Map(), keep: () => undefined },
): Promise<Comparison> {
  const slots = slotsOf(stack)
  const question = questionOf(stack, slots)
  const choices = allChoices(slots)
  const run = runner({ stack, seed, ...(question && { question }) }, slots, map, store, hooks)
  const rounds = await searchInRounds(choices, { seed, keep, exhaustive: exhaustive || question === undefined }, run)
  const asked = front ?? defaultFront(stack, pricesAreKnown(slots))
  const requests = candidateRequests(stack, asked.filter(isMetric))
  const candidates = rounds.found
    .flatMap((found, k) => (found === undefined ? [] : [{ found, choice: choices[k] }]))
    .sort((a, b) => byMerit(a.found, b.found))
    .map(({ found, choice }) => describeCandidate(stack, { slots, question, requests }, choice, found))
  const ruledOut = rounds.complete ? candidates.filter((candidate) => !candidate.searched_in_full).length : 0
  const axes = asked.map((axis) => axisOf(axis, requests))
  const sense = stack.optimize?.minimize.sense ?? 1
  return {
    title: stack.title,
    slots: slots.ids,
    seed,
    optimized: question !== undefined,
    candidates,
    front_axes: axes,
    front: nondominated(candidates.map((candidate) => axes.map((axis) => cost(candidate, axis, sense)))),
    ruled_out: ruledOut,
    ...(rounds.margins && { margins: rounds.margins }),
    interrupted: !rounds.complete,
  }
}

/** What is searched for each candidate; undefined where the file wants the angles as they are, or nothing is left to vary. */
function questionOf({ compare: asked, optimize }: Stack, slots: Slots): OptimizeQuestion | undefined {
  return asked?.optimize === true && optimize !== undefined ? questionWithin(optimize, slots) : undefined
}

function pricesAreKnown({ cards }: Slots): boolean {
  return cards.flat().every((card) => card.price_per_m2 !== undefined)
}

/** Jobs handed out at a time, so that what is done is kept even if the rest is interrupted. */
const PORTION = 16

/** Runs the jobs whose results are not in hand. */
function runner(
  shared: CompareShared,
  slots: Slots,
  map: ParallelMap,
  store: CompareStore,
  { stopped, progress }: Hooks,
): RunJobs {
  return async (jobs, from, to) => {
    const keys = jobs.map((job) => keyOf(slots, job))
    const results = keys.map((key) => store.known.get(key))
    const missing = jobs.map((_, k) => k).filter((k) => results[k] === undefined)
    for (let begun = 0; begun < missing.length && stopped?.() !== true; begun += PORTION) {
      const portion = missing.slice(begun, begun + PORTION)
      const jobsNow = portion.map((k) => jobs[k])
      const found = await map(compareJob, shared, jobsNow, {
        stopped,
        progress: (done) => progress?.(from + ((to - from) * (begun + done * portion.length)) / missing.length),
      })
      portion.forEach((k, index) => {
        const result = found[index]
        if (result === undefined) return
        results[k] = result
        store.keep(keys[k], result)
      })
    }
    return results
  }
}

function keyOf(slots: Slots, { kind, choice }: CompareJob): string {
  return `${kind}:${cardsOf(slots, choice)
    .map((card) => card.file)
    .join('|')}`
}
