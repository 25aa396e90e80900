import { METRIC_QUANTITIES } from '../../charts/quantity.js'
import type { MetricName } from '../../stack/stack.js'
import { metricNumber } from '../metricNumber.js'
import { type Content, html, type Markup } from './markup.js'

export interface TableColumn {
  readonly heading: Content
  /** Numbers stand right, words left. */
  readonly align: 'left' | 'right'
}

export function words(heading: Content): TableColumn {
  return { heading, align: 'left' }
}

export function numbers(heading: Content): TableColumn {
  return { heading, align: 'right' }
}

/** The first cell of a row is its heading. */
export function table(caption: string, columns: readonly TableColumn[], rows: readonly (readonly Content[])[]): Markup {
  const side = (k: number): string => (columns[k].align === 'right' ? 'number' : 'words')
  // A heading that says nothing is none to those who have the page read to them.
  const head = ({ heading }: TableColumn, k: number) =>
    heading === '' ? html`<td></td>` : html`<th scope="col" class="${side(k)}">${heading}</th>`
  const cell = (content: Content, k: number) =>
    k === 0 ? html`<th scope="row" class="${side(k)}">${content}</th>` : html`<td class="${side(k)}">${content}</td>`
  return html`<div class="wide" tabindex="0" role="region" aria-label="table: ${caption}"><table>
<caption>${caption}</caption>
<thead><tr>${columns.map(head)}</tr></thead>
<tbody>${rows.map((cells) => html`<tr>${cells.map(cell)}</tr>\n`)}</tbody>
</table></div>`
}

/** A number as it is shown, with all its digits in the page: the value stands in the JSON beside the report. */
export function figure(value: number, shown: string): Content {
  return Number.isFinite(value) ? html`<data value="${value}">${shown}</data>` : shown
}

export function metricFigure(metric: MetricName, value: number | undefined): Content {
  return value === undefined ? '–' : figure(value, metricNumber(metric, value))
}

export function metricHeading(metric: MetricName): string {
  const { label, unit } = METRIC_QUANTITIES[metric]
  return unit === '' ? label : `${label} (${unit})`
}
