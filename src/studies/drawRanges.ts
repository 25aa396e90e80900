/** Draws `from` … `to` - 1. */
export interface DrawRange {
  readonly from: number
  readonly to: number
}

/** Draws of one job: some 0.1 s of work, so that a stop is soon noticed. */
const BLOCK = 250

/** Draws `from` … `to` - 1 as jobs; where the blocks begin does not depend on who works on them. */
export function drawRanges(from: number, to: number): DrawRange[] {
  return Array.from({ length: Math.ceil((to - from) / BLOCK) }, (_, k) => ({
    from: from + k * BLOCK,
    to: Math.min(to, from + (k + 1) * BLOCK),
  }))
}
