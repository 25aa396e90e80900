import type { Itinerary, Pass } from '../studies/itinerary.js'
import { fixed, given } from './decimals.js'
import { type Paint, PLAIN } from './paint.js'
import { type Column, textTable } from './textTable.js'

const COLUMNS: readonly Column[] = [
  { heading: '', align: 'left' },
  { heading: 'layer', align: 'left' },
  { heading: 'flux %', align: 'right' },
  { heading: 'polarized %', align: 'right' },
  { heading: 'azimuth', align: 'right' },
  { heading: 'ellipticity', align: 'right' },
  { heading: '', align: 'left' },
]
const LEGEND = [
  'the light just behind each layer going in, in front of each coming out; the first way only, without later reflections',
  'azimuth counter-clockwise from three o’clock as the viewer sees it; the hand is named from the source',
]

/** The way of the light, a table for each wavelength. */
export function itineraryText({ title, theta_deg, phi_deg, passes }: Itinerary, paint: Paint = PLAIN): string {
  const wavelengths = [...new Set(passes.map(({ wavelength_nm }) => wavelength_nm))]
  const tables = wavelengths.map((nm) => {
    const rows = passes.filter(({ wavelength_nm }) => wavelength_nm === nm).map(rowOf)
    return `${paint.strong(`${given(nm)} nm`)}\n${textTable(COLUMNS, rows)}`
  })
  const heading = `${paint.strong(title)}\nseen from θ ${given(theta_deg)}° φ ${given(phi_deg)}°`
  return `${[heading, ...tables, paint.faint(LEGEND.join('\n'))].join('\n\n')}\n`
}

/** Less polarized than this, light has no ellipse worth a figure. */
const POLARIZED = 0.001

function rowOf(pass: Pass): string[] {
  const { layer, direction, stokes, degree_of_polarization: degree } = pass
  const start = [direction, layer, fixed(100 * stokes[0], 3), fixed(100 * degree, 2)]
  if (degree < POLARIZED) return [...start, '–', '–', 'unpolarized']
  return [...start, azimuthText(pass), `${fixed(pass.ellipticity_deg, 2)}°`, shapeOf(pass)]
}

/** Within these of its end, an ellipse is called by the end's name, deg. */
const NEARLY_DEG = 0.5

/** A circle has no azimuth. */
function azimuthText({ azimuth_deg, ellipticity_deg }: Pass): string {
  if (Math.abs(ellipticity_deg) > 45 - NEARLY_DEG) return '–'
  const shown = fixed(azimuth_deg, 2)
  return shown === '180.00' ? '0.00°' : `${shown}°`
}

function shapeOf({ ellipticity_deg }: Pass): string {
  if (Math.abs(ellipticity_deg) < NEARLY_DEG) return 'linear'
  const shape = Math.abs(ellipticity_deg) > 45 - NEARLY_DEG ? 'circular' : 'elliptical'
  return `${ellipticity_deg > 0 ? 'right' : 'left'}-handed ${shape}`
}
