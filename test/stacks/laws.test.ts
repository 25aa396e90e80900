/** Laws of optics that every demo stack keeps, whatever its numbers. */
import { describe, expect, it } from 'vitest'
import { Scene } from '../../src/appearance/scene.js'
import type { Layer, Stack } from '../../src/stack/stack.js'
import { DEMO_STACKS, demoStack } from './demoStacks.js'

const DEG = Math.PI / 180
const THETA = 48 * DEG
const PHI = 25 * DEG
/** Rounding alone. */
const TOLERANCE = 1e-10

function reflectance(stack: Stack, theta: number, phi: number): Float64Array {
  return new Scene(stack).look(stack, theta, phi).reflectance.slice()
}

function largestDifference(a: Float64Array, b: Float64Array): number {
  return Math.max(...a.map((value, i) => Math.abs(value - b[i])))
}

function turned(layer: Layer, angle: number): Layer {
  switch (layer.kind) {
    case 'isotropic':
      return layer
    case 'retarder':
      return { ...layer, slow_axis: layer.slow_axis + angle }
    case 'polarizer':
      return { ...layer, absorption_axis: layer.absorption_axis + angle }
    case 'crystal':
      return { ...layer, azimuth: layer.azimuth + angle }
  }
}

const NOTHING: Layer = { id: 'nothing', kind: 'isotropic', index: 1.7, thickness: 0, coherent: true }

describe.each(DEMO_STACKS)('%s', (name) => {
  // Reciprocity (Helmholtz; review: R. J. Potton, Rep. Prog. Phys. 67, 717 (2004); from memory).
  it('looks the same from opposite azimuths', async () => {
    const stack = await demoStack(name)
    const there = reflectance(stack, THETA, PHI)
    expect(largestDifference(there, reflectance(stack, THETA, PHI + Math.PI))).toBeLessThan(TOLERANCE)
  })

  it('turned as a whole looks the same from a direction turned with it', async () => {
    const stack = await demoStack(name)
    const angle = 63 * DEG
    const whole = { ...stack, layers: stack.layers.map((layer) => turned(layer, angle)) }
    const there = reflectance(stack, THETA, PHI)
    expect(largestDifference(there, reflectance(whole, THETA, PHI + angle))).toBeLessThan(TOLERANCE)
  })

  it('does not feel a layer of no thickness among its coherent ones', async () => {
    const stack = await demoStack(name)
    const thin = stack.layers.findIndex(({ coherent }) => coherent)
    const place = Math.max(thin, 0)
    const layers = [...stack.layers.slice(0, place), NOTHING, ...stack.layers.slice(place)]
    const there = reflectance(stack, THETA, PHI)
    expect(largestDifference(there, reflectance({ ...stack, layers }, THETA, PHI))).toBeLessThan(TOLERANCE)
  })

  it('does not feel a thick layer split in two', async () => {
    const stack = await demoStack(name)
    const place = stack.layers.findIndex(({ coherent }) => !coherent)
    const whole = stack.layers[place]
    // A retarder's retardance goes with its thickness.
    const half: Layer =
      whole.kind === 'retarder'
        ? { ...whole, thickness: whole.thickness / 2, ...halfRetardance(whole) }
        : { ...whole, thickness: whole.thickness / 2 }
    const layers = [...stack.layers.slice(0, place), half, half, ...stack.layers.slice(place + 1)]
    const there = reflectance(stack, THETA, PHI)
    expect(largestDifference(there, reflectance({ ...stack, layers }, THETA, PHI))).toBeLessThan(TOLERANCE)
  })
})

function halfRetardance({ retardance, rth }: Extract<Layer, { kind: 'retarder' }>) {
  if (typeof retardance !== 'number') throw new Error('a checked film has its retardance at 550 nm')
  return { retardance: retardance / 2, ...(rth !== undefined && { rth: rth / 2 }) }
}
