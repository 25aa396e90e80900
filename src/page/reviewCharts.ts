/** The script in a design review: puts a live chart, with values under the pointer, over each vector picture. */
import { Chart, registerables } from 'chart.js'
import { DATA_ID } from '../report/html/chartFigure.js'
import { reviewSheets } from '../report/reviewSheets.js'
import type { Sheet } from '../report/sheet.js'
import type { Review } from '../studies/review.js'

/** Canvas pixels per pixel of the sheet, so that a sheet shown larger than it is stays sharp. */
const LEAST_RATIO = 2
/** A chart is made when it comes this near to being seen: all at once would hold up the page. */
const AHEAD = '800px'

async function showCharts(): Promise<void> {
  const data = document.getElementById(DATA_ID)?.textContent
  if (!data) return
  Chart.register(...registerables)
  // A canvas does not wait for the faces of the page.
  await Promise.all(['normal', 'bold'].map((weight) => document.fonts.load(`${weight} 14px "DejaVu Sans"`)))
  const groups: readonly (readonly Sheet[])[] = Object.values(reviewSheets(JSON.parse(data) as Review))
  const sheets = new Map(groups.flat().map((sheet) => [sheet.name, sheet]))
  const watch = new IntersectionObserver(
    (entries) => {
      for (const { isIntersecting, target } of entries) {
        const sheet = target instanceof HTMLElement ? sheets.get(target.dataset.chart ?? '') : undefined
        if (!isIntersecting || sheet === undefined) continue
        watch.unobserve(target)
        showChart(target, sheet)
      }
    },
    { rootMargin: AHEAD },
  )
  for (const figure of document.querySelectorAll('figure[data-chart]')) watch.observe(figure)
}

/** The picture stays for print, and for what reads the page aloud. */
function showChart(figure: Element, { name, chart, width, height }: Sheet): void {
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
