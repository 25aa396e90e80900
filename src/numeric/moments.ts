/**
 * Mean and standard deviation of numbers as they come, without keeping them (B. P. Welford, Technometrics 4, 419 (1962));
 * two sets merge (T. F. Chan, G. H. Golub, R. J. LeVeque, Am. Stat. 37, 242 (1983)). Plain data: it can cross to a worker.
 */
export interface Moments {
  count: number
  /** NaN while there are none. */
  mean: number
  /** Sum of squared deviations from the mean. */
  squares: number
}

export function createMoments(): Moments {
  return { count: 0, mean: Number.NaN, squares: 0 }
}

export function addTo(moments: Moments, value: number): void {
  moments.count++
  if (moments.count === 1) {
    moments.mean = value
    return
  }
  const deviation = value - moments.mean
  moments.mean += deviation / moments.count
  moments.squares += deviation * (value - moments.mean)
}

/** Adds all that `other` has seen. */
export function mergeInto(moments: Moments, other: Moments): void {
  if (other.count === 0) return
  if (moments.count === 0) {
    Object.assign(moments, other)
    return
  }
  const count = moments.count + other.count
  const deviation = other.mean - moments.mean
  moments.squares += other.squares + (deviation * deviation * moments.count * other.count) / count
  moments.mean += (deviation * other.count) / count
  moments.count = count
}

/** Of the sample, with count - 1; 0 for a single number, NaN for none. */
export function standardDeviation({ count, squares }: Moments): number {
  if (count === 0) return Number.NaN
  return count === 1 ? 0 : Math.sqrt(squares / (count - 1))
}
