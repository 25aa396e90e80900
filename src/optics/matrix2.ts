/**
 * Complex 2×2 products over wavelength, structure of arrays (`8 n` numbers, row-major, re then im). `out` may not be an
 * input. Written out, so that nothing is allocated.
 */

export function multiply2(a: Float64Array, b: Float64Array, out: Float64Array, n: number): void {
  for (let i = 0; i < n; i++) {
    const i1 = n + i
    const i2 = 2 * n + i
    const i3 = 3 * n + i
    const i4 = 4 * n + i
    const i5 = 5 * n + i
    const i6 = 6 * n + i
    const i7 = 7 * n + i
    const b0 = b[i]
    const b1 = b[i1]
    const b2 = b[i2]
    const b3 = b[i3]
    const b4 = b[i4]
    const b5 = b[i5]
    const b6 = b[i6]
    const b7 = b[i7]
    const a0 = a[i]
    const a1 = a[i1]
    const a2 = a[i2]
    const a3 = a[i3]
    out[i] = a0 * b0 - a1 * b1 + a2 * b4 - a3 * b5
    out[i1] = a0 * b1 + a1 * b0 + a2 * b5 + a3 * b4
    out[i2] = a0 * b2 - a1 * b3 + a2 * b6 - a3 * b7
    out[i3] = a0 * b3 + a1 * b2 + a2 * b7 + a3 * b6
    const a4 = a[i4]
    const a5 = a[i5]
    const a6 = a[i6]
    const a7 = a[i7]
    out[i4] = a4 * b0 - a5 * b1 + a6 * b4 - a7 * b5
    out[i5] = a4 * b1 + a5 * b0 + a6 * b5 + a7 * b4
    out[i6] = a4 * b2 - a5 * b3 + a6 * b6 - a7 * b7
    out[i7] = a4 * b3 + a5 * b2 + a6 * b7 + a7 * b6
  }
}

/** out = a + b. */
export function add2(a: Float64Array, b: Float64Array, out: Float64Array, n: number): void {
  for (let k = 0; k < 8 * n; k++) out[k] = a[k] + b[k]
}

/** a ← (I - a)⁻¹: the sum of all round trips. */
export function sumRoundTrips2(a: Float64Array, n: number): void {
  for (let i = 0; i < n; i++) {
    const aRe = 1 - a[i]
    const aIm = -a[n + i]
    const bRe = -a[2 * n + i]
    const bIm = -a[3 * n + i]
    const cRe = -a[4 * n + i]
    const cIm = -a[5 * n + i]
    const dRe = 1 - a[6 * n + i]
    const dIm = -a[7 * n + i]
    const detRe = aRe * dRe - aIm * dIm - bRe * cRe + bIm * cIm
    const detIm = aRe * dIm + aIm * dRe - bRe * cIm - bIm * cRe
    const scale = 1 / (detRe * detRe + detIm * detIm)
    const gRe = detRe * scale
    const gIm = -detIm * scale
    a[i] = dRe * gRe - dIm * gIm
    a[n + i] = dRe * gIm + dIm * gRe
    a[2 * n + i] = bIm * gIm - bRe * gRe
    a[3 * n + i] = -bRe * gIm - bIm * gRe
    a[4 * n + i] = cIm * gIm - cRe * gRe
    a[5 * n + i] = -cRe * gIm - cIm * gRe
    a[6 * n + i] = aRe * gRe - aIm * gIm
    a[7 * n + i] = aRe * gIm + aIm * gRe
  }
}
