/** Bijection of 32-bit integers that scatters every bit: the finalizer of MurmurHash3 (A. Appleby, public domain). */
export function mixBits(value: number): number {
  let h = value | 0
  h = Math.imul(h ^ (h >>> 16), 0x85ebca6b)
  h = Math.imul(h ^ (h >>> 13), 0xc2b2ae35)
  return (h ^ (h >>> 16)) >>> 0
}
