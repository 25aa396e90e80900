/** Fixed decimals, never `-0.00`. */
export function fixed(value: number, decimals: number): string {
  const text = value.toFixed(decimals)
  return Number(text) === 0 ? (0).toFixed(decimals) : text
}

/** A number somebody gave, without the noise of its conversion: `45`, `4.7`. */
export function given(value: number): string {
  return String(Number(value.toPrecision(10)))
}
