import { createMedium, type OpticalLayer, type PanelEnd } from '../../src/optics/opticalLayer.js'
import { Solver } from '../../src/optics/solver.js'
import type { Complex } from '../oracle/complex.js'
import type { OraclePanel, OraclePoint, OracleResult } from '../oracle/solvePoint.js'
import type { Mueller, Stokes } from '../oracle/stokes.js'

/** The kernel in the oracle's shape: one wavelength, one direction. */
export function kernelPoint(point: OraclePoint): OracleResult {
  const solver = new Solver(Float64Array.of(point.wavelengthNm))
  const layers = point.layers.map(({ principal, ...rest }): OpticalLayer => ({ ...rest, medium: medium(principal) }))
  solver.solve(layers, panelEnd(point.panel), point.thetaRad, point.phiRad)
  const reflection = {
    reflectance: solver.reflectance[0],
    frontReflectance: solver.frontReflectance[0],
    mueller: muellerOf(solver),
  }
  if (point.panel.kind === 'metal') return reflection
  const transmittance = new Float64Array(1)
  const [s0, s1, s2, s3] = emissionOf(solver)
  solver.emissionTransmittance(transmittance)
  return { ...reflection, emissionTransmittance: transmittance[0], emissionStokes: [s0, s1, s2, s3] }
}

function medium([a, b, c]: readonly [Complex, Complex, Complex]) {
  const constant = ({ re, im }: Complex) => ({ n: Float64Array.of(re), k: Float64Array.of(im) })
  return createMedium(constant(a), constant(b), constant(c))
}

function panelEnd(panel: OraclePanel): PanelEnd {
  if (panel.kind === 'metal') return { kind: 'metal', medium: medium([panel.index, panel.index, panel.index]) }
  return {
    kind: 'mirror',
    index: Float64Array.of(panel.index),
    reflectance: Float64Array.of(panel.reflectance),
    depolarized: Float64Array.of(panel.depolarized),
  }
}

function muellerOf(solver: Solver): Mueller {
  const flat = new Float64Array(16)
  solver.mueller(flat)
  const row = (i: number): Stokes => [flat[4 * i], flat[4 * i + 1], flat[4 * i + 2], flat[4 * i + 3]]
  return [row(0), row(1), row(2), row(3)]
}

function emissionOf(solver: Solver): Float64Array {
  const stokes = new Float64Array(4)
  solver.emissionStokes(stokes)
  return stokes
}
