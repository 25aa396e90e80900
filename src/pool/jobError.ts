import type { Fault } from './messages.js'

/** A job that failed in a worker, or that a worker died with. */
export class JobError extends Error {
  constructor(
    readonly task: string,
    /** Place of the job in the list that was to be mapped. */
    readonly index: number,
    fault: Fault,
  ) {
    super(`job ${index} of ${task}: ${fault.message}`)
    this.name = 'JobError'
    // Where it happened, in the worker, tells more than where the answer arrived.
    if (fault.stack !== undefined) this.stack = `${this.name}: ${this.message}\n${fault.stack}`
  }
}
