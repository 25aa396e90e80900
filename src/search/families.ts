import { type Candidate, isBetter } from './problem.js'
import type { Space } from './variables.js'

/** One of the distinct good designs. */
export interface Family extends Candidate {
  /** How many starts ended in it. */
  readonly hits: number
}

/** The distinct local optima found so far, best first. */
export class Families {
  private readonly found: Family[] = []

  /** Points nearer than `separation` (see `Space.distance`) are one. */
  constructor(
    private readonly space: Space,
    private readonly separation: number,
  ) {}

  /** A new end of a polish: joins the family it lies in, which keeps the better point, or begins one. */
  add({ x, value, violation }: Candidate, hits = 1): void {
    if (!Number.isFinite(value)) return
    const same = this.found.findIndex((family) => this.space.distance(family.x, x) < this.separation)
    const family = { x, value, violation, hits }
    if (same >= 0) {
      const [known] = this.found.splice(same, 1)
      this.insert({ ...(isBetter(family, known) ? family : known), hits: known.hits + hits })
    } else this.insert(family)
  }

  /** Those as feasible as the best whose value is within `margin` (absolute) of it. */
  within(margin: number): Family[] {
    const [best] = this.found
    return this.found.filter((f) => f.violation <= best.violation && f.value <= best.value + margin)
  }

  get best(): Family | undefined {
    return this.found[0]
  }

  private insert(family: Family): void {
    const place = this.found.findIndex((other) => isBetter(family, other))
    this.found.splice(place < 0 ? this.found.length : place, 0, family)
  }
}
