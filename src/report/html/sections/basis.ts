import { degrees } from '../../../studies/evaluate.js'
import type { Review } from '../../../studies/review.js'
import { illuminantText } from '../../appearanceSheets.js'
import { given } from '../../decimals.js'
import { ESTIMATE_CAUTION } from '../../evaluateText.js'
import { type Content, html, type Markup } from '../markup.js'

/** What the figures rest on: assumptions, sources, limits of the model, cautions. */
export function basisSection(review: Review): Content[] {
  const { laminate } = review.designs[review.designs.length - 1]
  const indices = laminate.materials.map(
    ({ name, title, source, range_nm: [from, to] }) =>
      `Refractive index of ${name} (${title}), ${given(from)} to ${given(to)} nm: ${source}`,
  )
  return [
    list('Assumptions', assumptions(review)),
    list('Sources', [...SOURCES, ...indices, FROM_THE_FILE]),
    list('Limits of the model', MODEL_LIMITS),
    list('Cautions', CAUTIONS),
  ]
}

function list(title: string, items: readonly string[]): Markup {
  return html`<div class="keep"><h3>${title}</h3><ul>${items.map((item) => html`<li>${item}</li>\n`)}</ul></div>`
}

const FROM_THE_FILE =
  'All other figures of films, panel and emission: the stack file; their origin is for its author to state.'

function assumptions({ designs }: Review): string[] {
  const { stack, laminate } = designs[designs.length - 1]
  const { wavelengths, observer, illuminant, color_weights } = stack.conditions
  const coherent = laminate.layers.filter((layer) => layer.coherent).map(({ id }) => id)
  const { emission, panel } = stack
  return [
    `Unpolarized light of illuminant ${illuminantText(illuminant)}, CIE ${observer}° observer, summed from ${given(wavelengths.from)} to ${given(wavelengths.to)} nm by ${given(wavelengths.step)} nm; colors against the illuminant’s white.`,
    `Color-weighted reflectance weighs X, Y, Z as ${color_weights.map(given).join(' : ')}.`,
    'Reflectances are specular: the source stands opposite the eye. Directions are (θ, φ): θ from the normal, φ counter-clockwise from three o’clock as the viewer sees the screen.',
    coherent.length > 0
      ? `Joined by amplitudes (coherent): ${coherent.join(', ')}; all other layers by intensities.`
      : 'All layers are joined by intensities: none is thin enough to show fringes.',
    panel.kind === 'mirror'
      ? 'The panel is a mirror of the stated reflectance, of which the depolarized share returns unpolarized.'
      : 'The panel is a half-space of metal.',
    ...(emission.luminance > 0
      ? [
          `Ambient contrast: uniform illuminance; ${given(emission.luminance)} cd/m² lit and ${given(emission.dark_luminance)} cd/m² switched off, at the eye and on axis; emitted light ${emissionText(emission.polarization)}.`,
        ]
      : []),
  ]
}

function emissionText(polarization: Review['designs'][number]['stack']['emission']['polarization']): string {
  if (polarization === 'none') return 'unpolarized'
  const { axis, ellipticity, degree } = polarization
  return `${given(100 * degree)} % polarized, axis ${given(degrees(axis))}°, ellipticity ${given(degrees(ellipticity))}°`
}

const SOURCES = [
  'Color-matching functions and illuminants: CIE 015; CIELAB: ISO/CIE 11664-4; color differences: ISO/CIE 11664-6.',
  'Layers: Berreman’s 4 × 4 equations in closed form; thick layers as incoherent partial waves after Nichols, Arteaga, Martin and Kahr, J. Opt. Soc. Am. A 32 (2015).',
  'Swatches: sRGB, IEC 61966-2-1, with the Bradford adaptation of ICC.1.',
]

const MODEL_LIMITS = [
  'Plane layers, and one plane wave for each direction.',
  'Scattering only as the panel’s depolarized share: no haze, no anti-glare texture.',
  'No diffraction by the pixel pitch.',
  'Walk-off of rays inside thick films is ignored.',
]

const CAUTIONS = [
  ESTIMATE_CAUTION,
  'Sign-off needs a measured sample, in the geometry of the governing standard, by whoever is responsible for the product.',
  'In vehicles, aircraft and medicine, local codes and the responsible engineers decide; nothing here replaces their judgment.',
  'Swatches depend on the screen or printer that shows them and on the light around it: they compare, they do not measure.',
]
