import { METRIC_QUANTITIES } from '../../../charts/quantity.js'
import type { Stack } from '../../../stack/stack.js'
import { degrees } from '../../../studies/evaluate.js'
import type { Review } from '../../../studies/review.js'
import { illuminantText } from '../../appearanceSheets.js'
import { given } from '../../decimals.js'
import { askedText, levelText } from '../../limitsText.js'
import { questionText } from '../../optimizeText.js'
import { type Content, html, type Markup } from '../markup.js'

/** What is asked, from where it is looked at, and under which light. */
export function questionSection({ designs, optimum }: Review): Markup {
  const [{ stack, evaluation }] = designs
  return html`<dl>
${entry('Seen from', directionsText(stack))}
${entry('Under', `${illuminantText(stack.conditions.illuminant)}, ${stack.conditions.observer}° observer, ${wavelengthsText(stack)}`)}
${stack.ambient.length > 0 && entry('Ambient light', stack.ambient.map((lx) => `${given(lx)} lx`).join(', '))}
${stack.emission.luminance > 0 && entry('Lit screen', `${given(stack.emission.luminance)} cd/m² at the eye, on axis, through the laminate`)}
${
  evaluation.limits.length > 0 &&
  entry(
    'Limits',
    html`<ul>${evaluation.limits.map(
      (limit) =>
        html`<li>${METRIC_QUANTITIES[limit.metric].label}${levelText(limit)}, θ ${given(limit.theta_deg)}° φ ${given(limit.phi_deg)}°: ${askedText(limit)}</li>`,
    )}</ul>`,
  )
}
${optimum && entry('Search', html`${questionText(optimum)}; varied: ${Object.keys(optimum.best.parameters).join(', ')}`)}
${stack.notes !== undefined && entry('Notes of the file', stack.notes)}
</dl>`
}

function entry(term: string, text: Content): Markup {
  return html`<dt>${term}</dt><dd>${text}</dd>\n`
}

function directionsText({ conditions: { directions } }: Stack): string {
  return directions.map(({ theta, phi }) => `θ ${given(degrees(theta))}° φ ${given(degrees(phi))}°`).join('; ')
}

function wavelengthsText({ conditions: { wavelengths } }: Stack): string {
  const { from, to, step } = wavelengths
  return `${given(from)} to ${given(to)} nm by ${given(step)} nm`
}
