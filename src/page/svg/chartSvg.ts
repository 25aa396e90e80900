import { BasicPlatform, Chart, type ChartConfiguration, type ChartItem } from 'chart.js'
import { SvgPen } from './svgPen.js'

/** The chart as an SVG document. */
export function chartSvg(config: ChartConfiguration, width: number, height: number): string {
  const measure = document.createElement('canvas').getContext('2d')
  if (measure === null) throw new Error('this browser draws no canvas')
  const pen = new SvgPen(width, height, measure)
  const options = { ...config.options, responsive: false, animation: false as const, events: [], devicePixelRatio: 1 }
  const chart = new Chart(pen.canvas as ChartItem, {
    ...config,
    options,
    plugins: [...(config.plugins ?? [])],
    platform: BasicPlatform,
  })
  chart.destroy()
  return pen.text
}
