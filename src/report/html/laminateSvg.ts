import { numberText } from '../../charts/quantity.js'
import type { LaminateFacts, LayerFacts, PanelFacts } from '../../studies/laminateFacts.js'
import { axisDial } from './axisDial.js'
import { layerTexts } from './layerTexts.js'
import { type Content, html, type Markup } from './markup.js'
import { sheetHeightPx, THICKNESS_MARKS_NM, thicknessText } from './sheetHeight.js'

const WIDTH_PX = 980
const DIAL_X = 46
const SHEET = { left: 96, width: 340 } as const
const TEXT_X = 454
const TOP_PX = 34
const PANEL_PX = 56

/** Sheets seen edge-on; the more they do to the light the darker. */
const FILLS: Readonly<Record<LayerFacts['kind'], { readonly sheet: string; readonly ink: string }>> = {
  isotropic: { sheet: '#f3f3f3', ink: '#1a1a1a' },
  retarder: { sheet: '#d9d9d9', ink: '#1a1a1a' },
  crystal: { sheet: '#c6c6c6', ink: '#1a1a1a' },
  polarizer: { sheet: '#6b6b6b', ink: '#ffffff' },
}

/** The laminate edge-on, room above, panel below; with `before`, what a search changed is told. */
export function laminateSvg(laminate: LaminateFacts, before?: LaminateFacts): Markup {
  let top = TOP_PX
  const rows = laminate.layers.map((layer, k) => {
    const height = sheetHeightPx(layer.thickness_nm)
    const row = layerRow(layer, before?.layers[k], top, height)
    top += height
    return row
  })
  const legendTop = top + PANEL_PX + 26
  const height = legendTop + 110
  return html`<svg class="laminate" viewBox="0 0 ${WIDTH_PX} ${height}" role="img" aria-label="${spoken(laminate)}">
<text x="${SHEET.left}" y="20" class="note">room side ↓</text><text x="${DIAL_X}" y="20" class="note" text-anchor="middle">axis</text>
${rows}
${panelRow(laminate.panel, top)}
${thicknessLegend(legendTop)}
</svg>`
}

function layerRow(layer: LayerFacts, before: LayerFacts | undefined, top: number, height: number): Content {
  const { sheet, ink } = FILLS[layer.kind]
  const middle = top + height / 2
  const [main, ...rest] = layerTexts(layer, before)
  return html`<g>
<rect x="${SHEET.left}" y="${top}" width="${SHEET.width}" height="${height}" fill="${sheet}" stroke="#ffffff"/>
<text x="${SHEET.left + 14}" y="${middle + 5}" fill="${ink}" class="name">${layer.id}</text>
<text x="${SHEET.left + SHEET.width - 14}" y="${middle + 5}" fill="${ink}" text-anchor="end">${kindText(layer)}</text>
${axisDial(layer, before, DIAL_X, middle, Math.min(0.42 * height, 24))}
<text x="${TEXT_X}" y="${rest.length > 0 ? middle - 3 : middle + 5}">${main}</text>
${rest.map((line) => html`<text x="${TEXT_X}" y="${middle + 14}">${line}</text>`)}
</g>
`
}

function kindText({ kind, coherent }: LayerFacts): string {
  return coherent ? `${kind}, coherent` : kind
}

function panelRow(panel: PanelFacts, top: number): Content {
  const middle = top + PANEL_PX / 2
  return html`<rect x="${SHEET.left}" y="${top}" width="${SHEET.width}" height="${PANEL_PX}" fill="#111111"/>
<text x="${SHEET.left + 14}" y="${middle + 5}" fill="#f0f0f0" class="name">panel</text>
<text x="${SHEET.left + SHEET.width - 14}" y="${middle + 5}" fill="#f0f0f0" text-anchor="end">${panel.kind}</text>
<text x="${TEXT_X}" y="${middle + 5}">${panelText(panel)}</text>`
}

function panelText({ kind, index, extinction, reflectance, depolarized }: PanelFacts): string {
  if (kind === 'metal') return `n ${numberText(index, 4)}, k ${numberText(extinction, 4)}`
  return `reflects ${numberText(100 * (reflectance ?? 0))} %, of which ${numberText(100 * (depolarized ?? 0))} % depolarized; n ${numberText(index, 4)}`
}

/** Bars as high as sheets of round thicknesses. */
function thicknessLegend(top: number): Content {
  const bars = THICKNESS_MARKS_NM.map((nm, k) => {
    const height = sheetHeightPx(nm)
    const x = SHEET.left + 70 * k
    return html`<rect x="${x}" y="${top + 74 - height}" width="50" height="${height}" fill="#d9d9d9"/>
<text x="${x + 25}" y="${top + 90}" class="note" text-anchor="middle">${thicknessText(nm)}</text>`
  })
  return html`<g>${bars}
<text x="${TEXT_X}" y="${top + 46}" class="note">Sheets grow with the logarithm of their thickness.</text>
<text x="${TEXT_X}" y="${top + 64}" class="note">Axes as the viewer sees them, 0° at three o’clock, counter-clockwise.</text>
<text x="${TEXT_X}" y="${top + 82}" class="note">Figures at 550 nm.</text></g>`
}

function spoken({ layers, panel }: LaminateFacts): string {
  return `Laminate from the room to the panel: ${layers.map(({ id, kind }) => `${id} (${kind})`).join(', ')}, over a ${panel.kind} panel. The figures stand in the text of the drawing.`
}
