/**
 * A packet: everything coherent between two thick media, as complex 2×2 matrices on the tangential field. `r`, `t` for
 * light from above, `rBelow`, `tUp` for light from below; each `8 n` numbers as in `layerModes`.
 */
import type { LayerModes } from './layerModes.js'

export interface Packet {
  diagonal: boolean
  readonly r: Float64Array
  readonly t: Float64Array
  readonly rBelow: Float64Array
  readonly tUp: Float64Array
}

export function createPacket(count: number): Packet {
  return {
    diagonal: true,
    r: new Float64Array(8 * count),
    t: new Float64Array(8 * count),
    rBelow: new Float64Array(8 * count),
    tUp: new Float64Array(8 * count),
  }
}

/**
 * The face between A (above) and B (below): from continuity of E and H,
 *
 *   r = (Y_B + Y_A')⁻¹ (Y_A - Y_B),  t = I + r,  rBelow = (Y_B + Y_A')⁻¹ (Y_B' - Y_A'),  tUp = I + rBelow,
 *
 * where Y' = -yBack; without tilt Y' = Y and rBelow = -r.
 */
export function faceBetween(above: LayerModes, below: LayerModes, out: Packet, n: number): void {
  out.diagonal = above.diagonal && below.diagonal
  if (out.diagonal) diagonalFace(above.y, below.y, out, n)
  else {
    fullFace(above, below, out, n)
  }
}

function diagonalFace(yA: Float64Array, yB: Float64Array, out: Packet, n: number): void {
  const { r, t, rBelow, tUp } = out
  for (let c = 0; c < 8; c += 6) {
    for (let i = 0; i < n; i++) {
      const re = c * n + i
      const im = re + n
      const sumRe = yA[re] + yB[re]
      const sumIm = yA[im] + yB[im]
      const scale = 1 / (sumRe * sumRe + sumIm * sumIm)
      const difRe = yA[re] - yB[re]
      const difIm = yA[im] - yB[im]
      const rRe = (difRe * sumRe + difIm * sumIm) * scale
      const rIm = (difIm * sumRe - difRe * sumIm) * scale
      r[re] = rRe
      r[im] = rIm
      t[re] = 1 + rRe
      t[im] = rIm
      rBelow[re] = -rRe
      rBelow[im] = -rIm
      tUp[re] = 1 - rRe
      tUp[im] = -rIm
    }
  }
  for (const part of [r, t, rBelow, tUp]) part.fill(0, 2 * n, 6 * n)
}

function fullFace(above: LayerModes, below: LayerModes, out: Packet, n: number): void {
  const yA = above.y
  const yB = below.y
  const backA = above.tilted ? above.yBack : yA
  const signA = above.tilted ? -1 : 1
  const backB = below.tilted ? below.yBack : yB
  const signB = below.tilted ? -1 : 1
  solveFace(yB, backA, signA, yA, 1, yB, 1, out.r, out.t, n)
  if (above.tilted || below.tilted) {
    solveFace(yB, backA, signA, backB, signB, backA, signA, out.rBelow, out.tUp, n)
    return
  }
  const { r, rBelow, tUp } = out
  for (let k = 0; k < 8 * n; k++) {
    rBelow[k] = -r[k]
    tUp[k] = -r[k]
  }
  for (let i = 0; i < n; i++) {
    tUp[i] += 1
    tUp[6 * n + i] += 1
  }
}

/** r = (Y1 + s2 Y2)⁻¹ (s3 Y3 - s4 Y4) and t = I + r. */
function solveFace(
  y1: Float64Array,
  y2: Float64Array,
  s2: number,
  y3: Float64Array,
  s3: number,
  y4: Float64Array,
  s4: number,
  r: Float64Array,
  t: Float64Array,
  n: number,
): void {
  for (let i = 0; i < n; i++) {
    const i1 = n + i
    const i2 = 2 * n + i
    const i3 = 3 * n + i
    const i4 = 4 * n + i
    const i5 = 5 * n + i
    const i6 = 6 * n + i
    const i7 = 7 * n + i
    const aRe = y1[i] + s2 * y2[i]
    const aIm = y1[i1] + s2 * y2[i1]
    const bRe = y1[i2] + s2 * y2[i2]
    const bIm = y1[i3] + s2 * y2[i3]
    const cRe = y1[i4] + s2 * y2[i4]
    const cIm = y1[i5] + s2 * y2[i5]
    const dRe = y1[i6] + s2 * y2[i6]
    const dIm = y1[i7] + s2 * y2[i7]
    const detRe = aRe * dRe - aIm * dIm - bRe * cRe + bIm * cIm
    const detIm = aRe * dIm + aIm * dRe - bRe * cIm - bIm * cRe
    const scale = 1 / (detRe * detRe + detIm * detIm)
    const gRe = detRe * scale
    const gIm = -detIm * scale
    const pRe = s3 * y3[i] - s4 * y4[i]
    const pIm = s3 * y3[i1] - s4 * y4[i1]
    const qRe = s3 * y3[i2] - s4 * y4[i2]
    const qIm = s3 * y3[i3] - s4 * y4[i3]
    const uRe = s3 * y3[i4] - s4 * y4[i4]
    const uIm = s3 * y3[i5] - s4 * y4[i5]
    const vRe = s3 * y3[i6] - s4 * y4[i6]
    const vIm = s3 * y3[i7] - s4 * y4[i7]
    // adjugate [d -b; -c a] times [p q; u v], over the determinant
    const w0Re = dRe * pRe - dIm * pIm - bRe * uRe + bIm * uIm
    const w0Im = dRe * pIm + dIm * pRe - bRe * uIm - bIm * uRe
    const w1Re = dRe * qRe - dIm * qIm - bRe * vRe + bIm * vIm
    const w1Im = dRe * qIm + dIm * qRe - bRe * vIm - bIm * vRe
    const w2Re = aRe * uRe - aIm * uIm - cRe * pRe + cIm * pIm
    const w2Im = aRe * uIm + aIm * uRe - cRe * pIm - cIm * pRe
    const w3Re = aRe * vRe - aIm * vIm - cRe * qRe + cIm * qIm
    const w3Im = aRe * vIm + aIm * vRe - cRe * qIm - cIm * qRe
    r[i] = w0Re * gRe - w0Im * gIm
    r[i1] = w0Re * gIm + w0Im * gRe
    r[i2] = w1Re * gRe - w1Im * gIm
    r[i3] = w1Re * gIm + w1Im * gRe
    r[i4] = w2Re * gRe - w2Im * gIm
    r[i5] = w2Re * gIm + w2Im * gRe
    r[i6] = w3Re * gRe - w3Im * gIm
    r[i7] = w3Re * gIm + w3Im * gRe
    t[i] = 1 + r[i]
    t[i1] = r[i1]
    t[i2] = r[i2]
    t[i3] = r[i3]
    t[i4] = r[i4]
    t[i5] = r[i5]
    t[i6] = 1 + r[i6]
    t[i7] = r[i7]
  }
}
