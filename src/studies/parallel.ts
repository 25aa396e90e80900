import type { Hooks } from './hooks.js'

/**
 * A piece of a study that can run anywhere: `prepare` takes what all jobs share (plain data, sent once to each worker)
 * and returns the function of a job (plain data in, plain data out). A job starts from a fresh state, so that its digits
 * do not depend on which worker ran what before.
 */
export interface Task<Shared, Job, Result> {
  /** Key in `tasks.ts`, by which a worker finds it. */
  readonly name: string
  readonly prepare: (shared: Shared) => Promise<(job: Job) => Result | Promise<Result>>
}

/**
 * Results in the order of the jobs, whatever the number of workers. `hooks.progress` counts jobs; where `hooks.stopped`
 * turns true no further job is started, and the results of those not run are undefined.
 */
export type ParallelMap = <Shared, Job, Result>(
  task: Task<Shared, Job, Result>,
  shared: Shared,
  jobs: readonly Job[],
  hooks?: Hooks,
) => Promise<(Result | undefined)[]>

/** The results before the first that is missing: what a stopped study can still tell. */
export function leadingResults<Result>(results: readonly (Result | undefined)[]): Result[] {
  let count = 0
  while (count < results.length && results[count] !== undefined) count++
  return results.slice(0, count) as Result[]
}

/** A parallel map in the thread at hand; a stop is asked for between jobs. */
export const mapInline: ParallelMap = async (task, shared, jobs, hooks = {}) => {
  const run = await task.prepare(shared)
  // Filled, so that what is not run is undefined and not a hole that array methods pass over.
  const results = new Array(jobs.length).fill(undefined)
  for (let k = 0; k < jobs.length; k++) {
    if (hooks.stopped?.()) break
    results[k] = await run(jobs[k])
    hooks.progress?.((k + 1) / jobs.length)
  }
  return results
}
