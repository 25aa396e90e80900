/**
 * What a pool and its workers say to each other: plain data that any message channel can carry. A worker handles its messages
 * in the order in which they were sent.
 */

export type ToWorker =
  /** Makes the job function of a task; later jobs name it by `setup`. `shared` is sent this once. */
  | { readonly kind: 'prepare'; readonly setup: number; readonly task: string; readonly shared: unknown }
  | { readonly kind: 'run'; readonly setup: number; readonly ticket: number; readonly job: unknown }
  /** The setup will not be named again. */
  | { readonly kind: 'forget'; readonly setup: number }

export type FromWorker =
  | { readonly kind: 'done'; readonly ticket: number; readonly result: unknown }
  | { readonly kind: 'failed'; readonly ticket: number; readonly fault: Fault }

/** An error on its way between threads. */
export interface Fault {
  readonly message: string
  readonly stack?: string
}

/** The pool's end of one worker: a thread of Node, a worker of the browser, or a pair of ports in a test. */
export interface WorkerLike {
  readonly post: (message: ToWorker) => void
  /** Called once. `onDeath` is told why the worker ended without having been asked to. */
  readonly listen: (onMessage: (message: FromWorker) => void, onDeath: (reason: string) => void) => void
  /** Ends the worker at once, whatever it is doing. */
  readonly end: () => void
}

/** The worker's end. */
export interface PoolPort {
  readonly post: (message: FromWorker) => void
  readonly listen: (onMessage: (message: ToWorker) => void) => void
}
