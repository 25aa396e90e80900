import { fitFromStarts } from '../search/fitFromStarts.js'
import { parameterPaths } from '../stack/parameters.js'
import type { FitQuestion, Range, Stack } from '../stack/stack.js'
import { toPlain } from '../units/quantity.js'
import { fitProblem, type Measured } from './fitProblem.js'
import type { Hooks } from './hooks.js'
import { leadingResults, type ParallelMap, type Task } from './parallel.js'
import { prepareStack } from './prepareStack.js'

/** One thing that may have gone wrong, everything else as the file has it. */
export interface SingleFault {
  /** `nothing`, or the parameter(s) that were let free. */
  readonly fault: string
  readonly parameters: Readonly<Record<string, number>>
  /** Root mean square of measured less model, a reflectance. */
  readonly residual_rms: number
  /**
   * Bayesian information criterion, less that of the best: n ln(RSS/n) + k ln n, or χ² + k ln n where the noise is stated
   * (G. Schwarz, Ann. Stat. 6, 461 (1978)). Above about 10 the fault is very unlikely beside the best
   * (R. E. Kass, A. E. Raftery, J. Am. Stat. Assoc. 90, 773 (1995)).
   */
  readonly delta_bic: number
}

/** How far each field is let move about the file's value: angles ±10°, lengths ±20 %, ratios ±0.15, shares 0 to 1. */
const REACH: Readonly<Record<string, (value: number) => Range>> = {
  slow_axis: around(Math.PI / 18),
  absorption_axis: around(Math.PI / 18),
  azimuth: around(Math.PI / 18),
  retardance: (value) => ({ from: value - 0.2 * Math.abs(value), to: value + 0.2 * Math.abs(value) }),
  re450: around(0.15),
  re650: around(0.15),
  reflectance: () => ({ from: 0, to: 1 }),
  depolarized: () => ({ from: 0, to: 1 }),
}

function around(reach: number): (value: number) => Range {
  return (value) => ({ from: value - reach, to: value + reach })
}

type ScoredFault = Omit<SingleFault, 'delta_bic'> & { readonly bic: number }

interface Candidate {
  readonly fault: string
  readonly vary: Readonly<Record<string, Range>>
}

interface Shared {
  readonly stack: Stack
  readonly measured: Measured
  readonly noise?: number
}

export const fitSingleFault: Task<Shared, Candidate, ScoredFault> = {
  name: 'fitSingleFault',
  prepare: async ({ stack, measured, noise }) => {
    await prepareStack(stack)
    return ({ fault, vary }) => ({ fault, ...fitFault(stack, measured, { vary, noise }) })
  },
}

/** Best first; `nothing` among them. */
export async function singleFaults(
  stack: Stack,
  measured: Measured,
  { noise }: FitQuestion,
  hooks: Hooks,
  map: ParallelMap,
): Promise<SingleFault[]> {
  const candidates = [{ fault: 'nothing', vary: {} }, ...faultsOf(stack)]
  const fits = leadingResults(await map(fitSingleFault, { stack, measured, noise }, candidates, hooks))
  const best = Math.min(...fits.map(({ bic }) => bic))
  return fits
    .map(({ bic, ...fault }) => ({ ...fault, delta_bic: bic - best }))
    .sort((a, b) => a.delta_bic - b.delta_bic)
}

function fitFault(stack: Stack, measured: Measured, question: FitQuestion) {
  const problem = fitProblem(stack, measured, question)
  const paths = Object.keys(question.vary)
  const info = new Map(parameterPaths(stack).map((parameter) => [parameter.path, parameter]))
  const start = paths.map((path) => info.get(path)?.value ?? 0)
  const { x, value } = paths.length === 0 ? atNominal(problem) : fitFromStarts(problem, { start, starts: 2 })
  const n = problem.count
  const squares = 2 * value
  const misfit = question.noise === undefined ? n * Math.log(Math.max(squares, Number.MIN_VALUE) / n) : squares
  return {
    parameters: Object.fromEntries(paths.map((path, k) => [path, toPlain(x[k], info.get(path)?.kind ?? 'number')])),
    residual_rms: Math.sqrt(squares / n) * (question.noise ?? 1),
    bic: misfit + paths.length * Math.log(n),
  }
}

function atNominal(problem: ReturnType<typeof fitProblem>) {
  const residuals = new Float64Array(problem.count)
  const x = new Float64Array(0)
  problem.residuals(x, residuals)
  return { x, value: residuals.reduce((sum, r) => sum + r * r, 0) / 2 }
}

/** Angle, retardance and dispersion of each film, and the panel. */
function faultsOf(stack: Stack): Candidate[] {
  const parameters = parameterPaths(stack).filter(({ path }) => fieldOf(path) in REACH && !isIdleFilm(stack, path))
  const groups = new Map<string, Record<string, Range>>()
  for (const { path, value } of parameters) {
    const fault = path.replace(/\.re(450|650)$/, '')
    groups.set(fault, { ...groups.get(fault), [path]: REACH[fieldOf(path)](value) })
  }
  return [...groups].map(([fault, vary]) => ({ fault, vary }))
}

function fieldOf(path: string): string {
  return path.slice(path.lastIndexOf('.') + 1)
}

/** A film without in-plane retardance has no axis, retardance or dispersion to get wrong. */
function isIdleFilm(stack: Stack, path: string): boolean {
  const layer = stack.layers.find(({ id }) => path.startsWith(`${id}.`))
  return layer?.kind === 'retarder' && layer.retardance === 0
}
