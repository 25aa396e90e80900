import type { Sweep } from '../studies/sweep.js'
import { csvText } from './csvText.js'

/** One line a point: the axes (nm, degrees, fractions), then the metrics. */
export function sweepCsv({ axes, metrics }: Sweep): string {
  const across = axes[1]?.values.length ?? 1
  const names = Object.keys(metrics)
  const rows = metrics[names[0]].map((_, point) => {
    const at = [Math.floor(point / across), point % across]
    return [...axes.map(({ values }, k) => values[at[k]]), ...names.map((name) => metrics[name][point])]
  })
  return csvText([...axes.map(({ path }) => path), ...names], rows)
}
