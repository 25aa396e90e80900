/** Surfaces, coatings, metals, crystals: published values, each with its source, for any solver of the oracle's shape. */
import { describe, expect, it } from 'vitest'
import { type Complex, real } from '../oracle/complex.js'
import type { OracleLayer, OraclePanel, SolvePoint } from '../oracle/solvePoint.js'
import type { Mueller } from '../oracle/stokes.js'

const DEGREE = Math.PI / 180

interface Shares {
  readonly pp: number
  readonly ss: number
  readonly crossFromP: number
}

/** Reflectances of p and s light from the upper left of a Mueller matrix. */
const sharesOf = ([[m00, m01], [m10, m11]]: Mueller): Shares => ({
  pp: (m00 + m01 + m10 + m11) / 2,
  ss: (m00 - m01 - m10 + m11) / 2,
  crossFromP: (m00 + m01 - m10 - m11) / 2,
})

const glass = (n: number, k = 0): OraclePanel => ({ kind: 'metal', index: { re: n, im: k } })

export function publishedSurfaces(solve: SolvePoint): void {
  const look = (wavelengthNm: number, thetaDeg: number, layers: readonly OracleLayer[], panel: OraclePanel) =>
    solve({ wavelengthNm, thetaRad: thetaDeg * DEGREE, phiRad: 0, layers, panel })
  bareGlass(look)
  quarterWaveCoating(look)
  opaqueMetals(look)
  uniaxialHalfSpace(look)
  freeSlab(look)
}

type Look = (
  wavelengthNm: number,
  thetaDeg: number,
  layers: readonly OracleLayer[],
  panel: OraclePanel,
) => ReturnType<SolvePoint>

/** Fresnel's equations (Born, Wolf, Principles of Optics, 1.5; reference from memory), n = 1.5: θ, s, p. */
const FRESNEL_GLASS = [
  [0, 0.04, 0.04],
  [30, 0.057796, 0.025249],
  [45, 0.092013, 0.008466],
  [60, 0.176571, 0.001802],
  [70, 0.299595, 0.04249],
  [80, 0.538595, 0.236814],
  [85, 0.732345, 0.493254],
  [56.3099, 0.147929, 0],
] as const

function bareGlass(look: Look): void {
  it.each(FRESNEL_GLASS)('glass of index 1.5 from %d° (Fresnel)', (theta, s, p) => {
    const { mueller, reflectance, frontReflectance } = look(550, theta, [], glass(1.5))
    const shares = sharesOf(mueller)
    expect(shares.ss).toBeCloseTo(s, 6)
    expect(shares.pp).toBeCloseTo(p, 6)
    expect(reflectance).toBeCloseTo((s + p) / 2, 6)
    expect(frontReflectance).toBeCloseTo(reflectance, 13)
  })
}

/**
 * R = ((n₀ n_s − n₁²)/(n₀ n_s + n₁²))² at the design wavelength, Airy's formula elsewhere (Macleod, Thin-Film Optical
 * Filters; Hecht, Optics, ch. 9; references from memory): film, substrate, wavelength (nm), R.
 */
const QUARTER_WAVE_COATINGS = [
  [1.38, 1.52, 550, 0.012601],
  [1.38, 1.5, 550, 0.01411],
  [1.37851, 1.52, 550, 0.012362],
  [1.38, 1.51852, 550, 0.012709],
  [1.38, 1.52, 400, 0.022053],
  [1.38, 1.52, 450, 0.016204],
  [1.38, 1.52, 650, 0.014368],
  [1.38, 1.52, 700, 0.015962],
] as const

function quarterWaveCoating(look: Look): void {
  it.each(QUARTER_WAVE_COATINGS)(
    'quarter wave (550 nm) of index %d on %d at %d nm',
    (film, substrate, nm, expected) => {
      const n = real(film)
      const layer = {
        principal: [n, n, n] as const,
        azimuthRad: 0,
        tiltRad: 0,
        thicknessNm: 550 / 4 / film,
        coherent: true,
      }
      expect(look(nm, 0, [layer], glass(substrate)).reflectance).toBeCloseTo(expected, 6)
    },
  )
}

/** R = ((n − 1)² + k²)/((n + 1)² + k²) with n, k as printed in the source: metal, wavelength (nm), n, k, R. */
const METALS = [
  ['Al, printed R', 600, 1.26232, 7.1855, 0.91103],
  ['Al, McPeak et al., ACS Photonics 2, 326 (2015)', 450, 0.48922, 4.77832, 0.92188],
  ['Al, McPeak et al., ACS Photonics 2, 326 (2015)', 650, 1.24636, 6.85233, 0.90413],
  ['Al, Mathewson, Myers, Phys. Scr. 4, 291 (1971)', 550, 0.99936, 6.50563, 0.9137],
  ['Al, Rakic et al., Appl. Opt. 37, 5271 (1998)', 550, 0.96563, 6.45806, 0.91524],
  ['Ag, Johnson, Christy, Phys. Rev. B 6, 4370 (1972)', 450, 0.04, 2.6484, 0.98024],
  ['Ag, Johnson, Christy, Phys. Rev. B 6, 4370 (1972)', 650, 0.05222, 4.40936, 0.98983],
  ['Ag, McPeak et al., ACS Photonics 2, 326 (2015)', 550, 0.04382, 3.61011, 0.98759],
  ['Ag, Rakic et al., Appl. Opt. 37, 5271 (1998)', 650, 0.14623, 3.93665, 0.96521],
] as const

function opaqueMetals(look: Look): void {
  it.each(METALS)('opaque %s at %d nm', (_source, nm, n, k, expected) => {
    // n and k are rounded to five decimals, R is that of the unrounded ones.
    expect(Math.abs(look(nm, 0, [], glass(n, k)).reflectance - expected)).toBeLessThan(6e-6)
  })
}

type Axis = 'normal' | 'in plane' | 'across'

/** A uniaxial film with its axis along the normal, in the plane of incidence (φ = 0), or across it in the film. */
function uniaxial(no: Complex, ne: Complex, axis: Axis, thicknessNm: number, coherent: boolean): OracleLayer {
  const principal = axis === 'normal' ? ([no, no, ne] as const) : ([ne, no, no] as const)
  return { principal, azimuthRad: axis === 'across' ? Math.PI / 2 : 0, tiltRad: 0, thicknessNm, coherent }
}

/**
 * Uniaxial half-space from air: J. Lekner, J. Phys.: Condens. Matter 3, 6121 (1991) and 4, 1387 (1992), computed from
 * its closed forms: n_o, n_e, θ; axis along the normal s, p; in plane p (its s is that of the normal); across s, p.
 */
const LEKNER = [
  [1.6584, 1.4864, 0, 0.061339, 0.061339, 0.038269, 0.038269, 0.061339],
  [1.6584, 1.4864, 45, 0.129078, 0.020392, 0.005612, 0.088802, 0.016661],
  [1.6584, 1.4864, 60, 0.228121, 0.000101, 0.004717, 0.171841, 0.000197],
  [1.5, 1.6, 45, 0.092013, 0.006985, 0.015352, 0.115522, 0.008466],
  [1.5, 1.6, 60, 0.176571, 0.003261, 0.000104, 0.209857, 0.001802],
] as const

/** So thick and so little absorbing that nothing returns from below and the face does not feel the absorption. */
const halfSpace = (no: number, ne: number, axis: Axis): OracleLayer =>
  uniaxial({ re: no, im: 1e-6 }, { re: ne, im: 1e-6 }, axis, 1e10, false)

function uniaxialHalfSpace(look: Look): void {
  it.each(LEKNER)('uniaxial half-space %d, %d from %d° (Lekner)', (no, ne, theta, cs, cp, xp, ys, yp) => {
    const shares = (axis: Axis) => sharesOf(look(550, theta, [halfSpace(no, ne, axis)], glass(no)).mueller)
    expect(shares('normal').ss).toBeCloseTo(cs, 6)
    expect(shares('normal').pp).toBeCloseTo(cp, 6)
    expect(shares('in plane').ss).toBeCloseTo(cs, 6)
    expect(shares('in plane').pp).toBeCloseTo(xp, 6)
    expect(shares('across').ss).toBeCloseTo(ys, 6)
    expect(shares('across').pp).toBeCloseTo(yp, 6)
  })

  it('calcite with its axis at 45° to the polarization turns some of the light (Lekner; indices of Ghosh)', () => {
    // r = r_o cos²φ + r_e sin²φ, r' = (r_o − r_e) cos φ sin φ. Indices: G. Ghosh, Opt. Commun. 163, 95 (1999), 587.6 nm.
    const um2 = 0.5876 ** 2
    const sellmeier = (constant: number, b1: number, c1: number, b2: number) =>
      Math.sqrt(1 + constant + (b1 * um2) / (um2 - c1) + (b2 * um2) / (um2 - 120))
    const no = sellmeier(0.73358749, 0.96464345, 0.0194325203, 1.82831454)
    const ne = sellmeier(0.35859695, 0.8242783, 0.0106689543, 0.14429128)
    const turned = { ...halfSpace(no, ne, 'in plane'), azimuthRad: Math.PI / 4 }
    const shares = sharesOf(look(587.6, 0, [turned], glass(no)).mueller)
    expect(shares.pp).toBeCloseTo(0.0491151, 7)
    expect(shares.crossFromP).toBeCloseTo(6.79389e-4, 8)
  })
}

/**
 * Free-standing slab in air, n_o 1.5, n_e 1.6, 1 µm, 550 nm, from the same closed forms and Airy's sum; without phase
 * 2R/(1 + R): θ, coherent?, then as in the table above.
 */
const SLABS = [
  [45, true, 0.123152, 0.003075, 0.010056, 0.192555, 0.010721],
  [45, false, 0.168521, 0.013873, 0.03024, 0.207118, 0.016791],
  [60, true, 0.504878, 0.012039, 0.000208, 0.129171, 0.007031],
  [60, false, 0.300146, 0.006502, 0.000208, 0.346911, 0.003597],
] as const

function freeSlab(look: Look): void {
  describe.each(SLABS)('free slab from %d°, coherent %s', (theta, coherent, cs, cp, xp, ys, yp) => {
    const shares = (axis: Axis) =>
      sharesOf(look(550, theta, [uniaxial(real(1.5), real(1.6), axis, 1000, coherent)], glass(1)).mueller)
    it('axis along the normal', () => {
      expect(shares('normal').ss).toBeCloseTo(cs, 6)
      expect(shares('normal').pp).toBeCloseTo(cp, 6)
    })
    it('axis in the plane of incidence', () => {
      expect(shares('in plane').ss).toBeCloseTo(cs, 6)
      expect(shares('in plane').pp).toBeCloseTo(xp, 6)
    })
    it('axis across it', () => {
      expect(shares('across').ss).toBeCloseTo(ys, 6)
      expect(shares('across').pp).toBeCloseTo(yp, 6)
    })
  })
}
