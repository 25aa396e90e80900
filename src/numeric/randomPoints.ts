import type { PointSet } from './pointSet.js'
import { createRandom } from './random.js'

/** Independent uniform points in [0, 1). */
export function createRandomPoints(dimensions: number, seed: number): PointSet {
  const random = createRandom(seed)
  return {
    dimensions,
    point(index, out) {
      const stream = random.fork(index)
      for (let d = 0; d < dimensions; d++) out[d] = stream.uniform()
    },
  }
}
