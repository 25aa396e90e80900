/** Circular polarizers at normal incidence: published values, each with its source, for any solver of the oracle's shape. */
import { expect, it } from 'vitest'
import { luminousMean } from '../oracle/luminousMean.js'
import { oracleSpectrum } from '../oracle/oracleSpectrum.js'
import { polarizerSheet, retarderSheet, type SheetRetarder, sheetStack } from '../oracle/sheetStack.js'
import type { SolvePoint } from '../oracle/solvePoint.js'

const VISIBLE_NM = Array.from({ length: 81 }, (_, i) => 380 + 5 * i)

const film = (axisDeg: number, retardanceNm: number): SheetRetarder => ({ axisDeg, retardanceNm })
const half = (axisDeg: number) => film(axisDeg, 275)
const quarter = (axisDeg: number) => film(axisDeg, 137.5)

/**
 * L in %: the share of the light behind an ideal polarizer (transmission axis 0°) that an ideal mirror under the films
 * returns through it, at 450, 500, 600, 650 nm and the mean under D65, 380 to 780 nm by 5 nm; last, one unit of the last printed digit. From S3, the circular
 * component that reaches the mirror: L = 1 − S3² (Poincaré sphere, any textbook of polarized light), with
 * S3 = cos 2ε sin Γ for one film at 45° + ε; S3 = s[1 + 2S(1 − S)(1 − s²)], s = sin Γ, S = sin 2α for a half-wave film
 * at α and a quarter-wave film at 2α + 45° (rule: Destriau, Prouteau, J. Phys. Radium 10, 53 (1949); from memory); the
 * three plates of Pancharatnam, Proc. Indian Acad. Sci. A 41, 130 (1955) (angles from memory).
 */
const LEAKAGE = [
  ['quarter at 45°', [quarter(45)], [11.6978, 2.4472, 1.7037, 5.7272, 1.3708], 1e-4],
  ['15° / 75°', [half(15), quarter(75)], [1.0663, 0.0453, 0.0219, 0.2507, 0.0468], 1e-4],
  ['17.5° / 80°', [half(17.5), quarter(80)], [1.3029, 0.0976, 0.0585, 0.3709, 0.0758], 1e-4],
  ['22.5° / 90°', [half(22.5), quarter(90)], [2.9333, 0.4595, 0.3115, 1.2013, 0.276], 1e-4],
  ['10° / 65°', [half(10), quarter(65)], [2.1548, 0.2864, 0.1904, 0.8044, 0.1802], 1e-4],
  ['three plates', [half(6.883), half(34.533), quarter(100.333)], [0.02, 0.039, 0.03, 0.054, 0.0181], 1e-3],
  ['dispersion 0.89, 1.03', [dispersive(0.89, 1.03)], [1.8891, 0.8397, 1.0429, 4.0168, 0.647], 1e-4],
  ['dispersion 0.86, 1.06', [dispersive(0.86, 1.06)], [0.6432, 0.4062, 0.6332, 2.5987, 0.373], 1e-4],
  ['dispersion 1.06, 0.98', [dispersive(1.06, 0.98)], [20.0488, 3.7319, 2.2029, 7.0245, 1.9484], 1e-4],
] as const

function dispersive(re450: number, re650: number): SheetRetarder {
  return { ...quarter(45), dispersion: { re450, re650 } }
}

/** The same at 550 nm (same source): axis off by 1°, retardance off by 3 nm, both. */
const ERRORS_AT_550 = [
  ['axis', film(46, 137.5), 0.1218],
  ['retardance', film(45, 140.5), 0.11741],
  ['both', film(46, 140.5), 0.23906],
] as const

/** D65 mean of L in % of 15° / 75° with errors of the angles (same source). */
const ANGLE_ERRORS = [
  ['half-wave −1°', [half(14), quarter(75)], 0.686],
  ['half-wave +1°', [half(16), quarter(75)], 0.363],
  ['quarter-wave −1°', [half(15), quarter(74)], 0.086],
  ['quarter-wave +1°', [half(15), quarter(76)], 0.248],
  ['both −1°', [half(14), quarter(74)], 0.249],
  ['both +1°', [half(16), quarter(76)], 0.088],
] as const

/** Reflectance of unpolarized light, R = L/2 (double pass in Jones calculus): slow axis (deg), Re (nm), nm, R, digits. */
const JONES = [
  [45, 137.5, 450, 0.058489, 6],
  [45, 137.5, 550, 0, 7],
  [45, 137.5, 650, 0.028636, 6],
  [45, 137.5 * 0.82, 450, 6.09e-6, 7],
  [45, 137.5 * 1.18, 650, 2.92e-6, 7],
  [46, 137.5, 550, 0.00060899, 7],
  [47, 137.5, 550, 0.00243298, 7],
  [50, 137.5, 550, 0.01507684, 7],
] as const

export function publishedCircularPolarizers(solve: SolvePoint): void {
  const leakagePercent = (films: readonly SheetRetarder[], wavelengthsNm: readonly number[]): number[] => {
    const layers = [polarizerSheet(0, 'polarizer'), ...films.map((f, i) => retarderSheet(f, `film${i}`))]
    return oracleSpectrum(sheetStack(layers, 1), wavelengthsNm, 0, 0, solve).map((r) => 200 * r.reflectance)
  }
  const underD65 = (films: readonly SheetRetarder[]) => luminousMean(VISIBLE_NM, leakagePercent(films, VISIBLE_NM))

  it.each(LEAKAGE)('leakage of %s', (_name, films, expected, lastDigit) => {
    const values = leakagePercent(films, [450, 500, 600, 650])
    for (const [i, value] of values.entries()) expect(Math.abs(value - expected[i])).toBeLessThan(0.6 * lastDigit)
    expect(Math.abs(underD65(films) - expected[4])).toBeLessThan(0.6e-4)
  })

  it.each(ERRORS_AT_550)('leakage with an error of %s', (_name, f, expected) => {
    expect(Math.abs(leakagePercent([f], [550])[0] - expected)).toBeLessThan(0.6e-5)
  })

  it.each(ANGLE_ERRORS)('15° / 75°, %s', (_name, films, expected) => {
    expect(underD65(films)).toBeCloseTo(expected, 3)
  })

  it('the best constant single film is 137.68 nm (same source)', () => {
    const best = underD65([film(45, 137.68)])
    expect(best).toBeCloseTo(1.37039, 5)
    expect(underD65([film(45, 137.58)])).toBeGreaterThan(best)
    expect(underD65([film(45, 137.78)])).toBeGreaterThan(best)
  })

  it.each(JONES)('film at %d°, %d nm, seen at %d nm', (axisDeg, retardanceNm, nm, expected, digits) => {
    expect(leakagePercent([film(axisDeg, retardanceNm)], [nm])[0] / 200).toBeCloseTo(expected, digits)
  })

  realPolarizers(solve)
}

function realPolarizers(solve: SolvePoint): void {
  it('real polarizer: R = ½ Rm [k1² L + 2 k1 k2 (1 − L) + k2² L] (Jones calculus)', () => {
    const [k1, k2, mirror, leak] = [0.9, 0.02, 0.45, 0.116978]
    const layers = [polarizerSheet(0, 'polarizer', k1, k2), retarderSheet(quarter(45), 'quarter')]
    const [{ reflectance }] = oracleSpectrum(sheetStack(layers, mirror), [450], 0, 0, solve)
    const expected = (mirror / 2) * (k1 * k1 * leak + 2 * k1 * k2 * (1 - leak) + k2 * k2 * leak)
    expect(reflectance).toBeCloseTo(expected, 6)
  })

  // Malus' law, exact: angle between two ideal polarizers (deg), share of unpolarized light.
  it.each([
    [0, 0.5],
    [30, 0.375],
    [45, 0.25],
    [60, 0.125],
    [90, 0],
  ])('two polarizers at %d° pass %d (Malus)', (angle, expected) => {
    const stack = sheetStack([polarizerSheet(angle, 'upper'), polarizerSheet(0, 'lower')], 0)
    expect(oracleSpectrum(stack, [550], 0, 0, solve)[0].emissionTransmittance).toBeCloseTo(expected, 7)
  })

  it('a real pair passes (k1² + k2²)/2 parallel and k1 k2 crossed (Shurcliff, Polarized Light, 1962; from memory)', () => {
    const passed = (angle: number) => {
      const layers = [polarizerSheet(angle, 'upper', 0.88, 0.01), polarizerSheet(0, 'lower', 0.88, 0.01)]
      return oracleSpectrum(sheetStack(layers, 0), [550], 0, 0, solve)[0].emissionTransmittance
    }
    expect(passed(0)).toBeCloseTo((0.88 ** 2 + 0.01 ** 2) / 2, 7)
    expect(passed(90)).toBeCloseTo(0.88 * 0.01, 7)
  })
}
