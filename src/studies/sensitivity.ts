/** Which spread moves a metric: shares of its variance in production. */
import { createExperiment } from '../appearance/experiment.js'
import { indicesOf, REPLICATES, replicateSeed, type SobolReplicate, sobolReplicate } from '../numeric/sobolIndices.js'
import type { MetricRequest, Stack, ToleranceQuestion } from '../stack/stack.js'
import type { Hooks } from './hooks.js'
import type { ParallelMap, Task } from './parallel.js'
import { prepareStack } from './prepareStack.js'
import { createVariation } from './variation.js'

/** Shares of the variance with their 95 % intervals (which may reach below 0 or above 1). */
export interface ParameterShare {
  /** A path, or the paths given together joined by ` + `. */
  readonly parameter: string
  /** By this parameter alone (first-order Sobol' index). */
  readonly share: number
  readonly share_low: number
  readonly share_high: number
  /** With all its interactions (total Sobol' index). */
  readonly total: number
  readonly total_low: number
  readonly total_high: number
}

interface Shared {
  readonly stack: Stack
  readonly question: ToleranceQuestion
  readonly request: MetricRequest
  /** Base points of a replicate. */
  readonly points: number
}

export const sensitivityReplicate: Task<Shared, number, SobolReplicate> = {
  name: 'sensitivityReplicate',
  prepare: async ({ stack, question, request, points }) => {
    await prepareStack(stack)
    const variation = createVariation(stack, question)
    const values = new Float64Array(variation.paths.length)
    const metric = new Float64Array(1)
    return (replicate) => {
      const experiment = createExperiment(stack, variation.paths, [request])
      const metricAt = (point: Float64Array) => {
        variation.valuesAt(point, values)
        experiment(values, metric)
        return metric[0]
      }
      return sobolReplicate(metricAt, variation.factors.length, {
        points,
        seed: replicateSeed(question.seed, replicate),
      })
    }
  },
}

/** Largest total share first; undefined where it was stopped. */
export async function sensitivity(
  stack: Stack,
  question: ToleranceQuestion,
  request: MetricRequest,
  hooks: Hooks,
  map: ParallelMap,
): Promise<ParameterShare[] | undefined> {
  const points = replicatePoints(question.samples)
  const jobs = Array.from({ length: REPLICATES }, (_, replicate) => replicate)
  const results = await map(sensitivityReplicate, { stack, question, request, points }, jobs, hooks)
  const replicates = results.filter((result): result is SobolReplicate => result !== undefined)
  if (replicates.length < REPLICATES) return undefined
  const { first, total } = indicesOf(replicates)
  return createVariation(stack, question)
    .factors.map(({ name }, i) => ({
      parameter: name,
      share: first[i].value,
      share_low: first[i].low,
      share_high: first[i].high,
      total: total[i].value,
      total_low: total[i].low,
      total_high: total[i].high,
    }))
    .sort((a, b) => b.total - a.total)
}

/** Base points of a replicate, a power of two: all replicates together have about as many base points as the question has samples. */
export function replicatePoints(samples: number): number {
  return 2 ** Math.min(8, Math.max(4, Math.round(Math.log2(samples / REPLICATES))))
}
