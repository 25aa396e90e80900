/** Real 4×4 matrices at one wavelength, 16 numbers row-major. */

/** out = m x; out may not be x. */
export function apply(m: Float64Array, x: Float64Array, out: Float64Array): void {
  out[0] = m[0] * x[0] + m[1] * x[1] + m[2] * x[2] + m[3] * x[3]
  out[1] = m[4] * x[0] + m[5] * x[1] + m[6] * x[2] + m[7] * x[3]
  out[2] = m[8] * x[0] + m[9] * x[1] + m[10] * x[2] + m[11] * x[3]
  out[3] = m[12] * x[0] + m[13] * x[1] + m[14] * x[2] + m[15] * x[3]
}

/** out = x m, x a row; out may not be x. */
export function applyRow(x: Float64Array, m: Float64Array, out: Float64Array): void {
  out[0] = x[0] * m[0] + x[1] * m[4] + x[2] * m[8] + x[3] * m[12]
  out[1] = x[0] * m[1] + x[1] * m[5] + x[2] * m[9] + x[3] * m[13]
  out[2] = x[0] * m[2] + x[1] * m[6] + x[2] * m[10] + x[3] * m[14]
  out[3] = x[0] * m[3] + x[1] * m[7] + x[2] * m[11] + x[3] * m[15]
}

/** out = a b; out may be neither. */
export function multiply4(a: Float64Array, b: Float64Array, out: Float64Array): void {
  for (let k = 0; k < 16; k += 4) {
    const a0 = a[k]
    const a1 = a[k + 1]
    const a2 = a[k + 2]
    const a3 = a[k + 3]
    out[k] = a0 * b[0] + a1 * b[4] + a2 * b[8] + a3 * b[12]
    out[k + 1] = a0 * b[1] + a1 * b[5] + a2 * b[9] + a3 * b[13]
    out[k + 2] = a0 * b[2] + a1 * b[6] + a2 * b[10] + a3 * b[14]
    out[k + 3] = a0 * b[3] + a1 * b[7] + a2 * b[11] + a3 * b[15]
  }
}

/**
 * (I - a b)⁻¹, the sum of all round trips between two reflecting blocks. I - a b is the identity less a contraction:
 * elimination without pivoting is safe.
 */
export class RoundTrips {
  /** LU factors; the diagonal of U holds reciprocals. */
  private readonly lu = new Float64Array(16)

  factor(a: Float64Array, b: Float64Array): void {
    const { lu } = this
    multiply4(a, b, lu)
    for (let c = 0; c < 16; c++) lu[c] = -lu[c]
    lu[0] = 1 / (1 + lu[0])
    lu[4] *= lu[0]
    lu[8] *= lu[0]
    lu[12] *= lu[0]
    lu[5] = 1 / (1 + lu[5] - lu[4] * lu[1])
    lu[6] -= lu[4] * lu[2]
    lu[7] -= lu[4] * lu[3]
    lu[9] = (lu[9] - lu[8] * lu[1]) * lu[5]
    lu[13] = (lu[13] - lu[12] * lu[1]) * lu[5]
    lu[10] = 1 / (1 + lu[10] - lu[8] * lu[2] - lu[9] * lu[6])
    lu[11] -= lu[8] * lu[3] + lu[9] * lu[7]
    lu[14] = (lu[14] - lu[12] * lu[2] - lu[13] * lu[6]) * lu[10]
    lu[15] = 1 / (1 + lu[15] - lu[12] * lu[3] - lu[13] * lu[7] - lu[14] * lu[11])
  }

  /** x ← (I - a b)⁻¹ x. */
  solve(x: Float64Array): void {
    const { lu } = this
    const x0 = x[0]
    const x1 = x[1] - lu[4] * x0
    const x2 = x[2] - lu[8] * x0 - lu[9] * x1
    const x3 = (x[3] - lu[12] * x0 - lu[13] * x1 - lu[14] * x2) * lu[15]
    const y2 = (x2 - lu[11] * x3) * lu[10]
    const y1 = (x1 - lu[6] * y2 - lu[7] * x3) * lu[5]
    x[0] = (x0 - lu[1] * y1 - lu[2] * y2 - lu[3] * x3) * lu[0]
    x[1] = y1
    x[2] = y2
    x[3] = x3
  }

  /** z ← z (I - a b)⁻¹, z a row. */
  solveRow(z: Float64Array): void {
    const { lu } = this
    const z0 = z[0] * lu[0]
    const z1 = (z[1] - z0 * lu[1]) * lu[5]
    const z2 = (z[2] - z0 * lu[2] - z1 * lu[6]) * lu[10]
    const z3 = (z[3] - z0 * lu[3] - z1 * lu[7] - z2 * lu[11]) * lu[15]
    const y2 = z2 - z3 * lu[14]
    const y1 = z1 - y2 * lu[9] - z3 * lu[13]
    z[0] = z0 - y1 * lu[4] - y2 * lu[8] - z3 * lu[12]
    z[1] = y1
    z[2] = y2
    z[3] = z3
  }
}
