import type { Cone } from '../../studies/cone.js'
import type { Review } from '../../studies/review.js'
import { Markup } from './markup.js'

/** Digits the live charts get: finer than a pixel, half the size of the page. */
const DIGITS = 6

/**
 * The review as JSON for the page's script, without what no chart shows: film cards with their spectra, the layers, which stand in
 * the drawing, and most of the cones. Nothing in it can end the element it stands in.
 */
export function pageData(review: Review): Markup {
  const designs = review.designs.map((design) => {
    const { compare: _, ...stack } = design.stack
    return { ...design, stack: { ...stack, layers: [] }, ...(design.cone && { cone: charted(design.cone) }) }
  })
  const text = JSON.stringify({ ...review, designs }, (_, value) =>
    typeof value === 'number' && Number.isFinite(value) ? Number(value.toPrecision(DIGITS)) : value,
  )
  return new Markup(text.replaceAll('<', '\\u003c'))
}

function charted({ lab: _, delta_e00: __, emission_transmittance: ___, ambient_contrast: ____, ...cone }: Cone) {
  return cone
}
