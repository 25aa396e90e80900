import fc from 'fast-check'
import { complex, expm, type Complex as MathComplex, type Matrix as MathMatrix, matrix } from 'mathjs'
import { describe, expect, it } from 'vitest'
import { berremanMatrix, permittivity } from './berreman.js'
import { abs, type Complex, I, scale, sub } from './complex.js'
import { identity, type Matrix, product, scaleMatrix } from './complexMatrix.js'
import { layerModes, passDown, passUp } from './layerModes.js'

/** The general exponential of mathjs, as another way through the layer: ψ(d) = exp(i k0 d Δ) ψ(0). */
function exponentialByMathjs(m: Matrix): Matrix {
  const result = expm(matrix(m.map((row) => row.map((v) => complex(v.re, v.im)))) as MathMatrix)
  const rows = result.toArray() as unknown as (MathComplex | number)[][]
  return rows.map((row) => row.map((v) => (typeof v === 'number' ? { re: v, im: 0 } : { re: v.re, im: v.im })))
}

const largestDifference = (a: Matrix, b: Matrix): number =>
  Math.max(...a.flatMap((row, i) => row.map((v, j) => abs(sub(v, b[i][j])))))

const real = (min: number, max: number) => fc.double({ min, max, noNaN: true })
const index: fc.Arbitrary<Complex> = fc.record({
  re: real(1.3, 2),
  im: fc.oneof(fc.constant(0), real(0, 0.3)),
})
const isotropic = index.map((n): [Complex, Complex, Complex] => [n, n, n])
const nearlyIsotropic = fc
  .tuple(index, real(-1e-7, 1e-7))
  .map(([n, d]): [Complex, Complex, Complex] => [n, { ...n, re: n.re + d }, { ...n, re: n.re - d }])
const layer = fc.record({
  principal: fc.oneof(fc.tuple(index, index, index), isotropic, nearlyIsotropic),
  azimuthRad: real(-Math.PI, Math.PI),
  tiltRad: fc.oneof(fc.constant(0), real(-Math.PI / 2, Math.PI / 2)),
})

describe('the waves of a layer', () => {
  it('pass through it as the matrix exponential says', () => {
    fc.assert(
      fc.property(layer, real(0, 1.5), real(0, 6), (frame, thetaRad, k0d) => {
        const delta = berremanMatrix(permittivity(frame, 0), Math.sin(thetaRad))
        const modes = layerModes(delta)
        const through = exponentialByMathjs(scaleMatrix(scale(k0d, I), delta))
        const forward = [...identity(2), ...modes.admittanceForward]
        const backward = [...identity(2), ...modes.admittanceBackward]
        expect(largestDifference(product(through, forward), product(forward, passDown(modes, k0d)))).toBeLessThan(1e-9)
        expect(largestDifference(product(through, backward, passUp(modes, k0d)), backward)).toBeLessThan(1e-9)
      }),
      { seed: 20261201, numRuns: 300 },
    )
  })

  it('of glass have the admittances n / cos θ and n cos θ (Snell, Fresnel)', () => {
    const n = { re: 1.5, im: 0 }
    const xi = Math.sin(Math.PI / 3)
    const cosInside = Math.sqrt(1 - (xi / 1.5) ** 2)
    const frame = { principal: [n, n, n] as const, azimuthRad: 0.3, tiltRad: 0.2 }
    const { admittanceForward: y } = layerModes(berremanMatrix(permittivity(frame, 0.7), xi))
    expect(y[0][0].re).toBeCloseTo(1.5 / cosInside, 13)
    expect(y[1][1].re).toBeCloseTo(1.5 * cosInside, 13)
    expect(abs(y[0][1]) + abs(y[1][0])).toBeLessThan(1e-13)
  })
})
