import { expect, test } from 'vitest'
import { mapInline } from '../../src/studies/parallel.js'
import { sensitivity } from '../../src/studies/sensitivity.js'
import { polarizer, stackOf } from './builtStack.js'

const HEAD_ON = { metric: 'luminous_reflectance', theta: 0, phi: 0 } as const

/** Moments of a number spread evenly over m ± w. */
const square = (m: number, w: number) => m ** 2 + w ** 2 / 3
const fourth = (m: number, w: number) => m ** 4 + 2 * m ** 2 * w ** 2 + w ** 4 / 5

test('a polarizer over a mirror: shares of a product, by hand', async () => {
  // ½ T² R comes back: T of the polarizer's open axis, R of the mirror, each spread evenly.
  const { conditions } = stackOf([])
  const stack = stackOf([polarizer(0, 0.8)], {
    conditions: { ...conditions, wavelengths: { from: 500, to: 600, step: 50 } },
    panel: { reflectance: 0.5 },
  })
  const vary = {
    'polarizer.transmission_axis_transmittance': { uniform: 0.1 },
    'panel.reflectance': { uniform: 0.2 },
    'polarizer.absorption_axis': { uniform: 0.1 },
  }
  const question = { samples: 2000, seed: 1, sampling: 'sobol' as const, vary, together: [] }
  const varianceT = fourth(0.8, 0.1) - square(0.8, 0.1) ** 2
  const varianceR = 0.2 ** 2 / 3
  const [ofT, ofR] = [varianceT * 0.5 ** 2, square(0.8, 0.1) ** 2 * varianceR]
  const both = varianceT * varianceR
  const variance = ofT + ofR + both

  const shares = await sensitivity(stack, question, HEAD_ON, {}, mapInline)
  expect(shares?.map(({ parameter }) => parameter)).toEqual([
    'panel.reflectance',
    'polarizer.transmission_axis_transmittance',
    'polarizer.absorption_axis',
  ])
  const [r, t, axis] = shares ?? []
  expect(Math.abs(r.share - ofR / variance)).toBeLessThan(0.01)
  expect(Math.abs(r.total - (ofR + both) / variance)).toBeLessThan(0.01)
  expect(Math.abs(t.share - ofT / variance)).toBeLessThan(0.01)
  expect(Math.abs(t.total - (ofT + both) / variance)).toBeLessThan(0.01)
  for (const { share, share_low, share_high, total, total_low, total_high } of [r, t]) {
    expect(share_low).toBeLessThan(share)
    expect(share).toBeLessThan(share_high)
    expect(total_low).toBeLessThan(total)
    expect(total).toBeLessThan(total_high)
    expect(share_high - share_low).toBeLessThan(0.05)
  }
  expect(axis.total).toBeCloseTo(0, 6)
})

test('stopped, it tells nothing', async () => {
  const stack = stackOf([polarizer(0)])
  const question = {
    samples: 100,
    seed: 1,
    sampling: 'sobol' as const,
    vary: { 'panel.reflectance': { uniform: 0.1 } },
    together: [],
  }
  expect(await sensitivity(stack, question, HEAD_ON, { stopped: () => true }, mapInline)).toBeUndefined()
})
