import type { PointSet } from './pointSet.js'
import { createRandom, type Random } from './random.js'
import { sobolDirections } from './sobolDirections.js'

const BITS = 32

/** Dimensions for which there are direction numbers. */
export const SOBOL_DIMENSIONS = sobolDirections.polynomials.length + 1

/**
 * Sobol' sequence in Gray-code order (I. M. Sobol', USSR Comput. Math. Math. Phys. 7, 86 (1967); I. A. Antonov, V. M.
 * Saleev, ibid. 19, 252 (1980)), points in [0, 1), index up to 2^32. Take 2^k points for the best balance. With a seed, a
 * random linear scrambling and digital shift (J. Matoušek, J. Complexity 14, 527 (1998)): every point is uniform in
 * (0, 1) by itself, the points together stay as even as they were. Throws RangeError beyond SOBOL_DIMENSIONS.
 */
export function createSobol(dimensions: number, seed?: number): PointSet {
  if (!(dimensions >= 1 && dimensions <= SOBOL_DIMENSIONS)) {
    throw new RangeError(`Sobol' sequences have 1 to ${SOBOL_DIMENSIONS} dimensions here, not ${dimensions}`)
  }
  const directions = directionNumbers(dimensions)
  const shift = new Uint32Array(dimensions)
  if (seed !== undefined) scramble(directions, shift, createRandom(seed))
  // Half a step keeps scrambled points off 0, where a normal quantile is infinite.
  const offset = seed === undefined ? 0 : 0.5
  return {
    dimensions,
    point(index, out) {
      for (let d = 0; d < dimensions; d++) {
        let value = shift[d]
        for (let gray = (index ^ (index >>> 1)) >>> 0, at = d * BITS; gray !== 0; gray >>>= 1, at++) {
          if ((gray & 1) === 1) value ^= directions[at]
        }
        out[d] = ((value >>> 0) + offset) / 2 ** BITS
      }
    },
  }
}

/** 32 per dimension; the first bit of the fraction is the highest bit. */
function directionNumbers(dimensions: number): Uint32Array {
  const directions = new Uint32Array(dimensions * BITS)
  for (let k = 0; k < BITS; k++) directions[k] = 2 ** (BITS - 1 - k)
  let initialAt = 0
  for (let d = 1; d < dimensions; d++) {
    const polynomial = sobolDirections.polynomials[d - 1]
    const degree = 31 - Math.clz32(polynomial)
    const own = directions.subarray(d * BITS, (d + 1) * BITS)
    for (let k = 0; k < degree; k++) own[k] = sobolDirections.initial[initialAt + k] * 2 ** (BITS - 1 - k)
    for (let k = degree; k < BITS; k++) own[k] = recurrence(own, k, polynomial, degree)
    initialAt += degree
  }
  return directions
}

/** v_k = a_1 v_{k-1} ⊕ … ⊕ a_{s-1} v_{k-s+1} ⊕ v_{k-s} ⊕ v_{k-s}/2^s, a_i the inner coefficients of the polynomial. */
function recurrence(v: Uint32Array, k: number, polynomial: number, degree: number): number {
  let value = v[k - degree] ^ (v[k - degree] >>> degree)
  for (let i = 1; i < degree; i++) {
    if (((polynomial >>> (degree - i)) & 1) === 1) value ^= v[k - i]
  }
  return value
}

/** Multiplies the directions of each dimension by a random lower triangular matrix with ones on its diagonal. */
function scramble(directions: Uint32Array, shift: Uint32Array, random: Random): void {
  const rows = new Uint32Array(BITS)
  for (let d = 0; d < shift.length; d++) {
    const stream = random.fork(d)
    shift[d] = stream.uniform() * 2 ** BITS
    // Row r gives bit r of the result; its diagonal bit is set, the bits above (digits before) are random.
    for (let r = 0; r < BITS; r++) {
      const diagonal = 2 ** (BITS - 1 - r)
      rows[r] = diagonal + (r === 0 ? 0 : Math.floor(stream.uniform() * 2 ** r) * 2 * diagonal)
    }
    for (let at = d * BITS; at < (d + 1) * BITS; at++) directions[at] = multiply(rows, directions[at])
  }
}

function multiply(rows: Uint32Array, vector: number): number {
  let product = 0
  for (let r = 0; r < BITS; r++) product = (product << 1) | parity(rows[r] & vector)
  return product
}

function parity(bits: number): number {
  let folded = bits ^ (bits >>> 16)
  folded ^= folded >>> 8
  folded ^= folded >>> 4
  return (0x6996 >>> (folded & 15)) & 1
}
