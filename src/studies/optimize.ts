/** Which angles and retardances make the screen darkest: the best design, how it compares, and the others nearly as good. */
import { createExperiment } from '../appearance/experiment.js'
import { globalSearch } from '../search/globalSearch.js'
import type { Reason } from '../search/result.js'
import { runSearchJob, type SearchJob, type SearchJobMap, type SearchJobResult } from '../search/searchJob.js'
import { findParameter, getParameter } from '../stack/parameters.js'
import type { MetricName, MetricRequest, OptimizeQuestion, Stack } from '../stack/stack.js'
import { toPlain } from '../units/quantity.js'
import { designProblem, designVariables, objectiveRequests } from './designProblem.js'
import { degrees } from './evaluate.js'
import type { Hooks } from './hooks.js'
import { metricKey } from './metricKey.js'
import { mapInline, type ParallelMap, type Task } from './parallel.js'
import { prepareStack } from './prepareStack.js'

export interface OptimizeSettings {
  readonly seed: number
  /** Families are kept whose objective is within this share of the best's; default 5 %. */
  readonly margin?: number
  readonly maxEvaluations?: number
}

/** Parameters in nm, degrees, fractions; the objective as the file names it (not negated when maximized). */
export interface Optimum {
  readonly title: string
  readonly objective: {
    readonly metric: MetricName
    readonly sense: 'minimize' | 'maximize'
    readonly views: readonly { readonly theta_deg: number; readonly phi_deg: number; readonly weight: number }[]
    readonly quantile?: number
  }
  readonly seed: number
  readonly start: Design
  readonly best: Design
  /** Distinct good designs, best first; the first is `best`. */
  readonly families: readonly (Design & { readonly above_best: number; readonly found: number })[]
  readonly family_margin: number
  readonly evaluations: number
  readonly starts_screened: number
  readonly starts_polished: number
  readonly reason: Reason
  readonly interrupted: boolean
  /** Best so far against evaluations. */
  readonly history: readonly { readonly evaluations: number; readonly objective: number }[]
}

export interface Design {
  readonly objective: number
  readonly parameters: Readonly<Record<string, number>>
  readonly metrics: Readonly<Record<string, number>>
  /** Largest constraint missed, in its metric's unit; 0 where all are met. */
  readonly violation: number
}

interface Shared {
  readonly stack: Stack
  readonly question: OptimizeQuestion
}

export const optimizeJob: Task<Shared, SearchJob, SearchJobResult> = {
  name: 'optimizeJob',
  prepare: async ({ stack, question }) => {
    await prepareStack(stack)
    return (job) => runSearchJob(designProblem(stack, question), job)
  },
}

const DEFAULT_MARGIN = 0.05

/** The stack must ask the question: `stack.optimize` present. */
export async function optimize(
  stack: Stack,
  settings: OptimizeSettings,
  hooks: Hooks = {},
  map: ParallelMap = mapInline,
): Promise<Optimum> {
  const question = stack.optimize
  if (question === undefined) throw new Error('the stack has no optimize question')
  const { sense } = question.minimize
  const paths = Object.keys(question.vary)
  const jobs: SearchJobMap = (batch) => map(optimizeJob, { stack, question }, batch, { stopped: hooks.stopped })
  const margin = settings.margin ?? DEFAULT_MARGIN
  const start = Float64Array.from(paths, (path) => getParameter(stack, path))
  const found = await globalSearch(designVariables(stack, question), jobs, {
    seed: settings.seed,
    start,
    margin,
    maxEvaluations: settings.maxEvaluations,
    stopped: hooks.stopped,
    progress: (done, best) =>
      hooks.progress?.(done, `best so far ${shown(question.minimize.metric, sense * best.value)}`),
  })
  const describe = describer(stack, question)
  const best = found.families[0]
  return {
    title: stack.title,
    objective: {
      metric: question.minimize.metric,
      sense: sense === 1 ? 'minimize' : 'maximize',
      views: question.minimize.views.map(({ theta, phi, weight }) => ({
        theta_deg: degrees(theta),
        phi_deg: degrees(phi),
        weight,
      })),
      ...(question.minimize.quantile !== undefined && { quantile: question.minimize.quantile }),
    },
    seed: settings.seed,
    start: describe(start),
    best: describe(best?.x ?? found.x),
    families: found.families.map((family) => ({
      ...describe(family.x),
      above_best: Math.abs(family.value - best.value),
      found: family.hits,
    })),
    family_margin: margin,
    evaluations: found.evaluations,
    starts_screened: found.screened,
    starts_polished: found.polished,
    reason: found.reason,
    interrupted: found.reason === 'stopped',
    history: found.history.map(({ evaluations, value }) => ({ evaluations, objective: sense * value })),
  }
}

/** Short, for a line of progress. */
function shown(metric: MetricName, value: number): string {
  const isShare = metric.endsWith('reflectance') || metric.endsWith('transmittance')
  return isShare ? `${(100 * value).toFixed(4)} %` : value.toPrecision(5)
}

/** Metrics told of every design. */
const TOLD: readonly MetricName[] = [
  'luminous_reflectance',
  'color_weighted_reflectance',
  'chroma',
  'emission_transmittance',
]

function describer(stack: Stack, question: OptimizeQuestion): (x: Float64Array) => Design {
  const paths = Object.keys(question.vary)
  const kinds = paths.map((path) => findParameter(stack, path)?.kind ?? 'number')
  const requests = toldRequests(stack, question)
  const experiment = createExperiment(stack, paths, requests)
  const problem = designProblem(stack, question)
  const values = new Float64Array(requests.length)
  return (x) => {
    experiment(x, values)
    const constraints = problem.constraints?.(x) ?? []
    return {
      objective: question.minimize.sense * problem.objective(x),
      parameters: Object.fromEntries(paths.map((path, k) => [path, toPlain(x[k], kinds[k])])),
      metrics: Object.fromEntries(requests.map((request, k) => [metricKey(request, requests), values[k]])),
      violation: Math.max(0, ...constraints),
    }
  }
}

/** The told metrics from the file's directions and the search's views, and the objective itself; each once. */
function toldRequests(stack: Stack, question: OptimizeQuestion): MetricRequest[] {
  const metrics = TOLD.filter((metric) => metric !== 'emission_transmittance' || stack.panel.kind === 'mirror')
  const directions = [...stack.conditions.directions, ...question.minimize.views]
  const all = [
    ...directions.flatMap(({ theta, phi }) => metrics.map((metric) => ({ metric, theta, phi }))),
    ...objectiveRequests(question.minimize),
  ]
  const seen = new Map(all.map((request) => [JSON.stringify(request), request]))
  return [...seen.values()]
}
