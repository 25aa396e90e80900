/**
 * How the metrics move along one or two axes: any parameter of the stack, the direction (`theta`, `phi`), or the center of
 * a `wavelength` band. Links let other parameters follow (a laminate turned as one).
 */
import { metricValue } from '../appearance/metric.js'
import { Scene } from '../appearance/scene.js'
import { formulaAt, prepareFormula } from '../materials/formula.js'
import { compileParameters } from '../stack/parameters.js'
import type { MetricRequest, Stack } from '../stack/stack.js'
import { fromPlain, type QuantityKind, toPlain } from '../units/quantity.js'
import { degrees } from './evaluate.js'
import type { Hooks } from './hooks.js'
import { metricKey } from './metricKey.js'
import { leadingResults, mapInline, type ParallelMap, type Task } from './parallel.js'
import { prepareStack } from './prepareStack.js'

export interface SweepAxis {
  /** A parameter path, `theta`, `phi` or `wavelength`. */
  readonly path: string
  readonly kind: QuantityKind
  /** nm, rad, fractions. */
  readonly values: readonly number[]
}

/** A parameter that follows the axes: an expression in their paths, in nm, degrees, fractions. */
export interface SweepLink {
  readonly path: string
  readonly kind: QuantityKind
  readonly expression: string
}

export interface SweepQuestion {
  /** One or two; the first runs slowest. */
  readonly axes: readonly SweepAxis[]
  readonly links: readonly SweepLink[]
  readonly requests: readonly MetricRequest[]
  /** Width of the band around a `wavelength`, nm. */
  readonly bandNm: number
}

export interface Sweep {
  readonly title: string
  /** Where all metrics look from; absent where they differ, and of what an axis varies. */
  readonly theta_deg?: number
  readonly phi_deg?: number
  /** Values in nm, degrees, fractions. */
  readonly axes: readonly { readonly path: string; readonly unit: QuantityKind; readonly values: readonly number[] }[]
  /** One number per point of the grid, the last axis running fastest. */
  readonly metrics: Readonly<Record<string, readonly number[]>>
  readonly interrupted: boolean
}

interface Shared {
  readonly stack: Stack
  readonly question: SweepQuestion
}

const DIRECTION_AXES = ['theta', 'phi', 'wavelength']

/** A block of points of the grid, by index; returns the metrics of each point in turn. */
export const sweepBlock: Task<Shared, { from: number; to: number }, number[]> = {
  name: 'sweepBlock',
  prepare: async ({ stack, question }) => {
    await prepareStack(stack)
    const { axes, links } = question
    const variables = axes.map((axis) => axis.path)
    for (const link of links) await prepareFormula(link.expression, variables)
    const parameterAxes = axes.filter((axis) => !DIRECTION_AXES.includes(axis.path))
    const paths = [...parameterAxes.map((axis) => axis.path), ...links.map((link) => link.path)]
    const withParameters = compileParameters(stack, paths)
    const stackAt = (at: Place): Stack => {
      const plain = plainValues(axes, at)
      const linked = links.map((link) => fromPlain(formulaAt(link.expression, plain, variables), link.kind))
      return withParameters([...parameterAxes.map((axis) => at[axis.path]), ...linked])
    }
    return ({ from, to }) => {
      const out: number[] = []
      let scene = new Scene(stack)
      for (let point = from; point < to; point++) {
        const at = gridPoint(axes, point)
        if (at.wavelength !== undefined) scene = new Scene(stack, band(at.wavelength, question.bandNm))
        out.push(...metricsAt(scene, stackAt(at), at, question.requests))
      }
      return out
    }
  },
}

/** Where on the axes, by their paths: nm, rad, fractions. */
type Place = Readonly<Record<string, number>>

function metricsAt(scene: Scene, stack: Stack, at: Place, requests: readonly MetricRequest[]): number[] {
  // Directions that do not come again keep no solver.
  const moving = DIRECTION_AXES.some((name) => at[name] !== undefined)
  return requests.map((request) => {
    const { theta, phi } = { ...request, ...at }
    const look = moving ? scene.lookOnce(stack, theta, phi) : scene.look(stack, theta, phi)
    return metricValue(scene, stack, look, { ...request, theta, phi })
  })
}

/** Points handed out at once. */
const BLOCK = 32

export async function sweep(
  stack: Stack,
  question: SweepQuestion,
  hooks: Hooks = {},
  map: ParallelMap = mapInline,
): Promise<Sweep> {
  const count = question.axes.reduce((product, axis) => product * axis.values.length, 1)
  const blocks = Array.from({ length: Math.ceil(count / BLOCK) }, (_, k) => ({
    from: k * BLOCK,
    to: Math.min(count, (k + 1) * BLOCK),
  }))
  const results = await map(sweepBlock, { stack, question }, blocks, hooks)
  const done = leadingResults(results)
  const values = done.flat()
  const width = question.requests.length
  const names = question.requests.map((request) => metricKey(request, question.requests))
  return {
    title: stack.title,
    ...sharedDirection(question),
    axes: question.axes.map(({ path, kind, values: axisValues }) => ({
      path,
      unit: kind,
      values: axisValues.map((value) => toPlain(value, kind)),
    })),
    metrics: Object.fromEntries(names.map((name, m) => [name, values.filter((_, k) => k % width === m)])),
    interrupted: done.length < blocks.length,
  }
}

function sharedDirection({ axes, requests }: SweepQuestion): Pick<Sweep, 'theta_deg' | 'phi_deg'> {
  const shared = (name: 'theta' | 'phi') =>
    axes.every(({ path }) => path !== name) && requests.every((request) => request[name] === requests[0][name])
  return {
    ...(shared('theta') && { theta_deg: degrees(requests[0].theta) }),
    ...(shared('phi') && { phi_deg: degrees(requests[0].phi) }),
  }
}

function gridPoint(axes: readonly SweepAxis[], point: number): Place {
  const at: Record<string, number> = {}
  let rest = point
  for (const { path, values } of [...axes].reverse()) {
    at[path] = values[rest % values.length]
    rest = Math.floor(rest / values.length)
  }
  return at
}

function plainValues(axes: readonly SweepAxis[], at: Place): Record<string, number> {
  return Object.fromEntries(axes.map(({ path, kind }) => [path, toPlain(at[path], kind)]))
}

/** Five wavelengths evenly through the band. */
function band(centerNm: number, widthNm: number): Float64Array {
  return Float64Array.from([-0.4, -0.2, 0, 0.2, 0.4], (share) => centerNm + share * widthNm)
}
