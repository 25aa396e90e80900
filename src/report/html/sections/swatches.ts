import { numberText } from '../../../charts/quantity.js'
import type { OffStateSwatch } from '../../../studies/offStateSwatches.js'
import type { Review } from '../../../studies/review.js'
import { given } from '../../decimals.js'
import { type Content, html, type Markup } from '../markup.js'
import { figure } from '../table.js'
import { DESIGN_NAMES } from './figures.js'

/**
 * The off-state beside ideal black. The surround has L* = 10 (#1c1c1c): dark, so that it does not make a dark gray look
 * black, and not black, so that ideal black is told from it.
 */
export function swatchesSection({ designs }: Review): Markup {
  const rows = designs[0].swatches.map((first, k) => ({ first, swatches: designs.map(({ swatches }) => swatches[k]) }))
  const { theta_deg, phi_deg } = designs[0].evaluation.directions[0]
  const clipped = designs.some(({ swatches }) => swatches.some((swatch) => swatch.clipped))
  return html`<p>Seen from θ ${given(theta_deg)}° φ ${given(phi_deg)}°. The white named on the left is given the white of this screen or paper, and the off-state is as bright against it as it would be there. Surround: L* 10 (#1c1c1c).</p>
<div class="booth">
${unique(rows).map(
  ({ first, swatches }) => html`<div class="row">
<p>${whiteText(first)}</p>
${swatches.map((swatch, k) => tile(designs.length > 1 ? DESIGN_NAMES[designs[k].name] : 'off-state', swatch))}
<div class="tile"><div class="patch" style="background:#000000"></div><p>ideal black<br>0 cd/m²</p></div>
</div>
`,
)}</div>
<p class="note">Luminance is kept relative to the white, and color adapted from the illuminant to the white of sRGB (Bradford); all whites are taken to have the illuminant’s color.${clipped && ' A color outside sRGB was cut to its edge.'}</p>`
}

/** Against a diffuser the level matters only where the screen glows in the dark: alike rows stand once. */
function unique<Row extends { readonly first: OffStateSwatch }>(rows: readonly Row[]): Row[] {
  return rows.filter(({ first }, k) => {
    if (first.relative_to === 'lit_screen') return true
    const before = rows.findIndex((row) => row.first.relative_to === first.relative_to)
    return before === k || rows[before].first.srgb !== first.srgb
  })
}

function whiteText({ illuminance_lx, relative_to, white_luminance }: OffStateSwatch): Content {
  const white = relative_to === 'lit_screen' ? 'the lit screen’s white' : 'a white diffuser in the same light'
  return html`<b>${given(illuminance_lx)} lx</b>, relative to ${white}, ${figure(white_luminance, numberText(white_luminance))} cd/m²`
}

function tile(name: string, { srgb, off_luminance, relative_luminance }: OffStateSwatch): Content {
  return html`<div class="tile"><div class="patch" style="background:${srgb}"></div><p>${name}<br>${figure(off_luminance, numberText(off_luminance))} cd/m²<br>${figure(relative_luminance, numberText(100 * relative_luminance))} % · ${srgb}</p></div>`
}
