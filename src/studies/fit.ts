/**
 * Which layer went wrong: the parameters of a measured sample, how surely they are known, what the measurement cannot tell
 * apart, and which single fault would explain it best.
 */
import { createSpectrumExperiment } from '../appearance/spectrumExperiment.js'
import { fitFromStarts, type StartsResult } from '../search/fitFromStarts.js'
import { findParameter, getParameter, setParameters } from '../stack/parameters.js'
import { InputError } from '../stack/problem.js'
import type { FitQuestion, Stack } from '../stack/stack.js'
import { type QuantityKind, toPlain } from '../units/quantity.js'
import { degrees } from './evaluate.js'
import { fitProblem, type Measured } from './fitProblem.js'
import type { Hooks } from './hooks.js'
import { mapInline, type ParallelMap, type Task } from './parallel.js'
import { prepareStack } from './prepareStack.js'
import { optionProblem } from './readVary.js'
import { type SingleFault, singleFaults } from './singleFaults.js'
import { stageHooks } from './stageHooks.js'
import { type Unresolved, unresolvedCombinations } from './unresolved.js'

export interface FitSettings {
  readonly seed: number
  /** Starts besides the file's values; default 8. */
  readonly starts?: number
}

/** Parameters in nm, degrees, fractions. */
export interface Fit {
  readonly title: string
  readonly parameters: Readonly<Record<string, FittedParameter>>
  /** Root mean square of measured less model, a reflectance. */
  readonly residual_rms: number
  /** Standard deviation of one reading the errors rest on: stated in the file, or estimated from the residuals. */
  readonly noise: number
  readonly noise_is_stated: boolean
  readonly correlation: { readonly parameters: readonly string[]; readonly matrix: readonly (readonly number[])[] }
  readonly unresolved: readonly Unresolved[]
  readonly single_faults: readonly SingleFault[]
  readonly directions: readonly FittedDirection[]
  /** Other sets of parameters that explain the sample nearly as well. */
  readonly solutions: readonly {
    readonly parameters: Readonly<Record<string, number>>
    readonly residual_rms: number
  }[]
  readonly evaluations: number
  readonly reason: StartsResult['reason']
  readonly interrupted: boolean
}

export interface FittedParameter {
  readonly value: number
  /** One standard deviation; null where the data hold the parameter at a bound. */
  readonly std_error: number | null
  /** What the stack file says. */
  readonly nominal: number
}

export interface FittedDirection {
  readonly theta_deg: number
  readonly phi_deg: number
  readonly wavelength_nm: readonly number[]
  readonly measured: readonly number[]
  readonly model: readonly number[]
}

interface Shared {
  readonly stack: Stack
  readonly question: FitQuestion
  readonly measured: Measured
}

type StartsSettings = FitSettings & { readonly maxEvaluations?: number }

/** The fit of all parameters, from every start. */
export const fitParameters: Task<Shared, StartsSettings, StartsResult> = {
  name: 'fitParameters',
  prepare: async ({ stack, question, measured }) => {
    await prepareStack(stack)
    const start = Object.keys(question.vary).map((path) => getParameter(stack, path))
    return (settings) => fitFromStarts(fitProblem(stack, measured, question), { start, ...settings })
  },
}

/**
 * The stack must ask the question: `stack.fit` present.
 * @throws InputError where there are too few readings for so many parameters
 */
export async function fit(
  stack: Stack,
  measured: Measured,
  settings: FitSettings,
  hooks: Hooks = {},
  map: ParallelMap = mapInline,
): Promise<Fit> {
  const question = stack.fit
  if (question === undefined) throw new Error('the stack has no fit question')
  const paths = Object.keys(question.vary)
  const kinds = paths.map((path) => findParameter(stack, path)?.kind ?? 'number')
  const problem = fitProblem(stack, measured, question)
  requireReadings(problem.count, paths.length, question.noise !== undefined)
  const nominal = paths.map((path) => getParameter(stack, path))
  const shared = { stack, question, measured }
  const [fitted] = await map(fitParameters, shared, [settings], stageHooks(hooks, 0, 0.5))
  // Stopped before it began: the file's values are what there is.
  const found = fitted ?? (await asTheFileSays(shared))
  const faults = await singleFaults(stack, measured, question, stageHooks(hooks, 0.5, 1), map)
  const { certainty } = found
  const noise = question.noise ?? certainty.residualDeviation
  const scale = question.noise ?? 1
  const rms = (value: number) => Math.sqrt((2 * value) / problem.count) * scale
  return {
    title: stack.title,
    parameters: Object.fromEntries(
      paths.map((path, k) => [path, fittedParameter(found.x[k], certainty.standardErrors[k], nominal[k], kinds[k])]),
    ),
    residual_rms: rms(found.value),
    noise,
    noise_is_stated: question.noise !== undefined,
    correlation: correlationOf(paths, certainty.free, certainty.correlation),
    unresolved: unresolvedCombinations(stack, measured, { ...question, noise }, found.x),
    single_faults: faults,
    directions: fittedDirections(
      setParameters(stack, Object.fromEntries(paths.map((path, k) => [path, found.x[k]]))),
      measured,
    ),
    solutions: found.solutions.slice(1).map(({ x, value }) => ({
      parameters: Object.fromEntries(paths.map((path, k) => [path, toPlain(x[k], kinds[k])])),
      residual_rms: rms(value),
    })),
    evaluations: found.evaluations,
    reason: found.reason,
    interrupted: hooks.stopped?.() === true,
  }
}

async function asTheFileSays(shared: Shared): Promise<StartsResult> {
  const run = await fitParameters.prepare(shared)
  return run({ seed: 1, starts: 0, maxEvaluations: 1 })
}

/** As many as parameters; one more where they must tell their own noise. */
function requireReadings(count: number, parameters: number, noiseIsStated: boolean): void {
  const wanted = parameters + (noiseIsStated ? 0 : 1)
  if (count >= wanted) return
  const message = `too few readings for ${parameters} free parameters`
  const next = 'measure more wavelengths or directions, or vary less'
  const fault = { code: 'too_few_readings', message, received: `${count}`, allowed: `at least ${wanted}`, next }
  throw new InputError([optionProblem('--measured', fault)])
}

function fittedParameter(value: number, error: number, nominal: number, kind: QuantityKind): FittedParameter {
  return {
    value: toPlain(value, kind),
    std_error: Number.isNaN(error) ? null : toPlain(error, kind),
    nominal: toPlain(nominal, kind),
  }
}

function correlationOf(paths: readonly string[], free: readonly number[], flat: Float64Array): Fit['correlation'] {
  const p = free.length
  return {
    parameters: free.map((i) => paths[i]),
    matrix: free.map((_, a) => Array.from(flat.subarray(a * p, (a + 1) * p))),
  }
}

function fittedDirections(stack: Stack, { directions }: Measured): FittedDirection[] {
  const experiment = createSpectrumExperiment(stack, [], directions)
  const model = new Float64Array(experiment.count)
  experiment.reflectance(new Float64Array(0), model)
  let offset = 0
  return directions.map(({ theta, phi, wavelengthNm, reflectance }) => {
    const part = model.subarray(offset, offset + wavelengthNm.length)
    offset += wavelengthNm.length
    return {
      theta_deg: degrees(theta),
      phi_deg: degrees(phi),
      wavelength_nm: wavelengthNm,
      measured: reflectance,
      model: Array.from(part),
    }
  })
}
