import { xyzToLab } from '../color/cielab.js'
import type { MetricName } from '../stack/stack.js'
import type { Look, Scene } from './scene.js'

/** How a metric answers to small changes of the spectra: dm = Σ weight dR over wavelength, summed over the responses. */
export interface MetricWeights {
  readonly reflectance?: Float64Array
  readonly front_reflectance?: Float64Array
  readonly emission?: Float64Array
}

/** Metrics whose derivative follows from one direction's spectra. */
export type SpectralMetric = Exclude<MetricName, 'ambient_contrast'>

export function isSpectral(metric: MetricName): metric is SpectralMetric {
  return metric !== 'ambient_contrast'
}

export function metricWeights(scene: Scene, look: Look, metric: SpectralMetric): MetricWeights {
  const { weights, emissionWeights } = scene
  const luminous = (sign: number) => weights.y.map((value) => (sign * value) / 100)
  switch (metric) {
    case 'luminous_reflectance':
      return { reflectance: luminous(1) }
    case 'front_reflectance':
      return { front_reflectance: luminous(1) }
    case 'inner_reflectance':
      return { reflectance: luminous(1), front_reflectance: luminous(-1) }
    case 'emission_transmittance':
      return { emission: emissionWeights.map((value) => value / 100) }
    case 'color_weighted_reflectance': {
      const [wx, wy, wz] = scene.colorWeights
      const sum = wx + wy + wz
      const [xn, yn, zn] = weights.whiteXyz
      return { reflectance: combine(scene, [wx / xn / sum, wy / yn / sum, wz / zn / sum]) }
    }
    case 'lightness':
    case 'a_star':
    case 'b_star':
    case 'chroma':
      return { reflectance: combine(scene, labSlopes(look, weights.whiteXyz, metric)) }
  }
}

function combine({ weights }: Scene, [x, y, z]: readonly [number, number, number]): Float64Array {
  return weights.x.map((value, i) => x * value + y * weights.y[i] + z * weights.z[i])
}

type Triple = readonly [number, number, number]

/** d(metric)/d(X, Y, Z), by central differences of the closed form (its cube roots are smooth where there is light). */
function labSlopes({ xyz }: Look, white: Triple, metric: 'lightness' | 'a_star' | 'b_star' | 'chroma'): Triple {
  const value = (shifted: Triple) => {
    const [lightness, a, b] = xyzToLab(shifted, white)
    return { lightness, a_star: a, b_star: b, chroma: Math.sqrt(a * a + b * b) }[metric]
  }
  return [0, 1, 2].map((axis) => {
    const h = 1e-5 * Math.max(1e-3, xyz[axis])
    const at = (sign: number) => value(xyz.map((c, k) => (k === axis ? c + sign * h : c)) as unknown as Triple)
    return (at(1) - at(-1)) / (2 * h)
  }) as unknown as Triple
}
