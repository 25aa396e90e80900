/**
 * Joining without phase, from the panel up. W (real 4×4 on the coherency vector) is what everything below a thick medium
 * sends back, e (4) what it emits upward. A packet on top of it, all round trips summed:
 *
 *   W ← r + tUp W (I - rBelow W)⁻¹ t,     e ← tUp (I - W rBelow)⁻¹ e = tUp (e + W (I - rBelow W)⁻¹ rBelow e).
 *
 * The sum of incoherent partial waves of S. Nichols, O. Arteaga, A. Martin, B. Kahr, J. Opt. Soc. Am. A 32, 2049 (2015).
 * The light crossing the thick layer above is in the packet already (`Joiner.fold`). I - rBelow W is the identity less a
 * contraction: elimination without pivoting is safe.
 *
 * Half of all time is spent here, so the matrices of `coherency.ts` and all products are written out in local variables:
 * twice as fast as the same through small arrays.
 */
import type { Packet } from './packet.js'

/** What lies below a thick medium: `16 n` and `4 n` numbers, component after component. */
export interface Below {
  readonly w: Float64Array
  readonly e: Float64Array
}

export function createBelow(count: number): Below {
  return { w: new Float64Array(16 * count), e: new Float64Array(4 * count) }
}

/** `above` ← packet on `below`. */
export function addPacket(packet: Packet, below: Below, above: Below, n: number): void {
  const { r, t, rBelow, tUp } = packet
  const { w, e } = below
  const { w: wAbove, e: eAbove } = above
  for (let i = 0; i < n; i++) {
    // What lies below.
    const w00 = w[i]
    const w01 = w[1 * n + i]
    const w02 = w[2 * n + i]
    const w03 = w[3 * n + i]
    const w10 = w[4 * n + i]
    const w11 = w[5 * n + i]
    const w12 = w[6 * n + i]
    const w13 = w[7 * n + i]
    const w20 = w[8 * n + i]
    const w21 = w[9 * n + i]
    const w22 = w[10 * n + i]
    const w23 = w[11 * n + i]
    const w30 = w[12 * n + i]
    const w31 = w[13 * n + i]
    const w32 = w[14 * n + i]
    const w33 = w[15 * n + i]
    const e0 = e[i]
    const e1 = e[1 * n + i]
    const e2 = e[2 * n + i]
    const e3 = e[3 * n + i]

    // b = rBelow; I - b W = L U without pivoting, the diagonal of U as reciprocals.
    const bAre = rBelow[i]
    const bAim = rBelow[n + i]
    const bBre = rBelow[2 * n + i]
    const bBim = rBelow[3 * n + i]
    const bCre = rBelow[4 * n + i]
    const bCim = rBelow[5 * n + i]
    const bDre = rBelow[6 * n + i]
    const bDim = rBelow[7 * n + i]
    const bADre = bAre * bDre + bAim * bDim
    const bADim = bAim * bDre - bAre * bDim
    const bBCre = bBre * bCre + bBim * bCim
    const bBCim = bBim * bCre - bBre * bCim
    const b00 = bAre * bAre + bAim * bAim
    const b01 = bBre * bBre + bBim * bBim
    const b02 = 2 * (bAre * bBre + bAim * bBim)
    const b03 = 2 * (bAre * bBim - bAim * bBre)
    const b10 = bCre * bCre + bCim * bCim
    const b11 = bDre * bDre + bDim * bDim
    const b12 = 2 * (bCre * bDre + bCim * bDim)
    const b13 = 2 * (bCre * bDim - bCim * bDre)
    const b20 = bAre * bCre + bAim * bCim
    const b21 = bBre * bDre + bBim * bDim
    const b22 = bADre + bBCre
    const b23 = bBCim - bADim
    const b30 = bAim * bCre - bAre * bCim
    const b31 = bBim * bDre - bBre * bDim
    const b32 = bADim + bBCim
    const b33 = bADre - bBCre
    let l00 = 1 - b00 * w00 - b01 * w10 - b02 * w20 - b03 * w30
    const l01 = -b00 * w01 - b01 * w11 - b02 * w21 - b03 * w31
    const l02 = -b00 * w02 - b01 * w12 - b02 * w22 - b03 * w32
    const l03 = -b00 * w03 - b01 * w13 - b02 * w23 - b03 * w33
    let l10 = -b10 * w00 - b11 * w10 - b12 * w20 - b13 * w30
    let l11 = 1 - b10 * w01 - b11 * w11 - b12 * w21 - b13 * w31
    let l12 = -b10 * w02 - b11 * w12 - b12 * w22 - b13 * w32
    let l13 = -b10 * w03 - b11 * w13 - b12 * w23 - b13 * w33
    let l20 = -b20 * w00 - b21 * w10 - b22 * w20 - b23 * w30
    let l21 = -b20 * w01 - b21 * w11 - b22 * w21 - b23 * w31
    let l22 = 1 - b20 * w02 - b21 * w12 - b22 * w22 - b23 * w32
    let l23 = -b20 * w03 - b21 * w13 - b22 * w23 - b23 * w33
    let l30 = -b30 * w00 - b31 * w10 - b32 * w20 - b33 * w30
    let l31 = -b30 * w01 - b31 * w11 - b32 * w21 - b33 * w31
    let l32 = -b30 * w02 - b31 * w12 - b32 * w22 - b33 * w32
    let l33 = 1 - b30 * w03 - b31 * w13 - b32 * w23 - b33 * w33
    l00 = 1 / l00
    l10 *= l00
    l20 *= l00
    l30 *= l00
    l11 = 1 / (l11 - l10 * l01)
    l12 -= l10 * l02
    l13 -= l10 * l03
    l21 = (l21 - l20 * l01) * l11
    l31 = (l31 - l30 * l01) * l11
    l22 = 1 / (l22 - l20 * l02 - l21 * l12)
    l23 -= l20 * l03 + l21 * l13
    l32 = (l32 - l30 * l02 - l31 * l12) * l22
    l33 = 1 / (l33 - l30 * l03 - l31 * l13 - l32 * l23)

    // u = tUp; e ← u (e + W (I - b W)⁻¹ b e).
    const uAre = tUp[i]
    const uAim = tUp[n + i]
    const uBre = tUp[2 * n + i]
    const uBim = tUp[3 * n + i]
    const uCre = tUp[4 * n + i]
    const uCim = tUp[5 * n + i]
    const uDre = tUp[6 * n + i]
    const uDim = tUp[7 * n + i]
    const uADre = uAre * uDre + uAim * uDim
    const uADim = uAim * uDre - uAre * uDim
    const uBCre = uBre * uCre + uBim * uCim
    const uBCim = uBim * uCre - uBre * uCim
    const u00 = uAre * uAre + uAim * uAim
    const u01 = uBre * uBre + uBim * uBim
    const u02 = 2 * (uAre * uBre + uAim * uBim)
    const u03 = 2 * (uAre * uBim - uAim * uBre)
    const u10 = uCre * uCre + uCim * uCim
    const u11 = uDre * uDre + uDim * uDim
    const u12 = 2 * (uCre * uDre + uCim * uDim)
    const u13 = 2 * (uCre * uDim - uCim * uDre)
    const u20 = uAre * uCre + uAim * uCim
    const u21 = uBre * uDre + uBim * uDim
    const u22 = uADre + uBCre
    const u23 = uBCim - uADim
    const u30 = uAim * uCre - uAre * uCim
    const u31 = uBim * uDre - uBre * uDim
    const u32 = uADim + uBCim
    const u33 = uADre - uBCre
    const s0 = b00 * e0 + b01 * e1 + b02 * e2 + b03 * e3
    const s1 = b10 * e0 + b11 * e1 + b12 * e2 + b13 * e3 - l10 * s0
    const s2 = b20 * e0 + b21 * e1 + b22 * e2 + b23 * e3 - l20 * s0 - l21 * s1
    const sz = (b30 * e0 + b31 * e1 + b32 * e2 + b33 * e3 - l30 * s0 - l31 * s1 - l32 * s2) * l33
    const sy = (s2 - l23 * sz) * l22
    const sx = (s1 - l12 * sy - l13 * sz) * l11
    const sw = (s0 - l01 * sx - l02 * sy - l03 * sz) * l00
    const f0 = e0 + w00 * sw + w01 * sx + w02 * sy + w03 * sz
    const f1 = e1 + w10 * sw + w11 * sx + w12 * sy + w13 * sz
    const f2 = e2 + w20 * sw + w21 * sx + w22 * sy + w23 * sz
    const f3 = e3 + w30 * sw + w31 * sx + w32 * sy + w33 * sz
    eAbove[i] = u00 * f0 + u01 * f1 + u02 * f2 + u03 * f3
    eAbove[1 * n + i] = u10 * f0 + u11 * f1 + u12 * f2 + u13 * f3
    eAbove[2 * n + i] = u20 * f0 + u21 * f1 + u22 * f2 + u23 * f3
    eAbove[3 * n + i] = u30 * f0 + u31 * f1 + u32 * f2 + u33 * f3

    // W ← r + u W (I - b W)⁻¹ t, column by column.
    const tAre = t[i]
    const tAim = t[n + i]
    const tBre = t[2 * n + i]
    const tBim = t[3 * n + i]
    const tCre = t[4 * n + i]
    const tCim = t[5 * n + i]
    const tDre = t[6 * n + i]
    const tDim = t[7 * n + i]
    const tADre = tAre * tDre + tAim * tDim
    const tADim = tAim * tDre - tAre * tDim
    const tBCre = tBre * tCre + tBim * tCim
    const tBCim = tBim * tCre - tBre * tCim
    const t00 = tAre * tAre + tAim * tAim
    const t01 = tBre * tBre + tBim * tBim
    const t02 = 2 * (tAre * tBre + tAim * tBim)
    const t03 = 2 * (tAre * tBim - tAim * tBre)
    const t10 = tCre * tCre + tCim * tCim
    const t11 = tDre * tDre + tDim * tDim
    const t12 = 2 * (tCre * tDre + tCim * tDim)
    const t13 = 2 * (tCre * tDim - tCim * tDre)
    const t20 = tAre * tCre + tAim * tCim
    const t21 = tBre * tDre + tBim * tDim
    const t22 = tADre + tBCre
    const t23 = tBCim - tADim
    const t30 = tAim * tCre - tAre * tCim
    const t31 = tBim * tDre - tBre * tDim
    const t32 = tADim + tBCim
    const t33 = tADre - tBCre
    const rAre = r[i]
    const rAim = r[n + i]
    const rBre = r[2 * n + i]
    const rBim = r[3 * n + i]
    const rCre = r[4 * n + i]
    const rCim = r[5 * n + i]
    const rDre = r[6 * n + i]
    const rDim = r[7 * n + i]
    const rADre = rAre * rDre + rAim * rDim
    const rADim = rAim * rDre - rAre * rDim
    const rBCre = rBre * rCre + rBim * rCim
    const rBCim = rBim * rCre - rBre * rCim
    const r00 = rAre * rAre + rAim * rAim
    const r01 = rBre * rBre + rBim * rBim
    const r02 = 2 * (rAre * rBre + rAim * rBim)
    const r03 = 2 * (rAre * rBim - rAim * rBre)
    const r10 = rCre * rCre + rCim * rCim
    const r11 = rDre * rDre + rDim * rDim
    const r12 = 2 * (rCre * rDre + rCim * rDim)
    const r13 = 2 * (rCre * rDim - rCim * rDre)
    const r20 = rAre * rCre + rAim * rCim
    const r21 = rBre * rDre + rBim * rDim
    const r22 = rADre + rBCre
    const r23 = rBCim - rADim
    const r30 = rAim * rCre - rAre * rCim
    const r31 = rBim * rDre - rBre * rDim
    const r32 = rADim + rBCim
    const r33 = rADre - rBCre
    const p0 = t00
    const p1 = t10 - l10 * p0
    const p2 = t20 - l20 * p0 - l21 * p1
    const pz = (t30 - l30 * p0 - l31 * p1 - l32 * p2) * l33
    const py = (p2 - l23 * pz) * l22
    const px = (p1 - l12 * py - l13 * pz) * l11
    const pw = (p0 - l01 * px - l02 * py - l03 * pz) * l00
    const v00 = w00 * pw + w01 * px + w02 * py + w03 * pz
    const v10 = w10 * pw + w11 * px + w12 * py + w13 * pz
    const v20 = w20 * pw + w21 * px + w22 * py + w23 * pz
    const v30 = w30 * pw + w31 * px + w32 * py + w33 * pz
    wAbove[i] = r00 + u00 * v00 + u01 * v10 + u02 * v20 + u03 * v30
    wAbove[4 * n + i] = r10 + u10 * v00 + u11 * v10 + u12 * v20 + u13 * v30
    wAbove[8 * n + i] = r20 + u20 * v00 + u21 * v10 + u22 * v20 + u23 * v30
    wAbove[12 * n + i] = r30 + u30 * v00 + u31 * v10 + u32 * v20 + u33 * v30
    const q0 = t01
    const q1 = t11 - l10 * q0
    const q2 = t21 - l20 * q0 - l21 * q1
    const qz = (t31 - l30 * q0 - l31 * q1 - l32 * q2) * l33
    const qy = (q2 - l23 * qz) * l22
    const qx = (q1 - l12 * qy - l13 * qz) * l11
    const qw = (q0 - l01 * qx - l02 * qy - l03 * qz) * l00
    const v01 = w00 * qw + w01 * qx + w02 * qy + w03 * qz
    const v11 = w10 * qw + w11 * qx + w12 * qy + w13 * qz
    const v21 = w20 * qw + w21 * qx + w22 * qy + w23 * qz
    const v31 = w30 * qw + w31 * qx + w32 * qy + w33 * qz
    wAbove[1 * n + i] = r01 + u00 * v01 + u01 * v11 + u02 * v21 + u03 * v31
    wAbove[5 * n + i] = r11 + u10 * v01 + u11 * v11 + u12 * v21 + u13 * v31
    wAbove[9 * n + i] = r21 + u20 * v01 + u21 * v11 + u22 * v21 + u23 * v31
    wAbove[13 * n + i] = r31 + u30 * v01 + u31 * v11 + u32 * v21 + u33 * v31
    const g0 = t02
    const g1 = t12 - l10 * g0
    const g2 = t22 - l20 * g0 - l21 * g1
    const gz = (t32 - l30 * g0 - l31 * g1 - l32 * g2) * l33
    const gy = (g2 - l23 * gz) * l22
    const gx = (g1 - l12 * gy - l13 * gz) * l11
    const gw = (g0 - l01 * gx - l02 * gy - l03 * gz) * l00
    const v02 = w00 * gw + w01 * gx + w02 * gy + w03 * gz
    const v12 = w10 * gw + w11 * gx + w12 * gy + w13 * gz
    const v22 = w20 * gw + w21 * gx + w22 * gy + w23 * gz
    const v32 = w30 * gw + w31 * gx + w32 * gy + w33 * gz
    wAbove[2 * n + i] = r02 + u00 * v02 + u01 * v12 + u02 * v22 + u03 * v32
    wAbove[6 * n + i] = r12 + u10 * v02 + u11 * v12 + u12 * v22 + u13 * v32
    wAbove[10 * n + i] = r22 + u20 * v02 + u21 * v12 + u22 * v22 + u23 * v32
    wAbove[14 * n + i] = r32 + u30 * v02 + u31 * v12 + u32 * v22 + u33 * v32
    const h0 = t03
    const h1 = t13 - l10 * h0
    const h2 = t23 - l20 * h0 - l21 * h1
    const hz = (t33 - l30 * h0 - l31 * h1 - l32 * h2) * l33
    const hy = (h2 - l23 * hz) * l22
    const hx = (h1 - l12 * hy - l13 * hz) * l11
    const hw = (h0 - l01 * hx - l02 * hy - l03 * hz) * l00
    const v03 = w00 * hw + w01 * hx + w02 * hy + w03 * hz
    const v13 = w10 * hw + w11 * hx + w12 * hy + w13 * hz
    const v23 = w20 * hw + w21 * hx + w22 * hy + w23 * hz
    const v33 = w30 * hw + w31 * hx + w32 * hy + w33 * hz
    wAbove[3 * n + i] = r03 + u00 * v03 + u01 * v13 + u02 * v23 + u03 * v33
    wAbove[7 * n + i] = r13 + u10 * v03 + u11 * v13 + u12 * v23 + u13 * v33
    wAbove[11 * n + i] = r23 + u20 * v03 + u21 * v13 + u22 * v23 + u23 * v33
    wAbove[15 * n + i] = r33 + u30 * v03 + u31 * v13 + u32 * v23 + u33 * v33
  }
}
