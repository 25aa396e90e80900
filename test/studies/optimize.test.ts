/**
 * The search finds the global optimum for every seed. The reference is another search on the same engine: every point of a dense
 * grid over the whole box polished by a simplex of its own from the best few, without gradient, screen or multistart.
 */
import { nelderMead } from 'fmin'
import { describe, expect, it } from 'vitest'
import { createExperiment } from '../../src/appearance/experiment.js'
import type { OptimizeQuestion, RetarderLayer, Stack } from '../../src/stack/stack.js'
import { objectiveRequests } from '../../src/studies/designProblem.js'
import { optimize } from '../../src/studies/optimize.js'
import { DEG, glass, stackOf } from './builtStack.js'

const SEEDS = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10]
/** Share of the objective by which the best may be missed. */
const WITHIN = 2e-4

const polarizer = {
  id: 'polarizer',
  kind: 'polarizer',
  absorption_axis: 90 * DEG,
  thickness: 12e3,
  coherent: false,
  index: 1.5,
  single_transmittance: 0.432,
  polarization_efficiency: 0.9998,
} as const

function film(id: string, slowAxisDeg: number, retardance: number, rest: Partial<RetarderLayer> = {}): RetarderLayer {
  return {
    id,
    kind: 'retarder',
    index: 1.55,
    slow_axis: slowAxisDeg * DEG,
    retardance,
    thickness: 25e3,
    coherent: false,
    ...(rest.rth === undefined && { nz: 1 }),
    ...rest,
  } as RetarderLayer
}

const adhesive = (id: string) => glass(id, 1.475, 15e3)
const panel = { index: 1.5, reflectance: 0.45, depolarized: 0.01 }
const headOn = [{ theta: 0, phi: 0, weight: 1 }]
const fiveDirections = [
  { theta: 0, phi: 0, weight: 1 },
  ...[0, 45, 90, 135].map((phi) => ({ theta: 50 * DEG, phi: phi * DEG, weight: 0.5 })),
]

function asking(vary: OptimizeQuestion['vary'], views: OptimizeQuestion['minimize']['views']): OptimizeQuestion {
  return { vary, minimize: { metric: 'color_weighted_reflectance', sense: 1, views }, subject_to: [] }
}

const turn = { from: 0, to: Math.PI }

const CASES: Readonly<Record<string, Stack & { readonly optimize: OptimizeQuestion }>> = {
  'half + quarter pair, four parameters': {
    ...stackOf(
      [polarizer, adhesive('a'), film('half', 105, 272), adhesive('b'), film('quarter', 165, 138), adhesive('c')],
      { panel },
    ),
    optimize: asking(
      {
        'half.slow_axis': turn,
        'half.retardance': { from: 230, to: 310 },
        'quarter.slow_axis': turn,
        'quarter.retardance': { from: 90, to: 190 },
      },
      headOn,
    ),
  },
  'one reverse-dispersion film': {
    ...stackOf(
      [polarizer, adhesive('a'), film('quarter', 40, 130, { dispersion: { re450: 0.85, re650: 1.05 } }), adhesive('b')],
      { panel },
    ),
    optimize: asking({ 'quarter.slow_axis': turn, 'quarter.retardance': { from: 90, to: 190 } }, headOn),
  },
  'film + C-plate over five directions': {
    ...stackOf(
      [
        polarizer,
        adhesive('a'),
        film('quarter', 40, 130, { dispersion: { re450: 0.85, re650: 1.05 } }),
        film('plate', 0, 0, { rth: -60 }),
        adhesive('b'),
      ],
      { panel },
    ),
    optimize: asking(
      { 'quarter.slow_axis': turn, 'quarter.retardance': { from: 90, to: 190 }, 'plate.rth': { from: -200, to: 100 } },
      fiveDirections,
    ),
  },
}

/** Least value of the objective: a grid of `points` a side, then a simplex from the best twelve in scaled coordinates. */
function reference(stack: Stack & { readonly optimize: OptimizeQuestion }, points: number): number {
  const { vary, minimize } = stack.optimize
  const ranges = Object.values(vary).map((range) =>
    'from' in range ? range : { from: range.values[0], to: range.values[0] },
  )
  const requests = objectiveRequests(minimize)
  const experiment = createExperiment(stack, Object.keys(vary), requests)
  const values = new Float64Array(requests.length)
  const total = minimize.views.reduce((sum, { weight }) => sum + weight, 0)
  const at = (u: readonly number[]): number => {
    experiment(
      u.map((share, k) => ranges[k].from + (share - 1) * (ranges[k].to - ranges[k].from)),
      values,
    )
    return minimize.views.reduce((sum, { weight }, k) => sum + (weight * values[k]) / total, 0)
  }
  const count = points ** ranges.length
  const grid = Array.from({ length: count }, (_, index) =>
    ranges.map((_range, k) => 1 + (0.5 + (Math.floor(index / points ** k) % points)) / points),
  )
  const best = grid
    .map((u) => ({ u, value: at(u) }))
    .sort((a, b) => a.value - b.value)
    .slice(0, 12)
  return Math.min(
    ...best.map(({ u }) => nelderMead(at, nelderMead(at, u, { maxIterations: 600 }).x, { maxIterations: 600 }).fx),
  )
}

describe('the global optimum, for each of ten seeds', () => {
  it.each(Object.entries(CASES))('%s', async (_, stack) => {
    const least = reference(stack, Object.keys(stack.optimize.vary).length > 3 ? 9 : 12)
    const found = await Promise.all(SEEDS.map((seed) => optimize(stack, { seed })))
    for (const { best, reason, families } of found) {
      expect(best.objective).toBeLessThan(least * (1 + WITHIN))
      expect(best.objective).toBeGreaterThan(least * (1 - WITHIN))
      expect(reason).toBe('converged')
      expect(families[0].objective).toBe(best.objective)
    }
  })
})

describe('what a search gives back', () => {
  const stack = CASES['one reverse-dispersion film']

  it('is the same to the last digit for the same seed', async () => {
    expect(await optimize(stack, { seed: 3 })).toEqual(await optimize(stack, { seed: 3 }))
  })

  it('finds the film at 45° to the polarizer on either side', async () => {
    const { families } = await optimize(stack, { seed: 1 })
    const axes = families.map(({ parameters }) => parameters['quarter.slow_axis']).sort((a, b) => a - b)
    expect(axes).toHaveLength(2)
    // The slow axis of a quarter-wave film stands at 45° to the polarizer, on either side (common practice, no source).
    expect(axes[0]).toBeCloseTo(45, 1)
    expect(axes[1]).toBeCloseTo(135, 1)
  })

  it('takes only values on offer where a list is given', async () => {
    const question = {
      ...stack.optimize,
      vary: { ...stack.optimize.vary, 'quarter.slow_axis': { values: [15 * DEG, 40 * DEG, 75 * DEG] } },
    }
    const { best } = await optimize({ ...stack, optimize: question }, { seed: 1 })
    expect(best.parameters['quarter.slow_axis']).toBeCloseTo(40, 10)
  })

  it('heeds a constraint that the free optimum misses', async () => {
    const { best: free } = await optimize(stack, { seed: 1 })
    const limit = { metric: 'a_star', theta: 0, phi: 0, max: free.metrics.chroma / 2 - 0.4 } as const
    const { best } = await optimize({ ...stack, optimize: { ...stack.optimize, subject_to: [limit] } }, { seed: 1 })
    expect(best.violation).toBe(0)
    expect(best.objective).toBeGreaterThanOrEqual(free.objective - 1e-9)
  })

  it('keeps the best so far when stopped', async () => {
    let polls = 0
    const result = await optimize(stack, { seed: 1 }, { stopped: () => ++polls > 2 })
    expect(result.interrupted).toBe(true)
    expect(result.best.objective).toBeLessThanOrEqual(result.start.objective)
  })
})

describe('published angles', () => {
  it('finds 15°/75° as the best half + quarter pair of one flat material', async () => {
    // Destriau, Prouteau, J. Phys. Radium 10, 53 (1949), from memory: β = 2α + 45°, and 15/75 the exact best of that family at every
    // wavelength for films of 275 and 137.5 nm (Poincaré algebra). Polarizer transmitting along 0°.
    const sheet = { index: 1, thickness: 10e6 }
    const ideal = {
      ...polarizer,
      ...sheet,
      single_transmittance: undefined,
      polarization_efficiency: undefined,
      transmission_axis_transmittance: 1,
      absorption_axis_transmittance: 1e-12,
    }
    const pair = stackOf([ideal, film('half', 20, 275, sheet), film('quarter', 70, 137.5, sheet)])
    const question = asking(
      { 'half.slow_axis': { from: 5 * DEG, to: 40 * DEG }, 'quarter.slow_axis': { from: 50 * DEG, to: 100 * DEG } },
      headOn,
    )
    const luminous = { ...question, minimize: { ...question.minimize, metric: 'luminous_reflectance' as const } }
    const { best } = await optimize({ ...pair, optimize: luminous }, { seed: 1 })
    expect(best.parameters['half.slow_axis']).toBeCloseTo(15, 0)
    expect(best.parameters['quarter.slow_axis']).toBeCloseTo(75, 0)
    // Half of the light passes the polarizer; L = 0.0468 % at exactly 15/75 (published.md, computed from the closed form).
    expect(best.objective).toBeLessThan(0.5 * 4.68e-4 * 1.001)
  })
})
