/**
 * The search of many candidates, of which only the best are wanted.
 *
 * 1. A seeded random sample of the candidates, the pilots, is searched each by itself, on all wavelengths.
 * 2. Every candidate is searched quickly, on few wavelengths, from the designs that did well among the pilots.
 * 3. By how much the quick search falls short of one by itself is seen on those searched both ways; three times the largest
 *    shortfall is taken as its bound, one for searches that a constraint held and one for the others. A candidate whose quick value, less that bound, is still worse than what enough others
 *    surely reach is ruled out. All others are searched by themselves, and the bound is taken anew with their shortfalls, until
 *    nothing more is to be searched.
 */
import { mixBits } from '../numeric/mixBits.js'
import { permute } from '../numeric/permute.js'
import { byMerit, isBetter } from '../search/problem.js'
import type { Choice } from './candidate.js'
import type { CompareJob, SearchedCandidate } from './compareJob.js'

export interface RoundSettings {
  readonly seed: number
  /** How many of the best must be searched by themselves. */
  readonly keep: number
  /** All are pilots. */
  readonly exhaustive: boolean
}

export interface Rounds {
  /** In the order of the choices; undefined where not searched before a stop. */
  readonly found: readonly (FoundCandidate | undefined)[]
  /** Absent where none was ruled out. */
  readonly margins?: Margins
  /** Nothing is left to be searched. */
  readonly complete: boolean
}

/** Bounds taken for what the quick search falls short by, in the objective's unit, as far as candidates were ruled out by them. */
export interface Margins {
  /** Where no constraint held the search. */
  readonly free?: number
  /** Where one did. */
  readonly held?: number
}

export interface FoundCandidate extends SearchedCandidate {
  readonly inFull: boolean
}

/** Results in the order of the jobs, undefined where not run; `done` and `to` are fractions of the whole. */
export type RunJobs = (
  jobs: readonly CompareJob[],
  from: number,
  to: number,
) => Promise<readonly (SearchedCandidate | undefined)[]>

const LEAST_PILOTS = 8
const PILOT_SHARE = 0.05
/** Designs that one pilot teaches at most. */
const TAUGHT = 4
const SAFETY = 3
/** Least bound, as a share of the objective: a search ends that near its optimum at best. */
const LEAST_MARGIN = 1e-4
/** Fractions of the time after pilots and quick searches, as it usually divides. */
const AFTER_PILOTS = 0.3
const AFTER_QUICK = 0.6
const AFTER_FIRST_OPEN = 0.95

export async function searchInRounds(
  choices: readonly Choice[],
  settings: RoundSettings,
  run: RunJobs,
): Promise<Rounds> {
  const full = new Map<number, SearchedCandidate>()
  const pilots = pilotsOf(choices.length, settings)
  const all = pilots.length === choices.length
  const pilotEnds = await run(
    pilots.map((k) => ({ kind: 'pilot', choice: choices[k] })),
    0,
    all ? 1 : AFTER_PILOTS,
  )
  enter(full, pilots, pilotEnds)
  if (all) return { found: together(full, pilotEnds), complete: !pilotEnds.includes(undefined) }
  const designs = pilotEnds.flatMap((end) => end?.designs.slice(0, TAUGHT) ?? [])
  const quick = await run(
    choices.map((choice) => ({ kind: 'quick', choice, designs })),
    AFTER_PILOTS,
    AFTER_QUICK,
  )
  const broken = pilotEnds.includes(undefined) || !isComplete(quick)
  const ruled = broken ? { complete: false } : await searchOpen(choices, settings, run, full, quick)
  return { found: together(full, quick), ...ruled }
}

/** Step 3; `full` grows by what is searched. */
async function searchOpen(
  choices: readonly Choice[],
  { keep }: RoundSettings,
  run: RunJobs,
  full: Map<number, SearchedCandidate>,
  quick: readonly SearchedCandidate[],
): Promise<Pick<Rounds, 'margins' | 'complete'>> {
  const begun = new Set<number>()
  for (let from = AFTER_QUICK, to = AFTER_FIRST_OPEN; ; [from, to] = [to, (1 + to) / 2]) {
    const margins = quick.map((end) => marginOf(full, quick, end.isHeld))
    const open = openCandidates(full, quick, keep, margins).filter((k) => !begun.has(k))
    if (open.length === 0) return { complete: true, ...usedMargins(full, quick, margins) }
    const jobs = open.map((k): CompareJob => ({ kind: 'full', choice: choices[k], from: quick[k].x }))
    const ends = await run(jobs, from, to)
    enter(full, open, ends)
    if (!isComplete(ends)) return { complete: false }
    for (const k of open) begun.add(k)
  }
}

function isComplete<T>(results: readonly (T | undefined)[]): results is readonly T[] {
  return !results.includes(undefined)
}

/** A seeded random sample without repetition, ascending; all where little would be left. */
function pilotsOf(count: number, { seed, exhaustive }: RoundSettings): number[] {
  const wanted = Math.max(LEAST_PILOTS, Math.ceil(PILOT_SHARE * count))
  const all = Array.from({ length: count }, (_, k) => k)
  if (exhaustive || count <= 2 * wanted) return all
  const drawn = all.slice(0, wanted).map((k) => permute(k, count, mixBits(seed)))
  return drawn.sort((a, b) => a - b)
}

/** Of two searches of one candidate the better end stays. */
function enter(
  full: Map<number, SearchedCandidate>,
  indices: readonly number[],
  ends: readonly (SearchedCandidate | undefined)[],
): void {
  indices.forEach((k, index) => {
    const end = ends[index]
    const known = full.get(k)
    if (end !== undefined && (known === undefined || isBetter(end, known))) full.set(k, end)
  })
}

function together(
  full: ReadonlyMap<number, SearchedCandidate>,
  others: readonly (SearchedCandidate | undefined)[],
): (FoundCandidate | undefined)[] {
  return others.map((other, k) => {
    const inFull = full.get(k)
    return inFull !== undefined ? { ...inFull, inFull: true } : other && { ...other, inFull: false }
  })
}

/**
 * Bound for the shortfall of quick searches of one sort: held by a constraint or not. Infinite where none of that sort was searched
 * both ways, or one missed that the constraints can be met.
 */
function marginOf(
  full: ReadonlyMap<number, SearchedCandidate>,
  quick: readonly SearchedCandidate[],
  isHeld: boolean | undefined,
): number {
  const margins = [...full].filter(([k]) => quick[k].isHeld === isHeld).map(([k, end]) => shortfallBound(end, quick[k]))
  return margins.length === 0 ? Number.POSITIVE_INFINITY : Math.max(...margins)
}

function shortfallBound({ value, violation }: SearchedCandidate, quick: SearchedCandidate): number {
  if (violation > 0) return 0
  if (quick.violation > 0) return Number.POSITIVE_INFINITY
  return Math.max(SAFETY * (quick.value - value), LEAST_MARGIN * Math.abs(value))
}

function usedMargins(
  full: ReadonlyMap<number, SearchedCandidate>,
  quick: readonly SearchedCandidate[],
  margins: readonly number[],
): Pick<Rounds, 'margins'> {
  const used: { free?: number; held?: number } = {}
  quick.forEach(({ isHeld }, k) => {
    if (!full.has(k)) used[isHeld === true ? 'held' : 'free'] = margins[k]
  })
  return full.size < quick.length ? { margins: used } : {}
}

/** Those perhaps among the best `keep` but not yet searched by themselves, or found better by the quick search than so. */
function openCandidates(
  full: ReadonlyMap<number, SearchedCandidate>,
  quick: readonly SearchedCandidate[],
  keep: number,
  margins: readonly number[],
): number[] {
  const reached = quick.map((end, k) => full.get(k) ?? end).sort(byMerit)
  const bar = reached[Math.min(keep, reached.length) - 1]
  const isOpen = (end: SearchedCandidate, k: number): boolean => {
    const known = full.get(k)
    return known === undefined ? mayReach(end, bar, margins[k]) : isBetter(end, known)
  }
  return quick.flatMap((end, k) => (isOpen(end, k) ? [k] : []))
}

function mayReach({ value, violation }: SearchedCandidate, bar: SearchedCandidate, margin: number): boolean {
  if (margin === Number.POSITIVE_INFINITY) return true
  if (violation > 0) return violation <= bar.violation
  return bar.violation > 0 || value - margin <= bar.value
}
