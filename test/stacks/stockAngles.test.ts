import { expect, it } from 'vitest'
import { setParameters } from '../../src/stack/parameters.js'
import { evaluate } from '../../src/studies/evaluate.js'
import { optimize } from '../../src/studies/optimize.js'
import { demoStack } from './demoStacks.js'

/** Few enough to try them all: every pair of the angles that the supplier cuts. */
it('the search over the stock angles of the survey watch finds what trying all pairs finds', async () => {
  const stack = await demoStack('survey-watch.stack.yaml')
  const { best } = await optimize(stack, { seed: 1 })
  const angles = stack.optimize?.vary['half.slow_axis']
  if (angles === undefined || !('values' in angles)) throw new Error('the survey watch has its angles as a list')
  const objectives = angles.values.flatMap((half) =>
    angles.values.map((quarter) => {
      const cut = setParameters(stack, { 'half.slow_axis': half, 'quarter.slow_axis': quarter })
      return evaluate(cut).directions[0].color_weighted_reflectance
    }),
  )
  expect(objectives).toHaveLength(100)
  expect(best.objective).toBeCloseTo(Math.min(...objectives), 12)
})
