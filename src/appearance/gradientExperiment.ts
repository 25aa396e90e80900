import { type Response, Sensitivity } from '../optics/sensitivity.js'
import type { Solver } from '../optics/solver.js'
import { compileParameters, compileSetter, findParameter } from '../stack/parameters.js'
import type { Direction, Stack } from '../stack/stack.js'
import type { QuantityKind } from '../units/quantity.js'
import { metricValue } from './metric.js'
import { metricWeights, type SpectralMetric } from './metricWeights.js'
import { type Look, Scene } from './scene.js'

/** Value returned; its derivative by each parameter (per nm, rad, fraction) into `gradient`. */
export type GradientExperiment = (parameters: Float64Array, gradient: Float64Array) => number

/** A view of the metric and its weight in the sum. */
export interface WeightedView extends Direction {
  readonly weight: number
}

/** Half the step of the layers' own central differences: small against a wavelength, a turn, a share. */
export const DIFFERENCE_STEPS: Readonly<Record<QuantityKind, number>> = {
  length: 0.01,
  angle: 1e-5,
  share: 1e-6,
  number: 1e-6,
  illuminance: 1e-3,
  luminance: 1e-3,
  temperature: 1e-3,
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
  const parameters = paths.map((path) => ({
    set: compileSetter(stack, path),
    step: DIFFERENCE_STEPS[findParameter(stack, path)?.kind ?? 'number'],
  }))
  const sensitivities = new Map<Solver, Sensitivity>()
  const change = new Float64Array(scene.wavelengthsNm.length)

  const addGradient = (look: Look, base: Stack, x: Float64Array, weight: number, gradient: Float64Array) => {
    const sensitivity = sensitivityOf(sensitivities, look.solver)
    for (const [response, weights] of Object.entries(metricWeights(scene, look, metric))) {
      sensitivity.prepare(response as Response)
      parameters.forEach(({ set, step }, k) => {
        const plus = scene.variantOf(set(base, x[k] + step), base)
        const minus = scene.variantOf(set(base, x[k] - step), base)
        sensitivity.derivative(plus, minus, 2 * step, change)
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
