/**
 * What to tighten: how far each spread must shrink, the others as they are, for a wanted yield; and which spreads may
 * double.
 */
import { findParameter } from '../stack/parameters.js'
import { toPlain } from '../units/quantity.js'
import type { Hooks } from './hooks.js'
import type { ParallelMap } from './parallel.js'
import { createScaledYields, type ScaledYields, type ToleratedStack } from './scaledYields.js'
import { type SpreadMeasure, spreadSize } from './spreads.js'
import { stageHooks } from './stageHooks.js'
import { createVariation, type Factor } from './variation.js'

export interface Tightening {
  readonly wanted_yield: number
  /** The first draws of the run, used for all that follows, and their yield with the spreads of the file. */
  readonly draws: number
  readonly yield: number
  /** One per parameter or group; then `all`, shrinking alike, where there are several. */
  readonly spreads: readonly TightenedSpread[]
}

export interface TightenedSpread {
  /** A path, the paths given together joined by ` + `, or `all`. */
  readonly parameter: string
  /** `met`: the wanted yield is reached as it is. */
  readonly verdict: 'met' | 'alone' | 'cannot_alone'
  /** What may be left of the spread (a share), and the yield then; present for `alone`. */
  readonly scale?: number
  readonly yield_reached?: number
  /** Yield if this spread were nothing. */
  readonly yield_without: number
  readonly yield_doubled: number
  /** Doubled, it keeps the wanted yield or costs no more than half a percent of the production. */
  readonly can_be_doubled: boolean
  readonly paths: readonly SpreadChange[]
}

/** nm, degrees, fractions. */
export interface SpreadChange {
  readonly path: string
  readonly measure: SpreadMeasure
  readonly now: number
  /** Present for `alone`. */
  readonly needed?: number
}

export const MOST_DRAWS = 1000
/** Halvings of the scale: to 1/64, finer than so many draws can tell. */
const HALVINGS = 6
/** Of the work, about, where all spreads must be halved down. */
const ENDS_SHARE = 0.3
const LOSS_ALLOWED = 0.005

interface Bracket {
  readonly candidate: Factor
  readonly without: number
  readonly doubled: number
  /** Largest scale known to reach the wanted yield, and the yield there; smallest known to miss it. */
  low: number
  reached: number
  high: number
}

/** The stack must have limits; undefined where it was stopped. */
export async function tighten(
  shared: ToleratedStack,
  wantedYield: number,
  hooks: Hooks,
  map: ParallelMap,
): Promise<Tightening | undefined> {
  const { factors } = createVariation(shared.stack, shared.question)
  const draws = Math.min(MOST_DRAWS, shared.question.samples)
  const yields = createScaledYields(shared, draws, map)
  const ends = await measureEnds(factors, yields, roundHooks(hooks, 0))
  if (ends === undefined) return undefined
  const { now, brackets } = ends
  const open = brackets.filter(({ without }) => now < wantedYield && without >= wantedYield)
  for (let round = 1; round <= HALVINGS && open.length > 0; round++) {
    const scales = open.map((bracket) => scalesFor(factors, bracket.candidate, (bracket.low + bracket.high) / 2))
    const found = await yields(scales, roundHooks(hooks, round))
    if (found === undefined) return undefined
    open.forEach((bracket, k) => {
      halve(bracket, found[k], wantedYield)
    })
  }
  return {
    wanted_yield: wantedYield,
    draws,
    yield: now,
    spreads: brackets.map((bracket) => describe(shared, bracket, now, wantedYield)),
  }
}

/** Yield as it is, and with each candidate's spread gone and doubled. */
async function measureEnds(factors: readonly Factor[], yields: ScaledYields, hooks: Hooks) {
  const all: Factor = { name: 'all', paths: factors.flatMap(({ paths }) => paths) }
  const candidates = factors.length > 1 ? [...factors, all] : factors
  const found = await yields(
    [
      factors.map(() => 1),
      ...candidates.map((candidate) => scalesFor(factors, candidate, 0)),
      ...candidates.map((candidate) => scalesFor(factors, candidate, 2)),
    ],
    hooks,
  )
  if (found === undefined) return undefined
  const brackets = candidates.map((candidate, k): Bracket => {
    const without = found[1 + k]
    return { candidate, without, doubled: found[1 + candidates.length + k], low: 0, reached: without, high: 1 }
  })
  return { now: found[0], brackets }
}

function scalesFor(factors: readonly Factor[], candidate: Factor, scale: number): number[] {
  return factors.map(({ paths }) => (candidate.paths.includes(paths[0]) ? scale : 1))
}

function halve(bracket: Bracket, found: number, wantedYield: number): void {
  const middle = (bracket.low + bracket.high) / 2
  if (found < wantedYield) bracket.high = middle
  else Object.assign(bracket, { low: middle, reached: found })
}

function describe(shared: ToleratedStack, bracket: Bracket, now: number, wantedYield: number): TightenedSpread {
  const { candidate, without, doubled, low, reached } = bracket
  const verdict = now >= wantedYield ? 'met' : without >= wantedYield ? 'alone' : 'cannot_alone'
  return {
    parameter: candidate.name,
    verdict,
    ...(verdict === 'alone' && { scale: low, yield_reached: reached }),
    yield_without: without,
    yield_doubled: doubled,
    can_be_doubled: doubled >= wantedYield || doubled >= now - LOSS_ALLOWED,
    paths: candidate.paths.map((path) => spreadChange(shared, path, verdict === 'alone' ? low : undefined)),
  }
}

function spreadChange({ stack, question }: ToleratedStack, path: string, scale: number | undefined): SpreadChange {
  const { size, measure } = spreadSize(question.vary[path])
  const kind = findParameter(stack, path)?.kind ?? 'number'
  return {
    path,
    measure,
    now: toPlain(size, kind),
    ...(scale !== undefined && { needed: toPlain(scale * size, kind) }),
  }
}

/** Round 0 measures the ends, each later one halves. */
function roundHooks(hooks: Hooks, round: number): Hooks {
  const end = (rounds: number) => ENDS_SHARE + ((1 - ENDS_SHARE) * rounds) / HALVINGS
  return stageHooks(hooks, round === 0 ? 0 : end(round - 1), end(round))
}
