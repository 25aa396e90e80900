/** The fast solver against the slow one of `test/oracle/`, which shares no code with it, on seeded random stacks. */
import fc from 'fast-check'
import { expect, it } from 'vitest'
import { type OraclePoint, type OracleResult, solvePoint } from '../oracle/solvePoint.js'
import { kernelPoint } from './kernelPoint.js'
import { type PlainStack, randomStack } from './randomStack.js'

const complex = ([re, im]: readonly [number, number]) => ({ re, im })

function pointOf(stack: PlainStack, wavelengthNm: number): OraclePoint {
  const { panel, thetaRad, phiRad } = stack
  const layers = stack.layers.map(({ axes: [a, b, c], ...rest }) => ({
    ...rest,
    principal: [complex(a), complex(b), complex(c)] as const,
  }))
  const end = panel.kind === 'metal' ? { kind: panel.kind, index: complex(panel.index) } : panel
  return { wavelengthNm, thetaRad, phiRad, layers, panel: end }
}

/** Every number of a result: reflectance, front, 16 of the Mueller matrix, 5 of the emission over a mirror. */
const numbersOf = (r: OracleResult): readonly number[] => [
  r.reflectance,
  r.frontReflectance,
  ...r.mueller.flat(),
  ...(r.emissionTransmittance === undefined ? [] : [r.emissionTransmittance]),
  ...(r.emissionStokes ?? []),
]

it.each([true, false])('agrees with the oracle in every number of the answer, absorbing layers: %s', (lossy) => {
  fc.assert(
    fc.property(randomStack(lossy), fc.double({ min: 380, max: 780, noNaN: true }), (stack, wavelengthNm) => {
      const point = pointOf(stack, wavelengthNm)
      const expected = numbersOf(solvePoint(point))
      const actual = numbersOf(kernelPoint(point))
      expect(actual).toHaveLength(expected.length)
      for (const [i, value] of actual.entries()) expect(Math.abs(value - expected[i])).toBeLessThan(1e-9)
    }),
    { seed: 20261203, numRuns: 200 },
  )
})
