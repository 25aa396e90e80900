import { mixBits } from './mixBits.js'
import { permute } from './permute.js'
import type { PointSet } from './pointSet.js'
import { createRandom } from './random.js'

/**
 * Latin hypercube of `count` points in (0, 1): in every coordinate each of `count` equal slices holds exactly one point,
 * anywhere in it (M. D. McKay, R. J. Beckman, W. J. Conover, Technometrics 21, 239 (1979)).
 */
export function createLatinHypercube(count: number, dimensions: number, seed: number): PointSet {
  const random = createRandom(seed)
  const keys = Uint32Array.from({ length: dimensions }, () => mixBits(random.uniform() * 2 ** 32))
  return {
    dimensions,
    point(index, out) {
      const within = random.fork(index)
      for (let d = 0; d < dimensions; d++) out[d] = (permute(index, count, keys[d]) + within.uniform()) / count
    },
  }
}
