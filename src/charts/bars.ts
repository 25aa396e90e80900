import type { Theme } from './theme.js'

/** Horizontal bars, one a name: solid, or hollow for the second of a pair (told apart without color). */
export function barSeries(theme: Theme, label: string, values: readonly number[], look: 'solid' | 'hollow') {
  const color = theme.series[0].color
  return {
    type: 'bar' as const,
    label,
    data: [...values],
    backgroundColor: look === 'solid' ? color : theme.paper,
    borderColor: color,
    borderWidth: 1.5,
    // Without this the side of the bar on the axis has no line.
    borderSkipped: false as const,
    barPercentage: 0.86,
    categoryPercentage: 0.74,
  }
}
