import { describe, expect, test } from 'vitest'
import { toleranceCsv } from '../../src/report/toleranceCsv.js'
import { toleranceText } from '../../src/report/toleranceText.js'
import type { Tolerance } from '../../src/studies/tolerance.js'
import { polarizer, retarder, stackOf } from '../studies/builtStack.js'

const STACK = stackOf([polarizer(0), retarder('half', 15, 275), retarder('quarter', 75, 137.5)])

/** Invented numbers: how they are told is what is tested. */
const TOLERANCE: Tolerance = {
  title: 'Invented',
  sampling: 'random',
  seed: 3,
  samples: 20_000,
  draws: 20_000,
  design_meets_limits: true,
  yield: 0.9,
  yield_interval: [0.8957, 0.9041],
  limits: [
    {
      metric: 'luminous_reflectance',
      theta_deg: 0,
      phi_deg: 0,
      max: 0.045,
      yield: 0.99996,
      yield_interval: [0.9997, 1],
    },
  ],
  metrics: {
    luminous_reflectance: { mean: 0.042, std: 0.001, min: 0.04, p05: 0.0405, p50: 0.0419, p95: 0.0441, max: 0.046 },
  },
  histograms: {},
  held: { 'panel.depolarized': 0.25 },
  sensitivity_of: 'luminous_reflectance',
  sensitivity: [
    {
      parameter: 'half.retardance + quarter.retardance',
      share: 0.7,
      share_low: 0.68,
      share_high: 0.72,
      total: 0.75,
      total_low: 0.74,
      total_high: 0.76,
    },
    {
      parameter: 'half.slow_axis',
      share: -0.001,
      share_low: -0.02,
      share_high: 0.018,
      total: 0.3,
      total_low: 0.29,
      total_high: 0.31,
    },
  ],
  tightening: {
    wanted_yield: 0.95,
    draws: 1000,
    yield: 0.9,
    spreads: [
      {
        parameter: 'half.retardance + quarter.retardance',
        verdict: 'alone',
        scale: 0.5,
        yield_reached: 0.951,
        yield_without: 0.99,
        yield_doubled: 0.6,
        can_be_doubled: false,
        paths: [
          { path: 'half.retardance', measure: 'standard deviation', now: 3, needed: 1.5 },
          { path: 'quarter.retardance', measure: 'half-width', now: 2, needed: 1 },
        ],
      },
      {
        parameter: 'half.slow_axis',
        verdict: 'cannot_alone',
        yield_without: 0.91,
        yield_doubled: 0.899,
        can_be_doubled: true,
        paths: [{ path: 'half.slow_axis', measure: 'standard deviation', now: 0.25 }],
      },
    ],
  },
  interrupted: false,
}

/** Lines with single blanks, as read. */
function linesOf(tolerance: Tolerance): string[] {
  return toleranceText(STACK, tolerance)
    .split('\n')
    .map((line) => line.trim().replaceAll(/ +/g, ' '))
}

describe('toleranceText', () => {
  test('yields and spreads in percent, the interval beside each', () => {
    expect(linesOf(TOLERANCE)).toEqual(
      expect.arrayContaining([
        '20000 draws of the tolerances: random, seed 3',
        'yield: 90.0 % meet all limits (89.6 … 90.4)',
        'luminous reflectance % 4.200 0.100 4.050 4.190 4.410',
        'panel.depolarized was drawn beyond what is physical in 25.0 % of the draws and set to its edge',
      ]),
    )
  })

  test('100 % is said of all alone', () => {
    expect(linesOf(TOLERANCE)).toContain('luminous reflectance θ 0° φ 0° at most 4.5 % 99.99 % (99.97 … 100.0)')
  })

  test('spreads now and needed in the unit of each path; what a group shares stands once', () => {
    expect(linesOf(TOLERANCE)).toEqual(
      expect.arrayContaining([
        'half.retardance + quarter.retardance 70.0 % 68.0 … 72.0 75.0 % 74.0 … 76.0',
        'half.slow_axis -0.1 % -2.0 … 1.8 30.0 % 29.0 … 31.0',
        'what to tighten for a yield of 95 %: each spread alone, the others as they are',
        'half.retardance std. dev. nm 3.00 1.50 99.0 % 60.0 %',
        '+ quarter.retardance ± nm 2.00 1.00',
        'half.slow_axis std. dev. deg 0.25 91.0 % 89.9 % cannot do it alone, may be twice as loose',
        // √(0.95 · 0.05 / 1000)
        'From the first 1000 draws; a share of them is uncertain by about 0.7 %.',
      ]),
    )
  })

  test('what the interval means depends on how the draws were spread', () => {
    expect(linesOf(TOLERANCE).join(' ')).toContain('at most one of twenty runs')
    expect(linesOf({ ...TOLERANCE, sampling: 'sobol' }).join(' ')).toContain('rather too wide than too narrow')
  })

  test('a design that misses by itself, a file without limits, an interrupted run: each is told', () => {
    const missing = { ...TOLERANCE, design_meets_limits: false, tightening: undefined }
    expect(linesOf(missing).join(' ')).toContain('misses a limit even without errors')
    const { limits: _, yield: __, yield_interval: ___, ...free } = TOLERANCE
    expect(linesOf(free)).toContain('no limits in the file: no yield')
    const cut = linesOf({ ...TOLERANCE, draws: 500, interrupted: true })
    expect(cut).toContain('500 of 20000 draws of the tolerances: random, seed 3')
    expect(cut).toContain('interrupted: this is what was done so far')
  })
})

test('toleranceCsv: a line a metric, fractions', () => {
  expect(toleranceCsv(TOLERANCE)).toBe(
    'metric,mean,std,min,p05,p50,p95,max\r\nluminous_reflectance,0.042,0.001,0.04,0.0405,0.0419,0.0441,0.046\r\n',
  )
})
