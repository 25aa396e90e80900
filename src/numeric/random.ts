import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64'
import { xoroshiro128plusFromState } from 'pure-rand/generator/xoroshiro128plus'
import { mixBits } from './mixBits.js'

/** A seeded stream of numbers: the same digits on every machine. */
export interface Random {
  /** Next number of the stream in [0, 1), a multiple of 2^-53. */
  uniform(): number
  /**
   * Substream of that number (an integer from 0 to 2^53): the same however much was drawn before, so that a block of work
   * draws the same numbers on any worker.
   */
  fork(stream: number): Random
}

/** xoroshiro128+ (D. Blackman, S. Vigna, ACM Trans. Math. Softw. 47, 36 (2021)); `seed` is an integer from 0 to 2^53. */
export function createRandom(seed: number): Random {
  return streamOf(absorb([0x243f6a88, 0x85a308d3], seed))
}

/** What tells one stream from another: 64 bits. */
type Key = readonly [number, number]

/**
 * The state of a stream is scattered from its key. Jumping ahead, which this generator can also do, takes time in
 * proportion to the number of the stream; that streams of one key each meet within 2^40 draws has a chance below 2^-40.
 */
function streamOf(key: Key): Random {
  const [high, low] = key
  const state = [0, 1, 2, 3].map((word) => mixBits(mixBits(low + word) ^ high) | 0)
  const generator = xoroshiro128plusFromState(state)
  return {
    uniform: () => uniformFloat64(generator),
    fork: (stream) => streamOf(absorb(key, stream)),
  }
}

function absorb([high, low]: Key, value: number): Key {
  const a = mixBits(low ^ mixBits(value >>> 0))
  const b = mixBits(high ^ mixBits(Math.floor(value / 2 ** 32) + 0x9e3779b9) ^ a)
  return [b, mixBits(a + b)]
}
