/** Retarders in transmission and at an angle: published values, each with its source, for any solver of the oracle's shape. */
import { expect, it } from 'vitest'
import { oracleSpectrum } from '../oracle/oracleSpectrum.js'
import { polarizerSheet, retarderSheet, type SheetRetarder, sheetStack } from '../oracle/sheetStack.js'
import type { SolvePoint } from '../oracle/solvePoint.js'
import type { PlainStack } from '../oracle/stackFile.js'
import type { Stokes } from '../oracle/stokes.js'

const DEGREE = Math.PI / 180
const QUARTER_NM = 137.5

export function publishedRetarders(solve: SolvePoint): void {
  inTransmission(solve)
  circularLight(solve)
  obliqueRetardance(solve)
  darkFromEveryDirection(solve)
}

function emitted(solve: SolvePoint, stack: PlainStack, wavelengthNm: number, thetaDeg = 0, phiDeg = 0): Stokes {
  const [result] = oracleSpectrum(stack, [wavelengthNm], thetaDeg * DEGREE, phiDeg * DEGREE, solve)
  if (result.emissionStokes === undefined) throw new Error('no emission over this panel')
  return result.emissionStokes
}

/** Linear light along x through films, the first one it meets last in the list; then a share behind an analyzer at ψ. */
function behindAnalyzer(
  solve: SolvePoint,
  films: readonly SheetRetarder[],
  wavelengthNm: number,
  psiDeg: number,
): number {
  const layers = [...films.map((f, i) => retarderSheet(f, `film${i}`)), polarizerSheet(0, 'polarizer')]
  const [s0, s1, s2] = emitted(solve, sheetStack(layers, 0), wavelengthNm)
  // y' of the solver is −y at φ = 0, so S2 counts the azimuth clockwise.
  return (s0 + s1 * Math.cos(2 * psiDeg * DEGREE) - s2 * Math.sin(2 * psiDeg * DEGREE)) / (2 * s0)
}

/** T = ½(1 + cos Γ cos 2ψ), display polarizer 0°, film of 137.5 nm at 45°, analyzer ψ (Jones calculus): nm, ψ, T. */
const EYEWEAR = [
  [450, 0, 0.329],
  [450, 90, 0.671],
  [550, 0, 0.5],
  [550, 90, 0.5],
  [650, 0, 0.6197],
  [650, 90, 0.3803],
] as const

/**
 * Two half-wave plates at 22.5° + δ and 67.5° − δ turn linear light by 90° (J. Opt. Soc. Am. 49, 405 (1959)): co-polar
 * leak [cos²(Γ/2) − sin²(Γ/2) sin 4δ]², δ = 0.5°: Γ (deg), leak.
 */
const HALF_WAVE_PAIR = [
  [158.837, 0],
  [201.163, 0],
  [180, 1.218e-3],
] as const

function inTransmission(solve: SolvePoint): void {
  it.each(EYEWEAR)('quarter-wave film behind eyewear at %d nm, %d°', (nm, psi, expected) => {
    expect(behindAnalyzer(solve, [{ axisDeg: 45, retardanceNm: QUARTER_NM }], nm, psi)).toBeCloseTo(expected, 4)
  })

  it.each(HALF_WAVE_PAIR)('half-wave pair of Γ = %d° leaks %d', (gammaDeg, expected) => {
    const retardanceNm = (550 * gammaDeg) / 360
    const films = [67, 23].map((axisDeg) => ({ axisDeg, retardanceNm }))
    expect(behindAnalyzer(solve, films, 550, 0)).toBeCloseTo(expected, 6)
  })

  it('a half-wave film at 0° turns linear light from +45° to −45° (common practice, no source)', () => {
    const layers = [retarderSheet({ axisDeg: 0, retardanceNm: 275 }, 'half'), polarizerSheet(45, 'polarizer')]
    const [s0, s1, s2, s3] = emitted(solve, sheetStack(layers, 0), 550)
    // S2 > 0 is x' = x towards y' = −y: −45° as the viewer sees it.
    expect(s1 / s0).toBeCloseTo(0, 6)
    expect(s2 / s0).toBeCloseTo(1, 6)
    expect(s3 / s0).toBeCloseTo(0, 6)
  })
}

/** Common practice, no source. */
function circularLight(solve: SolvePoint): void {
  const quarter = (axisDeg: number, id: string) => retarderSheet({ axisDeg, retardanceNm: QUARTER_NM }, id)
  const maker = [quarter(45, 'maker'), polarizerSheet(0, 'polarizer')]
  const passed = (layers: PlainStack['layers']) => emitted(solve, sheetStack(layers, 0), 550)[0]

  it('a linear polarizer passes half of circular light, whatever its angle', () => {
    for (const angle of [0, 17, 45, 80, 133])
      expect(passed([polarizerSheet(angle, 'eye'), ...maker])).toBeCloseTo(0.25, 7)
  })

  it('light of one hand passes the pair that makes it and is stopped by the other', () => {
    expect(passed([polarizerSheet(0, 'eye'), quarter(-45, 'same'), ...maker])).toBeCloseTo(0.5, 6)
    expect(passed([polarizerSheet(0, 'eye'), quarter(45, 'other'), ...maker])).toBeCloseTo(0, 6)
  })

  it('two quarter-wave films act as one half-wave film: the reflected light is stopped, at any common angle', () => {
    for (const turn of [0, 20, 77]) {
      const stack = sheetStack([polarizerSheet(turn, 'polarizer'), quarter(45 + turn, 'quarter')], 1)
      expect(oracleSpectrum(stack, [550], 0, 0.4, solve)[0].reflectance).toBeCloseTo(0, 7)
    }
  })
}

const FILM_NM = 50_000

interface TiltedFilm {
  /** Mean of the three. */
  readonly index: number
  readonly retardance: number
  readonly nz?: number
  readonly rth?: number
}

/**
 * A film of 50 µm over a polarizer at 45° to the plane of incidence, in nearly index-matched surroundings: the phase
 * between p and s of what leaves, less that without retardance. Positive where p is the slow one; nm at 550 nm.
 */
function obliqueRetardanceNm(solve: SolvePoint, film: TiltedFilm, theta: number, phi: number): number {
  const phaseOf = (parameters: TiltedFilm): number => {
    const stack: PlainStack = {
      title: 'oblique',
      layers: [
        { id: 'film', kind: 'retarder', thickness: FILM_NM, slow_axis: 0, ...parameters },
        { ...polarizerSheet(phi + 45, 'polarizer'), index: 1.5 },
      ],
      panel: { kind: 'mirror', index: 1.5, reflectance: 0 },
    }
    const [, , s2, s3] = emitted(solve, stack, 550, theta, phi)
    return Math.atan2(s3, s2)
  }
  const phase = phaseOf(film) - phaseOf({ index: film.index, retardance: 0 })
  return (phase / (2 * Math.PI) - Math.round(phase / (2 * Math.PI))) * 550
}

/**
 * Film of 137.5 nm from 60°, d(q_slow − q_fast) along the normal (closed form of a biaxial film with its axes in and
 * along the normal): Nz, in the plane of the slow axis, of the fast axis. The source's second decimal is good to 0.006.
 */
const TILTED_QUARTER = [
  [1.5, 84.07, 196.49],
  [1, 112.23, 168.38],
  [0.5, 140.36, 140.32],
  [0, 168.43, 112.3],
  [-0.5, 196.46, 84.34],
] as const

/** C-plate of 50 µm whose index along the normal is 1.5, same closed form: Rth (nm), θ, retardance of s over p (nm). */
const TILTED_C_PLATE = [
  [100, 30, 11.776],
  [100, 45, 25.176],
  [100, 60, 40.784],
  [-100, 30, -11.794],
  [-100, 45, -25.219],
  [-100, 60, -40.866],
] as const

function obliqueRetardance(solve: SolvePoint): void {
  it.each(TILTED_QUARTER)('quarter-wave film of Nz %d from 60°', (nz, slowPlane, fastPlane) => {
    const film = { index: 1.5, retardance: QUARTER_NM, nz }
    expect(Math.abs(obliqueRetardanceNm(solve, film, 60, 0) - slowPlane)).toBeLessThan(0.006)
    expect(Math.abs(obliqueRetardanceNm(solve, film, 60, 90) + fastPlane)).toBeLessThan(0.006)
  })

  it.each(TILTED_C_PLATE)('C-plate of Rth %d nm from %d°', (rth, theta, expected) => {
    const mean = 1.5 + (2 / 3) * (rth / FILM_NM)
    expect(obliqueRetardanceNm(solve, { index: mean, retardance: 0, rth }, theta, 30)).toBeCloseTo(-expected, 3)
  })
}

/** Nz = 0.5 in both films is dark from every direction, Nz = 1.5 leaks (Kim et al., Opt. Express 22, A1725 (2014), abstract; volume from memory). */
function darkFromEveryDirection(solve: SolvePoint): void {
  const worstInner = (nz: number): number => {
    const films = [
      { id: 'half', axis: 15, retardance: 275 },
      { id: 'quarter', axis: 75, retardance: QUARTER_NM },
    ].map(
      ({ id, axis, retardance }) =>
        ({ id, kind: 'retarder', index: 1.5, thickness: '50 um', slow_axis: axis, retardance, nz }) as const,
    )
    const stack: PlainStack = {
      title: 'half and quarter',
      layers: [{ ...polarizerSheet(0, 'polarizer'), index: 1.5 }, ...films],
      panel: { kind: 'mirror', index: 1.5, reflectance: 1 },
    }
    const seen = [0, 30, 60, 90, 120, 150].map(
      (phi) => oracleSpectrum(stack, [550], 60 * DEGREE, phi * DEGREE, solve)[0],
    )
    return Math.max(...seen.map((r) => r.reflectance - r.frontReflectance))
  }

  it('Nz = 0.5 is dark from 60° all around where Nz = 1.5 leaks', () => {
    expect(worstInner(0.5)).toBeLessThan(worstInner(1.5) / 10)
  })
}
