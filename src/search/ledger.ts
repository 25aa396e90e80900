import { type Candidate, isBetter } from './problem.js'
import type { Reason } from './result.js'
import type { SearchJob, SearchJobMap, SearchJobResult } from './searchJob.js'

/** Where a polish ended, and why. */
export interface PolishEnd extends Candidate {
  readonly reason: Reason
}

/** Has the jobs of a global search done and keeps its books, in the order of the jobs. */
export class Ledger {
  evaluations = 0
  polished = 0
  /** A job was not run, or was broken off: no more are started. */
  interrupted = false
  best: Candidate | undefined
  /** Each time the best point that meets the constraints improved. */
  readonly history: { readonly evaluations: number; readonly value: number }[] = []

  constructor(
    private readonly map: SearchJobMap,
    private readonly pointsPerJob: number,
  ) {}

  /** The points with their values, short of those not done. */
  async screen(points: readonly Float64Array[]): Promise<Candidate[]> {
    const jobs: SearchJob[] = []
    for (let k = 0; k < points.length; k += this.pointsPerJob) {
      jobs.push({ kind: 'screen', points: points.slice(k, k + this.pointsPerJob) })
    }
    return (await this.work(jobs)).flatMap((result) => result?.candidates ?? [])
  }

  /**
   * The ends of the polishes that begin in `starts`, in their order; they share the evaluations left up to `limit`; `rough`
   * by the problem's stand-in. Undefined
   * for those not done.
   */
  async polish(
    starts: readonly Float64Array[],
    tolerance: number,
    step: number,
    limit: number,
    rough = false,
  ): Promise<(PolishEnd | undefined)[]> {
    const left = Math.floor(limit - this.evaluations)
    const affordable = starts.slice(0, Math.max(0, left))
    const maxEvaluations = Math.floor(left / affordable.length)
    const results = await this.work(
      affordable.map((start) => ({ kind: 'polish', start, tolerance, step, maxEvaluations, rough })),
    )
    this.polished += results.filter((result) => result !== undefined).length
    return starts.map((_, k) => results[k] && { ...results[k].candidates[0], reason: results[k].reason })
  }

  private async work(jobs: readonly SearchJob[]): Promise<readonly (SearchJobResult | undefined)[]> {
    if (this.interrupted || jobs.length === 0) return []
    const results = await this.map(jobs)
    this.interrupted = results.some((result) => result === undefined || result.reason === 'stopped')
    for (const result of results) if (result !== undefined) this.enter(result)
    return results
  }

  private enter({ evaluations, candidates }: SearchJobResult): void {
    this.evaluations += evaluations
    // Values of a stand-in for the objective say nothing of the best.
    if (evaluations === 0) return
    for (const candidate of candidates) {
      if (!Number.isFinite(candidate.value)) continue
      if (this.best !== undefined && !isBetter(candidate, this.best)) continue
      this.best = candidate
      if (candidate.violation === 0) this.history.push({ evaluations: this.evaluations, value: candidate.value })
    }
  }
}
