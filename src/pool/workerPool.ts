/**
 * The parallel map over any kind of workers. Jobs are handed out in their order, results are put in the place of their job,
 * and a job is a pure function: the outcome does not depend on the number of workers or on which was faster.
 */
import type { Hooks } from '../studies/hooks.js'
import type { ParallelMap, Task } from '../studies/parallel.js'
import { JobError } from './jobError.js'
import type { FromWorker, WorkerLike } from './messages.js'

export interface WorkerPool {
  readonly map: ParallelMap
  /** Ends the workers at once; a map that is under way is rejected. */
  readonly close: () => void
}

/** Jobs a worker holds at a time: it begins the next one while the answer to the last is on its way. */
const JOBS_HELD = 2
/** Setups a worker keeps, so that a search which maps again and again over the same stack sends it once. */
const SETUPS_KEPT = 4

/** Starts `count` workers when the first job comes. */
export function createWorkerPool(count: number, startWorker: () => WorkerLike): WorkerPool {
  const pool = new Pool(count, startWorker)
  return { map: (task, shared, jobs, hooks) => pool.map(task, shared, jobs, hooks), close: () => pool.close() }
}

interface Batch {
  readonly task: string
  readonly shared: unknown
  readonly setup: number
  readonly jobs: readonly unknown[]
  readonly results: unknown[]
  readonly hooks: Hooks
  readonly resolve: (results: unknown[]) => void
  readonly reject: (error: Error) => void
  next: number
  held: number
  done: number
}

interface Hand {
  readonly worker: WorkerLike
  /** Setups sent, the oldest first. */
  readonly setups: Set<number>
  /** Jobs it holds, by ticket. */
  readonly held: Map<number, { readonly batch: Batch; readonly index: number }>
}

class Pool {
  private hands: Hand[] = []
  private batches: Batch[] = []
  private readonly setupNumbers = new WeakMap<object, Map<string, number>>()
  private lastSetup = 0
  private lastTicket = 0
  private ended: Error | undefined

  constructor(
    private readonly count: number,
    private readonly startWorker: () => WorkerLike,
  ) {}

  map<Shared, Job, Result>(
    task: Task<Shared, Job, Result>,
    shared: Shared,
    jobs: readonly Job[],
    hooks: Hooks = {},
  ): Promise<(Result | undefined)[]> {
    return new Promise((resolve, reject) => {
      if (this.ended !== undefined) throw this.ended
      if (this.hands.length === 0) this.hands = Array.from({ length: this.count }, () => this.hire())
      this.batches.push({
        task: task.name,
        shared,
        setup: this.setupOf(task.name, shared),
        jobs,
        results: new Array(jobs.length).fill(undefined),
        hooks,
        resolve: (results) => resolve(results as (Result | undefined)[]),
        reject,
        next: 0,
        held: 0,
        done: 0,
      })
      this.handOut()
    })
  }

  close(): void {
    this.end(new Error('the workers were ended'))
  }

  private hire(): Hand {
    const hand: Hand = { worker: this.startWorker(), setups: new Set(), held: new Map() }
    hand.worker.listen(
      (message) => this.receive(hand, message),
      (reason) => this.mourn(hand, reason),
    )
    return hand
  }

  /** The same shared data for the same task is one setup. */
  private setupOf(task: string, shared: unknown): number {
    if (typeof shared !== 'object' || shared === null) return ++this.lastSetup
    const numbers = this.setupNumbers.get(shared) ?? new Map<string, number>()
    this.setupNumbers.set(shared, numbers)
    const setup = numbers.get(task) ?? ++this.lastSetup
    numbers.set(task, setup)
    return setup
  }

  /** One job each in turn, so that few jobs spread over all workers. */
  private handOut(): void {
    for (let load = 0; load < JOBS_HELD; load++) {
      for (const hand of this.hands) {
        const batch = hand.held.size > load ? undefined : this.nextBatch()
        if (batch !== undefined) this.give(hand, batch)
      }
    }
    for (const batch of this.batches.filter((b) => b.held === 0 && isExhausted(b))) {
      this.drop(batch)
      batch.resolve(batch.results)
    }
  }

  private nextBatch(): Batch | undefined {
    return this.batches.find((batch) => !isExhausted(batch))
  }

  private give(hand: Hand, batch: Batch): void {
    const { setup, task, shared } = batch
    if (!hand.setups.delete(setup)) hand.worker.post({ kind: 'prepare', setup, task, shared })
    hand.setups.add(setup)
    if (hand.setups.size > SETUPS_KEPT) {
      const [oldest] = hand.setups
      hand.setups.delete(oldest)
      hand.worker.post({ kind: 'forget', setup: oldest })
    }
    const ticket = ++this.lastTicket
    const index = batch.next++
    batch.held++
    hand.held.set(ticket, { batch, index })
    hand.worker.post({ kind: 'run', setup, ticket, job: batch.jobs[index] })
  }

  private receive(hand: Hand, message: FromWorker): void {
    const found = hand.held.get(message.ticket)
    hand.held.delete(message.ticket)
    if (found === undefined || this.ended !== undefined) return
    const { batch, index } = found
    batch.held--
    if (message.kind === 'failed') this.fail(batch, new JobError(batch.task, index, message.fault))
    else {
      batch.results[index] = message.result
      batch.hooks.progress?.(++batch.done / batch.jobs.length)
    }
    this.handOut()
  }

  /** A dead worker takes the whole pool with it: what killed it would kill the next. */
  private mourn(hand: Hand, reason: string): void {
    if (this.ended !== undefined) return
    const [first] = hand.held.values()
    const fault = { message: `the worker ended: ${reason}` }
    this.end(first === undefined ? new Error(fault.message) : new JobError(first.batch.task, first.index, fault))
  }

  private fail(batch: Batch, error: Error): void {
    this.drop(batch)
    batch.reject(error)
  }

  private drop(batch: Batch): void {
    this.batches = this.batches.filter((other) => other !== batch)
  }

  private end(error: Error): void {
    this.ended = error
    for (const hand of this.hands) hand.worker.end()
    for (const batch of this.batches) batch.reject(error)
    this.hands = []
    this.batches = []
  }
}

/** Nothing of it is left to be handed out. */
function isExhausted({ next, jobs, hooks }: Batch): boolean {
  return next >= jobs.length || hooks.stopped?.() === true
}
