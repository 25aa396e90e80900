import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { clopperPearson } from '../../src/numeric/binomialInterval.js'
import { gaussLegendre } from '../../src/numeric/gaussLegendre.js'
import { incompleteBeta, inverseIncompleteBeta } from '../../src/numeric/incompleteBeta.js'
import { inverseNormal, normalCdf } from '../../src/numeric/normal.js'
import scipy from './fixtures/fromScipy.json'

function expectClose(value: number, expected: number, relative: number): void {
  expect(Math.abs(value - expected), `${value} against ${expected}`).toBeLessThanOrEqual(relative * Math.abs(expected))
}

describe('normal distribution, against SciPy', () => {
  test.each(scipy.normalCdf)('Φ(%d) = %d', (x, p) => {
    // SciPy underflows to 0 a little earlier; 5e-14: what exp(-200) and the difference from ½ at -3 leave.
    if (p === 0) expect(normalCdf(x)).toBeLessThan(1e-300)
    else expectClose(normalCdf(x), p, 5e-14)
  })
  test.each(scipy.inverseNormal)('Φ⁻¹(%d) = %d', (p, x) => expectClose(inverseNormal(p), x, 5e-15))
  test('the one inverts the other', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-300, max: 0.5, noNaN: true }), (p) => {
        expectClose(normalCdf(inverseNormal(p)), p, 1e-12)
      }),
      { seed: 4, numRuns: 300 },
    )
  })
  test('ends', () => {
    expect(inverseNormal(0)).toBe(-Infinity)
    expect(inverseNormal(1)).toBe(Infinity)
    expect(inverseNormal(-0.1)).toBeNaN()
    expect(normalCdf(-Infinity)).toBe(0)
    expect(normalCdf(Infinity)).toBe(1)
    expect(normalCdf(Number.NaN)).toBeNaN()
  })
})

describe('incomplete beta function, against SciPy', () => {
  // For parameters near a million the terms of the continued fraction cancel by four digits.
  test.each(scipy.incompleteBeta)('I_%d(%d, %d) = %d', (x, a, b, p) => expectClose(incompleteBeta(x, a, b), p, 5e-12))
  test.each(scipy.inverseIncompleteBeta)('quantile %d of Beta(%d, %d) = %d', (p, a, b, x) =>
    expectClose(inverseIncompleteBeta(p, a, b), x, 1e-12),
  )
  test('I_x(a, b) = 1 - I_(1-x)(b, a)', () => {
    const shape = fc.double({ min: 0.05, max: 5000, noNaN: true })
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1023 }), shape, shape, (k, a, b) => {
        expect(incompleteBeta(k / 1024, a, b)).toBeCloseTo(1 - incompleteBeta(1 - k / 1024, b, a), 11)
      }),
      { seed: 5, numRuns: 300 },
    )
  })
  test('ends', () => {
    expect([incompleteBeta(0, 2, 3), incompleteBeta(1, 2, 3)]).toEqual([0, 1])
    expect([inverseIncompleteBeta(0, 2, 3), inverseIncompleteBeta(1, 2, 3)]).toEqual([0, 1])
  })
})

describe('Clopper–Pearson interval', () => {
  test.each(scipy.clopperPearson)('%d of %d, against SciPy', (successes, count, low, high) => {
    const interval = clopperPearson(successes, count, 0.95)
    expectClose(interval[0], low, 1e-10)
    expectClose(interval[1], high, 1e-10)
  })
  test('81 of 263: R. G. Newcombe, Stat. Med. 17, 857 (1998), table I (from memory)', () => {
    const [low, high] = clopperPearson(81, 263, 0.95)
    expect(low).toBeCloseTo(0.2527, 4)
    expect(high).toBeCloseTo(0.3676, 4)
  })
  test('none of n: the closed form 1 - (α/2)^(1/n)', () => {
    for (const count of [1, 2, 30, 5000]) {
      expectClose(clopperPearson(0, count, 0.95)[1], 1 - 0.025 ** (1 / count), 1e-11)
    }
  })
})

test('Gauss–Legendre nodes and weights of order 7, against NumPy', () => {
  const { nodes, weights } = gaussLegendre(7)
  nodes.forEach((node, i) => {
    expectClose(node, scipy.gaussLegendre7.nodes[i], 1e-14)
    expectClose(weights[i], scipy.gaussLegendre7.weights[i], 1e-14)
  })
})
