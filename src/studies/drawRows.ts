import { findParameter } from '../stack/parameters.js'
import type { Stack } from '../stack/stack.js'
import { toPlain } from '../units/quantity.js'
import type { DrawnBlock } from './toleranceBlock.js'

/** Draws as a table. */
export interface DrawRows {
  /** Parameter paths, then metrics. */
  readonly columns: readonly string[]
  /** nm, degrees, fractions. */
  readonly rows: readonly (readonly number[])[]
}

export function createDrawRows(
  stack: Stack,
  paths: readonly string[],
  metrics: readonly string[],
): (block: DrawnBlock) => DrawRows {
  const columns = [...paths, ...metrics]
  const kinds = paths.map((path) => findParameter(stack, path)?.kind ?? 'number')
  return (block) => ({
    columns,
    rows: Array.from({ length: block.metrics.length / metrics.length }, (_, draw) => [
      ...kinds.map((kind, k) => toPlain(block.parameters[draw * paths.length + k], kind)),
      ...block.metrics.subarray(draw * metrics.length, (draw + 1) * metrics.length),
    ]),
  })
}
