import type { FromWorker, PoolPort, ToWorker, WorkerLike } from '../../src/pool/messages.js'
import { serveJobs } from '../../src/pool/serveJobs.js'
import type { Task } from '../../src/studies/parallel.js'

export interface LocalWorker extends WorkerLike {
  /** What the pool has sent. */
  readonly sent: ToWorker[]
  readonly die: (reason: string) => void
}

/** A worker in this thread: messages are copied and arrive later, after `delay()` turns of the event loop, as between threads. */
export function startLocalWorker(
  tasks: readonly Task<never, never, unknown>[],
  delay: () => number = () => 1,
): LocalWorker {
  const sent: ToWorker[] = []
  let alive = true
  let toPool: (message: FromWorker) => void = () => undefined
  let die: (reason: string) => void = () => undefined
  let toWorker: (message: ToWorker) => void = () => undefined
  const port: PoolPort = {
    post: (message) => later(delay(), structuredClone(message), (copy) => alive && toPool(copy)),
    listen: (onMessage) => {
      toWorker = onMessage
    },
  }
  serveJobs(port, new Map(tasks.map((task) => [task.name, task])))
  return {
    sent,
    die: (reason) => {
      alive = false
      die(reason)
    },
    post: (message) => {
      sent.push(message)
      const copy = structuredClone(message)
      setImmediate(() => alive && toWorker(copy))
    },
    listen: (onMessage, onDeath) => {
      toPool = onMessage
      die = onDeath
    },
    end: () => {
      alive = false
    },
  }
}

function later<T>(turns: number, value: T, then: (value: T) => void): void {
  if (turns <= 0) then(value)
  else setImmediate(() => later(turns - 1, value, then))
}
