/** A fixed range, so that charts of compared designs can be read against one another. */
export interface ScaleRange {
  readonly min: number
  readonly max: number
}

/** Steps of a map: color of the band above `levels[i]` is `t = (i + ½)/(levels.length − 1)` of the ramp. */
export interface ColorScale {
  /** Ascending, evenly spaced round numbers; the first and last enclose the range. */
  readonly levels: readonly number[]
  readonly step: number
}

const TARGET_BANDS = 9
const ROUND = [1, 2, 2.5, 5, 10]

/** Round levels about `TARGET_BANDS` in number over the range. */
export function colorScale({ min, max }: ScaleRange): ColorScale {
  const span = max - min || Math.abs(max) || 1
  const raw = span / TARGET_BANDS
  const decade = 10 ** Math.floor(Math.log10(raw))
  const step = decade * (ROUND.find((r) => r * decade >= raw * 0.999) ?? 10)
  const first = Math.floor(min / step + 1e-9)
  const last = Math.max(first + 1, Math.ceil(max / step - 1e-9))
  return { levels: Array.from({ length: last - first + 1 }, (_, i) => (first + i) * step), step }
}

/** Range of the finite values. */
export function rangeOf(values: Iterable<number>): ScaleRange {
  let [min, max] = [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY]
  for (const value of values) {
    if (!Number.isFinite(value)) continue
    min = Math.min(min, value)
    max = Math.max(max, value)
  }
  return min <= max ? { min, max } : { min: 0, max: 1 }
}
