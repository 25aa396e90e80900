import { REPLICATES } from '../numeric/sobolIndices.js'
import type { Direction, MetricRequest, Stack, ToleranceQuestion } from '../stack/stack.js'
import { replicatePoints } from './sensitivity.js'
import { MOST_DRAWS } from './tighten.js'
import type { Variation } from './variation.js'

/** Halvings that a spread takes on average, beside the two ends. */
const ROUNDS = 5

/** At which share of the work the draws end and the sensitivity ends, about: what follows is what to tighten. */
export function toleranceStages(
  { limits }: Stack,
  { samples }: ToleranceQuestion,
  requests: readonly MetricRequest[],
  { factors }: Variation,
  tightens: boolean,
): [drawsEnd: number, sensitivityEnd: number] {
  const draws = samples * viewsOf(requests)
  const shares = REPLICATES * replicatePoints(samples) * (factors.length + 2)
  const yields = tightens ? Math.min(MOST_DRAWS, samples) * viewsOf(limits) * ROUNDS * (factors.length + 1) : 0
  const all = draws + shares + yields
  return [draws / all, (draws + shares) / all]
}

function viewsOf(directions: readonly Direction[]): number {
  return new Set(directions.map(({ theta, phi }) => `${theta},${phi}`)).size
}
