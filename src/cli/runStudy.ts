import type { Hooks } from '../studies/hooks.js'
import type { ParallelMap } from '../studies/parallel.js'
import type { Context } from './context.js'
import { nodeWorkers } from './nodeWorkers.js'

/** Runs a long study over worker threads, with its progress shown and Ctrl-C heard. */
export async function runStudy<Result>(
  { options, terminal, interrupt }: Context,
  label: string,
  study: (hooks: Hooks, map: ParallelMap) => Promise<Result>,
): Promise<Result> {
  interrupt.arm()
  const progress = terminal.progress(label)
  const pool = nodeWorkers(options.workers)
  try {
    return await study({ progress: progress.update, stopped: interrupt.stopped }, pool.map)
  } finally {
    progress.end()
    pool.close()
  }
}
