import { type Response, Sensitivity } from '../optics/sensitivity.js'
import type { Solver } from '../optics/solver.js'
import { compileParameters } from '../stack/parameters.js'
import type { Direction, Stack } from '../stack/stack.js'
import { metricValue } from './metric.js'
import { metricWeights, type SpectralMetric } from './metricWeights.js'
import { compileDifference } from './parameterDifference.js'
import { type Look, Scene } from './scene.js'

/** Value returned; its derivative by each parameter (per nm, rad, fraction) into `gradient`. */
export type GradientExperiment = (parameters: Float64Array, gradient: Float64Array) => number

/** A view of the metric and its weight in the sum. */
export interface WeightedView extends Direction {
  readonly weight: number
}

/**
 * Weighted sum of one metric over views, with its gradient by the adjoint of the adding recursion: about two evaluations
 * plus a quarter of one per parameter, whatever the stack.
 */
export function createGradientExperiment(
  stack: Stack,
  paths: readonly string[],
  metric: SpectralMetric,
  views: readonly WeightedView[],
  wavelengthsNm?: Float64Array,
): GradientExperiment {
  const scene = new Scene(stack, wavelengthsNm)
  const withParameters = compileParameters(stack, paths)
  const differences = paths.map((path) => compileDifference(stack, path))
  const sensitivities = new Map<Solver, Sensitivity>()
  const change = new Float64Array(scene.wavelengthsNm.length)

  const addGradient = (look: Look, base: Stack, x: Float64Array, weight: number, gradient: Float64Array) => {
    const sensitivity = sensitivityOf(sensitivities, look.solver)
    for (const [response, weights] of Object.entries(metricWeights(scene, look, metric))) {
      sensitivity.prepare(response as Response)
      differences.forEach((differenceAt, k) => {
        const { plus, minus, apart } = differenceAt(base, x[k])
        sensitivity.derivative(scene.variantOf(plus, base), scene.variantOf(minus, base), apart, change)
        gradient[k] += weight * dot(weights, change)
      })
    }
  }

  return (x, gradient) => {
    gradient.fill(0)
    const base = withParameters(x)
    let sum = 0
    for (const { theta, phi, weight } of views) {
      const look = scene.look(base, theta, phi)
      sum += weight * metricValue(scene, base, look, { metric, theta, phi })
      addGradient(look, base, x, weight, gradient)
    }
    return sum
  }
}

function sensitivityOf(known: Map<Solver, Sensitivity>, solver: Solver): Sensitivity {
  let found = known.get(solver)
  if (found === undefined) {
    found = new Sensitivity(solver)
    known.set(solver, found)
  }
  return found
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0
  for (let i = 0; i < a.length; i++) sum += a[i] * b[i]
  return sum
}
