import { type Candidate, isBetter } from './problem.js'
import type { StartPoints } from './startPoints.js'
import type { Space } from './variables.js'

/** Share of the sample from which starts are taken. */
const REDUCED_SHARE = 0.3
/** σ of the critical distance. */
const LINKAGE = 2

/** The points screened so far, and which of them are worth a polish. */
export class Sample {
  private readonly points: Candidate[] = []
  private readonly starts: Float64Array[] = []

  constructor(
    private readonly space: Space,
    private readonly startPoints: StartPoints,
  ) {}

  get size(): number {
    return this.points.length
  }

  /** The next `count` points to be screened. */
  next(count: number): Float64Array[] {
    return Array.from({ length: count }, (_, k) => this.startPoints.point(this.points.length + k))
  }

  add(screened: readonly Candidate[]): void {
    this.points.push(...screened)
  }

  markStarted(x: Float64Array): void {
    this.starts.push(x)
  }

  /** Up to `count` of the best points that lie apart from each other and from all earlier starts; they count as started. */
  promising(count: number): Float64Array[] {
    const weight = this.violationWeight()
    const merit = ({ value, violation }: Candidate): number => value + (violation > 0 ? weight * violation : 0)
    const ranked = this.points.toSorted((a, b) => merit(a) - merit(b) || 0)
    const reduced = ranked.slice(0, Math.ceil(REDUCED_SHARE * ranked.length))
    const distance = this.criticalDistance()
    const chosen: Float64Array[] = []
    for (const { x } of reduced) {
      if (chosen.length === count) break
      if (this.starts.some((start) => this.space.distance(start, x) < distance)) continue
      chosen.push(x)
      this.starts.push(x)
    }
    return chosen
  }

  /** Between the quartiles of the values: a scale of the objective that single spikes do not move. */
  spread(): number {
    const values = this.points
      .map(({ value }) => value)
      .filter(Number.isFinite)
      .sort((a, b) => a - b)
    return values.length === 0 ? 0 : values[Math.floor(0.75 * values.length)] - values[Math.floor(0.25 * values.length)]
  }

  /** The best of the sample as values of the objective, where the screen is the objective itself. */
  best(): Candidate | undefined {
    return this.points.reduce<Candidate | undefined>(
      (best, point) => (best === undefined || isBetter(point, best) ? point : best),
      undefined,
    )
  }

  private criticalDistance(): number {
    const count = Math.max(2, this.points.length / (this.startPoints.combinations?.length ?? 1))
    const dimensions = Math.max(1, this.space.continuous.length)
    return 0.5 * ((LINKAGE * Math.log(count)) / count) ** (1 / dimensions)
  }

  /** Objective per unit of violation at which the spreads of both are alike. */
  private violationWeight(): number {
    const missed = this.points.filter(({ violation }) => violation > 0 && Number.isFinite(violation))
    const mean = missed.reduce((sum, { violation }) => sum + violation, 0) / missed.length
    return missed.length === 0 ? 0 : this.spread() / mean
  }
}
