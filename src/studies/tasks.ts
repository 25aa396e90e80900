import { coneRow } from './cone.js'
import type { Task } from './parallel.js'
import { sweepBlock } from './sweep.js'

/** Everything a worker can be asked for, by name. */
export const TASKS: ReadonlyMap<string, Task<never, never, unknown>> = new Map(
  [coneRow, sweepBlock].map((task) => [task.name, task as Task<never, never, unknown>]),
)
