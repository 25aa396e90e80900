/**
 * What happens to the light on its way: the state of polarization after each layer, going in and coming back, on the
 * first pass (reflections that join later left out). Flux is relative to what fell on the screen.
 */
import { Scene } from '../appearance/scene.js'
import { firstPass, type PassedLight } from '../optics/firstPass.js'
import type { Direction, Stack } from '../stack/stack.js'
import { degrees } from './evaluate.js'
import { slicesOf } from './slices.js'

/** A blue, the green of the quoted retardances, a red: common practice, no source. */
export const USUAL_WAVELENGTHS_NM: readonly number[] = [450, 550, 650]

export interface ItineraryQuestion extends Direction {
  readonly wavelengthsNm: readonly number[]
}

export interface Itinerary {
  readonly title: string
  readonly theta_deg: number
  readonly phi_deg: number
  /** By wavelength; of each, in the order of the way: in through every layer to the panel, and out again into the air. */
  readonly passes: readonly Pass[]
}

/**
 * Light just after a layer: behind it going in, in front of it coming out; at the panel before and after the mirror. Stokes
 * vector in the display's frame (S1 > 0 along 0°, S2 > 0 along 45° as the viewer sees it, S3 > 0 right-handed as named from
 * the source); S0 is the flux, so a half-wave film keeps it and a polarizer halves it.
 */
export interface Pass {
  readonly wavelength_nm: number
  readonly layer: string
  readonly direction: 'in' | 'out'
  readonly stokes: Stokes
  /** Of the polarization ellipse, [0, 180). */
  readonly azimuth_deg: number
  /** -45 (left circular) to 45 (right circular). */
  readonly ellipticity_deg: number
  readonly degree_of_polarization: number
  /** States inside a film that turns the light, on the way to the one after it; evenly spaced. */
  readonly within?: readonly Stokes[]
}

type Stokes = readonly [number, number, number, number]

export function itinerary(stack: Stack, { wavelengthsNm, theta, phi }: ItineraryQuestion): Itinerary {
  return {
    title: stack.title,
    theta_deg: degrees(theta),
    phi_deg: degrees(phi),
    passes: wavelengthsNm.flatMap((nm) => passesAt(stack, nm, { theta, phi })),
  }
}

/** A place on the way, and the layer it belongs to. */
interface Station {
  readonly layer: string
  /** In the middle of a film. */
  readonly within: boolean
}

function passesAt(stack: Stack, wavelength_nm: number, direction: Direction): Pass[] {
  const slices = stack.layers.map((layer) => slicesOf(layer, wavelength_nm))
  const scene = new Scene(stack, Float64Array.of(wavelength_nm))
  const { solver } = scene.look({ ...stack, layers: slices.flat() }, direction.theta, direction.phi)
  const { down, up } = firstPass(solver)
  const films = stack.layers.map(({ id }, k) => stations(id, slices[k].length))
  const [end, air] = [stations('panel', 1), stations('air', 1)]
  const at = (light: PassedLight, station: Station, sense: 1 | -1) => ({
    station,
    stokes: stokesOf(light, sense, direction),
  })
  const inward = [...films, end].flat().map((station, k) => at(down[k], station, 1))
  const outward = [end, ...films.toReversed(), air].flat().map((station, k) => at(up[k], station, -1))
  return [...passes(inward, 'in'), ...passes(outward, 'out')].map((pass) => ({ wavelength_nm, ...pass }))
}

function stations(layer: string, count: number): Station[] {
  return Array.from({ length: count }, (_, k) => ({ layer, within: k < count - 1 }))
}

/** Gathers what lies inside a film under the pass that leaves it. */
function passes(
  way: readonly { readonly station: Station; readonly stokes: Stokes }[],
  direction: 'in' | 'out',
): Omit<Pass, 'wavelength_nm'>[] {
  const found: Omit<Pass, 'wavelength_nm'>[] = []
  let within: Stokes[] = []
  for (const { station, stokes } of way) {
    if (station.within) within.push(stokes)
    else {
      found.push({
        layer: station.layer,
        direction,
        stokes,
        ...ellipseOf(stokes),
        ...(within.length > 0 && { within }),
      })
      within = []
    }
  }
  return found
}

/**
 * Flux and state of a tangential coherency vector in a medium of index m: Ep = Ex' √(m/cm), Es = Ey' √(m cm), over cos θ of
 * the light that fell on the screen; turned from the plane of incidence into the display's frame. `sense` is +1 for light
 * going in (along the solver's z), -1 coming out: the hand is named along the propagation.
 */
function stokesOf({ coherency, index: [index] }: PassedLight, sense: 1 | -1, { theta, phi }: Direction): Stokes {
  const [x, y, u, v] = coherency
  const sin = Math.sin(theta) / index
  const cos = Math.sqrt(Math.max(0, 1 - sin * sin))
  const scale = index / Math.cos(theta)
  const p = (x * scale) / cos
  const s = y * scale * cos
  const re = 2 * u * scale
  const [c, d] = [Math.cos(2 * phi), Math.sin(2 * phi)]
  return [p + s, c * (p - s) + d * re, d * (p - s) - c * re, -2 * sense * v * scale]
}

/** The ellipse of the polarized part. */
function ellipseOf([s0, s1, s2, s3]: Stokes) {
  const polarized = Math.hypot(s1, s2, s3)
  const azimuth = degrees(Math.atan2(s2, s1) / 2)
  return {
    // A hair below 0 would be rounded to 180.
    azimuth_deg: azimuth < 0 ? (azimuth + 180) % 180 : azimuth,
    ellipticity_deg: polarized > 0 ? degrees(Math.asin(Math.max(-1, Math.min(1, s3 / polarized))) / 2) : 0,
    degree_of_polarization: s0 > 0 ? Math.min(1, polarized / s0) : 0,
  }
}
