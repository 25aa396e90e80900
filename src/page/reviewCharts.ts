/** The script in a design review: puts a live chart, with values under the pointer, over each vector picture. */
import { Chart, registerables } from 'chart.js'
import { DATA_ID } from '../report/html/chartFigure.js'
import { reviewSheets } from '../report/reviewSheets.js'
import type { Sheet } from '../report/sheet.js'
import type { Review } from '../studies/review.js'

/** Canvas pixels per pixel of the sheet, so that a sheet shown larger than it is stays sharp. */
const LEAST_RATIO = 2

async function showCharts(): Promise<void> {
  const data = document.getElementById(DATA_ID)?.textContent
  if (!data) return
  Chart.register(...registerables)
  // A canvas does not wait for the faces of the page.
  await Promise.all(['normal', 'bold'].map((weight) => document.fonts.load(`${weight} 14px "DejaVu Sans"`)))
  const groups: readonly (readonly Sheet[])[] = Object.values(reviewSheets(JSON.parse(data) as Review))
  for (const sheet of groups.flat()) showChart(sheet)
}

/** The picture stays for print, and for what reads the page aloud. */
function showChart({ name, chart, width, height }: Sheet): void {
  const figure = document.querySelector(`figure[data-chart="${CSS.escape(name)}"]`)
  if (figure === null) return
  const canvas = document.createElement('canvas')
  canvas.width = width
  canvas.height = height
  const label = figure.querySelector('img')?.alt
  canvas.setAttribute('role', 'img')
  canvas.setAttribute('aria-label', label ?? name)
  figure.append(canvas)
  const devicePixelRatio = Math.max(LEAST_RATIO, window.devicePixelRatio)
  new Chart(canvas, { ...chart, options: { ...chart.options, responsive: false, devicePixelRatio } })
  // Chart.js has fixed the size; the sheet is drawn at its own and shown as wide as its column.
  canvas.style.width = ''
  canvas.style.height = ''
  figure.classList.add('live')
}

void showCharts()
