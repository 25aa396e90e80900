/** The `optimize` question of a stack as functions of its parameters, in the terms of `search/`. */
import { createExperiment } from '../appearance/experiment.js'
import { createGradientExperiment } from '../appearance/gradientExperiment.js'
import { isSpectral } from '../appearance/metricWeights.js'
import type { SearchProblem } from '../search/problem.js'
import type { Variable } from '../search/variables.js'
import { findParameter } from '../stack/parameters.js'
import type { Limit, MetricRequest, Objective, OptimizeQuestion, Range, Stack } from '../stack/stack.js'
import { wavelengthsOf } from '../stack/wavelengths.js'
import { limitMargin } from './evaluate.js'
import { type RobustQuestion, underTolerances, underTolerancesWithGradient } from './underTolerances.js'

/** Wavelengths kept for choosing starts: enough to rank them, a quarter of the work. */
const SCREEN_STRIDE = 4
const SCREEN_LEAST = 16

/** Every few wavelengths of the band, evenly. */
export function coarseWavelengths(wavelengths: Float64Array): Float64Array {
  const stride = Math.max(1, Math.min(SCREEN_STRIDE, Math.floor(wavelengths.length / SCREEN_LEAST)))
  return wavelengths.filter((_, i) => i % stride === 0)
}

export function designVariables(stack: Stack, { vary }: Pick<OptimizeQuestion, 'vary'>): Variable[] {
  return Object.entries(vary).map(([path, range]) => variableOf(stack, path, range))
}

function variableOf(stack: Stack, path: string, range: Range): Variable {
  const period = findParameter(stack, path)?.period
  const shared = period !== undefined ? { period } : {}
  if ('from' in range) return { lower: range.from, upper: range.to, ...shared }
  const values = [...range.values].sort((a, b) => a - b)
  return { lower: values[0], upper: values[values.length - 1], values, ...shared }
}

/** Objective (with the sign of a minimum), constraints and screen; fresh, so that a job's digits are its own. */
export function designProblem(
  stack: Stack,
  question: OptimizeQuestion,
  wavelengths: Float64Array = wavelengthsOf(stack.conditions),
): SearchProblem {
  const coarse = coarseWavelengths(wavelengths)
  return {
    variables: designVariables(stack, question),
    ...functionsAt(stack, question, wavelengths),
    // Which starts are worth a polish, and their basins, are told by the design as it is drawn; what production makes of it
    // decides among the basins and the rest.
    screen: whenAsked(() => meanOverViews(stack, Object.keys(question.vary), question.minimize, coarse)),
    rough: functionsAt(stack, asDrawn(question), coarse),
  }
}

/** The same question without tolerances. */
function asDrawn({ minimize: { quantile: _, ...minimize }, ...rest }: OptimizeQuestion): OptimizeQuestion {
  return { ...rest, minimize }
}

/** Objective, gradient and constraints on these wavelengths, each made ready when first asked for. */
function functionsAt(stack: Stack, question: OptimizeQuestion, wavelengths: Float64Array) {
  const paths = Object.keys(question.vary)
  const { minimize, subject_to } = question
  const value = (all: readonly string[]) => meanOverViews(stack, all, minimize, wavelengths)
  const slope = (all: readonly string[]) => gradientOf(stack, all, minimize, wavelengths)
  const robust = robustQuestion(stack, paths, minimize)
  return {
    objective: whenAsked(() => (robust === undefined ? value(paths) : underTolerances(stack, robust, value))),
    ...(isSpectral(minimize.metric) && {
      objectiveWithGradient: whenAsked(() =>
        robust === undefined ? slope(paths) : underTolerancesWithGradient(stack, robust, slope),
      ),
    }),
    ...(subject_to.length > 0 && {
      constraints: whenAsked(() => constraintsOf(stack, paths, subject_to, wavelengths)),
    }),
  }
}

/** The quantile of the objective under the file's tolerances, where the file asks for it. */
function robustQuestion(stack: Stack, paths: readonly string[], { quantile }: Objective): RobustQuestion | undefined {
  if (quantile === undefined) return undefined
  const { tolerance } = stack
  if (tolerance === undefined) throw new Error('a quantile needs the tolerances of the stack')
  // Of the objective with the sign of a minimum: this share of production does at least as well, also where the metric is maximized.
  return { tolerance, paths, share: quantile }
}

function whenAsked<Args extends unknown[], Result>(make: () => (...args: Args) => Result): (...args: Args) => Result {
  let made: ((...args: Args) => Result) | undefined
  return (...args) => {
    made ??= make()
    return made(...args)
  }
}

/** Weighted mean of the metric over the views, times the sense of the search. */
function meanOverViews(stack: Stack, paths: readonly string[], objective: Objective, wavelengths: Float64Array) {
  const requests = objectiveRequests(objective)
  const experiment = createExperiment(stack, paths, requests, wavelengths)
  const values = new Float64Array(requests.length)
  const total = objective.views.reduce((sum, view) => sum + view.weight, 0)
  return (x: Float64Array): number => {
    experiment(x, values)
    let sum = 0
    for (let k = 0; k < values.length; k++) sum += objective.views[k].weight * values[k]
    return (objective.sense * sum) / total
  }
}

/** The same with its gradient; the metric has one where `isSpectral`. */
function gradientOf(
  stack: Stack,
  paths: readonly string[],
  { metric, sense, views }: Objective,
  wavelengths: Float64Array,
) {
  if (!isSpectral(metric)) throw new Error(`no gradient of ${metric}`)
  const total = views.reduce((sum, view) => sum + view.weight, 0)
  const weighted = views.map((view) => ({ ...view, weight: (sense * view.weight) / total }))
  return createGradientExperiment(stack, paths, metric, weighted, wavelengths)
}

export function objectiveRequests({ metric, illuminance, views }: Objective): MetricRequest[] {
  return views.map(({ theta, phi }) => ({ metric, theta, phi, ...(illuminance !== undefined && { illuminance }) }))
}

function constraintsOf(stack: Stack, paths: readonly string[], limits: readonly Limit[], wavelengths: Float64Array) {
  const experiment = createExperiment(stack, paths, limits, wavelengths)
  const values = new Float64Array(limits.length)
  return (x: Float64Array): number[] => {
    experiment(x, values)
    return limits.map((limit, k) => -limitMargin(limit, values[k]))
  }
}
