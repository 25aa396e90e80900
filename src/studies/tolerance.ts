/** How much of production meets the limits, how the metrics spread, which tolerance moves them, and what to tighten. */
import { Scene } from '../appearance/scene.js'
import type { Histogram } from '../numeric/distribution.js'
import type { MetricName, MetricRequest, Stack, ToleranceQuestion } from '../stack/stack.js'
import { drawAll } from './drawAll.js'
import { createDrawRows, type DrawRows } from './drawRows.js'
import { type AskedLimit, evaluateLimit } from './evaluate.js'
import type { Hooks } from './hooks.js'
import { metricKey } from './metricKey.js'
import { mapInline, type ParallelMap } from './parallel.js'
import type { ToleratedStack } from './scaledYields.js'
import { type ParameterShare, sensitivity } from './sensitivity.js'
import { stageHooks } from './stageHooks.js'
import { type Tightening, tighten } from './tighten.js'
import type { DrawnBlock } from './toleranceBlock.js'
import { toleranceStages } from './toleranceStages.js'
import { isSameMetric, type MetricSpread, ToleranceTally, type Yield } from './toleranceTally.js'
import { createVariation } from './variation.js'

export interface ToleranceSettings {
  /** Of the yield, for what to tighten; default 95 %. */
  readonly wantedYield?: number
  /** The metric whose variance is shared out; default: that of the limit which costs the most yield, else the first told. */
  readonly explained?: MetricRequest
  /** Neither sensitivity nor what to tighten. */
  readonly drawsOnly?: boolean
  /** Receives every draw in its order, so that a long run can be written out while it goes on. */
  readonly onDraws?: (draws: DrawRows) => void | Promise<void>
}

export interface Tolerance extends Partial<Yield> {
  readonly title: string
  readonly sampling: ToleranceQuestion['sampling']
  readonly seed: number
  /** Draws asked for, and made: fewer where it was interrupted. */
  readonly samples: number
  readonly draws: number
  /** The design without any errors; where it does not, no spread is to blame and nothing is said about tightening. */
  readonly design_meets_limits?: boolean
  /** With the share of the draws that meets each; absent, as the yield of all, where the file has none. */
  readonly limits?: readonly (AskedLimit & Yield)[]
  readonly metrics: Readonly<Record<string, MetricSpread>>
  readonly histograms: Readonly<Record<string, Histogram>>
  /** Parameters drawn beyond what is physical and set to its edge, with the share of such draws. */
  readonly held: Readonly<Record<string, number>>
  /** Metric of the sensitivity. */
  readonly sensitivity_of?: string
  /** Largest total share first. */
  readonly sensitivity?: readonly ParameterShare[]
  readonly tightening?: Tightening
  readonly interrupted: boolean
}

/** Told from every direction of the file, beside the metrics of its limits. */
const TOLD: readonly MetricName[] = ['color_weighted_reflectance', 'luminous_reflectance', 'chroma']
const WANTED_YIELD = 0.95

/** Of `question`, by default the stack's own; its paths must be parameters of the stack. */
export async function tolerance(
  stack: Stack,
  question: ToleranceQuestion | undefined = stack.tolerance,
  settings: ToleranceSettings = {},
  hooks: Hooks = {},
  map: ParallelMap = mapInline,
): Promise<Tolerance> {
  if (question === undefined) throw new Error('the stack has no tolerance question')
  const requests = toldRequests(stack)
  const names = requests.map((request) => metricKey(request, requests))
  const variation = createVariation(stack, question)
  const tally = new ToleranceTally(variation, requests, stack.limits)
  const rowsOf = createDrawRows(stack, variation.paths, names)
  const take = async (block: DrawnBlock) => {
    tally.add(block)
    await settings.onDraws?.(rowsOf(block))
  }
  const design_meets_limits = meetsLimits(stack)
  const wantedYield =
    stack.limits.length > 0 && design_meets_limits ? (settings.wantedYield ?? WANTED_YIELD) : undefined
  const ends =
    settings.drawsOnly === true
      ? ([1, 1] as const)
      : toleranceStages(stack, question, requests, variation, wantedYield !== undefined)
  await drawAll({ stack, question, requests }, take, stageHooks(hooks, 0, ends[0], 'draws'), map)

  const complete = tally.draws === question.samples
  const explained = settings.explained ?? tally.mostCostly() ?? requests[0]
  const causes =
    complete && settings.drawsOnly !== true
      ? await findCauses({ stack, question }, explained, wantedYield, ends, hooks, map)
      : { interrupted: !complete }
  return {
    title: stack.title,
    sampling: question.sampling,
    seed: question.seed,
    samples: question.samples,
    draws: tally.draws,
    ...(stack.limits.length > 0 && {
      design_meets_limits,
      ...(tally.draws > 0 && { ...tally.yieldOfAll(), limits: tally.limitYields() }),
    }),
    metrics: named(names, tally.spreads()),
    histograms: named(names, tally.histograms()),
    held: tally.heldShares(),
    ...causes,
    ...(causes.sensitivity && { sensitivity_of: metricKey(explained, requests) }),
  }
}

/** What moves the explained metric; what to tighten where a yield is wanted. */
async function findCauses(
  shared: ToleratedStack,
  explained: MetricRequest,
  wantedYield: number | undefined,
  [from, to]: readonly [number, number],
  hooks: Hooks,
  map: ParallelMap,
): Promise<Pick<Tolerance, 'sensitivity' | 'tightening' | 'interrupted'>> {
  const { stack, question } = shared
  const shares = await sensitivity(stack, question, explained, stageHooks(hooks, from, to, 'sensitivity'), map)
  if (shares === undefined) return { interrupted: true }
  if (wantedYield === undefined) return { sensitivity: shares, interrupted: false }
  const tightening = await tighten(shared, wantedYield, stageHooks(hooks, to, 1, 'what to tighten'), map)
  return { sensitivity: shares, ...(tightening && { tightening }), interrupted: tightening === undefined }
}

function meetsLimits(stack: Stack): boolean {
  const scene = new Scene(stack)
  return stack.limits.every((limit) => evaluateLimit(scene, stack, limit).met)
}

/** Each once. */
function toldRequests({ conditions, limits }: Stack): MetricRequest[] {
  const told = conditions.directions.flatMap(({ theta, phi }) => TOLD.map((metric) => ({ metric, theta, phi })))
  const limited = limits.map(({ max: _, min: __, ...request }) => request)
  const all: MetricRequest[] = [...told, ...limited]
  return all.filter((request, k) => all.findIndex((other) => isSameMetric(other, request)) === k)
}

function named<Value>(names: readonly string[], values: readonly Value[]): Record<string, Value> {
  return Object.fromEntries(values.map((value, k) => [names[k], value]))
}
