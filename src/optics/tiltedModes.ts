/**
 * A crystal with its axes out of the film plane. Berreman's matrix then couples all four tangential fields,
 *
 *   E' = i k0 (D E + A H),  H' = i k0 (C E + Dᵀ' H),   d0 = -ξ εxz/εzz,  d1 = -ξ εyz/εzz,
 *   D = [[d0, d1], [0, 0]],  A = diag(a, 1),  a = 1 - ξ²/εzz,  C = [[c00, c01], [c01, c11]],  G = [[d0, 0], [d1, 0]],
 *   c00 = εxx - εxz²/εzz,  c01 = εxy - εxz εyz/εzz,  c11 = εyy - εyz²/εzz - ξ².
 *
 * Its characteristic quartic is (u² - a c00)(q² - κ) = (a c01 + u d1)²/a with u = q - d0, κ = c11 - d1²/a. From the
 * quadratic factors of the waves in (s, p) and back (sb, pb), the spectral projector onto the waves going in is
 * (Δ² - sb Δ + pb)/…; applied to pure E it gives their admittance without any eigenvector:
 *
 *   Y = (C D + G C - sb C) (D² + A C - sb D + pb)⁻¹,   S = D + A Y,   P = exp(i k0 d S),
 *
 * and the same with s, p for the waves coming back, where P runs the other way. Nothing fails where modes meet.
 * D. W. Berreman, J. Opt. Soc. Am. 62, 502 (1972); spectral projectors from Cayley and Hamilton.
 */
import { forwardRoot } from './forwardRoot.js'
import type { LayerModes } from './layerModes.js'
import type { Medium } from './opticalLayer.js'
import { exponentialParts } from './planarModes.js'
import { refineFactor } from './waveFactor.js'

/** Complex numbers as Re, Im pairs, for one wavelength. */
const TENSOR = new Float64Array(12) // εxx εxy εxz εyy εyz εzz
const BERREMAN = new Float64Array(12) // d0 d1 a c00 c01 c11
const QUARTIC = new Float64Array(8) // a3 a2 a1 a0
const FORWARD = new Float64Array(4) // s p
const BACKWARD = new Float64Array(4) // sb pb
const ADMITTANCE = new Float64Array(8)
const STEP = new Float64Array(8) // S = D + A Y
const Q = new Float64Array(2)
const EXPONENTIAL = new Float64Array(4)
const BLOCKS = new Float64Array(16)

export function fillTiltedModes(
  modes: LayerModes,
  medium: Medium,
  relativeAzimuthRad: number,
  tiltRad: number,
  thicknessNm: number,
  xi: number,
  waveNumbers: Float64Array,
): void {
  const n = waveNumbers.length
  modes.diagonal = false
  modes.tilted = true
  for (let i = 0; i < n; i++) {
    tensorAt(medium.permittivity, n, i, relativeAzimuthRad, tiltRad)
    berremanElements(xi)
    findFactors()
    const phase = waveNumbers[i] * thicknessNm
    admittanceFrom(BACKWARD)
    store(modes.y, ADMITTANCE, n, i)
    propagator(phase, modes.p, n, i)
    admittanceFrom(FORWARD)
    store(modes.yBack, ADMITTANCE, n, i)
    propagator(-phase, modes.pBack, n, i)
  }
}

/** ε = Σ εj vj vjᵀ with the axes in the solver frame (x' in the plane of incidence, z' into the panel). */
function tensorAt(eps: Float64Array, n: number, i: number, azimuth: number, tilt: number): void {
  const ca = Math.cos(azimuth)
  const sa = Math.sin(azimuth)
  const ct = Math.cos(tilt)
  const st = Math.sin(tilt)
  TENSOR.fill(0)
  addAxis(eps[i], eps[n + i], ct * ca, -ct * sa, -st)
  addAxis(eps[2 * n + i], eps[3 * n + i], -sa, -ca, 0)
  addAxis(eps[4 * n + i], eps[5 * n + i], -st * ca, st * sa, -ct)
}

function addAxis(re: number, im: number, x: number, y: number, z: number): void {
  addComplex(0, re, im, x * x)
  addComplex(2, re, im, x * y)
  addComplex(4, re, im, x * z)
  addComplex(6, re, im, y * y)
  addComplex(8, re, im, y * z)
  addComplex(10, re, im, z * z)
}

function addComplex(at: number, re: number, im: number, factor: number): void {
  TENSOR[at] += re * factor
  TENSOR[at + 1] += im * factor
}

function berremanElements(xi: number): void {
  const t = TENSOR
  const scale = 1 / (t[10] * t[10] + t[11] * t[11])
  const wRe = t[10] * scale // 1/εzz
  const wIm = -t[11] * scale
  const xRe = t[4] * wRe - t[5] * wIm // εxz/εzz
  const xIm = t[4] * wIm + t[5] * wRe
  const yRe = t[8] * wRe - t[9] * wIm // εyz/εzz
  const yIm = t[8] * wIm + t[9] * wRe
  const b = BERREMAN
  b[0] = -xi * xRe
  b[1] = -xi * xIm
  b[2] = -xi * yRe
  b[3] = -xi * yIm
  b[4] = 1 - xi * xi * wRe
  b[5] = -xi * xi * wIm
  b[6] = t[0] - (t[4] * xRe - t[5] * xIm)
  b[7] = t[1] - (t[4] * xIm + t[5] * xRe)
  b[8] = t[2] - (t[4] * yRe - t[5] * yIm)
  b[9] = t[3] - (t[4] * yIm + t[5] * yRe)
  b[10] = t[6] - (t[8] * yRe - t[9] * yIm) - xi * xi
  b[11] = t[7] - (t[8] * yIm + t[9] * yRe)
}

/** Coefficients of the quartic with the tilt terms d0, d1 scaled by `share`, and the factor of the untilted one. */
function quarticAt(share: number): void {
  const b = BERREMAN
  const d0Re = b[0] * share
  const d0Im = b[1] * share
  const d1Re = b[2] * share
  const d1Im = b[3] * share
  const aScale = 1 / (b[4] * b[4] + b[5] * b[5])
  const iRe = b[4] * aScale // 1/a
  const iIm = -b[5] * aScale
  const d11Re = d1Re * d1Re - d1Im * d1Im
  const d11Im = 2 * d1Re * d1Im
  const eRe = d11Re * iRe - d11Im * iIm // d1²/a
  const eIm = d11Re * iIm + d11Im * iRe
  const kRe = b[10] - eRe // κ
  const kIm = b[11] - eIm
  const acRe = b[4] * b[6] - b[5] * b[7] // a c00
  const acIm = b[4] * b[7] + b[5] * b[6]
  const fRe = d0Re * d0Re - d0Im * d0Im - acRe // d0² - a c00
  const fIm = 2 * d0Re * d0Im - acIm
  const wRe = b[4] * b[8] - b[5] * b[9] - (d0Re * d1Re - d0Im * d1Im) // a c01 - d0 d1
  const wIm = b[4] * b[9] + b[5] * b[8] - (d0Re * d1Im + d0Im * d1Re)
  const waRe = wRe * iRe - wIm * iIm // w/a
  const waIm = wRe * iIm + wIm * iRe
  QUARTIC[0] = -2 * d0Re
  QUARTIC[1] = -2 * d0Im
  QUARTIC[2] = fRe - kRe - eRe
  QUARTIC[3] = fIm - kIm - eIm
  QUARTIC[4] = 2 * (d0Re * kRe - d0Im * kIm) - 2 * (d1Re * waRe - d1Im * waIm)
  QUARTIC[5] = 2 * (d0Re * kIm + d0Im * kRe) - 2 * (d1Re * waIm + d1Im * waRe)
  QUARTIC[6] = -(fRe * kRe - fIm * kIm) - (wRe * waRe - wIm * waIm)
  QUARTIC[7] = -(fRe * kIm + fIm * kRe) - (wRe * waIm + wIm * waRe)
}

/** Forward factor of q⁴ + a2 q² + a0: the quartic without its odd terms. */
function guessFactor(): void {
  const hRe = -QUARTIC[2] / 2
  const hIm = -QUARTIC[3] / 2
  forwardRoot(hRe * hRe - hIm * hIm - QUARTIC[6], 2 * hRe * hIm - QUARTIC[7], Q)
  const dRe = Q[0]
  const dIm = Q[1]
  forwardRoot(hRe + dRe, hIm + dIm, Q)
  const q1Re = Q[0]
  const q1Im = Q[1]
  forwardRoot(hRe - dRe, hIm - dIm, Q)
  FORWARD[0] = q1Re + Q[0]
  FORWARD[1] = q1Im + Q[1]
  FORWARD[2] = q1Re * Q[0] - q1Im * Q[1]
  FORWARD[3] = q1Re * Q[1] + q1Im * Q[0]
}

/** Where Newton's method does not settle at once, the tilt terms are brought in step by step. */
const HOMOTOPY_STEPS = 32

function findFactors(): void {
  quarticAt(1)
  guessFactor()
  if (refineFactor(QUARTIC, FORWARD, BACKWARD)) return
  quarticAt(0)
  guessFactor()
  for (let step = 0; step <= HOMOTOPY_STEPS; step++) {
    quarticAt(step / HOMOTOPY_STEPS)
    refineFactor(QUARTIC, FORWARD, BACKWARD)
  }
}

/** Y of the group of waves whose partner group has the factor `other` = [s, p]; also S = D + A Y. */
function admittanceFrom(other: Float64Array): void {
  const b = BERREMAN
  const [sRe, sIm, pRe, pIm] = [other[0], other[1], other[2], other[3]]
  const [d0Re, d0Im, d1Re, d1Im, aRe, aIm] = [b[0], b[1], b[2], b[3], b[4], b[5]]
  const [c00Re, c00Im, c01Re, c01Im, c11Re, c11Im] = [b[6], b[7], b[8], b[9], b[10], b[11]]
  const N = BLOCKS
  // d0 - s
  const eRe = d0Re - sRe
  const eIm = d0Im - sIm
  // N11 = D² + A C - s D + p: D² = d0 D has a first row alone.
  N[0] = d0Re * eRe - d0Im * eIm + aRe * c00Re - aIm * c00Im + pRe
  N[1] = d0Re * eIm + d0Im * eRe + aRe * c00Im + aIm * c00Re + pIm
  N[2] = d1Re * eRe - d1Im * eIm + aRe * c01Re - aIm * c01Im
  N[3] = d1Re * eIm + d1Im * eRe + aRe * c01Im + aIm * c01Re
  N[4] = c01Re
  N[5] = c01Im
  N[6] = c11Re + pRe
  N[7] = c11Im + pIm
  // N21 = C D + G C - s C; C D has c0j d0, c0j d1; G C has d0 c0j and d1 c0j.
  const f0Re = 2 * d0Re - sRe
  const f0Im = 2 * d0Im - sIm
  N[8] = c00Re * f0Re - c00Im * f0Im
  N[9] = c00Re * f0Im + c00Im * f0Re
  N[10] = c00Re * d1Re - c00Im * d1Im + c01Re * eRe - c01Im * eIm
  N[11] = c00Re * d1Im + c00Im * d1Re + c01Re * eIm + c01Im * eRe
  N[12] = c01Re * eRe - c01Im * eIm + d1Re * c00Re - d1Im * c00Im
  N[13] = c01Re * eIm + c01Im * eRe + d1Re * c00Im + d1Im * c00Re
  N[14] = 2 * (c01Re * d1Re - c01Im * d1Im) - (c11Re * sRe - c11Im * sIm)
  N[15] = 2 * (c01Re * d1Im + c01Im * d1Re) - (c11Re * sIm + c11Im * sRe)
  divideBlocks()
  const y = ADMITTANCE
  STEP[0] = d0Re + aRe * y[0] - aIm * y[1]
  STEP[1] = d0Im + aRe * y[1] + aIm * y[0]
  STEP[2] = d1Re + aRe * y[2] - aIm * y[3]
  STEP[3] = d1Im + aRe * y[3] + aIm * y[2]
  STEP[4] = y[4]
  STEP[5] = y[5]
  STEP[6] = y[6]
  STEP[7] = y[7]
}

/** ADMITTANCE = N21 N11⁻¹. */
function divideBlocks(): void {
  const N = BLOCKS
  const detRe = N[0] * N[6] - N[1] * N[7] - (N[2] * N[4] - N[3] * N[5])
  const detIm = N[0] * N[7] + N[1] * N[6] - (N[2] * N[5] + N[3] * N[4])
  const scale = 1 / (detRe * detRe + detIm * detIm)
  const gRe = detRe * scale
  const gIm = -detIm * scale
  for (let row = 0; row < 2; row++) {
    const k = 8 + 4 * row
    const u0Re = N[k] * N[6] - N[k + 1] * N[7] - (N[k + 2] * N[4] - N[k + 3] * N[5])
    const u0Im = N[k] * N[7] + N[k + 1] * N[6] - (N[k + 2] * N[5] + N[k + 3] * N[4])
    const u1Re = N[k + 2] * N[0] - N[k + 3] * N[1] - (N[k] * N[2] - N[k + 1] * N[3])
    const u1Im = N[k + 2] * N[1] + N[k + 3] * N[0] - (N[k] * N[3] + N[k + 1] * N[2])
    ADMITTANCE[4 * row] = u0Re * gRe - u0Im * gIm
    ADMITTANCE[4 * row + 1] = u0Re * gIm + u0Im * gRe
    ADMITTANCE[4 * row + 2] = u1Re * gRe - u1Im * gIm
    ADMITTANCE[4 * row + 3] = u1Re * gIm + u1Im * gRe
  }
}

/** exp(i phase S) of the 2×2 STEP into `out` at wavelength i. */
function propagator(phase: number, out: Float64Array, n: number, i: number): void {
  const s = STEP
  const mRe = (s[0] + s[6]) / 2
  const mIm = (s[1] + s[7]) / 2
  const hRe = (s[0] - s[6]) / 2
  const hIm = (s[1] - s[7]) / 2
  const xRe = s[2] * s[4] - s[3] * s[5]
  const xIm = s[2] * s[5] + s[3] * s[4]
  forwardRoot(hRe * hRe - hIm * hIm + xRe, 2 * hRe * hIm + xIm, Q)
  exponentialParts(phase, mRe + Q[0], mIm + Q[1], mRe - Q[0], mIm - Q[1], EXPONENTIAL)
  const [cRe, cIm, fRe, fIm] = [EXPONENTIAL[0], EXPONENTIAL[1], EXPONENTIAL[2], EXPONENTIAL[3]]
  const vRe = fRe * hRe - fIm * hIm
  const vIm = fRe * hIm + fIm * hRe
  out[i] = cRe + vRe
  out[n + i] = cIm + vIm
  out[2 * n + i] = fRe * s[2] - fIm * s[3]
  out[3 * n + i] = fRe * s[3] + fIm * s[2]
  out[4 * n + i] = fRe * s[4] - fIm * s[5]
  out[5 * n + i] = fRe * s[5] + fIm * s[4]
  out[6 * n + i] = cRe - vRe
  out[7 * n + i] = cIm - vIm
}

function store(out: Float64Array, value: Float64Array, n: number, i: number): void {
  for (let c = 0; c < 8; c++) out[c * n + i] = value[c]
}
