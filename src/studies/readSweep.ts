import { InputError } from '../stack/problem.js'
import type { Direction, MetricName, Stack } from '../stack/stack.js'
import { readRequests } from './readRequests.js'
import { optionProblem, readVary } from './readVary.js'
import type { SweepQuestion } from './sweep.js'

export interface SweepTexts {
  readonly vary: readonly string[]
  /** Absent: luminous reflectance and chroma. */
  readonly metrics: readonly string[]
  /** Where metrics without a direction look from. */
  readonly direction: Direction
  readonly bandNm: number
}

const DEFAULT_METRICS: readonly MetricName[] = ['luminous_reflectance', 'chroma']

/** @throws InputError with the problems of the axes and links, or else those of the metrics */
export async function readSweep(
  stack: Stack,
  { vary, metrics, direction, bandNm }: SweepTexts,
): Promise<SweepQuestion> {
  const { axes, links } = await readVary(stack, vary)
  const turned = axes.find(({ path }) => path === 'theta' || path === 'phi')
  const fixed = metrics.find((text) => text.includes('@'))
  if (turned !== undefined && fixed !== undefined) {
    const message = `the direction of a metric is fixed while ${turned.path} is varied`
    const next = 'leave out the direction; --theta and --phi give the one that is not varied'
    throw new InputError([
      optionProblem(`--metric ${fixed}`, { code: 'direction_fixed', message, received: fixed, next }),
    ])
  }
  return {
    axes,
    links,
    requests: readRequests(stack, metrics.length > 0 ? metrics : DEFAULT_METRICS, direction),
    bandNm,
  }
}
