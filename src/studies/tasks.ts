import { coneRow } from './cone.js'
import type { Task } from './parallel.js'

/** Everything a worker can be asked for, by name. */
export const TASKS: ReadonlyMap<string, Task<never, never, unknown>> = new Map(
  [coneRow].map((task) => [task.name, task as Task<never, never, unknown>]),
)
