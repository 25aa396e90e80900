/** How the off-state looks from every direction: metrics over the viewing cone, its worst place, its diffuse average. */
import { Scene } from '../appearance/scene.js'
import { ciede2000 } from '../color/ciede2000.js'
import { chroma } from '../color/cielab.js'
import type { Stack } from '../stack/stack.js'
import { type ConeSummary, diffuseReflectance, summarizeCone } from './coneSummary.js'
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

/** Degrees and fractions. */
export interface Cone extends ConeTables {
  readonly title: string
  readonly theta_deg: readonly number[]
  readonly phi_deg: readonly number[]
  readonly summary: ConeSummary
  readonly interrupted: boolean
}

/** Each [θ][φ]. */
interface ConeTables {
  readonly luminous_reflectance: readonly (readonly number[])[]
  readonly chroma: readonly (readonly number[])[]
  readonly lab: readonly (readonly Lab[])[]
  /** CIEDE2000 from the head-on color. */
  readonly delta_e00: readonly (readonly number[])[]
  readonly emission_transmittance?: readonly (readonly number[])[]
  readonly ambient_contrast?: readonly {
    readonly illuminance_lx: number
    readonly ratio: readonly (readonly number[])[]
  }[]
}

type Lab = readonly [number, number, number]

interface Shared {
  readonly stack: Stack
  readonly phis: readonly number[]
}

interface Row {
  readonly luminous: number[]
  readonly lab: Lab[]
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
        row.lab.push(look.lab)
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

/** The diffuse average, beside the rows: it looks from directions of its own. */
export const diffuseAverage: Task<{ readonly stack: Stack }, null, number> = {
  name: 'diffuseAverage',
  prepare: async ({ stack }) => {
    await prepareStack(stack)
    return () => diffuseReflectance(stack)
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
  // Asked for first: workers start on it while the symmetry is looked into here.
  const diffusing = map(diffuseAverage, { stack }, [null], { stopped: hooks.stopped })
  const half = phis.length % 2 === 0 && hasHalfTurnSymmetry(stack, question.thetaMax)
  const computed = half ? phis.slice(0, phis.length / 2) : phis
  const shared = { stack, phis: computed }
  const [asked, [diffuse]] = await Promise.all([map(coneRow, shared, thetas, hooks), diffusing])
  const rings = leadingResults(asked)
  // Head-on there is always something to tell, however early the study was stopped.
  const done = rings.length > 0 ? rings : leadingResults(await mapInline(coneRow, shared, thetas.slice(0, 1)))
  const tables = tablesOf(stack, done, half ? 2 : 1)
  const summary = summarizeCone(stack, { thetas, phis, luminous: tables.luminous_reflectance }, question.limit)
  return {
    title: stack.title,
    theta_deg: thetas.slice(0, done.length).map(degrees),
    phi_deg: phis.map(degrees),
    ...tables,
    summary: { ...summary, diffuse_reflectance: diffuse ?? diffuseReflectance(stack), half_turn_symmetry: half },
    interrupted: done.length < thetas.length,
  }
}

/** The metrics as [θ][φ]; each row stands for `turns` equal parts of the circle. */
function tablesOf({ ambient }: Stack, rows: readonly Row[], turns: 1 | 2): ConeTables {
  const whole = <T>(values: readonly T[]): T[] => (turns === 2 ? [...values, ...values] : [...values])
  const lab = rows.map((row) => whole(row.lab))
  const headOn = lab[0]?.[0] ?? [0, 0, 0]
  return {
    luminous_reflectance: rows.map((row) => whole(row.luminous)),
    chroma: lab.map((row) => row.map(chroma)),
    lab,
    delta_e00: lab.map((row) => row.map((color) => ciede2000(headOn, color))),
    ...(rows[0]?.emission.length > 0 && { emission_transmittance: rows.map((row) => whole(row.emission)) }),
    ...(rows[0]?.contrast.length > 0 && {
      ambient_contrast: ambient.map((illuminance_lx, level) => ({
        illuminance_lx,
        ratio: rows.map((row) => whole(row.contrast.map((ratios) => ratios[level]))),
      })),
    }),
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
