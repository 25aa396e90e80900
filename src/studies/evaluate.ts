/** How dark, how neutral, at what cost: one stack from the directions of its conditions, and its limits. */

import { metricValue } from '../appearance/metric.js'
import { type Look, Scene } from '../appearance/scene.js'
import { chroma } from '../color/cielab.js'
import type { Limit, MetricName, Stack } from '../stack/stack.js'

export interface Evaluation {
  readonly title: string
  readonly directions: readonly DirectionEvaluation[]
  readonly limits: readonly LimitEvaluation[]
}

/** Fractions, nm, degrees; emission is absent over a metal panel, contrast where no luminance is stated. */
export interface DirectionEvaluation {
  readonly theta_deg: number
  readonly phi_deg: number
  readonly luminous_reflectance: number
  readonly color_weighted_reflectance: number
  readonly front_reflectance: number
  readonly inner_reflectance: number
  readonly xyz: readonly number[]
  readonly lab: readonly number[]
  readonly chroma: number
  readonly emission_transmittance?: number
  readonly ambient_contrast?: readonly { readonly illuminance_lx: number; readonly ratio: number }[]
  readonly spectrum: {
    readonly wavelength_nm: readonly number[]
    readonly reflectance: readonly number[]
    readonly front_reflectance: readonly number[]
    readonly emission_transmittance?: readonly number[]
  }
}

/** A limit of the file, its direction in degrees. */
export interface AskedLimit {
  readonly metric: MetricName
  readonly theta_deg: number
  readonly phi_deg: number
  readonly illuminance_lx?: number
  readonly max?: number
  readonly min?: number
}

export interface LimitEvaluation extends AskedLimit {
  readonly value: number
  /** How far inside the limit (negative: by how much it is missed), in the metric's unit. */
  readonly margin: number
  readonly met: boolean
}

/** `scene` is one made for the same conditions, of an earlier state of the stack, say: what did not change is kept. */
export function evaluate(stack: Stack, scene: Scene = new Scene(stack)): Evaluation {
  return {
    title: stack.title,
    directions: stack.conditions.directions.map(({ theta, phi }) =>
      describeLook(scene, stack, scene.look(stack, theta, phi)),
    ),
    limits: stack.limits.map((limit) => evaluateLimit(scene, stack, limit)),
  }
}

function describeLook(scene: Scene, stack: Stack, look: Look): DirectionEvaluation {
  const emission = look.emissionTransmittance
  return {
    theta_deg: degrees(look.theta),
    phi_deg: degrees(look.phi),
    luminous_reflectance: look.luminousReflectance,
    color_weighted_reflectance: look.colorWeightedReflectance,
    front_reflectance: look.luminousFrontReflectance,
    inner_reflectance: look.luminousReflectance - look.luminousFrontReflectance,
    xyz: [...look.xyz],
    lab: [...look.lab],
    chroma: chroma(look.lab),
    ...(emission && { emission_transmittance: look.luminousEmissionTransmittance }),
    ...(emission && stack.emission.luminance > 0 && { ambient_contrast: contrasts(scene, stack, look) }),
    spectrum: {
      wavelength_nm: Array.from(scene.wavelengthsNm),
      reflectance: Array.from(look.reflectance),
      front_reflectance: Array.from(look.frontReflectance),
      ...(emission && { emission_transmittance: Array.from(emission) }),
    },
  }
}

function contrasts(scene: Scene, stack: Stack, look: Look) {
  return stack.ambient.map((illuminance_lx) => ({
    illuminance_lx,
    ratio: scene.ambientContrast(stack, look, illuminance_lx),
  }))
}

export function evaluateLimit(scene: Scene, stack: Stack, limit: Limit): LimitEvaluation {
  const look = scene.look(stack, limit.theta, limit.phi)
  const value = metricValue(scene, stack, look, limit)
  const margin = limitMargin(limit, value)
  return { ...askedLimit(limit), value, margin, met: margin >= 0 }
}

export function askedLimit({ metric, theta, phi, illuminance, max, min }: Limit): AskedLimit {
  return {
    metric,
    theta_deg: degrees(theta),
    phi_deg: degrees(phi),
    ...(illuminance !== undefined && { illuminance_lx: illuminance }),
    ...(max !== undefined && { max }),
    ...(min !== undefined && { min }),
  }
}

/** How far `value` lies inside the limit, in the metric's unit; negative where it is missed. */
export function limitMargin({ max, min }: Limit, value: number): number {
  return Math.min(
    max === undefined ? Number.POSITIVE_INFINITY : max - value,
    min === undefined ? Number.POSITIVE_INFINITY : value - min,
  )
}

/** Degrees without the rounding noise of a conversion there and back (45 deg stays 45). */
export function degrees(rad: number): number {
  return Number.parseFloat(((rad * 180) / Math.PI).toPrecision(14))
}
