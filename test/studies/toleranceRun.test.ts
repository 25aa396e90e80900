import { describe, expect, test } from 'vitest'
import type { Stack, ToleranceQuestion } from '../../src/stack/stack.js'
import type { ParallelMap } from '../../src/studies/parallel.js'
import { tolerance } from '../../src/studies/tolerance.js'
import { toleranceBlock } from '../../src/studies/toleranceBlock.js'
import { DEG, darkerThan, polarizer, retarder, stackOf } from './builtStack.js'

const QUESTION: ToleranceQuestion = {
  samples: 1000,
  seed: 5,
  sampling: 'latin_hypercube',
  vary: {
    'quarter.slow_axis': { normal: 1 * DEG },
    'quarter.retardance': { normal: 3 },
    'panel.reflectance': { uniform: 0.01 },
  },
  together: [],
}

/** Three wavelengths: the draws are what is tested. */
const STACK: Stack = stackOf([polarizer(0), retarder('quarter', 45, 137.5)], {
  conditions: {
    wavelengths: { from: 500, to: 600, step: 50 },
    observer: 2,
    illuminant: 'D65',
    directions: [
      { theta: 0, phi: 0 },
      { theta: 30 * DEG, phi: 0 },
    ],
    color_weights: [1, 1, 1],
  },
  panel: { reflectance: 0.5 },
  limits: [darkerThan(0.005), darkerThan(0.011, 30, 0)],
  tolerance: QUESTION,
})

/** As a pool does it: every job on a worker that has prepared the task for itself and ran others before; the last first. */
const elsewhere: ParallelMap = async (task, shared, jobs) => {
  const results = new Array(jobs.length)
  const workers = [await task.prepare(structuredClone(shared)), await task.prepare(structuredClone(shared))]
  for (let k = jobs.length - 1; k >= 0; k--) results[k] = await workers[k % 2](structuredClone(jobs[k]))
  return results
}

describe('the same digits', () => {
  test('on whatever worker the blocks are drawn', async () => {
    const few = { ...QUESTION, samples: 600 }
    const here = await tolerance(STACK, few)
    expect(here.yield).toBeLessThan(0.95)
    expect(here.tightening?.spreads).toHaveLength(4)
    expect(await tolerance(STACK, few, {}, {}, elsewhere)).toEqual(here)
  })

  test.each(['random', 'latin_hypercube', 'sobol'] as const)('%s: wherever a block begins', async (sampling) => {
    const shared = { stack: STACK, question: { ...QUESTION, sampling }, requests: STACK.limits }
    const draw = await toleranceBlock.prepare(shared)
    const whole = await draw({ from: 0, to: 60 })
    const ranges = [0, 1, 30, 47].map((from, k, starts) => ({ from, to: starts[k + 1] ?? 60 }))
    const parts = await Promise.all(ranges.map(draw))
    expect(parts.flatMap(({ parameters }) => [...parameters])).toEqual([...whole.parameters])
    expect(parts.flatMap(({ metrics }) => [...metrics])).toEqual([...whole.metrics])
  })
})

test('stopped half way: the draws made so far, told as such', async () => {
  const question: ToleranceQuestion = { ...QUESTION, sampling: 'random' }
  let polls = 0
  const stopped = await tolerance(STACK, question, {}, { stopped: () => ++polls > 2 })
  expect(stopped).toMatchObject({ interrupted: true, draws: 500, samples: 1000 })
  expect(stopped.sensitivity).toBeUndefined()
  const short = await tolerance(STACK, { ...question, samples: 500 }, { drawsOnly: true })
  expect(stopped.metrics).toEqual(short.metrics)
  expect(stopped.yield).toBe(short.yield)
})

test('stopped before the first draw', async () => {
  const nothing = await tolerance(STACK, QUESTION, {}, { stopped: () => true })
  expect(nothing).toMatchObject({ interrupted: true, draws: 0, metrics: {}, held: {} })
  expect(nothing.yield).toBeUndefined()
})

test('progress rises to the end', async () => {
  const seen: number[] = []
  await tolerance(STACK, { ...QUESTION, samples: 300 }, {}, { progress: (done) => seen.push(done) })
  expect(seen).toEqual(seen.toSorted((a, b) => a - b))
  expect(seen.at(-1)).toBeGreaterThan(0.3)
})

test('every draw can be written out, in plain units', async () => {
  const rows: (readonly number[])[] = []
  const { metrics } = await tolerance(STACK, QUESTION, {
    drawsOnly: true,
    onDraws: (draws) => {
      expect(draws.columns.slice(0, 4)).toEqual([...Object.keys(QUESTION.vary), 'color_weighted_reflectance@0,0'])
      rows.push(...draws.rows)
    },
  })
  expect(rows).toHaveLength(1000)
  const axes = rows.map(([axis]) => axis)
  expect(Math.min(...axes)).toBeGreaterThan(40)
  expect(Math.max(...axes)).toBeLessThan(50)
  const mean = rows.reduce((sum, row) => sum + row[3], 0) / rows.length
  expect(mean).toBeCloseTo(metrics['color_weighted_reflectance@0,0'].mean, 12)
})

describe('yield', () => {
  test('each limit has its own, that of all is no higher', async () => {
    const { limits, yield: all } = await tolerance(STACK, QUESTION, { drawsOnly: true })
    expect(limits?.map(({ theta_deg }) => theta_deg)).toEqual([0, 30])
    for (const limit of limits ?? []) expect(limit.yield).toBeGreaterThanOrEqual(all ?? Number.NaN)
  })

  test.each([1, 0])('with a limit of %f it is the same, with an interval', async (expected) => {
    const { yield: all, yield_interval } = await tolerance(
      { ...STACK, limits: [darkerThan(expected)] },
      { ...QUESTION, samples: 100 },
      { drawsOnly: true },
    )
    expect(all).toBe(expected)
    // C. J. Clopper, E. S. Pearson, Biometrika 26, 404 (1934): for none or all of n the far end is 1 - 0.025^(1/n) from there.
    const reach = 1 - 0.025 ** (1 / 100)
    expect(yield_interval?.[0]).toBeCloseTo(expected === 1 ? 1 - reach : 0, 12)
    expect(yield_interval?.[1]).toBeCloseTo(expected === 1 ? 1 : reach, 12)
  })

  test('without limits there is none', async () => {
    const free = await tolerance({ ...STACK, limits: [] }, { ...QUESTION, samples: 64 })
    expect(free.yield).toBeUndefined()
    expect(free.tightening).toBeUndefined()
    expect(free.sensitivity_of).toBe('color_weighted_reflectance@0,0')
    expect(free.interrupted).toBe(false)
  })
})

test('a design that misses a limit by itself: no spread is to blame', async () => {
  const missed = { ...STACK, limits: [darkerThan(1e-6)] }
  const told = await tolerance(missed, { ...QUESTION, samples: 64 })
  expect(told).toMatchObject({ design_meets_limits: false, interrupted: false })
  expect(told.sensitivity).toHaveLength(3)
  expect(told.tightening).toBeUndefined()
})

test('a share is not drawn below 0, and that is told', async () => {
  const { held } = await tolerance(
    STACK,
    { ...QUESTION, vary: { ...QUESTION.vary, 'panel.depolarized': { normal: 0.01 } } },
    { drawsOnly: true },
  )
  // Half of the production about 0 (one share in 1000 draws of a Latin hypercube).
  expect(held).toEqual({ 'panel.depolarized': 0.5 })
})
