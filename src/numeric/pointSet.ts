/** Points in the unit cube, each found by its number alone: any worker can take any block of them. */
export interface PointSet {
  readonly dimensions: number
  /** Point `index` (from 0) into the first `dimensions` elements of `out`. */
  point(index: number, out: Float64Array): void
}
