import type { LayerFacts } from '../../studies/laminateFacts.js'
import { type Content, html } from './markup.js'

/** Lines of a polarizer's dial, beside its axis, in radii: the fingers that absorb. */
const COMB = [-0.5, 0, 0.5]

/** A dial with the film's axis as the viewer sees it; dashed where it was before. Nothing for a film without an axis. */
export function axisDial(
  layer: LayerFacts,
  before: LayerFacts | undefined,
  x: number,
  y: number,
  radius: number,
): Content {
  const { axis_deg } = layer
  if (axis_deg === undefined) return undefined
  const moved = before?.axis_deg !== undefined && Math.abs(before.axis_deg - axis_deg) > 0.005
  const offsets = layer.kind === 'polarizer' ? COMB : [0]
  return html`<g><circle cx="${x}" cy="${y}" r="${radius}" fill="#ffffff" stroke="#9a9a9a"/>
${moved && chord(x, y, radius, before.axis_deg ?? 0, 0, 'past')}
${offsets.map((offset) => chord(x, y, radius, axis_deg, offset, offset === 0 ? 'hand' : 'finger'))}</g>`
}

/** A chord parallel to the axis, `offset` radii beside the middle; its look is a class of the page's style. */
function chord(
  x: number,
  y: number,
  radius: number,
  axisDeg: number,
  offset: number,
  look: 'hand' | 'finger' | 'past',
): Content {
  const [c, s] = [Math.cos((axisDeg * Math.PI) / 180), Math.sin((axisDeg * Math.PI) / 180)]
  const half = radius * Math.sqrt(1 - offset * offset)
  const [mx, my] = [x - radius * offset * s, y - radius * offset * c]
  const at = (value: number): string => value.toFixed(2)
  return html`<line class="${look}" x1="${at(mx - half * c)}" y1="${at(my + half * s)}" x2="${at(mx + half * c)}" y2="${at(my - half * s)}"/>`
}
