import { drawRanges } from './drawRanges.js'
import type { Hooks } from './hooks.js'
import { leadingResults, type ParallelMap } from './parallel.js'
import { stageHooks } from './stageHooks.js'
import { type DrawnBlock, type DrawnStack, toleranceBlock } from './toleranceBlock.js'

/** Draws handed out and taken back at once: memory holds no more, and the workers seldom wait for each other. */
const WAVE = 20_000

/** Makes the question's draws and passes them on in their order, block by block, up to where it is stopped. */
export async function drawAll(
  shared: DrawnStack,
  take: (block: DrawnBlock) => void | Promise<void>,
  hooks: Hooks,
  map: ParallelMap,
): Promise<void> {
  const { samples } = shared.question
  for (let from = 0; from < samples; from += WAVE) {
    const to = Math.min(samples, from + WAVE)
    const ranges = drawRanges(from, to)
    const blocks = await map(toleranceBlock, shared, ranges, stageHooks(hooks, from / samples, to / samples))
    const made = leadingResults(blocks)
    for (const block of made) await take(block)
    if (made.length < ranges.length) return
  }
}
