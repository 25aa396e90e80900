/**
 * The box of a search, and its scaled coordinates u: every variable's range is [0, 1], a periodic variable wraps, a bounded
 * one is held at its bound. Holding (rather than reflecting) makes a bound a point of its own, so that an optimum on it is
 * met exactly.
 */

/** One variable of a search; `upper >= lower`. */
export interface Variable {
  readonly lower: number
  readonly upper: number
  /** In the same unit. A box of a full period or more has no walls; a narrower one is an ordinary box. */
  readonly period?: number
  /** Allowed values, ascending, within the box; at least one. Absent: all of it. */
  readonly values?: readonly number[]
}

export class Space {
  /** Indices of the variables that move continuously, and of those with a list of values (or a box of no width). */
  readonly continuous: readonly number[]
  readonly discrete: readonly number[]
  /** Width of each variable's box in its own unit (a period at most); 0 for discrete ones. */
  readonly width: Float64Array

  constructor(readonly variables: readonly Variable[]) {
    const indices = variables.map((_, i) => i)
    const isDiscrete = (i: number): boolean =>
      variables[i].values !== undefined || variables[i].upper <= variables[i].lower
    this.discrete = indices.filter(isDiscrete)
    this.continuous = indices.filter((i) => !isDiscrete(i))
    this.width = Float64Array.from(variables, ({ lower, upper, period }, i) =>
      isDiscrete(i) ? 0 : Math.min(upper - lower, period ?? Number.POSITIVE_INFINITY),
    )
  }

  /** Allowed values of a discrete variable. */
  valuesOf(i: number): readonly number[] {
    return this.variables[i].values ?? [this.variables[i].lower]
  }

  /** A box that closes on itself. */
  isPeriodic(i: number): boolean {
    const { lower, upper, period } = this.variables[i]
    // A hair of slack: 180° in radians, written as text, may be short of π by a rounding.
    return this.width[i] > 0 && period !== undefined && upper - lower >= period * (1 - 1e-12)
  }

  /** Scaled coordinate of a continuous variable's value. */
  toUnit(i: number, value: number): number {
    return (value - this.variables[i].lower) / this.width[i]
  }

  /** Value of a continuous variable at any scaled coordinate: wrapped or held, always within the box. */
  fromUnit(i: number, u: number): number {
    const { lower, upper } = this.variables[i]
    if (!this.isPeriodic(i)) return u >= 1 ? upper : Math.min(upper, lower + Math.max(0, u) * this.width[i])
    const value = lower + (u - Math.floor(u)) * this.width[i]
    // Where rounding completes the period.
    return value < lower + this.width[i] ? value : lower
  }

  /** The nearest allowed point: values taken from the lists, the rest wrapped or held. */
  nearest(x: ArrayLike<number>): Float64Array {
    return Float64Array.from(this.variables, (_, i) => {
      if (this.width[i] > 0) return this.fromUnit(i, this.toUnit(i, x[i]))
      return this.valuesOf(i).reduce((best, v) => (Math.abs(v - x[i]) < Math.abs(best - x[i]) ? v : best))
    })
  }

  /** Largest difference of a scaled coordinate, around the period where there is one; 1 between different listed values. */
  distance(a: ArrayLike<number>, b: ArrayLike<number>): number {
    let largest = 0
    for (let i = 0; i < this.variables.length; i++) {
      largest = Math.max(largest, this.separation(i, a[i], b[i]))
    }
    return largest
  }

  private separation(i: number, a: number, b: number): number {
    if (this.width[i] === 0) return a === b ? 0 : 1
    const apart = Math.abs(a - b) / this.width[i]
    return this.isPeriodic(i) ? Math.min(apart % 1, 1 - (apart % 1)) : apart
  }
}
