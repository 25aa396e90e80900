import { mixBits } from './mixBits.js'

/** Six already fail a test of evenness on four places. */
const ROUNDS = 12

/**
 * Place of `index` in a seeded random permutation of 0 … length - 1, without storing it. A Feistel network permutes the
 * next power of four; a value that falls beyond the length is permuted again until it falls within ("cycle walking": J.
 * Black, P. Rogaway, CT-RSA 2002, LNCS 2271, 114). `length` up to 2^30; `key` 32 bits.
 */
export function permute(index: number, length: number, key: number): number {
  const half = Math.ceil(bitsOf(length - 1) / 2)
  const mask = 2 ** half - 1
  let place = index
  do {
    let left = place >>> half
    let right = place & mask
    for (let round = 0; round < ROUNDS; round++) {
      const turned = left ^ (mixBits(right ^ mixBits(key + round * 0x9e3779b9)) & mask)
      left = right
      right = turned
    }
    place = (left << half) | right
  } while (place >= length)
  return place
}

function bitsOf(value: number): number {
  return 32 - Math.clz32(value)
}
