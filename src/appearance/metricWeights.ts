import { chroma, compressionSlopes } from '../color/cielab.js'
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

/** d(metric)/d(X, Y, Z), from the differentials of L*, a*, b* and of C*ab = √(a*² + b*²); zero at the tip of the cone C*ab = 0. */
function labSlopes({ xyz, lab }: Look, white: Triple, metric: 'lightness' | 'a_star' | 'b_star' | 'chroma'): Triple {
  const [fx, fy, fz] = compressionSlopes(xyz, white)
  const a: Triple = [500 * fx, -500 * fy, 0]
  const b: Triple = [0, 200 * fy, -200 * fz]
  switch (metric) {
    case 'lightness':
      return [0, 116 * fy, 0]
    case 'a_star':
      return a
    case 'b_star':
      return b
    case 'chroma': {
      const size = chroma(lab) || 1
      const along = (axis: 0 | 1 | 2) => (lab[1] * a[axis] + lab[2] * b[axis]) / size
      return [along(0), along(1), along(2)]
    }
  }
}
