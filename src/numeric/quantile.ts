/**
 * Quantile `p` (0 to 1) of numbers sorted in ascending order, linear between order statistics at (count - 1) p: type 7 of
 * R. J. Hyndman, Y. Fan, Am. Stat. 50, 361 (1996), the default of R and NumPy. NaN for none.
 */
export function quantile(sorted: ArrayLike<number>, p: number): number {
  const last = sorted.length - 1
  if (last < 0) return Number.NaN
  const at = Math.min(last, Math.max(0, last * p))
  const below = Math.floor(at)
  const value = sorted[below]
  return below === last ? value : value + (at - below) * (sorted[below + 1] - value)
}
