/**
 * Cubic through four evenly spaced samples, at `t` in [0, 1] between the second and the third (Catmull and Rom, 1974):
 * smooth iso-lines from a coarse grid, exact at the samples.
 */
export function cubicBetween([a, b, c, d]: readonly [number, number, number, number], t: number): number {
  return b + 0.5 * t * (c - a + t * (2 * a - 5 * b + 4 * c - d + t * (3 * (b - c) + d - a)))
}

/** The sample one step beyond the last of a row, `last`, `before`, `first`: on the parabola through the three, so that lines meet the edge as they run. */
export function beyondEnd(last: number, before: number, first: number): number {
  return 3 * last - 3 * before + first
}
