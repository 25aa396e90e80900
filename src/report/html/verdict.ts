import type { MetricName } from '../../stack/stack.js'
import type { Review, ReviewedDesign } from '../../studies/review.js'
import { given } from '../decimals.js'
import { metricWithUnit } from '../metricNumber.js'
import { type Content, html, type Markup } from './markup.js'
import { figure } from './table.js'

/** The answer in a line of large figures: seen from the first direction of the file, before and after. */
export function verdict({ designs }: Review): Markup {
  const { theta_deg, phi_deg } = designs[0].evaluation.directions[0]
  const place = theta_deg === 0 ? 'head-on' : `θ ${given(theta_deg)}° φ ${given(phi_deg)}°`
  return html`<ul class="verdict">
${told(`luminous reflectance, ${place}`, designs, 'luminous_reflectance', ({ evaluation }) => evaluation.directions[0].luminous_reflectance)}
${told(`chroma C*ab, ${place}`, designs, 'chroma', ({ evaluation }) => evaluation.directions[0].chroma)}
${told('emission transmittance', designs, 'emission_transmittance', ({ evaluation }) => evaluation.directions[0].emission_transmittance)}
${designs[0].evaluation.limits.length > 0 && html`<li><b>${arrow(designs.map(limitsMet))}</b> limits met</li>`}
</ul>`
}

function told(
  name: string,
  designs: readonly ReviewedDesign[],
  metric: MetricName,
  of: (design: ReviewedDesign) => number | undefined,
): Content {
  const values = designs.map(of).filter((value) => value !== undefined)
  if (values.length === 0) return undefined
  return html`<li><b>${arrow(values.map((value) => figure(value, metricWithUnit(metric, value))))}</b> ${name}</li>\n`
}

function limitsMet({ evaluation: { limits } }: ReviewedDesign): string {
  return `${limits.filter(({ met }) => met).length} of ${limits.length}`
}

function arrow(texts: readonly Content[]): Content {
  return texts.length > 1 ? [html`<small>${texts[0]} →</small> `, texts[1]] : texts[0]
}
