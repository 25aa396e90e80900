/**
 * Light that no longer remembers its phase is carried as the coherency vector of the tangential field
 *
 *   s = (|Ex'|², |Ey'|², Re Ex'Ey'*, Im Ex'Ey'*),
 *
 * in which a 2×2 map m acts as a real 4×4 matrix (m ⊗ m* in this basis).
 */

/** Writes the 4×4 of the 2×2 at wavelength i of `m` (8 n numbers) into out[0..15], row-major. */
export function coherencyMatrix(m: Float64Array, i: number, n: number, out: Float64Array): void {
  const aRe = m[i]
  const aIm = m[n + i]
  const bRe = m[2 * n + i]
  const bIm = m[3 * n + i]
  const cRe = m[4 * n + i]
  const cIm = m[5 * n + i]
  const dRe = m[6 * n + i]
  const dIm = m[7 * n + i]
  const adRe = aRe * dRe + aIm * dIm
  const adIm = aIm * dRe - aRe * dIm
  const bcRe = bRe * cRe + bIm * cIm
  const bcIm = bIm * cRe - bRe * cIm
  out[0] = aRe * aRe + aIm * aIm
  out[1] = bRe * bRe + bIm * bIm
  out[2] = 2 * (aRe * bRe + aIm * bIm)
  out[3] = -2 * (aIm * bRe - aRe * bIm)
  out[4] = cRe * cRe + cIm * cIm
  out[5] = dRe * dRe + dIm * dIm
  out[6] = 2 * (cRe * dRe + cIm * dIm)
  out[7] = -2 * (cIm * dRe - cRe * dIm)
  out[8] = aRe * cRe + aIm * cIm
  out[9] = bRe * dRe + bIm * dIm
  out[10] = adRe + bcRe
  out[11] = bcIm - adIm
  out[12] = aIm * cRe - aRe * cIm
  out[13] = bIm * dRe - bRe * dIm
  out[14] = adIm + bcIm
  out[15] = adRe - bcRe
}
