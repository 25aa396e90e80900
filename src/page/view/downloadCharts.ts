import { Chart } from 'chart.js'
import { chartSvg } from '../svg/chartSvg.js'
import { configOf } from './ChartView.js'
import { downloadBlob, downloadText } from './download.js'

/** The charts on the page as they stand, one file each. */
export async function downloadPngs(stem: string): Promise<void> {
  for (const canvas of chartCanvases()) {
    const blob = await new Promise<Blob | null>((resolve) => canvas.toBlob(resolve, 'image/png'))
    if (blob !== null) downloadBlob(`${stem}.${canvas.dataset.chart}.png`, blob)
  }
}

export function downloadSvgs(stem: string): void {
  for (const canvas of chartCanvases()) {
    const chart = Chart.getChart(canvas)
    const config = configOf(canvas)
    if (chart === undefined || config === undefined) continue
    downloadText(`${stem}.${canvas.dataset.chart}.svg`, chartSvg(config, chart.width, chart.height), 'image/svg+xml')
  }
}

function chartCanvases(): HTMLCanvasElement[] {
  return [...document.querySelectorAll<HTMLCanvasElement>('canvas[data-chart]')]
}
