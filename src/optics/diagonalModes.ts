/**
 * A layer whose in-plane permittivity is the same in all azimuths (isotropic, or a C-plate). p and s stay apart:
 *
 *   a = 1 - ξ²/ε3,  q_p = √(a ε1),  q_s = √(ε1 - ξ²),  Y = diag(q_p / a, q_s),  P = diag(e^{i k0 d q_p}, e^{i k0 d q_s}).
 *
 * Berreman's equations (D. W. Berreman, J. Opt. Soc. Am. 62, 502 (1972)) in the split form for axes in and along the
 * normal; time convention exp(-iωt).
 */
import { forwardRoot } from './forwardRoot.js'
import type { LayerModes } from './layerModes.js'
import type { Medium } from './opticalLayer.js'

const ROOT = new Float64Array(2)

/** Fills Y and P. `xi` is the tangential wavevector in units of k0, `waveNumbers` k0 in 1/nm over wavelength. */
export function fillDiagonalModes(
  modes: LayerModes,
  medium: Medium,
  thicknessNm: number,
  xi: number,
  waveNumbers: Float64Array,
): void {
  const n = waveNumbers.length
  const eps = medium.permittivity
  const { y, p } = modes
  modes.diagonal = true
  modes.tilted = false
  const xi2 = xi * xi
  y.fill(0, 2 * n, 6 * n)
  p.fill(0, 2 * n, 6 * n)
  for (let i = 0; i < n; i++) {
    const eRe = eps[i]
    const eIm = eps[n + i]
    const zRe = eps[4 * n + i]
    const zIm = eps[5 * n + i]
    const zScale = xi2 / (zRe * zRe + zIm * zIm)
    const aRe = 1 - zRe * zScale
    const aIm = zIm * zScale
    const phase = waveNumbers[i] * thicknessNm

    forwardRoot(aRe * eRe - aIm * eIm, aRe * eIm + aIm * eRe, ROOT)
    const aScale = 1 / (aRe * aRe + aIm * aIm)
    y[i] = (ROOT[0] * aRe + ROOT[1] * aIm) * aScale
    y[n + i] = (ROOT[1] * aRe - ROOT[0] * aIm) * aScale
    const decayP = Math.exp(-phase * ROOT[1])
    p[i] = decayP * Math.cos(phase * ROOT[0])
    p[n + i] = decayP * Math.sin(phase * ROOT[0])

    forwardRoot(eRe - xi2, eIm, ROOT)
    y[6 * n + i] = ROOT[0]
    y[7 * n + i] = ROOT[1]
    const decayS = Math.exp(-phase * ROOT[1])
    p[6 * n + i] = decayS * Math.cos(phase * ROOT[0])
    p[7 * n + i] = decayS * Math.sin(phase * ROOT[0])
  }
}
