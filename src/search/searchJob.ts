/** The pieces of a global search that can be done side by side: plain data in, plain data out, no state between them. */
import { polish } from './polish.js'
import { type Candidate, type SearchProblem, violationOf } from './problem.js'
import type { Reason } from './result.js'

export type SearchJob =
  | { readonly kind: 'screen'; readonly points: readonly Float64Array[] }
  | {
      readonly kind: 'polish'
      readonly start: Float64Array
      readonly tolerance: number
      readonly step: number
      readonly maxEvaluations: number
      /** By the problem's stand-in, where it has one. */
      readonly rough?: boolean
    }

export interface SearchJobResult {
  /** The points screened, in order, with the values of the screening objective; or the one point found by the polish. */
  readonly candidates: readonly Candidate[]
  /** Of the objective proper. */
  readonly evaluations: number
  readonly reason: Reason
}

/** Results in the order of the jobs; undefined for a job that was not run, which ends the search. */
export type SearchJobMap = (jobs: readonly SearchJob[]) => Promise<readonly (SearchJobResult | undefined)[]>

/** Jobs one after the other, in the thread at hand. */
export function searchInline(problem: SearchProblem, stopped?: () => boolean): SearchJobMap {
  return async (jobs) => {
    const results: (SearchJobResult | undefined)[] = []
    for (const job of jobs) {
      results.push(stopped?.() ? undefined : runSearchJob(problem, job, stopped))
    }
    return results
  }
}

export function runSearchJob(problem: SearchProblem, job: SearchJob, stopped?: () => boolean): SearchJobResult {
  if (job.kind === 'polish') {
    const { start, tolerance, step, maxEvaluations } = job
    const options = { tolerance, step, maxEvaluations, stopped }
    const standIn = job.rough === true ? problem.rough : undefined
    const result = polish({ ...problem, ...standIn }, start, options)
    const end = standIn === undefined ? result : evaluated(problem, result.x)
    return { candidates: [end], evaluations: result.evaluations, reason: result.reason }
  }
  const candidates = job.points.map((x) => screen(problem, x))
  return {
    candidates,
    evaluations: problem.screen === undefined ? candidates.length : 0,
    reason: 'converged',
  }
}

function screen(problem: SearchProblem, x: Float64Array): Candidate {
  return evaluated({ ...problem, objective: problem.screen ?? problem.objective }, x)
}

function evaluated(problem: SearchProblem, x: Float64Array): Candidate {
  const value = problem.objective(x)
  return {
    x,
    value: Number.isFinite(value) ? value : Number.POSITIVE_INFINITY,
    violation: violationOf(problem.constraints?.(x) ?? []),
  }
}
