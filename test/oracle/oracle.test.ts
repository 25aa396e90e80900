import { readdirSync, readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { parse } from 'yaml'
import { luminousMean } from './luminousMean.js'
import { oracleSpectrum } from './oracleSpectrum.js'
import type { PlainStack } from './stackFile.js'

/**
 * `test/check-values/` holds the answers of an independent NumPy program (general 4×4 eigen-solves), printed with ten
 * digits: 1e-9 is what that rounding and the sums over 81 wavelengths leave.
 */
const TOLERANCE = 1e-9
const FOLDER = new URL('../check-values/', import.meta.url)
const NAMES = readdirSync(FOLDER)
  .filter((file) => file.endsWith('.stack.yaml'))
  .map((file) => file.replace('.stack.yaml', ''))

interface ExpectedDirection {
  readonly theta_deg: number
  readonly phi_deg: number
  readonly luminous_reflectance: number
  readonly front_reflectance: number
  readonly emission_transmittance?: number
  readonly spectrum: {
    readonly wavelength_nm: readonly number[]
    readonly reflectance: readonly number[]
    readonly emission_transmittance?: readonly number[]
  }
}

const stackOf = (name: string): PlainStack => parse(readFileSync(new URL(`${name}.stack.yaml`, FOLDER), 'utf8'))
const expectedOf = (name: string): readonly ExpectedDirection[] =>
  JSON.parse(readFileSync(new URL(`${name}.expected.json`, FOLDER), 'utf8')).directions

const largestDifference = (a: readonly number[], b: readonly number[]): number =>
  Math.max(Math.abs(a.length - b.length), ...a.map((v, i) => Math.abs(v - b[i])))

it('finds all ten check stacks', () => expect(NAMES).toHaveLength(10))

describe.each(NAMES)('%s', (name) => {
  it.each(expectedOf(name).map((d) => [d.theta_deg, d.phi_deg, d] as const))(
    'from (%d°, %d°)',
    (theta, phi, expected) => {
      const { wavelength_nm, reflectance, emission_transmittance } = expected.spectrum
      const results = oracleSpectrum(stackOf(name), wavelength_nm, (theta * Math.PI) / 180, (phi * Math.PI) / 180)
      const mine = results.map((r) => r.reflectance)
      const front = results.map((r) => r.frontReflectance)
      expect(largestDifference(mine, reflectance)).toBeLessThan(TOLERANCE)
      expect(Math.abs(luminousMean(wavelength_nm, mine) - expected.luminous_reflectance)).toBeLessThan(TOLERANCE)
      expect(Math.abs(luminousMean(wavelength_nm, front) - expected.front_reflectance)).toBeLessThan(TOLERANCE)
      const emitted = results.flatMap((r) => r.emissionTransmittance ?? [])
      expect(largestDifference(emitted, emission_transmittance ?? [])).toBeLessThan(TOLERANCE)
      if (expected.emission_transmittance === undefined) return
      const luminous = luminousMean(wavelength_nm, emitted)
      expect(Math.abs(luminous - expected.emission_transmittance)).toBeLessThan(TOLERANCE)
    },
  )
})
