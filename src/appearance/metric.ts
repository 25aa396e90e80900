import { chroma } from '../color/cielab.js'
import type { MetricRequest, Stack } from '../stack/stack.js'
import type { Look, Scene } from './scene.js'

/** Value of the requested metric for a look from its direction; NaN where it does not apply (emission over a metal). */
export function metricValue(scene: Scene, stack: Stack, look: Look, request: MetricRequest): number {
  switch (request.metric) {
    case 'luminous_reflectance':
      return look.luminousReflectance
    case 'color_weighted_reflectance':
      return look.colorWeightedReflectance
    case 'front_reflectance':
      return look.luminousFrontReflectance
    case 'inner_reflectance':
      return look.luminousReflectance - look.luminousFrontReflectance
    case 'lightness':
      return look.lab[0]
    case 'a_star':
      return look.lab[1]
    case 'b_star':
      return look.lab[2]
    case 'chroma':
      return chroma(look.lab)
    case 'emission_transmittance':
      return look.luminousEmissionTransmittance ?? Number.NaN
    case 'ambient_contrast':
      return scene.ambientContrast(stack, look, request.illuminance ?? stack.ambient[0] ?? 0)
  }
}
