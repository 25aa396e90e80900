/** Smallest |q| taken: exactly at a critical angle the admittance would be infinite. */
const SMALLEST_ROOT = 1e-9

/**
 * Normal component q of the wave that travels or decays into the panel, from q² = re + i im, into out[0], out[1].
 *
 * The principal root, turned over only where it would grow into the panel and is mainly evanescent (Im q < 0 and
 * |Im q| > Re q). Turning over whenever Im q < 0 would reverse travelling waves on rounding noise.
 */
export function forwardRoot(re: number, im: number, out: Float64Array): void {
  let rootRe: number
  let rootIm: number
  if (im === 0) {
    rootRe = re >= 0 ? Math.sqrt(re) : 0
    rootIm = re >= 0 ? 0 : Math.sqrt(-re)
  } else {
    const modulus = Math.sqrt(re * re + im * im)
    if (re >= 0) {
      rootRe = Math.sqrt((modulus + re) / 2)
      // Where the modulus underflows the root is nothing.
      rootIm = rootRe > 0 ? im / (2 * rootRe) : 0
    } else {
      const size = Math.sqrt((modulus - re) / 2)
      rootIm = im < 0 ? -size : size
      rootRe = im / (2 * rootIm)
    }
    if (rootIm < 0 && -rootIm > rootRe) {
      rootRe = -rootRe
      rootIm = -rootIm
    }
  }
  if (Math.abs(rootRe) + Math.abs(rootIm) < SMALLEST_ROOT) rootRe = SMALLEST_ROOT
  out[0] = rootRe
  out[1] = rootIm
}
