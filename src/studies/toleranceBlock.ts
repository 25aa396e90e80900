import { createExperiment } from '../appearance/experiment.js'
import type { MetricRequest, Stack, ToleranceQuestion } from '../stack/stack.js'
import type { DrawRange } from './drawRanges.js'
import type { Task } from './parallel.js'
import { prepareStack } from './prepareStack.js'
import { createVariation, drawsOf } from './variation.js'

export interface DrawnStack {
  readonly stack: Stack
  readonly question: ToleranceQuestion
  readonly requests: readonly MetricRequest[]
}

export interface DrawnBlock {
  /** One row per draw: the parameters in the order of the paths (nm, rad, fractions). */
  readonly parameters: Float64Array
  /** One row per draw: the metrics in the order of the requests. */
  readonly metrics: Float64Array
}

/** A block of laminates as production makes them. */
export const toleranceBlock: Task<DrawnStack, DrawRange, DrawnBlock> = {
  name: 'toleranceBlock',
  prepare: async ({ stack, question, requests }) => {
    await prepareStack(stack)
    const variation = createVariation(stack, question)
    const width = variation.paths.length
    const draws = drawsOf(question, variation.factors.length)
    const point = new Float64Array(variation.factors.length)
    return ({ from, to }) => {
      const experiment = createExperiment(stack, variation.paths, requests)
      const parameters = new Float64Array((to - from) * width)
      const metrics = new Float64Array((to - from) * requests.length)
      for (let draw = 0; draw < to - from; draw++) {
        const values = parameters.subarray(draw * width, (draw + 1) * width)
        draws.point(from + draw, point)
        variation.valuesAt(point, values)
        experiment(values, metrics.subarray(draw * requests.length, (draw + 1) * requests.length))
      }
      return { parameters, metrics }
    }
  },
}
