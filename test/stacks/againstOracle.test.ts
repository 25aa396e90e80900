/**
 * Every demo stack against the oracle: general eigen-solves and linear systems (`test/oracle/`), itself held to the
 * values of an independent program.
 */
import { describe, expect, it } from 'vitest'
import { Scene } from '../../src/appearance/scene.js'
import { oracleSpectrum } from '../oracle/oracleSpectrum.js'
import { DEMO_STACKS, demoStack } from './demoStacks.js'
import { plainStack } from './plainStack.js'

/** Rounding of two solvers that share no formula, over up to fifteen layers. */
const TOLERANCE = 1e-9
const WAVELENGTHS_NM = [430, 545, 660]
const DIRECTIONS_DEG = [
  [0, 0],
  [37, 200],
  [62, 15],
] as const
const DEG = Math.PI / 180

describe.each(DEMO_STACKS)('%s', (name) => {
  it.each(DIRECTIONS_DEG)('is what the oracle says at θ %i°, φ %i°', async (theta, phi) => {
    const stack = await demoStack(name)
    const scene = new Scene(stack, Float64Array.from(WAVELENGTHS_NM))
    const look = scene.look(stack, theta * DEG, phi * DEG)
    const expected = oracleSpectrum(plainStack(stack, WAVELENGTHS_NM), WAVELENGTHS_NM, theta * DEG, phi * DEG)
    expected.forEach(({ reflectance, frontReflectance, emissionTransmittance }, i) => {
      expect(Math.abs(look.reflectance[i] - reflectance)).toBeLessThan(TOLERANCE)
      expect(Math.abs(look.frontReflectance[i] - frontReflectance)).toBeLessThan(TOLERANCE)
      if (emissionTransmittance === undefined || stack.emission.polarization !== 'none') return
      expect(Math.abs((look.emissionTransmittance?.[i] ?? Number.NaN) - emissionTransmittance)).toBeLessThan(TOLERANCE)
    })
  })
})
