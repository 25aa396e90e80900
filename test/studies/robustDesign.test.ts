import { expect, test } from 'vitest'
import { setParameters } from '../../src/stack/parameters.js'
import type { Stack } from '../../src/stack/stack.js'
import { bestValues } from '../../src/studies/bestValues.js'
import { optimize } from '../../src/studies/optimize.js'
import { tolerance } from '../../src/studies/tolerance.js'
import { demoStack } from '../stacks/demoStacks.js'

/** The design's production under other draws than the search had. */
async function production(stack: Stack) {
  const question = { ...stack.tolerance!, samples: 1000, seed: 77, sampling: 'random' as const }
  return tolerance(stack, question, { drawsOnly: true })
}

test('a robust design of the regatta watch: worse when new, better at the 95th percentile, more of it passes', async () => {
  const demo = await demoStack('regatta-watch.stack.yaml')
  // Coarse, to be quick.
  const wavelengths = { ...demo.conditions.wavelengths, step: 40 }
  const stack: Stack = { ...demo, conditions: { ...demo.conditions, wavelengths } }
  const { quantile, ...nominalAim } = stack.optimize!.minimize
  expect(quantile).toBe(0.95)
  const nominalStack = { ...stack, optimize: { ...stack.optimize!, minimize: nominalAim } }
  const [robust, nominal] = [await optimize(stack, { seed: 1 }), await optimize(nominalStack, { seed: 1 })]
  const [ofRobust, ofNominal] = [
    await production(setParameters(stack, bestValues(stack, robust))),
    await production(setParameters(stack, bestValues(stack, nominal))),
  ]
  const key = 'color_weighted_reflectance@0,0'
  expect(robust.best.metrics[key]).toBeGreaterThan(nominal.best.metrics[key])
  // Of 1000 draws the 95th percentile is known to some 0.0001.
  expect(ofRobust.metrics[key].p95).toBeLessThan(ofNominal.metrics[key].p95 - 0.001)
  expect(Math.abs(ofRobust.metrics[key].p95 - robust.best.objective)).toBeLessThan(0.0003)
  expect(ofRobust.yield).toBeGreaterThan((ofNominal.yield ?? 1) + 0.3)
})
