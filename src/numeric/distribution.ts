import { addTo, createMoments, type Moments, standardDeviation } from './moments.js'
import { quantile } from './quantile.js'

/** Values kept one by one; up to here quantiles are exact. */
export const EXACT_VALUES = 200_000
/** Bins per range of the kept values, and how far the bins reach beyond it on either side, in ranges. */
const FINE_BINS = 10_000
const REACH = 0.5

export interface Histogram {
  /** Evenly spaced, one more than counts. */
  readonly edges: readonly number[]
  readonly counts: readonly number[]
}

/**
 * What a stream of numbers looks like, in memory that does not grow with it: mean and standard deviation, extremes,
 * quantiles, histogram. Beyond EXACT_VALUES numbers the rest is counted in bins 1e-4 of the range of the first ones wide
 * (and in one open bin at either end), so the first numbers must be as mixed as the later ones.
 */
export class Distribution {
  min = Number.POSITIVE_INFINITY
  max = Number.NEGATIVE_INFINITY
  private readonly moments: Moments = createMoments()
  private values = new Float64Array(1024)
  private sorted = true
  private bins: Bins | undefined

  get count(): number {
    return this.moments.count
  }

  get mean(): number {
    return this.moments.mean
  }

  get standardDeviation(): number {
    return standardDeviation(this.moments)
  }

  /** The most by which a quantile can be off; 0 while all values are kept. */
  get quantileError(): number {
    return this.bins === undefined ? 0 : this.bins.width
  }

  add(value: number): void {
    if (this.count === EXACT_VALUES) this.bins = new Bins(this.kept(), this.min, this.max)
    if (this.bins !== undefined) this.bins.add(value)
    else this.keep(value)
    addTo(this.moments, value)
    this.min = Math.min(this.min, value)
    this.max = Math.max(this.max, value)
  }

  /** NaN where no value came. */
  quantile(p: number): number {
    return this.bins === undefined ? quantile(this.kept(), p) : this.bins.quantile(p, this.count, this.min, this.max)
  }

  /**
   * About `bins` even bins over all values, one edge at `anchor` if that lies among them (a limit then divides bins, not
   * the inside of one). Beyond EXACT_VALUES a value within `quantileError` of an edge may count on its other side.
   */
  histogram(bins: number, anchor?: number): Histogram {
    const { edges, width } = evenEdges(this.min, this.max, bins, anchor)
    const counts = new Array<number>(edges.length - 1).fill(0)
    const place = (value: number, count: number) => {
      const bin = Math.floor((value - edges[0]) / width)
      counts[Math.min(counts.length - 1, Math.max(0, bin))] += count
    }
    if (this.bins === undefined) for (const value of this.kept()) place(value, 1)
    else this.bins.forEach(place)
    return { edges, counts }
  }

  private keep(value: number): void {
    if (this.count === this.values.length) {
      const longer = new Float64Array(Math.min(EXACT_VALUES, 2 * this.values.length))
      longer.set(this.values)
      this.values = longer
    }
    this.values[this.count] = value
    this.sorted = false
  }

  /** In ascending order. */
  private kept(): Float64Array {
    const kept = this.values.subarray(0, Math.min(this.count, EXACT_VALUES))
    if (!this.sorted) kept.sort()
    this.sorted = true
    return kept
  }
}

/** Counts in even bins, with one open bin at either end. */
class Bins {
  readonly width: number
  private readonly low: number
  private readonly counts: Float64Array

  constructor(values: Float64Array, min: number, max: number) {
    this.width = (max - min) / FINE_BINS
    this.low = min - REACH * (max - min)
    this.counts = new Float64Array(FINE_BINS * (1 + 2 * REACH) + 2)
    for (const value of values) this.add(value)
  }

  add(value: number): void {
    const bin = this.width === 0 ? 1 : Math.floor((value - this.low) / this.width) + 1
    this.counts[Math.min(this.counts.length - 1, Math.max(0, bin))]++
  }

  /** Linear within the bin that holds it; min and max close the open bins. */
  quantile(p: number, count: number, min: number, max: number): number {
    let rest = p * count
    let bin = 0
    while (bin < this.counts.length - 1 && rest > this.counts[bin]) rest -= this.counts[bin++]
    const from = bin === 0 ? min : this.edge(bin)
    const to = bin === this.counts.length - 1 ? max : this.edge(bin + 1)
    return Math.min(max, Math.max(min, from + (this.counts[bin] > 0 ? rest / this.counts[bin] : 0) * (to - from)))
  }

  /** Middle and count of each bin that is not empty. */
  forEach(visit: (value: number, count: number) => void): void {
    this.counts.forEach((count, bin) => {
      if (count > 0) visit(this.edge(bin) + this.width / 2, count)
    })
  }

  private edge(bin: number): number {
    return this.low + (bin - 1) * this.width
  }
}

function evenEdges(min: number, max: number, bins: number, anchor?: number): { edges: number[]; width: number } {
  // A single value stands in the middle of one bin of a width that can be drawn.
  if (!(max > min)) return { edges: [min - singleHalf(min), min + singleHalf(min)], width: 2 * singleHalf(min) }
  const width = (max - min) / bins
  const inside = anchor !== undefined && anchor > min && anchor < max
  const first = inside ? anchor - Math.ceil((anchor - min) / width) * width : min
  const count = Math.max(1, Math.ceil((max - first) / width - 1e-9))
  return { edges: Array.from({ length: count + 1 }, (_, k) => first + k * width), width }
}

function singleHalf(value: number): number {
  return Math.abs(value) / 100 || 0.5
}
