/**
 * The best of all local optima, and the others nearly as good.
 *
 * Multistart in rounds. A round adds Sobol' points to the sample, screens them, and polishes roughly the most promising of those
 * that lie farther from every earlier start than the critical distance of multi-level single linkage,
 *
 *   r = ½ (σ ln N / N)^(1/d)   in the maximum norm of scaled coordinates
 *
 * (after Rinnooy Kan, Timmer, Math. Program. 39, 57 (1987), doi:10.1007/BF02592071), N points of d dimensions: within r of a point
 * some other sample is to be expected. It shrinks as N grows, so that no part of the space stays closed. The rounds end when the basins
 * of the *rivals* (optima within 1 % of the best, which could still turn out to be it) are known: N searches that ended in W distinct ones have seen, as
 * an expectation over a uniform prior, the share
 *
 *   (N - W - 1)(N + W) / N(N - 1)
 *
 * of them (Boender, Rinnooy Kan, Math. Program. 37, 59 (1987), doi:10.1007/BF02591684). Only the families within the margin are
 * then polished to the end.
 *
 * All decisions are made between rounds from the results in the order of their jobs, so they do not depend on who ran what when.
 */
import { Families, type Family } from './families.js'
import { Ledger } from './ledger.js'
import type { Candidate } from './problem.js'
import { DEFAULT_TOLERANCE, type Reason, resolution, type SearchOptions, type SearchResult } from './result.js'
import { Sample } from './sample.js'
import type { SearchJobMap } from './searchJob.js'
import { StartPoints } from './startPoints.js'
import { Space, type Variable } from './variables.js'

export interface GlobalOptions extends SearchOptions {
  /** Of the Sobol' points; default 1. The same seed gives the same digits. */
  readonly seed?: number
  /** Most evaluations of the objective; default 20,000. */
  readonly maxEvaluations?: number
  /** A point in hand, which is polished first. */
  readonly start?: ArrayLike<number>
  /** Families are kept whose value is within this share of the best's magnitude; default 0.05. */
  readonly margin?: number
  /** Share of a variable's range below which two optima are one family; default 0.05. */
  readonly separation?: number
  /** Between batches: a fraction of the work done (an estimate) and the best so far. */
  readonly progress?: (done: number, best: Candidate) => void
}

/**
 * `x`, `value` and `violation` are those of the best point evaluated: `families[0]`, but where the search was broken off before its
 * first polish. `iterations` counts rounds.
 */
export interface GlobalResult extends SearchResult {
  /** Largest constraint missed by the best; 0 where all are met. */
  readonly violation: number
  /** Distinct local optima within the margin, best first; empty where the objective has no finite value. */
  readonly families: readonly Family[]
  /** Points screened, and starts polished. */
  readonly screened: number
  readonly polished: number
  /** Each time the best (of those that meet the constraints) improved, and the end; ascending evaluations. */
  readonly history: readonly { readonly evaluations: number; readonly value: number }[]
}

/** Runs the search with `map` doing the jobs: all that is needed of the problem here is its variables. */
export async function globalSearch(
  variables: readonly Variable[],
  map: SearchJobMap,
  options: GlobalOptions = {},
): Promise<GlobalResult> {
  const search = new Multistart(new Space(variables), map, options)
  const reason = await search.run()
  return search.result(reason)
}

const DEFAULT_MARGIN = 0.05
const DEFAULT_SEPARATION = 0.05
const DEFAULT_EVALUATIONS = 20_000
/** Share of the evaluations kept for the last polish. */
const RESERVE = 0.25
/** Share of the others used before listed values are exchanged. */
const SHARE_BEFORE_EXCHANGE = 0.5
/** Points added per round and dimension, and per combination of listed values in the first round. */
const POINTS_PER_DIMENSION = 16
const POINTS_PER_COMBINATION = 8
const POINTS_PER_JOB = 32
const STARTS_PER_ROUND = 6
const MOST_ROUNDS = 200
/** Share of the best's magnitude within which an optimum known only roughly is a rival. */
const RIVAL_MARGIN = 0.01
/** The search for basins ends when this share of the rivals' is expected to be known, … */
const WANTED_COVERAGE = 0.95
/**
 * … or when so many starts came to the best value: the rule for a valley of equal designs, which has no number. With 14, all of
 * 120 runs on film pairs (three boxes, 40 seeds) found the best of their basins; with 10, one did not.
 */
const ENOUGH_HITS = 14
/** Tolerance of the first polish as a share of the sample's spread; edges of the simplices as shares of the ranges. */
const FIRST_TOLERANCE = 1e-4
const LOOSEST_TOLERANCE = 1e-3
/** How many times that tolerance the first polish may end above its minimum. */
const ROUGHNESS = 10
const FIRST_STEP = 0.1
const LAST_STEP = 0.02
const MOST_FAMILIES = 12

class Multistart {
  private readonly startPoints: StartPoints
  private readonly sample: Sample
  private readonly ledger: Ledger
  private readonly tolerance: number
  private readonly margin: number
  private readonly limit: number
  /** Evaluations up to which basins are looked for. */
  private readonly exploring: number
  private families: Families
  /** How far above their minimum the families may still be. */
  private slack = 0
  private rounds = 0

  constructor(
    private readonly space: Space,
    map: SearchJobMap,
    private readonly options: GlobalOptions,
  ) {
    this.startPoints = new StartPoints(space, options.seed ?? 1)
    this.sample = new Sample(space, this.startPoints)
    this.ledger = new Ledger(map, POINTS_PER_JOB)
    this.families = this.noFamilies()
    this.tolerance = options.tolerance ?? DEFAULT_TOLERANCE
    this.margin = options.margin ?? DEFAULT_MARGIN
    this.limit = options.maxEvaluations ?? DEFAULT_EVALUATIONS
    this.exploring = (1 - RESERVE) * this.limit
  }

  async run(): Promise<Reason> {
    const known = await this.findBasins()
    if (this.startPoints.combinations === undefined) await this.exchangeListed()
    const reason = await this.finish()
    if (this.ledger.interrupted) return 'stopped'
    return known ? reason : 'limit'
  }

  result(reason: Reason): GlobalResult {
    const { evaluations, polished, history, best } = this.ledger
    const { x, value, violation } = best ?? {
      x: this.startPoints.point(0),
      value: Number.POSITIVE_INFINITY,
      violation: Number.POSITIVE_INFINITY,
    }
    return {
      x,
      value,
      violation,
      families: this.within(this.margin),
      evaluations,
      iterations: this.rounds,
      reason,
      screened: this.sample.size,
      polished,
      history: violation === 0 ? [...history, { evaluations, value }] : history,
    }
  }

  /** Rounds until the basins of interest are known (true) or the evaluations spent (false). */
  private async findBasins(): Promise<boolean> {
    const { start } = this.options
    const { combinations } = this.startPoints
    const first = start === undefined ? [] : [this.space.nearest(start)]
    for (const x of first) this.sample.markStarted(x)
    if (this.space.continuous.length === 0 && combinations !== undefined) {
      await this.polishRoughly(combinations.map((_, k) => this.startPoints.point(k)))
      return true
    }
    const share = combinations === undefined ? SHARE_BEFORE_EXCHANGE : 1
    while (this.mayExplore(share)) {
      this.rounds++
      await this.screenMore()
      await this.polishRoughly([...first.splice(0), ...this.sample.promising(STARTS_PER_ROUND)])
      if (this.basinsAreKnown()) return true
    }
    return false
  }

  private mayExplore(share = 1): boolean {
    const { interrupted, evaluations } = this.ledger
    return !interrupted && this.rounds < MOST_ROUNDS && evaluations < share * this.exploring
  }

  private async screenMore(): Promise<void> {
    const combinations = this.startPoints.combinations?.length ?? 1
    const first = this.sample.size === 0 ? POINTS_PER_COMBINATION * combinations : 0
    const wanted = Math.max(first, POINTS_PER_DIMENSION * this.space.variables.length)
    const count = Math.min(wanted, Math.ceil(this.exploring - this.ledger.evaluations))
    this.sample.add(await this.ledger.screen(this.sample.next(count)))
  }

  private async polishRoughly(starts: readonly Float64Array[]): Promise<void> {
    const tolerance = Math.max(this.tolerance, Math.min(LOOSEST_TOLERANCE, FIRST_TOLERANCE * this.sample.spread()))
    this.slack = ROUGHNESS * FIRST_TOLERANCE * this.sample.spread()
    for (const end of await this.ledger.polish(starts, tolerance, FIRST_STEP, this.exploring, true)) {
      if (end !== undefined) this.families.add(end)
    }
    const { best, evaluations } = this.ledger
    const done = Math.max(evaluations / this.limit, this.hitsOfBest() / ENOUGH_HITS)
    if (best !== undefined) this.options.progress?.(Math.min(0.95, done), best)
  }

  private basinsAreKnown(): boolean {
    const rivals = this.within(Math.min(RIVAL_MARGIN, this.margin))
    const searches = hitsOf(rivals)
    const known = ((searches - rivals.length - 1) * (searches + rivals.length)) / (searches * (searches - 1))
    if (searches > 1 && known >= WANTED_COVERAGE) return true
    return this.hitsOfBest() >= ENOUGH_HITS
  }

  private hitsOfBest(): number {
    return hitsOf(this.families.within(FIRST_TOLERANCE * this.sample.spread()))
  }

  /** Where the combinations of listed values are too many to sample each: one value at a time, as long as that helps. */
  private async exchangeListed(): Promise<void> {
    for (let before: Candidate | undefined; this.mayExplore(); ) {
      const { best } = this.ledger
      if (best === undefined || best === before) return
      before = best
      const neighbors = await this.ledger.screen(this.startPoints.exchanges(best.x))
      neighbors.sort((a, b) => a.violation - b.violation || a.value - b.value)
      await this.polishRoughly(neighbors.slice(0, STARTS_PER_ROUND).map(({ x }) => x))
    }
  }

  /** Polishes what is of interest to the end; returns why that of the best ended. */
  private async finish(): Promise<Reason> {
    if (this.space.continuous.length === 0) return 'converged'
    const rough = this.within(this.margin).slice(0, MOST_FAMILIES)
    const starts = rough.map(({ x }) => x)
    const ends = await this.ledger.polish(starts, this.tolerance, LAST_STEP, this.limit)
    this.families = this.noFamilies()
    rough.forEach((family, k) => {
      this.families.add(ends[k] ?? family, family.hits)
    })
    this.slack = 0
    const best = ends.find((end) => end !== undefined && end.value === this.families.best?.value)
    return best?.reason ?? 'limit'
  }

  /** Families within a share of the best's magnitude, or of what is not followed. */
  private within(margin: number): Family[] {
    const value = this.families.best?.value ?? 0
    return this.families.within(margin * Math.abs(value) + Math.max(this.slack, resolution(this.tolerance, value)))
  }

  private noFamilies(): Families {
    return new Families(this.space, this.options.separation ?? DEFAULT_SEPARATION)
  }
}

function hitsOf(families: readonly Family[]): number {
  return families.reduce((sum, { hits }) => sum + hits, 0)
}
