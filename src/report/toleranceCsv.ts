import type { Tolerance } from '../studies/tolerance.js'
import { csvText } from './csvText.js'

/** One line a metric; fractions. */
export function toleranceCsv({ metrics }: Tolerance): string {
  const rows = Object.entries(metrics).map(([name, { mean, std, min, p05, p50, p95, max }]) => [
    name,
    ...[mean, std, min, p05, p50, p95, max],
  ])
  return csvText(['metric', 'mean', 'std', 'min', 'p05', 'p50', 'p95', 'max'], rows)
}
