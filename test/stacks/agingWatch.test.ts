import { expect, it } from 'vitest'
import { setParameters } from '../../src/stack/parameters.js'
import type { Stack } from '../../src/stack/stack.js'
import { optimize } from '../../src/studies/optimize.js'
import { tolerance } from '../../src/studies/tolerance.js'
import { demoStack } from './demoStacks.js'

/** 95th percentile of the aged watches' reflectance, by draws of another kind and number than the search saw. */
async function p95Of(stack: Stack, design: Readonly<Record<string, number>>): Promise<number> {
  if (stack.tolerance === undefined) throw new Error('the watch has its tolerances')
  const question = { ...stack.tolerance, sampling: 'random', samples: 4000, seed: 99 } as const
  const { metrics } = await tolerance(setParameters(stack, design), question, { drawsOnly: true })
  return metrics['color_weighted_reflectance@0,0'].p95
}

it('the regatta watch designed for its aging stays darker than the one designed as new', async () => {
  const stack = await demoStack('regatta-watch.stack.yaml')
  if (stack.optimize === undefined) throw new Error('the watch is to be optimized')
  const { quantile, ...asNew } = stack.optimize.minimize
  expect(quantile).toBe(0.95)
  const nominal = { ...stack, optimize: { ...stack.optimize, minimize: asNew } }
  const designs = await Promise.all([stack, nominal].map((asked) => optimize(asked, { seed: 1 })))
  const [robust, best] = designs.map(({ best: { parameters } }) => internal(parameters))
  const [robustP95, nominalP95] = [await p95Of(stack, robust), await p95Of(stack, best)]
  // Far more than the percentile of 4000 draws is uncertain by.
  expect(nominalP95 - robustP95).toBeGreaterThan(0.001)
})

/** Parameters of a result are in degrees and nm. */
function internal(parameters: Readonly<Record<string, number>>): Record<string, number> {
  const entries = Object.entries(parameters).map(([path, value]): [string, number] => [
    path,
    path.endsWith('slow_axis') ? (value * Math.PI) / 180 : value,
  ])
  return Object.fromEntries(entries)
}
