/** The adjoint against central differences of the whole stack (a general method; no outside number needed). */
import fc from 'fast-check'
import { expect, it } from 'vitest'
import { Sensitivity } from '../../src/optics/sensitivity.js'
import { Solver } from '../../src/optics/solver.js'
import { opticalLayer, type PlainStack, panelEnd, randomStack, WAVELENGTHS_NM } from './randomStack.js'

const count = WAVELENGTHS_NM.length
const STEP = 1e-4

const CHANGES = [
  (stack: PlainStack, k: number, h: number) => changeLayer(stack, k, { azimuthRad: stack.layers[k].azimuthRad + h }),
  (stack: PlainStack, k: number, h: number) => changeLayer(stack, k, { tiltRad: stack.layers[k].tiltRad + h }),
  (stack: PlainStack, k: number, h: number) =>
    changeLayer(stack, k, { thicknessNm: stack.layers[k].thicknessNm + 10 * h }),
  (stack: PlainStack, _: number, h: number): PlainStack => {
    const { panel } = stack
    if (panel.kind === 'metal')
      return { ...stack, panel: { kind: 'metal', index: [panel.index[0] + h, panel.index[1]] } }
    return { ...stack, panel: { ...panel, depolarized: panel.depolarized + h, reflectance: panel.reflectance - h } }
  },
]

function changeLayer(stack: PlainStack, k: number, change: object): PlainStack {
  return { ...stack, layers: stack.layers.map((layer, j) => (j === k ? { ...layer, ...change } : layer)) }
}

it('agrees with central differences of the whole stack to 1e-6, for any layer and the panel', () => {
  fc.assert(
    fc.property(randomStack(true), fc.nat(), fc.nat({ max: CHANGES.length - 1 }), (stack, pick, kind) => {
      fc.pre(stack.layers.length > 0)
      // Thick crystals with strong tilt have fringes of their own inside; keep the differences accurate.
      fc.pre(stack.layers.every((layer) => layer.thicknessNm < 20000))
      const k = pick % stack.layers.length
      const layers = stack.layers.map((layer) => opticalLayer(layer))
      const panel = panelEnd(stack.panel)
      const shifted = (h: number) => {
        const changed = CHANGES[kind](stack, k, h)
        return {
          layers: layers.map((layer, j) =>
            changed.layers[j] === stack.layers[j] ? layer : opticalLayer(changed.layers[j]),
          ),
          panel: changed.panel === stack.panel ? panel : panelEnd(changed.panel),
        }
      }
      const solver = new Solver(WAVELENGTHS_NM)
      solver.solve(layers, panel, stack.thetaRad, stack.phiRad)
      const sensitivity = new Sensitivity(solver)
      sensitivity.prepare('reflectance')
      const adjoint = new Float64Array(count)
      sensitivity.derivative(shifted(STEP), shifted(-STEP), 2 * STEP, adjoint)
      const at = (h: number) => {
        const fresh = new Solver(WAVELENGTHS_NM)
        const changed = shifted(h)
        fresh.solve(changed.layers, changed.panel, stack.thetaRad, stack.phiRad)
        return fresh.reflectance
      }
      const [plus, minus, plus2, minus2] = [at(STEP), at(-STEP), at(2 * STEP), at(-2 * STEP)]
      for (let i = 0; i < count; i++) {
        const fourthOrder = (8 * (plus[i] - minus[i]) - (plus2[i] - minus2[i])) / (12 * STEP)
        expect(Math.abs(adjoint[i] - fourthOrder)).toBeLessThan(1e-6 * (1 + Math.abs(fourthOrder)))
      }
    }),
    { numRuns: 300, seed: 20261201 },
  )
})
