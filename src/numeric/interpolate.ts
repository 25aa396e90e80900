/** Value at `at` of the table (x ascending, y): linear between the points, constant outside. */
export function interpolateLinear(x: ArrayLike<number>, y: ArrayLike<number>, at: number): number {
  const last = x.length - 1
  if (at <= x[0]) return y[0]
  if (at >= x[last]) return y[last]
  let low = 0
  let high = last
  while (high - low > 1) {
    const middle = (low + high) >> 1
    if (x[middle] <= at) low = middle
    else high = middle
  }
  return y[low] + ((y[high] - y[low]) * (at - x[low])) / (x[high] - x[low])
}

/** The table at each of `at`. */
export function interpolateOnto(x: ArrayLike<number>, y: ArrayLike<number>, at: Float64Array): Float64Array {
  return at.map((value) => interpolateLinear(x, y, value))
}
