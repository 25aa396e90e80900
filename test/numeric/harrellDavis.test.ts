import { expect, test } from 'vitest'
import { harrellDavisWeights } from '../../src/numeric/harrellDavis.js'

function estimate(sorted: readonly number[], p: number): number {
  return harrellDavisWeights(sorted.length, p).reduce((sum, weight, i) => sum + weight * sorted[i], 0)
}

/** SciPy 1.17.1, scipy.stats.mstats.hdquantiles. */
test('quantiles, against SciPy', () => {
  const few = [1, 2, 4, 7, 11, 16, 22, 29, 37, 46]
  expect(estimate(few, 0.05)).toBeCloseTo(1.2673541525205934, 12)
  expect(estimate(few, 0.5)).toBeCloseTo(14.458304653012888, 12)
  expect(estimate(few, 0.95)).toBeCloseTo(44.18792660992563, 12)
  const squares = Array.from({ length: 64 }, (_, i) => (i + 1) ** 2)
  expect(estimate(squares, 0.95)).toBeCloseTo(3760.8223813911973, 8)
})
