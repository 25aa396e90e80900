import { Sensitivity } from '../optics/sensitivity.js'
import type { Solver } from '../optics/solver.js'
import { compileParameters } from '../stack/parameters.js'
import type { Direction, Stack } from '../stack/stack.js'
import { compileDifference } from './parameterDifference.js'
import { Scene } from './scene.js'

/** Reflectance of the stack at measured directions and wavelengths, as a function of some of its parameters. */
export interface SpectrumExperiment {
  /** Reflectances in all, direction after direction. */
  readonly count: number
  readonly reflectance: (parameters: Float64Array, out: Float64Array) => void
  /** `count` rows of one derivative per parameter (per nm, rad, fraction), row-major. */
  readonly jacobian: (parameters: Float64Array, out: Float64Array) => void
}

export interface MeasuredDirection extends Direction {
  readonly wavelengthNm: readonly number[]
}

export function createSpectrumExperiment(
  stack: Stack,
  paths: readonly string[],
  directions: readonly MeasuredDirection[],
): SpectrumExperiment {
  const withParameters = compileParameters(stack, paths)
  const scenes = scenesOf(stack, directions)
  const differences = paths.map((path) => compileDifference(stack, path))
  const sensitivities = new Map<Solver, Sensitivity>()
  const offsets = directions.map((_, d) =>
    directions.slice(0, d).reduce((sum, { wavelengthNm }) => sum + wavelengthNm.length, 0),
  )

  const reflectance = (x: Float64Array, out: Float64Array) => {
    const changed = withParameters(x)
    directions.forEach(({ theta, phi }, d) => {
      out.set(scenes[d].look(changed, theta, phi).reflectance, offsets[d])
    })
  }

  const jacobian = (x: Float64Array, out: Float64Array) => {
    const base = withParameters(x)
    directions.forEach(({ theta, phi, wavelengthNm }, d) => {
      const { solver } = scenes[d].look(base, theta, phi)
      const sensitivity = sensitivities.get(solver) ?? new Sensitivity(solver)
      sensitivities.set(solver, sensitivity)
      sensitivity.prepare('reflectance')
      const change = new Float64Array(wavelengthNm.length)
      differences.forEach((differenceAt, k) => {
        const { plus, minus, apart } = differenceAt(base, x[k])
        sensitivity.derivative(scenes[d].variantOf(plus, base), scenes[d].variantOf(minus, base), apart, change)
        change.forEach((slope, i) => {
          out[(offsets[d] + i) * paths.length + k] = slope
        })
      })
    })
  }

  return { count: directions.reduce((sum, { wavelengthNm }) => sum + wavelengthNm.length, 0), reflectance, jacobian }
}

/** One scene for all directions measured at the same wavelengths. */
function scenesOf(stack: Stack, directions: readonly MeasuredDirection[]): Scene[] {
  const known = new Map<string, Scene>()
  return directions.map(({ wavelengthNm }) => {
    const key = wavelengthNm.join()
    const scene = known.get(key) ?? new Scene(stack, Float64Array.from(wavelengthNm))
    known.set(key, scene)
    return scene
  })
}
