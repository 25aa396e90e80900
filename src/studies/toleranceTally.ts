import { clopperPearson } from '../numeric/binomialInterval.js'
import { Distribution, type Histogram } from '../numeric/distribution.js'
import type { Limit, MetricRequest } from '../stack/stack.js'
import { type AskedLimit, askedLimit, limitMargin } from './evaluate.js'
import type { DrawnBlock } from './toleranceBlock.js'
import type { Variation } from './variation.js'

export interface Yield {
  readonly yield: number
  /** 95 %, after Clopper and Pearson. */
  readonly yield_interval: readonly [low: number, high: number]
}

export interface MetricSpread {
  readonly mean: number
  readonly std: number
  readonly min: number
  readonly p05: number
  readonly p50: number
  readonly p95: number
  readonly max: number
  /** The most by which the percentiles can be off because not every value was kept; absent where all were. */
  readonly percentile_error?: number
}

/** Bins of a metric's histogram, about. */
const BINS = 40

/** What the draws add up to, one after the other, in memory that does not grow with them. */
export class ToleranceTally {
  draws = 0
  private passed = 0
  private readonly limitsPassed: Float64Array
  private readonly held: Float64Array
  private readonly distributions: readonly Distribution[]
  /** Where each limit's metric stands among the requests. */
  private readonly limitAt: readonly number[]

  constructor(
    private readonly variation: Variation,
    private readonly requests: readonly MetricRequest[],
    private readonly limits: readonly Limit[],
  ) {
    this.limitsPassed = new Float64Array(limits.length)
    this.held = new Float64Array(variation.paths.length)
    this.distributions = requests.map(() => new Distribution())
    this.limitAt = limits.map((limit) => requests.findIndex((request) => isSameMetric(request, limit)))
  }

  add({ parameters, metrics }: DrawnBlock): void {
    const [width, depth] = [this.variation.paths.length, this.requests.length]
    for (let draw = 0; draw < metrics.length / depth; draw++) {
      this.draws++
      for (let k = 0; k < width; k++) {
        if (this.variation.isHeld(k, parameters[draw * width + k])) this.held[k]++
      }
      this.addMetrics(metrics.subarray(draw * depth, (draw + 1) * depth))
    }
  }

  private addMetrics(metrics: Float64Array): void {
    this.distributions.forEach((distribution, k) => {
      distribution.add(metrics[k])
    })
    let good = true
    this.limits.forEach((limit, k) => {
      const met = limitMargin(limit, metrics[this.limitAt[k]]) >= 0
      if (met) this.limitsPassed[k]++
      good &&= met
    })
    if (good) this.passed++
  }

  /** Share of the draws that meet every limit. */
  yieldOfAll(): Yield {
    return this.yieldOf(this.passed)
  }

  limitYields(): (AskedLimit & Yield)[] {
    return this.limits.map((limit, k) => ({ ...askedLimit(limit), ...this.yieldOf(this.limitsPassed[k]) }))
  }

  /** The limit that costs the most yield; undefined where none costs any. */
  mostCostly(): Limit | undefined {
    const least = Math.min(...this.limitsPassed)
    return least < this.draws ? this.limits[this.limitsPassed.indexOf(least)] : undefined
  }

  /** By request, as all that follows. */
  spreads(): MetricSpread[] {
    if (this.draws === 0) return []
    return this.distributions.map((values) => ({
      mean: values.mean,
      std: values.standardDeviation,
      min: values.min,
      p05: values.quantile(0.05),
      p50: values.quantile(0.5),
      p95: values.quantile(0.95),
      max: values.max,
      ...(values.quantileError > 0 && { percentile_error: values.quantileError }),
    }))
  }

  /** Where the file limits the metric, one edge lies at the limit. */
  histograms(): Histogram[] {
    if (this.draws === 0) return []
    return this.distributions.map((values, k) => {
      const limit = this.limits[this.limitAt.indexOf(k)]
      return values.histogram(BINS, limit?.max ?? limit?.min)
    })
  }

  /** Share of the draws in which a parameter was stopped at what is physical, for those that were. */
  heldShares(): Record<string, number> {
    const shares = this.variation.paths.map((path, k): [string, number] => [path, this.held[k] / this.draws])
    return Object.fromEntries(shares.filter(([, share]) => share > 0))
  }

  private yieldOf(passed: number): Yield {
    return { yield: passed / this.draws, yield_interval: clopperPearson(passed, this.draws, 0.95) }
  }
}

export function isSameMetric(a: MetricRequest, b: MetricRequest): boolean {
  return a.metric === b.metric && a.theta === b.theta && a.phi === b.phi && a.illuminance === b.illuminance
}
