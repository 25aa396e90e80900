import type { Sheet } from '../report/sheet.js'
import { drawChart } from './drawChart.js'

/** Each chart as PNG for slides and as SVG for print, by file name; `stem` begins every name. */
export async function chartFiles(stem: string, sheets: readonly Sheet[]): Promise<Map<string, Buffer>> {
  const files = new Map<string, Buffer>()
  for (const { name, chart, width, height } of sheets) {
    for (const format of ['png', 'svg'] as const) {
      files.set(`${stem}.${name}.${format}`, await drawChart(chart, { width, height, format }))
    }
  }
  return files
}
