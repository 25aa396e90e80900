import { createSobol } from '../numeric/sobol.js'
import type { Space } from './variables.js'

/** Up to this many combinations of listed values, each gets its share of the starts. */
const MOST_COMBINATIONS = 256

/**
 * Points that fill the space evenly: Sobol' points of the continuous variables for each combination of the listed values in
 * turn; where there are too many combinations, the listed values are further dimensions of the Sobol' points.
 */
export class StartPoints {
  /** All combinations of listed values, a row each in the order of `space.discrete`; one empty row where none are listed. */
  readonly combinations: readonly (readonly number[])[] | undefined
  private readonly sobol: ReturnType<typeof createSobol>
  private readonly share: Float64Array

  constructor(
    private readonly space: Space,
    seed: number,
  ) {
    const lists = space.discrete.map((i) => space.valuesOf(i))
    const count = lists.reduce((product, list) => product * list.length, 1)
    this.combinations = count <= MOST_COMBINATIONS ? combine(lists) : undefined
    const dimensions = space.continuous.length + (this.combinations === undefined ? lists.length : 0)
    this.share = new Float64Array(dimensions)
    this.sobol = createSobol(Math.max(1, dimensions), seed)
  }

  point(index: number): Float64Array {
    const rows = this.combinations
    const { continuous, discrete, variables } = this.space
    if (this.share.length > 0) this.sobol.point(rows ? Math.floor(index / rows.length) : index, this.share)
    const x = new Float64Array(variables.length)
    continuous.forEach((i, k) => {
      x[i] = this.space.fromUnit(i, this.share[k])
    })
    discrete.forEach((i, k) => {
      const values = this.space.valuesOf(i)
      x[i] = rows
        ? rows[index % rows.length][k]
        : values[Math.min(values.length - 1, Math.floor(this.share[continuous.length + k] * values.length))]
    })
    return x
  }

  /** All points that differ from `x` in one listed value. */
  exchanges(x: Float64Array): Float64Array[] {
    return this.space.discrete.flatMap((i) =>
      this.space
        .valuesOf(i)
        .filter((value) => value !== x[i])
        .map((value) => x.with(i, value)),
    )
  }
}

function combine(lists: readonly (readonly number[])[]): number[][] {
  return lists.reduce<number[][]>((rows, list) => rows.flatMap((row) => list.map((value) => [...row, value])), [[]])
}
