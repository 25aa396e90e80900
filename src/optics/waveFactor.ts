/**
 * The four normal wavevectors of a tilted crystal, as two quadratic factors: q² - s q + p for the two waves going in
 * and q² - sb q + pb for the two coming back. Factors stay smooth where single roots meet (along an optic axis), so
 * they are found directly, by Newton's method on their coefficients (Bairstow's step, in complex numbers).
 *
 * Quartic: q⁴ + a3 q³ + a2 q² + a1 q + a0, coefficients as Re, Im pairs: QUARTIC = [a3, a2, a1, a0].
 */
const STEPS_MAX = 40
const SMALL = 1e-15

/**
 * Refines FORWARD = [Re s, Im s, Re p, Im p] in place and fills BACKWARD likewise. Returns false where it does not
 * settle, or settles on a factor that is not the forward one.
 */
export function refineFactor(quartic: Float64Array, forward: Float64Array, backward: Float64Array): boolean {
  for (let step = 0; step < STEPS_MAX; step++) {
    const [sRe, sIm, pRe, pIm] = [forward[0], forward[1], forward[2], forward[3]]
    // Quotient q² - sb q + pb of the quartic by the factor, then the remainder r1 q + r0.
    const tRe = quartic[0] + sRe
    const tIm = quartic[1] + sIm
    const bRe = quartic[2] - pRe + (sRe * tRe - sIm * tIm)
    const bIm = quartic[3] - pIm + (sRe * tIm + sIm * tRe)
    const r1Re = quartic[4] + (sRe * bRe - sIm * bIm) - (pRe * tRe - pIm * tIm)
    const r1Im = quartic[5] + (sRe * bIm + sIm * bRe) - (pRe * tIm + pIm * tRe)
    const r0Re = quartic[6] - (pRe * bRe - pIm * bIm)
    const r0Im = quartic[7] - (pRe * bIm + pIm * bRe)
    backward[0] = -tRe
    backward[1] = -tIm
    backward[2] = bRe
    backward[3] = bIm
    // (quotient mod factor) = α q + β
    const alRe = sRe + tRe
    const alIm = sIm + tIm
    const beRe = bRe - pRe
    const beIm = bIm - pIm
    // [ -(α s + β)  α ] [δs]   [r1]
    // [    α p      β ] [δp] = [r0]
    const m00Re = -(alRe * sRe - alIm * sIm + beRe)
    const m00Im = -(alRe * sIm + alIm * sRe + beIm)
    const m10Re = alRe * pRe - alIm * pIm
    const m10Im = alRe * pIm + alIm * pRe
    const detRe = m00Re * beRe - m00Im * beIm - (alRe * m10Re - alIm * m10Im)
    const detIm = m00Re * beIm + m00Im * beRe - (alRe * m10Im + alIm * m10Re)
    const scale = 1 / (detRe * detRe + detIm * detIm)
    const n0Re = r1Re * beRe - r1Im * beIm - (alRe * r0Re - alIm * r0Im)
    const n0Im = r1Re * beIm + r1Im * beRe - (alRe * r0Im + alIm * r0Re)
    const n1Re = m00Re * r0Re - m00Im * r0Im - (m10Re * r1Re - m10Im * r1Im)
    const n1Im = m00Re * r0Im + m00Im * r0Re - (m10Re * r1Im + m10Im * r1Re)
    const dsRe = (n0Re * detRe + n0Im * detIm) * scale
    const dsIm = (n0Im * detRe - n0Re * detIm) * scale
    const dpRe = (n1Re * detRe + n1Im * detIm) * scale
    const dpIm = (n1Im * detRe - n1Re * detIm) * scale
    forward[0] += dsRe
    forward[1] += dsIm
    forward[2] += dpRe
    forward[3] += dpIm
    const change = Math.abs(dsRe) + Math.abs(dsIm) + Math.abs(dpRe) + Math.abs(dpIm)
    const size = 1 + Math.abs(sRe) + Math.abs(sIm) + Math.abs(pRe) + Math.abs(pIm)
    if (!(change < 1e6 * size)) return false
    if (change <= SMALL * size * 4 || (step > 8 && change <= 1e-13 * size))
      return forward[0] + forward[1] > backward[0] + backward[1]
  }
  return false
}
