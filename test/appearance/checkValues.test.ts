/**
 * Whole stack files against the answers of an independent NumPy program with general 4×4 eigen-solves (test/check-values/README.md).
 * They are printed to ten digits; agreement is asked to 1e-7, and found near 1e-10.
 */
import { readdirSync, readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { describe, expect, it } from 'vitest'
import { readStack } from '../../src/stack/readStack.js'
import { evaluate } from '../../src/studies/evaluate.js'

const FOLDER = fileURLToPath(new URL('../check-values/', import.meta.url))
const TOLERANCE = 1e-7

interface Expected {
  readonly theta_deg: number
  readonly phi_deg: number
  readonly luminous_reflectance: number
  readonly color_weighted_reflectance: number
  readonly front_reflectance: number
  readonly emission_transmittance?: number
  readonly xyz: readonly number[]
  readonly lab: readonly number[]
  readonly spectrum: Readonly<Record<string, readonly number[]>>
}

async function evaluated(name: string) {
  const text = readFileSync(`${FOLDER}${name}.stack.yaml`, 'utf8')
  const reading = await readStack(text, {
    file: `${name}.stack.yaml`,
    files: { read: () => undefined, list: () => [] },
    sets: [],
  })
  if (!reading.ok) throw new Error(reading.problems.map(({ message }) => message).join('\n'))
  return evaluate(reading.stack).directions
}

function expectNear(actual: number | undefined, expected: number, scale = 1): void {
  expect(Math.abs((actual ?? Number.NaN) - expected) / scale).toBeLessThan(TOLERANCE)
}

const names = readdirSync(FOLDER)
  .filter((file) => file.endsWith('.stack.yaml'))
  .map((file) => file.replace('.stack.yaml', ''))

describe('check values', () => {
  it('has all ten stacks', () => expect(names).toHaveLength(10))

  it.each(names)('%s', async (name) => {
    const expected: Expected[] = JSON.parse(readFileSync(`${FOLDER}${name}.expected.json`, 'utf8')).directions
    const directions = await evaluated(name)
    expect(directions).toHaveLength(expected.length)
    expected.forEach((wanted, d) => {
      const got = directions[d]
      expectNear(got.theta_deg, wanted.theta_deg)
      expectNear(got.phi_deg, wanted.phi_deg)
      expectNear(got.luminous_reflectance, wanted.luminous_reflectance)
      expectNear(got.color_weighted_reflectance, wanted.color_weighted_reflectance)
      expectNear(got.front_reflectance, wanted.front_reflectance)
      wanted.xyz.forEach((value, k) => {
        expectNear(got.xyz[k], value, 100)
      })
      wanted.lab.forEach((value, k) => {
        expectNear(got.lab[k], value, 100)
      })
      expect(got.spectrum.wavelength_nm).toEqual(wanted.spectrum.wavelength_nm)
      wanted.spectrum.reflectance.forEach((value, i) => {
        expectNear(got.spectrum.reflectance[i], value)
      })
      if (wanted.emission_transmittance === undefined) {
        expect(got).not.toHaveProperty('emission_transmittance')
        return
      }
      expectNear(got.emission_transmittance, wanted.emission_transmittance)
      wanted.spectrum.emission_transmittance.forEach((value, i) => {
        expectNear(got.spectrum.emission_transmittance?.[i], value)
      })
    })
  })
})
