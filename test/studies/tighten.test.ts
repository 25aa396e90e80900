import { describe, expect, test } from 'vitest'
import type { Spread, Stack } from '../../src/stack/stack.js'
import { mapInline } from '../../src/studies/parallel.js'
import { tighten } from '../../src/studies/tighten.js'
import { DEG, darkerThan, polarizer, retarder, stackOf } from './builtStack.js'

const SAMPLES = 1000

/**
 * One film at 45° in green light returns ½ cos² Γ (Poincaré-sphere algebra, any textbook of polarized light): a retardance
 * within 8 nm of a quarter of 550 nm is what this limit asks for.
 */
const LIMIT = Math.cos((2 * Math.PI * (137.5 + 8)) / 550) ** 2 / 2

function production(vary: Readonly<Record<string, Spread>>, together: string[][] = []) {
  const { conditions } = stackOf([])
  const stack: Stack = stackOf([polarizer(0), retarder('quarter', 45, 137.5)], {
    conditions: { ...conditions, wavelengths: { from: 549.9, to: 550.1, step: 0.1 } },
    limits: [darkerThan(LIMIT)],
  })
  return { stack, question: { samples: SAMPLES, seed: 2, sampling: 'sobol' as const, vary, together } }
}

async function tightened(shared: ReturnType<typeof production>, wantedYield = 0.95) {
  const result = await tighten(shared, wantedYield, {}, mapInline)
  if (result === undefined) throw new Error('it was not stopped')
  return result
}

describe('a spread of ±10 nm where ±8 nm pass, an axis that hardly matters', () => {
  const run = tightened(
    production({ 'quarter.retardance': { uniform: 10 }, 'quarter.slow_axis': { normal: 0.05 * DEG } }),
  )

  test('the retardance must shrink to 8 / (0.95 · 10), and that is enough', async () => {
    const { spreads, yield: now, draws } = await run
    expect(draws).toBe(SAMPLES)
    expect(now).toBeCloseTo(0.8, 2)
    const [retardance] = spreads
    expect(retardance).toMatchObject({ parameter: 'quarter.retardance', verdict: 'alone', can_be_doubled: false })
    // One step of 64 and one of 1000 draws.
    expect(Math.abs((retardance.scale ?? Number.NaN) - 8 / 9.5)).toBeLessThan(0.018)
    expect(retardance.yield_reached).toBeGreaterThanOrEqual(0.95)
    expect(retardance.yield_without).toBe(1)
    expect(retardance.yield_doubled).toBeCloseTo(0.4, 2)
    expect(retardance.paths[0]).toMatchObject({ measure: 'half-width', now: 10 })
    expect(retardance.paths[0].needed).toBeCloseTo(10 * (retardance.scale ?? Number.NaN), 12)
  })

  test('the axis cannot do it alone, and may be twice as loose; its spread is told in degrees', async () => {
    const [, axis] = (await run).spreads
    expect(axis).toMatchObject({ parameter: 'quarter.slow_axis', verdict: 'cannot_alone', can_be_doubled: true })
    expect(axis.scale).toBeUndefined()
    expect(axis.paths).toEqual([{ path: 'quarter.slow_axis', measure: 'standard deviation', now: 0.05 }])
  })

  test('all together need about what the retardance needs', async () => {
    const all = (await run).spreads[2]
    expect(all).toMatchObject({ parameter: 'all', verdict: 'alone' })
    expect(Math.abs((all.scale ?? Number.NaN) - 8 / 9.5)).toBeLessThan(0.018)
  })
})

test('what already passes needs nothing; doubling is told by the yield that is left', async () => {
  const shared = production({ 'quarter.retardance': { uniform: 4.1 } })
  const [retardance] = (await tightened(shared)).spreads
  expect(retardance).toMatchObject({ verdict: 'met', yield_without: 1, can_be_doubled: true })
  expect(retardance.yield_doubled).toBeCloseTo(8 / 8.2, 2)
  expect(retardance.paths[0].needed).toBeUndefined()
  const [strict] = (await tightened(shared, 0.99)).spreads
  expect(strict).toMatchObject({ verdict: 'met', can_be_doubled: false })
})

test('films given together shrink together', async () => {
  const paths = ['quarter.retardance', 'quarter.slow_axis']
  const shared = production({ [paths[0]]: { uniform: 10 }, [paths[1]]: { uniform: 0.2 * DEG } }, [paths])
  const { spreads } = await tightened(shared)
  expect(spreads.map(({ parameter }) => parameter)).toEqual(['quarter.retardance + quarter.slow_axis'])
  const { scale, paths: changes } = spreads[0]
  expect(changes.map(({ now, needed }) => (needed ?? Number.NaN) / now)).toEqual(
    [scale, scale].map((s) => expect.closeTo(s ?? 0, 12)),
  )
})

test('stopped, it tells nothing', async () => {
  const shared = production({ 'quarter.retardance': { uniform: 10 } })
  expect(await tighten(shared, 0.95, { stopped: () => true }, mapInline)).toBeUndefined()
})
