import { createExperiment } from '../appearance/experiment.js'
import type { Stack, ToleranceQuestion } from '../stack/stack.js'
import { type DrawRange, drawRanges } from './drawRanges.js'
import { limitMargin } from './evaluate.js'
import type { Hooks } from './hooks.js'
import type { ParallelMap, Task } from './parallel.js'
import { prepareStack } from './prepareStack.js'
import { createVariation, drawsOf } from './variation.js'

export interface ToleratedStack {
  readonly stack: Stack
  readonly question: ToleranceQuestion
}

interface Job extends DrawRange {
  /** Of each factor's spread. */
  readonly scales: readonly number[]
}

/** How many of a range of draws meet every limit, with the spreads scaled. */
export const passingDraws: Task<ToleratedStack, Job, number> = {
  name: 'passingDraws',
  prepare: async ({ stack, question }) => {
    await prepareStack(stack)
    const { limits } = stack
    const variation = createVariation(stack, question)
    const draws = drawsOf(question, variation.factors.length)
    const point = new Float64Array(variation.factors.length)
    const values = new Float64Array(variation.paths.length)
    const metrics = new Float64Array(limits.length)
    return ({ from, to, scales }) => {
      const experiment = createExperiment(stack, variation.paths, limits)
      let passed = 0
      for (let draw = from; draw < to; draw++) {
        draws.point(draw, point)
        variation.valuesAt(point, values, scales)
        experiment(values, metrics)
        if (limits.every((limit, k) => limitMargin(limit, metrics[k]) >= 0)) passed++
      }
      return passed
    }
  },
}

/** Yield for each set of scales; undefined where it was stopped before all were known. */
export type ScaledYields = (scaleSets: readonly (readonly number[])[], hooks: Hooks) => Promise<number[] | undefined>

/**
 * Yields from the first `count` draws of the question. The same draws serve every set of scales (common random numbers), so
 * that two yields differ by the spreads alone.
 */
export function createScaledYields(shared: ToleratedStack, count: number, map: ParallelMap): ScaledYields {
  const ranges = drawRanges(0, count)
  return async (scaleSets, hooks) => {
    const jobs = scaleSets.flatMap((scales) => ranges.map((range) => ({ ...range, scales })))
    const passed = await map(passingDraws, shared, jobs, hooks)
    if (passed.includes(undefined)) return undefined
    return scaleSets.map((_, set) => {
      const own = passed.slice(set * ranges.length, (set + 1) * ranges.length)
      return own.reduce<number>((sum, number) => sum + (number ?? 0), 0) / count
    })
  }
}
