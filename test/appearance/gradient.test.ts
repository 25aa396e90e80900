/**
 * The adjoint gradient against differences of the experiment itself, of which it knows nothing: central differences at two
 * steps, extrapolated (L. F. Richardson, Phil. Trans. R. Soc. A 210, 307 (1911)).
 */
import { describe, expect, it } from 'vitest'
import { createExperiment } from '../../src/appearance/experiment.js'
import { createGradientExperiment } from '../../src/appearance/gradientExperiment.js'
import type { SpectralMetric } from '../../src/appearance/metricWeights.js'
import { createSpectrumExperiment } from '../../src/appearance/spectrumExperiment.js'
import { type ParameterInfo, parameterPaths } from '../../src/stack/parameters.js'
import type { Stack } from '../../src/stack/stack.js'
import { DEMO_STACKS, demoStack } from '../stacks/demoStacks.js'

const WAVELENGTHS_NM = [440, 520, 560, 610, 680]
const DEG = Math.PI / 180
const VIEWS = [
  { theta: 0, phi: 0, weight: 2 },
  { theta: 40 * DEG, phi: 25 * DEG, weight: -0.7 },
]
const METRICS: readonly SpectralMetric[] = [
  'luminous_reflectance',
  'color_weighted_reflectance',
  'front_reflectance',
  'inner_reflectance',
  'lightness',
  'a_star',
  'b_star',
  'chroma',
  'emission_transmittance',
]

/** A step is this share of the range where a hand on a knob would look, less where the physical range ends sooner. */
const STEP_SHARE = 2e-4
const TOLERANCE = 1e-6

/** Shares go to 1, the numbers of CIELAB to 100: dark colors to a tenth of that. */
function scaleOf(metric: SpectralMetric): number {
  return metric.includes('_') && !metric.endsWith('_star') ? 1 : 10
}

interface Moved extends ParameterInfo {
  readonly step: number
}

/** Parameters that move what is seen, each under one name, and have room on both sides. */
function movable(stack: Stack): Moved[] {
  const all = parameterPaths(stack)
  const has = (path: string): boolean => all.some((other) => other.path === path)
  const isAlias = (path: string): boolean =>
    (path.endsWith('.n') && has(path.slice(0, -2))) || (path.endsWith('.rth') && has(path.replace(/rth$/, 'nz')))
  return all
    .filter(({ path }) => !path.startsWith('emission.') && !isAlias(path))
    .map((parameter) => {
      const { value, range, usual } = parameter
      const room = Math.min(value - range[0], range[1] - value)
      return { ...parameter, step: Math.min(STEP_SHARE * (usual[1] - usual[0]), 0.02 * room) }
    })
    .filter(({ step }) => step > 0)
}

/** df/dx of each parameter, in rows as long as f's values. */
function differences(f: (x: Float64Array) => Float64Array, x: Float64Array, steps: readonly number[]): Float64Array[] {
  const central = (k: number, h: number) => {
    const [above, below] = [f(x.with(k, x[k] + h)), f(x.with(k, x[k] - h))]
    return above.map((value, i) => (value - below[i]) / (2 * h))
  }
  return steps.map((step, k) => {
    const [coarse, fine] = [central(k, step), central(k, step / 2)]
    return fine.map((value, i) => (4 * value - coarse[i]) / 3)
  })
}

describe.each(DEMO_STACKS)('%s', (name) => {
  it('has the gradient of every metric by every parameter', async () => {
    const stack = await demoStack(name)
    const parameters = movable(stack)
    const paths = parameters.map(({ path }) => path)
    const x = Float64Array.from(parameters, ({ value }) => value)
    const metrics = METRICS.filter((metric) => metric !== 'emission_transmittance' || stack.panel.kind === 'mirror')
    const wavelengths = Float64Array.from(WAVELENGTHS_NM)
    const requests = metrics.flatMap((metric) => VIEWS.map(({ theta, phi }) => ({ metric, theta, phi })))
    const experiment = createExperiment(stack, paths, requests, wavelengths)
    const sums = (at: Float64Array): Float64Array => {
      const values = new Float64Array(requests.length)
      experiment(at, values)
      return Float64Array.from(metrics, (_, m) =>
        VIEWS.reduce((sum, { weight }, v) => sum + weight * values[m * VIEWS.length + v], 0),
      )
    }
    const expected = differences(
      sums,
      x,
      parameters.map(({ step }) => step),
    )
    const values = sums(x)
    metrics.forEach((metric, m) => {
      const gradient = new Float64Array(paths.length)
      const value = createGradientExperiment(stack, paths, metric, VIEWS, wavelengths)(x, gradient)
      expect(value).toBeCloseTo(values[m], 12)
      paths.forEach((path, k) => {
        // Over the knob's whole turn, as a share of the metric's scale: more where the metric is more or turns faster.
        const turn = parameters[k].step / STEP_SHARE
        const error = Math.abs(gradient[k] - expected[k][m]) * turn
        expect(error, `${metric} by ${path}: ${gradient[k]}, not ${expected[k][m]}`).toBeLessThan(
          TOLERANCE * Math.max(Math.abs(value), Math.abs(expected[k][m]) * turn, scaleOf(metric)),
        )
      })
    })
  })

  it('has the slopes of its spectra by every parameter', async () => {
    const stack = await demoStack(name)
    const parameters = movable(stack)
    const paths = parameters.map(({ path }) => path)
    const x = Float64Array.from(parameters, ({ value }) => value)
    // Two directions of like wavelengths share their scene, the third does not.
    const experiment = createSpectrumExperiment(stack, paths, [
      { theta: 0, phi: 0, wavelengthNm: WAVELENGTHS_NM },
      { theta: 40 * DEG, phi: 25 * DEG, wavelengthNm: WAVELENGTHS_NM },
      { theta: 60 * DEG, phi: -70 * DEG, wavelengthNm: [455, 633] },
    ])
    expect(experiment.count).toBe(12)
    const spectra = (at: Float64Array): Float64Array => {
      const out = new Float64Array(experiment.count)
      experiment.reflectance(at, out)
      return out
    }
    const jacobian = new Float64Array(experiment.count * paths.length)
    experiment.jacobian(x, jacobian)
    const expected = differences(
      spectra,
      x,
      parameters.map(({ step }) => step),
    )
    paths.forEach((path, k) => {
      const turn = parameters[k].step / STEP_SHARE
      expected[k].forEach((slope, i) => {
        const error = Math.abs(jacobian[i * paths.length + k] - slope) * turn
        expect(error, `${path}, reading ${i}`).toBeLessThan(TOLERANCE * Math.max(Math.abs(slope) * turn, 1))
      })
    })
  })
})
