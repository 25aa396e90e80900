import type { ChartConfiguration } from 'chart.js'
import { linearAxis, nameAxis } from './axis.js'
import { barSeries } from './bars.js'
import { frameOptions, paperPainter } from './frame.js'
import { painter } from './painter.js'
import { axisTitle, type Quantity, quantityText, stepText } from './quantity.js'
import { fontOf, type Theme } from './theme.js'

export interface BudgetBarsData {
  readonly title: string
  readonly notes?: readonly string[]
  readonly metric: Quantity
  /** Of the whole stack. */
  readonly total: number
  /** In the metric's stored unit; drawn in this order from the top. */
  readonly terms: readonly { readonly name: string; readonly alone: number; readonly ifRemoved: number }[]
}

/** The light budget: what each imperfection makes alone, and what would be gained without it. */
export function budgetBars(data: BudgetBarsData, theme: Theme): ChartConfiguration {
  const { metric, terms } = data
  const shown = (key: 'alone' | 'ifRemoved'): number[] => terms.map((term) => metric.factor * term[key])
  const [alone, ifRemoved] = [shown('alone'), shown('ifRemoved')]
  const [low, high] = [Math.min(0, ...alone, ...ifRemoved), Math.max(0, ...alone, ...ifRemoved)]
  const span = high - low || 1
  // All figures to the same decimals: a hundredth of the largest bar's decade.
  const step = 10 ** (Math.floor(Math.log10(span)) - 2)
  const margin = 0.12 * span
  return {
    type: 'bar',
    data: {
      labels: terms.map((term) => term.name),
      datasets: [barSeries(theme, 'alone', alone, 'solid'), barSeries(theme, 'gained if removed', ifRemoved, 'hollow')],
    },
    options: {
      ...frameOptions(theme, {
        title: data.title,
        notes: [`whole stack: ${quantityText(metric, data.total)}`, ...(data.notes ?? [])],
        hover: ({ dataset, dataIndex, datasetIndex }) =>
          `${dataset.label}: ${quantityText(metric, terms[dataIndex][datasetIndex === 0 ? 'alone' : 'ifRemoved'])}`,
      }),
      indexAxis: 'y',
      scales: {
        x: linearAxis(theme, { title: axisTitle(metric), min: low < 0 ? low - margin : 0, max: high + margin }),
        y: nameAxis(theme),
      },
    },
    plugins: [
      paperPainter(theme),
      painter('values', 'afterDatasetsDraw', (pen, { ends }) => {
        pen.font = fontOf(theme, theme.smallSize)
        pen.textBaseline = 'middle'
        pen.fillStyle = theme.ink
        for (const [datasetIndex, values] of [alone, ifRemoved].entries()) {
          ends(datasetIndex).forEach(({ x, y }, i) => {
            pen.textAlign = values[i] < 0 ? 'right' : 'left'
            pen.fillText(stepText(values[i], step), x + (values[i] < 0 ? -6 : 6), y)
          })
        }
      }),
    ],
  }
}
