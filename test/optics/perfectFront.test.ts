import { describe, expect, it } from 'vitest'
import { createMedium, type OpticalLayer, type PanelEnd } from '../../src/optics/opticalLayer.js'
import { Solver } from '../../src/optics/solver.js'

const MIRROR: PanelEnd = {
  kind: 'mirror',
  index: Float64Array.of(1.5),
  reflectance: Float64Array.of(0.45),
  depolarized: Float64Array.of(0),
}

function layer(n: number, thicknessNm: number, coherent: boolean): OpticalLayer {
  const index = { n: Float64Array.of(n), k: Float64Array.of(0) }
  return { medium: createMedium(index, index, index), azimuthRad: 0, tiltRad: 0, thicknessNm, coherent }
}

/** Energy and symmetry, from the definition: a face that reflects nothing lets a mirror in a matched medium be seen as it is. */
describe.each([0, 30, 60, 85])('a perfect front at %d°', (thetaDeg) => {
  const solver = new Solver(Float64Array.of(550), 'perfect')
  const glass = [layer(1.5, 1e6, false)]
  const coated = [layer(1.38, 100, true), layer(2.1, 60, true), ...glass]

  it.each([
    ['glass', glass],
    ['coated glass', coated],
  ])('over %s returns what the mirror returns, in its state', (_name, layers) => {
    solver.solve(layers, MIRROR, (thetaDeg * Math.PI) / 180, 0.3)
    const mueller = new Float64Array(16)
    solver.mueller(mueller)
    expect(solver.reflectance[0]).toBeCloseTo(0.45, 12)
    expect(solver.frontReflectance[0]).toBe(0)
    for (const [component, sign] of [1, 1, 1, -1].entries()) expect(mueller[5 * component]).toBeCloseTo(0.45 * sign, 12)
  })

  it('lets out all that the panel emits', () => {
    solver.solve(coated, MIRROR, (thetaDeg * Math.PI) / 180, 0.3)
    const emission = new Float64Array(1)
    solver.emissionTransmittance(emission)
    expect(emission[0]).toBeCloseTo(1, 12)
  })
})
