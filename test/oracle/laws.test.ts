import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Complex } from './complex.js'
import { oracleSpectrum } from './oracleSpectrum.js'
import { polarizerSheet, retarderSheet, sheetStack } from './sheetStack.js'
import { type OracleLayer, type OraclePoint, solvePoint } from './solvePoint.js'
import type { Mueller } from './stokes.js'

const RUNS = { seed: 20261202, numRuns: 100 }
const real = (min: number, max: number) => fc.double({ min, max, noNaN: true })

const layers = (largestK: number): fc.Arbitrary<OracleLayer[]> => {
  const index = fc.record({ re: real(1.3, 2), im: real(0, largestK) })
  const layer = fc.record({
    principal: fc.oneof(
      fc.tuple(index, index, index),
      index.map((n): OracleLayer['principal'] => [n, n, n]),
    ),
    azimuthRad: real(-3, 3),
    tiltRad: fc.oneof(fc.constant(0), real(-1.5, 1.5)),
    thicknessNm: real(0, 9000),
    coherent: fc.boolean(),
  })
  return fc.array(layer, { maxLength: 5 })
}

const point = (largestK: number): fc.Arbitrary<OraclePoint> =>
  fc.record({
    wavelengthNm: real(380, 780),
    thetaRad: real(0, 1.5),
    phiRad: real(-3, 3),
    layers: layers(largestK),
    panel: fc.record({
      kind: fc.constant('mirror' as const),
      index: real(1, 2),
      reflectance: real(0, 1),
      depolarized: real(0, 1),
    }),
  })

/** Stokes vectors of fully polarized light of unit flux. */
const polarizedLight = fc
  .tuple(real(0, Math.PI), real(-Math.PI / 4, Math.PI / 4))
  .map(([azimuth, ellipticity]) => [
    1,
    Math.cos(2 * ellipticity) * Math.cos(2 * azimuth),
    Math.cos(2 * ellipticity) * Math.sin(2 * azimuth),
    Math.sin(2 * ellipticity),
  ])

const times = (mueller: Mueller, input: readonly number[]): readonly number[] =>
  mueller.map((row) => row.reduce((sum, v, j) => sum + v * input[j], 0))

const lossless = (n: Complex): Complex => ({ re: n.re, im: 0 })
const withoutLoss = ([a, b, c]: OracleLayer['principal']): OracleLayer['principal'] => [
  lossless(a),
  lossless(b),
  lossless(c),
]

/** The same stack over a panel that returns the given share. */
const overPanel = (p: OraclePoint, reflectance: number): OraclePoint =>
  p.panel.kind === 'mirror' ? { ...p, panel: { ...p.panel, reflectance } } : p

/** Textbook physics: energy, reciprocity, passivity. */
describe('the oracle', () => {
  it('loses no energy in lossless layers: over an ideal mirror, and over a panel that takes all it gets', () => {
    fc.assert(
      fc.property(point(0), (p) => {
        expect(solvePoint(overPanel(p, 1)).reflectance).toBeCloseTo(1, 10)
        const black = solvePoint(overPanel(p, 0))
        // What goes in from above is what comes out from below (reciprocity), so it can be read from the emission.
        expect(black.reflectance + (black.emissionTransmittance ?? Number.NaN)).toBeCloseTo(1, 10)
      }),
      RUNS,
    )
  })

  it('is reciprocal: seen from φ + 180° the Mueller matrix is transposed', () => {
    fc.assert(
      fc.property(point(0.05), (p) => {
        const here = solvePoint(p).mueller
        const there = solvePoint({ ...p, phiRad: p.phiRad + Math.PI }).mueller
        for (const [i, row] of here.entries())
          for (const [j, v] of row.entries()) expect(there[j][i]).toBeCloseTo(v, 11)
      }),
      RUNS,
    )
  })

  it('returns no state polarized beyond 100 %', () => {
    fc.assert(
      fc.property(point(0.05), polarizedLight, (p, input) => {
        const { mueller, emissionStokes } = solvePoint(p)
        for (const [s0, s1, s2, s3] of [times(mueller, input), emissionStokes ?? []])
          expect(Math.hypot(s1, s2, s3)).toBeLessThan(s0 + 1e-12)
      }),
      RUNS,
    )
  })

  it('returns no more than it gets', () => {
    // Only coherent layers absorb here: at a face between absorbing media the fluxes of the wave that comes and of the
    // one that returns do not simply add, and joining without phase leaves that term, of the order of k, out.
    fc.assert(
      fc.property(point(0.05), polarizedLight, (p, input) => {
        const thickLossless = p.layers.map((l) => (l.coherent ? l : { ...l, principal: withoutLoss(l.principal) }))
        const { mueller } = solvePoint({ ...p, layers: thickLossless })
        expect(times(mueller, input)[0]).toBeLessThan(1 + 1e-12)
      }),
      RUNS,
    )
  })

  it('names the hand from the source', () => {
    // Linear along x, going to the viewer, slow axis at +45°: exp(−iωt + iqz) puts the slow component a quarter period
    // behind, so the field stands along −45° first and along +45° a quarter period later. It turns counter-clockwise
    // as the viewer sees it, with the fingers of a right hand whose thumb points along the propagation.
    const handOf = (axisDeg: number) => {
      const films = [retarderSheet({ axisDeg, retardanceNm: 550 / 4 }, 'quarter'), polarizerSheet(0, 'polarizer')]
      return oracleSpectrum(sheetStack(films, 0), [550], 0, 0.3)[0].emissionStokes?.[3]
    }
    expect(handOf(45)).toBeCloseTo(0.5, 7)
    expect(handOf(-45)).toBeCloseTo(-0.5, 7)
  })

  it('turns the hand over at a mirror, and only that', () => {
    const [{ mueller }] = oracleSpectrum(sheetStack([], 1), [550], 0.6, 0.3)
    const expected = [1, 1, 1, -1]
    for (const [i, row] of mueller.entries())
      for (const [j, v] of row.entries()) expect(v).toBeCloseTo(i === j ? expected[i] : 0, 13)
  })
})
