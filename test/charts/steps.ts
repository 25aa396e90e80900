export const DEGREE = Math.PI / 180

/** From `from` to `to`, both included. */
export function steps(from: number, to: number, step: number): number[] {
  return Array.from({ length: Math.round((to - from) / step) + 1 }, (_, i) => from + i * step)
}
