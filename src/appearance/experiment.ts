import { compileParameters } from '../stack/parameters.js'
import type { MetricRequest, Stack } from '../stack/stack.js'
import { metricValue } from './metric.js'
import { Scene } from './scene.js'

/** Sets the parameters (nm, rad, fractions; order of the paths) and writes the requested metrics into `out`. */
export type Experiment = (parameters: ArrayLike<number>, out: Float64Array) => void

/**
 * The stack as a function of some of its parameters, made for being called often: what the parameters at hand do not
 * touch is computed once. `wavelengthsNm` replaces the stack's own (a coarser band screens faster).
 */
export function createExperiment(
  stack: Stack,
  paths: readonly string[],
  requests: readonly MetricRequest[],
  wavelengthsNm?: Float64Array,
): Experiment {
  const withParameters = compileParameters(stack, paths)
  const scene = new Scene(stack, wavelengthsNm)
  const groups = groupByDirection(requests)
  return (parameters, out) => {
    const changed = withParameters(parameters)
    for (const { theta, phi, indices } of groups) {
      const look = scene.look(changed, theta, phi)
      for (const index of indices) out[index] = metricValue(scene, changed, look, requests[index])
    }
  }
}

interface DirectionGroup {
  readonly theta: number
  readonly phi: number
  readonly indices: number[]
}

function groupByDirection(requests: readonly MetricRequest[]): DirectionGroup[] {
  const groups = new Map<string, DirectionGroup>()
  requests.forEach(({ theta, phi }, index) => {
    const key = `${theta},${phi}`
    const group = groups.get(key)
    if (group === undefined) groups.set(key, { theta, phi, indices: [index] })
    else group.indices.push(index)
  })
  return [...groups.values()]
}
