/** How the off-state looks from every direction: metrics over the viewing cone, its worst place, its diffuse average. */
import { Scene } from '../appearance/scene.js'
import { ciede2000 } from '../color/ciede2000.js'
import { chroma } from '../color/cielab.js'
import { gaussLegendre } from '../numeric/gaussLegendre.js'
import type { Stack } from '../stack/stack.js'
import { degrees } from './evaluate.js'
import type { Hooks } from './hooks.js'
import { leadingResults, mapInline, type ParallelMap, type Task } from './parallel.js'
import { prepareStack } from './prepareStack.js'

export interface ConeQuestion {
  /** rad; below π/2. */
  readonly thetaMax: number
  /** About; the steps are made even. */
  readonly thetaStep: number
  readonly phiStep: number
  /** Luminous reflectance that counts as dark enough, for the summary; default: the first such limit of the file. */
  readonly limit?: number
}

/** Degrees and fractions; tables are [θ][φ]. */
export interface Cone {
  readonly title: string
  readonly theta_deg: readonly number[]
  readonly phi_deg: readonly number[]
  readonly luminous_reflectance: readonly (readonly number[])[]
  readonly chroma: readonly (readonly number[])[]
  readonly lab: readonly (readonly (readonly number[])[])[]
  /** CIEDE2000 from the head-on color. */
  readonly delta_e00: readonly (readonly number[])[]
  readonly emission_transmittance?: readonly (readonly number[])[]
  readonly ambient_contrast?: readonly {
    readonly illuminance_lx: number
    readonly ratio: readonly (readonly number[])[]
  }[]
  readonly summary: ConeSummary
  readonly interrupted: boolean
}

export interface ConeSummary {
  readonly worst: { readonly theta_deg: number; readonly phi_deg: number; readonly luminous_reflectance: number }
  readonly limit?: number
  /** Share of the cone's solid angle within the limit. */
  readonly share_within_limit?: number
  /** Largest θ up to which every azimuth meets the limit; absent where even head-on does not. */
  readonly theta_within_limit_deg?: number
  /** Luminous reflectance under uniform diffuse light: ∫ R cos θ dΩ / π over the hemisphere. */
  readonly diffuse_reflectance: number
  /** Whether half the azimuths were computed and the others taken from the half-turn symmetry. */
  readonly half_turn_symmetry: boolean
}

interface Shared {
  readonly stack: Stack
  readonly phis: readonly number[]
}

interface Row {
  readonly luminous: number[]
  readonly lab: number[][]
  readonly emission: number[]
  readonly contrast: number[][]
}

/** One θ, all asked φ: layers alike in every azimuth are computed once per row. */
export const coneRow: Task<Shared, number, Row> = {
  name: 'coneRow',
  prepare: async ({ stack, phis }) => {
    await prepareStack(stack)
    return (theta) => {
      const scene = new Scene(stack)
      const row: Row = { luminous: [], lab: [], emission: [], contrast: [] }
      for (const phi of phis) {
        const look = scene.lookOnce(stack, theta, phi)
        row.luminous.push(look.luminousReflectance)
        row.lab.push([...look.lab])
        if (look.luminousEmissionTransmittance === undefined) continue
        row.emission.push(look.luminousEmissionTransmittance)
        if (stack.emission.luminance > 0) {
          row.contrast.push(stack.ambient.map((illuminance) => scene.ambientContrast(stack, look, illuminance)))
        }
      }
      return row
    }
  },
}

export async function cone(
  stack: Stack,
  question: ConeQuestion,
  hooks: Hooks = {},
  map: ParallelMap = mapInline,
): Promise<Cone> {
  const thetas = [...divided(question.thetaMax, question.thetaStep), question.thetaMax]
  const phis = divided(2 * Math.PI, question.phiStep)
  const half = phis.length % 2 === 0 && hasHalfTurnSymmetry(stack, question.thetaMax)
  const computed = half ? phis.slice(0, phis.length / 2) : phis
  const rows = await map(coneRow, { stack, phis: computed }, thetas, hooks)
  const done = leadingResults(rows)
  const whole = <T>(values: readonly T[]): T[] => (half ? [...values, ...values] : [...values])
  const luminous = done.map((row) => whole(row.luminous))
  const lab = done.map((row) => whole(row.lab))
  const headOn = lab[0]?.[0] ?? [0, 0, 0]
  const emits = done[0] !== undefined && done[0].emission.length > 0
  const contrasts = done[0] !== undefined && done[0].contrast.length > 0
  return {
    title: stack.title,
    theta_deg: thetas.slice(0, done.length).map(degrees),
    phi_deg: phis.map(degrees),
    luminous_reflectance: luminous,
    chroma: lab.map((row) => row.map((color) => chroma(color as [number, number, number]))),
    lab,
    delta_e00: lab.map((row) =>
      row.map((color) => ciede2000(headOn as [number, number, number], color as [number, number, number])),
    ),
    ...(emits && { emission_transmittance: done.map((row) => whole(row.emission)) }),
    ...(contrasts && {
      ambient_contrast: stack.ambient.map((illuminance_lx, level) => ({
        illuminance_lx,
        ratio: done.map((row) => whole(row.contrast.map((ratios) => ratios[level]))),
      })),
    }),
    summary: summarize(stack, question, thetas, phis, luminous, half),
    interrupted: done.length < thetas.length,
  }
}

/** From 0 to below `whole`, which even steps divide, as near to `step` as may be. */
function divided(whole: number, step: number): number[] {
  const count = Math.max(1, Math.round(whole / step))
  return Array.from({ length: count }, (_, k) => (k * whole) / count)
}

/**
 * A stack whose layers all have their axes in the film and along its normal is its own image under a half turn about the
 * normal, so every metric repeats after 180°. (With tilted crystals reflectance still does, by reciprocity, emission does
 * not: the whole circle is computed.) The claim is checked on three azimuths at the widest angle before it is used.
 */
function hasHalfTurnSymmetry(stack: Stack, theta: number): boolean {
  if (stack.layers.some((layer) => layer.kind === 'crystal' && layer.tilt !== 0)) return false
  const scene = new Scene(stack)
  return [0.3, 1.2, 2.6].every((phi) => {
    const here = scene.lookOnce(stack, theta, phi)
    const [reflectance, emission] = [here.luminousReflectance, here.luminousEmissionTransmittance ?? 0]
    const there = scene.lookOnce(stack, theta, phi + Math.PI)
    return (
      Math.abs(there.luminousReflectance - reflectance) < 1e-10 &&
      Math.abs((there.luminousEmissionTransmittance ?? 0) - emission) < 1e-10
    )
  })
}

function summarize(
  stack: Stack,
  question: ConeQuestion,
  thetas: readonly number[],
  phis: readonly number[],
  luminous: readonly (readonly number[])[],
  half: boolean,
): ConeSummary {
  let worst = { theta_deg: 0, phi_deg: 0, luminous_reflectance: Number.NEGATIVE_INFINITY }
  luminous.forEach((row, t) => {
    row.forEach((value, p) => {
      if (value <= worst.luminous_reflectance) return
      worst = { theta_deg: degrees(thetas[t]), phi_deg: degrees(phis[p]), luminous_reflectance: value }
    })
  })
  const limit =
    question.limit ?? stack.limits.find((l) => l.metric === 'luminous_reflectance' && l.max !== undefined)?.max
  return {
    worst,
    ...(limit !== undefined && { limit, ...withinLimit(thetas, luminous, limit) }),
    diffuse_reflectance: diffuseReflectance(stack),
    half_turn_symmetry: half,
  }
}

function withinLimit(thetas: readonly number[], luminous: readonly (readonly number[])[], limit: number) {
  const step = thetas.length > 1 ? thetas[1] - thetas[0] : 0
  let solidAngle = 0
  let within = 0
  let largest: number | undefined
  let unbroken = true
  luminous.forEach((row, t) => {
    // The ring of directions nearest to this θ.
    const low = Math.max(0, thetas[t] - step / 2)
    const high = Math.min(thetas[thetas.length - 1], thetas[t] + step / 2)
    const ring = (Math.cos(low) - Math.cos(high)) / row.length
    const good = row.filter((value) => value <= limit).length
    solidAngle += ring * row.length
    within += ring * good
    unbroken = unbroken && good === row.length
    if (unbroken) largest = degrees(thetas[t])
  })
  return {
    share_within_limit: solidAngle > 0 ? within / solidAngle : Number(luminous[0]?.[0] <= limit),
    ...(largest !== undefined && { theta_within_limit_deg: largest }),
  }
}

/** Quadrature of the diffuse average: Gauss–Legendre in cos θ (where R is smooth up to grazing), equal steps in φ. */
const DIFFUSE_POLAR = 16
const DIFFUSE_AZIMUTHS = 12

/** 2 ∫ R(θ) cos θ d(cos θ), averaged over azimuth. */
export function diffuseReflectance(stack: Stack): number {
  const scene = new Scene(stack)
  const { nodes, weights } = gaussLegendre(DIFFUSE_POLAR)
  let sum = 0
  nodes.forEach((cos, k) => {
    for (let m = 0; m < DIFFUSE_AZIMUTHS; m++) {
      // By reciprocity half a turn tells all.
      const look = scene.lookOnce(stack, Math.acos(cos), (Math.PI * m) / DIFFUSE_AZIMUTHS)
      sum += (2 * cos * weights[k] * look.luminousReflectance) / DIFFUSE_AZIMUTHS
    }
  })
  return sum
}
