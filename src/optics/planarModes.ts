/**
 * A layer whose principal axes lie in the film and along its normal, at azimuth α to the plane of incidence.
 * Berreman's equations split: with E = (Ex', Ey'), H = (Hy', -Hx'),
 *
 *   E' = i k0 A H,  H' = i k0 C E,  A = diag(a, 1),  a = 1 - ξ²/εzz,  C = [[εxx, εxy], [εxy, εyy - ξ²]].
 *
 * With q1, q2 the forward roots of the eigenvalues of AC, the root S = (AC)^½ = (AC + q1 q2 I)/(q1 + q2) needs no
 * eigenvectors, so nearly isotropic layers need no special case. Then Y = A⁻¹ S and
 *
 *   P = exp(i k0 d S) = c I + s (S - m I),  c = (e1 + e2)/2,  s = (e1 - e2)/(q1 - q2),  m = (q1 + q2)/2,  ej = e^{i k0 d qj}.
 *
 * D. W. Berreman, J. Opt. Soc. Am. 62, 502 (1972); square root of a 2×2 matrix from Cayley and Hamilton.
 */
import { forwardRoot } from './forwardRoot.js'
import type { LayerModes } from './layerModes.js'
import type { Medium } from './opticalLayer.js'

const Q = new Float64Array(2)
const EXPONENTIAL = new Float64Array(4)

/** Fills Y and P. `relativeAzimuthRad` is the azimuth of axis 1 less that of the plane of incidence. */
export function fillPlanarModes(
  modes: LayerModes,
  medium: Medium,
  relativeAzimuthRad: number,
  thicknessNm: number,
  xi: number,
  waveNumbers: Float64Array,
): void {
  const n = waveNumbers.length
  const eps = medium.permittivity
  const { y, p } = modes
  modes.diagonal = false
  modes.tilted = false
  const cos = Math.cos(relativeAzimuthRad)
  const sin = Math.sin(relativeAzimuthRad)
  const cos2 = cos * cos
  const sin2 = sin * sin
  const cross = -sin * cos
  const xi2 = xi * xi
  for (let i = 0; i < n; i++) {
    const e1Re = eps[i]
    const e1Im = eps[n + i]
    const e2Re = eps[2 * n + i]
    const e2Im = eps[3 * n + i]
    const zRe = eps[4 * n + i]
    const zIm = eps[5 * n + i]
    const zScale = xi2 / (zRe * zRe + zIm * zIm)
    const aRe = 1 - zRe * zScale
    const aIm = zIm * zScale
    const xxRe = e1Re * cos2 + e2Re * sin2
    const xxIm = e1Im * cos2 + e2Im * sin2
    const xyRe = (e1Re - e2Re) * cross
    const xyIm = (e1Im - e2Im) * cross
    // AC, row-major: b00 b01 / xy b11
    const b00Re = aRe * xxRe - aIm * xxIm
    const b00Im = aRe * xxIm + aIm * xxRe
    const b01Re = aRe * xyRe - aIm * xyIm
    const b01Im = aRe * xyIm + aIm * xyRe
    const b11Re = e1Re * sin2 + e2Re * cos2 - xi2
    const b11Im = e1Im * sin2 + e2Im * cos2
    // Half the difference of the eigenvalues, from differences of elements: exact where they nearly meet.
    const halfRe = (b00Re - b11Re) / 2
    const halfIm = (b00Im - b11Im) / 2
    const meanRe = (b00Re + b11Re) / 2
    const meanIm = (b00Im + b11Im) / 2
    const d2Re = halfRe * halfRe - halfIm * halfIm + b01Re * xyRe - b01Im * xyIm
    const d2Im = 2 * halfRe * halfIm + b01Re * xyIm + b01Im * xyRe
    forwardRoot(d2Re, d2Im, Q)
    const dRe = Q[0]
    const dIm = Q[1]
    forwardRoot(meanRe + dRe, meanIm + dIm, Q)
    const q1Re = Q[0]
    const q1Im = Q[1]
    forwardRoot(meanRe - dRe, meanIm - dIm, Q)
    const q2Re = Q[0]
    const q2Im = Q[1]

    // S = (AC + q1 q2 I) / (q1 + q2)
    const sumRe = q1Re + q2Re
    const sumIm = q1Im + q2Im
    const sumScale = 1 / (sumRe * sumRe + sumIm * sumIm)
    const gRe = sumRe * sumScale
    const gIm = -sumIm * sumScale
    const prodRe = q1Re * q2Re - q1Im * q2Im
    const prodIm = q1Re * q2Im + q1Im * q2Re
    const t00Re = b00Re + prodRe
    const t00Im = b00Im + prodIm
    const t11Re = b11Re + prodRe
    const t11Im = b11Im + prodIm
    const s00Re = t00Re * gRe - t00Im * gIm
    const s00Im = t00Re * gIm + t00Im * gRe
    const s01Re = b01Re * gRe - b01Im * gIm
    const s01Im = b01Re * gIm + b01Im * gRe
    const s10Re = xyRe * gRe - xyIm * gIm
    const s10Im = xyRe * gIm + xyIm * gRe
    const s11Re = t11Re * gRe - t11Im * gIm
    const s11Im = t11Re * gIm + t11Im * gRe

    // Y = A⁻¹ S
    const aScale = 1 / (aRe * aRe + aIm * aIm)
    const iRe = aRe * aScale
    const iIm = -aIm * aScale
    y[i] = s00Re * iRe - s00Im * iIm
    y[n + i] = s00Re * iIm + s00Im * iRe
    y[2 * n + i] = s01Re * iRe - s01Im * iIm
    y[3 * n + i] = s01Re * iIm + s01Im * iRe
    y[4 * n + i] = s10Re
    y[5 * n + i] = s10Im
    y[6 * n + i] = s11Re
    y[7 * n + i] = s11Im

    exponentialParts(waveNumbers[i] * thicknessNm, q1Re, q1Im, q2Re, q2Im, EXPONENTIAL)
    const cRe = EXPONENTIAL[0]
    const cIm = EXPONENTIAL[1]
    const fRe = EXPONENTIAL[2]
    const fIm = EXPONENTIAL[3]
    // S - m I is traceless: its diagonal is ± half the difference.
    const uRe = (s00Re - s11Re) / 2
    const uIm = (s00Im - s11Im) / 2
    const vRe = fRe * uRe - fIm * uIm
    const vIm = fRe * uIm + fIm * uRe
    p[i] = cRe + vRe
    p[n + i] = cIm + vIm
    p[2 * n + i] = fRe * s01Re - fIm * s01Im
    p[3 * n + i] = fRe * s01Im + fIm * s01Re
    p[4 * n + i] = fRe * s10Re - fIm * s10Im
    p[5 * n + i] = fRe * s10Im + fIm * s10Re
    p[6 * n + i] = cRe - vRe
    p[7 * n + i] = cIm - vIm
  }
}

/**
 * c = (e1 + e2)/2 and s = (e1 - e2)/(q1 - q2) of e_j = exp(i phase q_j), into out as Re c, Im c, Re s, Im s.
 * Written with e1 and e2 themselves: cosh and sinh of a thick metal would overflow.
 */
export function exponentialParts(
  phase: number,
  q1Re: number,
  q1Im: number,
  q2Re: number,
  q2Im: number,
  out: Float64Array,
): void {
  const decay1 = q1Im === 0 ? 1 : Math.exp(-phase * q1Im)
  const decay2 = q2Im === 0 ? 1 : Math.exp(-phase * q2Im)
  const e1Re = decay1 * Math.cos(phase * q1Re)
  const e1Im = decay1 * Math.sin(phase * q1Re)
  const e2Re = decay2 * Math.cos(phase * q2Re)
  const e2Im = decay2 * Math.sin(phase * q2Re)
  out[0] = (e1Re + e2Re) / 2
  out[1] = (e1Im + e2Im) / 2
  const dRe = q1Re - q2Re
  const dIm = q1Im - q2Im
  const d2 = dRe * dRe + dIm * dIm
  if (d2 * phase * phase < 1e-6) {
    // s = i phase e^{i phase m} sinhc(z), z = i phase (q1 - q2)/2, where the difference above would cancel.
    const zRe = (-phase * dIm) / 2
    const zIm = (phase * dRe) / 2
    const z2Re = zRe * zRe - zIm * zIm
    const z2Im = 2 * zRe * zIm
    const sincRe = 1 + z2Re / 6 + (z2Re * z2Re - z2Im * z2Im) / 120
    const sincIm = z2Im / 6 + (z2Re * z2Im) / 60
    const decay = Math.exp((-phase * (q1Im + q2Im)) / 2)
    const mRe = decay * Math.cos((phase * (q1Re + q2Re)) / 2)
    const mIm = decay * Math.sin((phase * (q1Re + q2Re)) / 2)
    const hRe = -phase * mIm
    const hIm = phase * mRe
    out[2] = hRe * sincRe - hIm * sincIm
    out[3] = hRe * sincIm + hIm * sincRe
    return
  }
  const nRe = e1Re - e2Re
  const nIm = e1Im - e2Im
  out[2] = (nRe * dRe + nIm * dIm) / d2
  out[3] = (nIm * dRe - nRe * dIm) / d2
}
