/**
 * Minimization with a gradient in a box: projected quasi-Newton.
 *
 * In scaled coordinates u (every range is [0, 1]), with g = df/du and B a positive definite model of the Hessian:
 * 1. A bound is active where u lies on it or a hair beside it and -g points out of the box. Active coordinates go to their bound;
 *    for the free ones F the step p solves B_FF p = -g_F (Bertsekas, SIAM J. Control Optim. 20, 221 (1982),
 *    doi:10.1137/0320018: without the hair, steps across a bound leave no room for the others).
 * 2. Along the projected path u(t) = P[u + t p], t is shortened from 1 until f(u(t)) <= f(u) + 1e-4 gᵀ(u(t) - u).
 * 3. B takes up the change y of g over the step s by the BFGS formula, with Powell's damping where sᵀy is too small, so that
 *    B stays positive definite (Nocedal, Wright, Numerical Optimization, 2nd ed., procedure 18.2).
 */
import { CholeskyDecomposition, Matrix } from 'ml-matrix'
import { Recorder } from './recorder.js'
import {
  DEFAULT_TOLERANCE,
  type ObjectiveWithGradient,
  type Reason,
  resolution,
  type SearchOptions,
  type SearchResult,
} from './result.js'
import { Space, type Variable } from './variables.js'

/** Longest first step, and longest step at all, as shares of a variable's range: a polish is to stay in its basin. */
const FIRST_STEP = 0.1
const LONGEST_STEP = 0.3
/** The hair beside a bound. */
const EDGE = 1e-3
const SUFFICIENT_DECREASE = 1e-4
const SHORTEST_SHARE = 1e-10
/** So many steps in turn that gain less than the tolerance end the search: one alone may be the model's fault. */
const QUIET_STEPS = 3
/** Powell's: the least curvature kept, as a share of the model's. */
const DAMPING = 0.2

/** The discrete variables keep the values they have in `start`. An evaluation is a value with its gradient. */
export function quasiNewton(
  objective: ObjectiveWithGradient,
  variables: readonly Variable[],
  start: ArrayLike<number>,
  options: SearchOptions = {},
): SearchResult {
  const space = new Space(variables)
  const gradient = new Float64Array(variables.length)
  const recorder = new Recorder((x) => objective(x, gradient), space.nearest(start), options)
  const descent = new Descent(space, recorder, gradient)
  const tolerance = options.tolerance ?? DEFAULT_TOLERANCE
  const reason = recorder.run(() => descent.run(tolerance))
  const { bestX, bestValue, evaluations } = recorder
  return { x: bestX, value: bestValue, evaluations, iterations: descent.iterations, reason }
}

interface Point {
  /** Scaled coordinates of the continuous variables; those of periodic ones are not wrapped. */
  readonly u: number[]
  readonly value: number
  readonly g: number[]
}

class Descent {
  iterations = 0
  private readonly x: Float64Array
  private hessian: number[][] = []

  constructor(
    private readonly space: Space,
    private readonly recorder: Recorder,
    /** df/dx as the objective left it. */
    private readonly gradient: Float64Array,
  ) {
    this.x = recorder.bestX.slice()
  }

  run(tolerance: number): Reason {
    const { continuous } = this.space
    let here = this.at(continuous.map((i) => this.space.toUnit(i, this.x[i])))
    if (!Number.isFinite(here.value)) return 'stalled'
    this.hessian = firstModel(here.g)
    let quiet = 0
    for (;;) {
      const free = this.freeCoordinates(here)
      const p = this.step(here, free)
      const promised = -dot(here.g, p)
      if (!(promised > resolution(tolerance, here.value))) return 'converged'
      const next = this.search(here, p)
      if (next === undefined) return 'stalled'
      this.iterations++
      this.learn(here, next)
      const gained = here.value - next.value
      here = next
      quiet = gained < resolution(tolerance, here.value) ? quiet + 1 : 0
      if (quiet === QUIET_STEPS) return 'converged'
    }
  }

  private at(u: number[]): Point {
    this.space.continuous.forEach((i, k) => {
      this.x[i] = this.space.fromUnit(i, u[k])
    })
    const value = this.recorder.at(this.x)
    return { u, value, g: this.space.continuous.map((i) => this.gradient[i] * this.space.width[i]) }
  }

  private freeCoordinates({ u, g }: Point): number[] {
    const isFree = (k: number): boolean =>
      this.space.isPeriodic(this.space.continuous[k]) || !((u[k] <= EDGE && g[k] > 0) || (u[k] >= 1 - EDGE && g[k] < 0))
    return u.map((_, k) => k).filter(isFree)
  }

  /** The quasi-Newton step of the free coordinates, the way to the bound for the others; no longer than allowed. */
  private step({ u, g }: Point, free: readonly number[]): number[] {
    const p = u.map((component, k) => (free.includes(k) ? 0 : (g[k] > 0 ? 0 : 1) - component))
    if (free.length === 0) return p
    const solved = this.factored(free, g).solve(Matrix.columnVector(free.map((k) => -g[k])))
    free.forEach((k, row) => {
      p[k] = solved.get(row, 0)
    })
    const shorten = Math.min(1, LONGEST_STEP / largest(p))
    return p.map((component) => component * shorten)
  }

  /** B_FF; where rounding has cost it its definiteness, the model begins anew. */
  private factored(free: readonly number[], g: readonly number[]): CholeskyDecomposition {
    const factor = () => new CholeskyDecomposition(new Matrix(free.map((a) => free.map((b) => this.hessian[a][b]))))
    const known = factor()
    if (known.isPositiveDefinite()) return known
    this.hessian = firstModel(g)
    return factor()
  }

  /** The first point along the projected path that is better by enough; undefined where none is. */
  private search(here: Point, p: readonly number[]): Point | undefined {
    for (let t = 1; t > SHORTEST_SHARE; ) {
      const u = here.u.map((component, k) => this.project(k, component + t * p[k]))
      const next = this.at(u)
      const slope = dot(here.g, difference(u, here.u))
      if (next.value <= here.value + SUFFICIENT_DECREASE * slope) return next
      // Least point of the parabola through both values and the slope, kept between a tenth and a half.
      const wanted = -slope / (2 * (next.value - here.value - slope))
      t *= Math.min(0.5, Math.max(0.1, Number.isFinite(wanted) ? wanted : 0.1))
    }
    return undefined
  }

  private project(k: number, u: number): number {
    return this.space.isPeriodic(this.space.continuous[k]) ? u : Math.min(1, Math.max(0, u))
  }

  /** BFGS with Powell's damping; the first step also sets the scale of the model. */
  private learn(before: Point, after: Point): void {
    const s = difference(after.u, before.u)
    const y = difference(after.g, before.g)
    const scale = dot(y, y) / dot(s, y)
    if (this.iterations === 1 && scale > 0 && Number.isFinite(scale)) this.hessian = diagonal(s.length, scale)
    const bs = this.hessian.map((row) => dot(row, s))
    const model = dot(s, bs)
    if (!(model > 0)) return
    const curvature = dot(s, y)
    const share = curvature >= DAMPING * model ? 1 : ((1 - DAMPING) * model) / (model - curvature)
    const r = y.map((component, k) => share * component + (1 - share) * bs[k])
    const sr = dot(s, r)
    const learned = this.hessian.map((row, a) => row.map((b, k) => b - (bs[a] * bs[k]) / model + (r[a] * r[k]) / sr))
    // Steps and slopes may be so small that their products vanish.
    if (learned.flat().every(Number.isFinite)) this.hessian = learned
  }
}

/** A model by which the first step is as long as allowed. */
function firstModel(g: readonly number[]): number[][] {
  return diagonal(g.length, (largest(g) || 1) / FIRST_STEP)
}

function diagonal(size: number, value: number): number[][] {
  return Array.from({ length: size }, (_, a) => Array.from({ length: size }, (__, b) => (a === b ? value : 0)))
}

function dot(a: readonly number[], b: readonly number[]): number {
  return a.reduce((sum, component, k) => sum + component * b[k], 0)
}

function difference(a: readonly number[], b: readonly number[]): number[] {
  return a.map((component, k) => component - b[k])
}

function largest(values: readonly number[]): number {
  return values.reduce((most, value) => Math.max(most, Math.abs(value)), 0)
}
