/** A laminate to be measured, small enough for many fits, and the readings that the slow solver of the tests makes of it. */
import type { MeasuredSpectrum } from '../../src/stack/readMeasured.js'
import type { FitQuestion, Range, RetarderLayer, Stack } from '../../src/stack/stack.js'
import { oracleSpectrum } from '../oracle/oracleSpectrum.js'
import { plainStack } from '../stacks/plainStack.js'
import { DEG, glass, retarder, stackOf } from './builtStack.js'

const FILM = { index: 1.53, thickness: 25e3, nz: 1.2, dispersion: { re450: 1.03, re650: 0.98 } } as const

/** Hard coat, polarizer, half- and quarter-wave film in real thicknesses over a mirror of index 1.5 that returns 45 %. */
export function laminate(changes: Readonly<Record<string, Partial<RetarderLayer>>> = {}, panel = {}): Stack {
  return stackOf(
    [
      glass('coat', 1.49, 5000),
      {
        id: 'polarizer',
        kind: 'polarizer',
        absorption_axis: 90 * DEG,
        thickness: 12e3,
        coherent: false,
        index: 1.5,
        single_transmittance: 0.432,
        polarization_efficiency: 0.9998,
      },
      { ...retarder('half', 22.5, 270, FILM), ...changes.half },
      { ...retarder('quarter', 90, 140, FILM), ...changes.quarter },
    ],
    { panel: { index: 1.5, reflectance: 0.45, depolarized: 0.01, ...panel } },
  )
}

/** θ, φ in degrees. */
export type DirectionDeg = readonly [thetaDeg: number, phiDeg: number]

export const SIX_DIRECTIONS: readonly DirectionDeg[] = [
  [8, 0],
  [30, 0],
  [30, 90],
  [45, 45],
  [45, 135],
  [60, 90],
]

export const EVERY_30_NM = Array.from({ length: 11 }, (_, k) => 400 + 30 * k)

export function measure(
  stack: Stack,
  directions: readonly DirectionDeg[],
  wavelengthNm: readonly number[] = EVERY_30_NM,
): MeasuredSpectrum[] {
  const plain = plainStack(stack, wavelengthNm)
  return directions.map(([thetaDeg, phiDeg]) => {
    const [theta, phi] = [thetaDeg * DEG, phiDeg * DEG]
    const reflectance = oracleSpectrum(plain, wavelengthNm, theta, phi).map((point) => point.reflectance)
    return { theta, phi, wavelengthNm, reflectance }
  })
}

/** With noise of this standard deviation added to each reading. */
export function noisy(
  spectra: readonly MeasuredSpectrum[],
  deviation: number,
  normal: () => number,
): MeasuredSpectrum[] {
  return spectra.map((spectrum) => ({
    ...spectrum,
    reflectance: spectrum.reflectance.map((value) => value + deviation * normal()),
  }))
}

/** Both films' axes and retardances, in the ranges of a laminator and a supplier. */
export const FOUR_PARAMETERS: Readonly<Record<string, Range>> = {
  'half.slow_axis': { from: 17.5 * DEG, to: 27.5 * DEG },
  'half.retardance': { from: 255, to: 285 },
  'quarter.slow_axis': { from: 85 * DEG, to: 95 * DEG },
  'quarter.retardance': { from: 130, to: 150 },
}

export function asking(stack: Stack, question: FitQuestion): Stack {
  return { ...stack, fit: question }
}
