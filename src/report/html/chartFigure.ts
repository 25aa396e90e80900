import type { Sheet } from '../sheet.js'
import { compactSvg } from './compactSvg.js'
import { html, Markup } from './markup.js'

/** Id of the element with the review's data; a chart's place has its name as `data-chart`. */
export const DATA_ID = 'review-data'

/** A chart as a vector picture; on a screen the page's script puts the live chart in its place. */
export function chartFigure({ name, chart, width, height }: Sheet, svg: string): Markup {
  const title = chart.options?.plugins?.title?.text ?? name
  const alt = typeof title === 'string' ? title : title.join(' ')
  return html`<figure class="chart" data-chart="${name}"><img alt="chart: ${alt}" width="${width}" height="${height}" src="${dataUri(svg)}"></figure>\n`
}

/** Shorter than base64, as most of it is plain text; fit for an attribute in double quotes. */
function dataUri(svg: string): Markup {
  const text = compactSvg(svg).replaceAll('"', "'")
  return new Markup(
    `data:image/svg+xml,${text.replace(/[%#<>"{}|^`&\r\n]/g, (character) => encodeURIComponent(character))}`,
  )
}
