import { compareJob } from './compare.js'
import { coneRow } from './cone.js'
import { optimizeJob } from './optimize.js'
import type { Task } from './parallel.js'
import { sweepBlock } from './sweep.js'

/** Everything a worker can be asked for, by name. */
export const TASKS: ReadonlyMap<string, Task<never, never, unknown>> = new Map(
  [compareJob, coneRow, optimizeJob, sweepBlock].map((task) => [task.name, task as Task<never, never, unknown>]),
)
