import { DEFAULT_MAX_EVALUATIONS, type Objective, type Reason, type SearchOptions } from './result.js'

/** Thrown through a solver that knows no stop of its own; never leaves this room. */
class Interruption extends Error {
  constructor(readonly reason: 'limit' | 'stopped') {
    super(reason)
  }
}

/** Stands between a solver and its objective: counts, keeps the best point whatever happens, ends the search in time. */
export class Recorder {
  evaluations = 0
  bestValue = Number.POSITIVE_INFINITY
  readonly bestX: Float64Array
  private readonly limit: number

  /** `start` is the best point until one is evaluated. */
  constructor(
    private readonly objective: Objective,
    start: ArrayLike<number>,
    private readonly options: SearchOptions,
  ) {
    this.bestX = Float64Array.from(start)
    this.limit = options.maxEvaluations ?? DEFAULT_MAX_EVALUATIONS
  }

  /** The objective at x; Infinity where it is not finite. To be called within `run`. */
  readonly at: Objective = (x) => {
    this.spend()
    const value = this.objective(x)
    if (!Number.isFinite(value)) return Number.POSITIVE_INFINITY
    if (value < this.bestValue) {
      this.bestValue = value
      this.bestX.set(x)
    }
    return value
  }

  /** Counts an evaluation, or ends the search. For those that do not pass `at`: to be called within `run`. */
  spend(): void {
    if (this.options.stopped?.()) throw new Interruption('stopped')
    if (this.evaluations >= this.limit) throw new Interruption('limit')
    this.evaluations++
  }

  /** Runs a search and says why it ended: its own reason, or that of the interruption. */
  run(search: () => Reason): Reason {
    try {
      return search()
    } catch (error) {
      if (error instanceof Interruption) return error.reason
      throw error
    }
  }
}
