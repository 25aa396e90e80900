/**
 * Where two waves of a layer fall together, or nearly: along an optic axis, at normal incidence, in layers that are
 * isotropic but for a trifle, at tilts next to 0° and 90°. Eigenvectors mean nothing there; the answer does. The fast
 * solver against the slow one of `test/oracle/`.
 */
import { describe, expect, it } from 'vitest'
import { real } from '../oracle/complex.js'
import { type OracleLayer, type OraclePoint, solvePoint } from '../oracle/solvePoint.js'
import { kernelPoint } from './kernelPoint.js'

const DEGREE = Math.PI / 180

const MATERIALS: readonly (readonly [string, OracleLayer['principal']])[] = [
  ['uniaxial, first axis', [real(1.7), real(1.5), real(1.5)]],
  ['uniaxial, second axis', [real(1.5), real(1.6), real(1.5)]],
  ['uniaxial, third axis', [real(1.5), real(1.5), real(1.6)]],
  ['biaxial', [real(1.7), real(1.5), real(1.6)]],
  ['isotropic but for 1e-9', [real(1.5 + 1e-9), real(1.5), real(1.5)]],
  ['isotropic but for 1e-13', [real(1.5), real(1.5), real(1.5 + 1e-13)]],
  [
    'dichroic alone',
    [
      { re: 1.5, im: 1e-3 },
      { re: 1.5, im: 1e-6 },
      { re: 1.5, im: 1e-6 },
    ],
  ],
]

const TILTS_RAD = [0, 1e-13, 1e-8, 30 * DEGREE, 90 * DEGREE - 1e-8, 90 * DEGREE, -90 * DEGREE]
const AZIMUTHS_RAD = [0, 30 * DEGREE, 90 * DEGREE]
/** θ, φ of the eye, degrees. */
const EYES = [
  [0, 0],
  [30, 30],
  [60, 0],
  [89, 120],
] as const

const PANEL = { kind: 'mirror', index: 1.5, reflectance: 0.5, depolarized: 0.1 } as const

function pointsOf(principal: OracleLayer['principal'], coherent: boolean): OraclePoint[] {
  const thicknessNm = coherent ? 800 : 30_000
  return TILTS_RAD.flatMap((tiltRad) =>
    AZIMUTHS_RAD.flatMap((azimuthRad) =>
      EYES.map(([theta, phi]) => ({
        wavelengthNm: 517,
        thetaRad: theta * DEGREE,
        phiRad: phi * DEGREE,
        layers: [{ principal, azimuthRad, tiltRad, thicknessNm, coherent }],
        panel: PANEL,
      })),
    ),
  )
}

function expectAgreement(point: OraclePoint): void {
  const expected = solvePoint(point)
  const actual = kernelPoint(point)
  const differences = [
    ...actual.mueller.flatMap((row, i) => row.map((v, j) => v - expected.mueller[i][j])),
    ...(actual.emissionStokes ?? []).map((v, i) => v - (expected.emissionStokes?.[i] ?? Number.NaN)),
    actual.frontReflectance - expected.frontReflectance,
  ]
  expect(differences).toHaveLength(21)
  expect(Math.max(...differences.map(Math.abs)), JSON.stringify(point)).toBeLessThan(1e-11)
}

describe.each(MATERIALS)('%s', (_name, principal) => {
  it.each([true, false])('joined by amplitudes: %s', (coherent) => {
    for (const point of pointsOf(principal, coherent)) expectAgreement(point)
  })
})

/**
 * The optic axes of a crystal lie in the plane of its smallest and largest index a < c, at the angle
 * tan V = (c/a) √((b² − a²)/(c² − b²)) from the axis of c (Born, Wolf, Principles of Optics, 15.3; from memory), so a
 * wave whose normal inside stands there has two equal indices b. Uniaxial: V = 0 and b = a.
 */
describe.each([
  ['uniaxial', 1.5, 1.5, 1.7],
  ['biaxial (conical refraction)', 1.5, 1.6, 1.7],
])('along the optic axis, %s', (_name, a, b, c) => {
  const fromLargest = Math.atan((c / a) * Math.sqrt((b * b - a * a) / (c * c - b * b)))
  it.each([0, 20, 50, 80])('light from %d°', (theta) => {
    // First axis: c. Second, in the film: b. The light goes down at `inside` from the normal, along a line that rises
    // towards φ + 180°, and comes back up along one that rises towards φ: at one azimuth the waves that go down fall
    // together, at the other those that come back.
    const inside = Math.asin(Math.sin(theta * DEGREE) / b)
    for (const tiltRad of [Math.PI / 2 - inside - fromLargest, Math.PI / 2 - inside + fromLargest]) {
      for (const azimuthRad of [Math.PI, 0]) {
        const layer = { principal: [real(c), real(b), real(a)] as const, azimuthRad, tiltRad }
        const seen = { wavelengthNm: 517, thetaRad: theta * DEGREE, phiRad: 0, panel: PANEL }
        expectAgreement({ ...seen, layers: [{ ...layer, thicknessNm: 800, coherent: true }] })
        expectAgreement({ ...seen, layers: [{ ...layer, thicknessNm: 30_000, coherent: false }] })
      }
    }
  })
})
