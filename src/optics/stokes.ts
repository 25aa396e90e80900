/**
 * From the coherency vector of the tangential field in air to Stokes vectors, Ep = Ex'/cos θ and Es = Ey' of the solver frame:
 * S = (|Ep|² + |Es|², |Ep|² - |Es|², 2 Re Ep Es*, S3). S3 > 0 is right-handed as named from the source: -2 Im Ep Es* for light
 * that goes in, +2 Im Ep Es* for light that comes out.
 */

/** Stokes vector of light that comes out; `4 n` numbers each. */
export function stokesOf(coherency: Float64Array, cosTheta: number, out: Float64Array, n: number): void {
  const c = cosTheta
  for (let i = 0; i < n; i++) {
    const p = coherency[i] / (c * c)
    const s = coherency[n + i]
    out[i] = p + s
    out[n + i] = p - s
    out[2 * n + i] = (2 * coherency[2 * n + i]) / c
    out[3 * n + i] = (2 * coherency[3 * n + i]) / c
  }
}

/** Mueller matrix of what the whole stack sends back, from its matrix `w` on the coherency vector; `16 n` numbers each. */
export function muellerOf(w: Float64Array, cosTheta: number, out: Float64Array, n: number): void {
  const c = cosTheta
  // Columns: coherency vector of each Stokes component going in; rows: Stokes vector of what comes out.
  for (let i = 0; i < n; i++) {
    for (let row = 0; row < 4; row++) {
      const x = w[4 * row * n + i] * c * c
      const y = w[(4 * row + 1) * n + i]
      out[4 * row * n + i] = (x + y) / 2
      out[(4 * row + 1) * n + i] = (x - y) / 2
      out[(4 * row + 2) * n + i] = (w[(4 * row + 2) * n + i] * c) / 2
      out[(4 * row + 3) * n + i] = (-w[(4 * row + 3) * n + i] * c) / 2
    }
    for (let column = 0; column < 4; column++) {
      const p = out[column * n + i] / (c * c)
      const s = out[(4 + column) * n + i]
      out[column * n + i] = p + s
      out[(4 + column) * n + i] = p - s
      out[(8 + column) * n + i] *= 2 / c
      out[(12 + column) * n + i] *= 2 / c
    }
  }
}
