/** Laws of optics that hold for every stack, on seeded random ones. Textbook physics; no number is copied from the program. */
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { Solver } from '../../src/optics/solver.js'
import { opticalLayer, type PlainLayer, type PlainStack, panelEnd, randomStack, WAVELENGTHS_NM } from './randomStack.js'

const RUNS = { numRuns: 200, seed: 20261201 }
const count = WAVELENGTHS_NM.length

function solve(stack: PlainStack): Solver {
  const solver = new Solver(WAVELENGTHS_NM)
  const layers = stack.layers.map((layer) => opticalLayer(layer))
  solver.solve(layers, panelEnd(stack.panel), stack.thetaRad, stack.phiRad)
  return solver
}

function expectSame(a: Float64Array, b: Float64Array, tolerance: number): void {
  for (let i = 0; i < a.length; i++) expect(Math.abs(a[i] - b[i])).toBeLessThan(tolerance)
}

function muellerOf(stack: PlainStack): Float64Array {
  const out = new Float64Array(16 * count)
  solve(stack).mueller(out)
  return out
}

describe('laws', () => {
  it('reflects all light from lossless layers over an ideal mirror', () => {
    fc.assert(
      fc.property(randomStack(false), (stack) => {
        const { reflectance } = solve(stack)
        for (const value of reflectance) expect(Math.abs(value - 1)).toBeLessThan(1e-9)
      }),
      RUNS,
    )
  })

  it('lets all emitted light out of lossless layers over an ideal mirror', () => {
    fc.assert(
      fc.property(randomStack(false), (stack) => {
        const transmittance = new Float64Array(count)
        solve(stack).emissionTransmittance(transmittance)
        for (const value of transmittance) expect(Math.abs(value - 1)).toBeLessThan(1e-7)
      }),
      RUNS,
    )
  })

  it('is reciprocal: R(θ, φ) = R(θ, φ + 180°) for unpolarized light', () => {
    fc.assert(
      fc.property(randomStack(true), (stack) => {
        const turned = { ...stack, phiRad: stack.phiRad + Math.PI }
        expectSame(solve(stack).reflectance, solve(turned).reflectance, 1e-10)
      }),
      RUNS,
    )
  })

  it('turns its viewing cone with the stack', () => {
    fc.assert(
      fc.property(randomStack(true), fc.double({ min: -3, max: 3, noNaN: true }), (stack, turn) => {
        const layers = stack.layers.map((layer) => ({ ...layer, azimuthRad: layer.azimuthRad + turn }))
        const turned = { ...stack, layers, phiRad: stack.phiRad + turn }
        expectSame(muellerOf(stack), muellerOf(turned), 1e-9)
      }),
      RUNS,
    )
  })

  it('does not notice a layer split in two', () => {
    fc.assert(
      fc.property(randomStack(true), fc.nat(), fc.double({ min: 0.1, max: 0.9, noNaN: true }), (stack, pick, share) => {
        fc.pre(stack.layers.length > 0)
        const k = pick % stack.layers.length
        const whole = stack.layers[k]
        const parts = [share, 1 - share].map((part) => ({ ...whole, thicknessNm: part * whole.thicknessNm }))
        const layers = [...stack.layers.slice(0, k), ...parts, ...stack.layers.slice(k + 1)]
        expectSame(muellerOf(stack), muellerOf({ ...stack, layers }), 1e-9)
      }),
      RUNS,
    )
  })

  it('does not notice an inserted coherent layer of no thickness', () => {
    const nothing: PlainLayer = {
      axes: [
        [1.7, 0.01],
        [1.5, 0],
        [1.6, 0],
      ],
      azimuthRad: 0.4,
      tiltRad: 0.3,
      thicknessNm: 0,
      coherent: true,
    }
    fc.assert(
      fc.property(randomStack(true), fc.nat(), (stack, pick) => {
        const k = pick % (stack.layers.length + 1)
        const layers = [...stack.layers.slice(0, k), nothing, ...stack.layers.slice(k)]
        expectSame(muellerOf(stack), muellerOf({ ...stack, layers }), 1e-9)
      }),
      RUNS,
    )
  })

  it('has a Mueller matrix that a sum of non-depolarizing systems can have', () => {
    fc.assert(
      fc.property(randomStack(true), (stack) => {
        const m = muellerOf(stack)
        for (let i = 0; i < count; i++) {
          const at = (row: number, column: number) => m[(4 * row + column) * count + i]
          expect(at(0, 0)).toBeGreaterThanOrEqual(-1e-12)
          expect(at(0, 0)).toBeLessThanOrEqual(1 + 1e-9)
          // Trace condition of a sum of pure systems, J. J. Gil, E. Bernabeu, Opt. Acta 32, 259 (1985): tr(MᵀM) <= 4 m00².
          let squares = 0
          for (let c = 0; c < 16; c++) squares += m[c * count + i] ** 2
          expect(squares).toBeLessThanOrEqual(4 * at(0, 0) ** 2 + 1e-9)
        }
      }),
      RUNS,
    )
  })

  it('keeps nothing it should have computed again: a used solver gives the digits of a new one', () => {
    const used = new Solver(WAVELENGTHS_NM)
    fc.assert(
      fc.property(randomStack(true), fc.nat(), (stack, pick) => {
        const base = stack.layers.map((layer) => opticalLayer(layer))
        used.solve(base, panelEnd(stack.panel), stack.thetaRad, stack.phiRad)
        const k = base.length > 0 ? pick % base.length : 0
        const changed = base.map((layer, j) => (j === k ? { ...layer, azimuthRad: layer.azimuthRad + 0.1 } : layer))
        const end = panelEnd(stack.panel)
        used.solve(changed, end, stack.thetaRad, stack.phiRad)
        const fresh = new Solver(WAVELENGTHS_NM)
        fresh.solve(changed, end, stack.thetaRad, stack.phiRad)
        expect(used.reflectance).toEqual(fresh.reflectance)
        expect(used.frontReflectance).toEqual(fresh.frontReflectance)
      }),
      RUNS,
    )
  })
})

it('stays finite where extinction and tilt are the smallest numbers there are', () => {
  // Found by a random run: the square of the smallest double is 0.
  const layer: PlainLayer = {
    axes: [
      [1.35, 7.4e-323],
      [1.35, 0],
      [1.35, 0],
    ],
    azimuthRad: 0,
    tiltRad: -5e-324,
    thicknessNm: 5000,
    coherent: false,
  }
  const panel = { kind: 'mirror', index: 1.3, reflectance: 0, depolarized: 0 } as const
  const { reflectance } = solve({ layers: [layer], panel, thetaRad: 0, phiRad: 0 })
  for (const value of reflectance) expect(value).toBeGreaterThan(0)
})
