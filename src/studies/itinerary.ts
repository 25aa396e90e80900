/**
 * What happens to the light on its way: the state of polarization after each layer, going in and coming back, on the
 * first pass (reflections that join later left out). Flux is relative to what fell on the screen.
 */
import { Scene } from '../appearance/scene.js'
import { indexAt } from '../materials/indexAt.js'
import { firstPass } from '../optics/firstPass.js'
import type { Layer, Stack } from '../stack/stack.js'
import { degrees } from './evaluate.js'

export interface ItineraryQuestion {
  readonly wavelengthsNm: readonly number[]
  readonly theta: number
  readonly phi: number
}

export interface Itinerary {
  readonly title: string
  readonly theta_deg: number
  readonly phi_deg: number
  readonly passes: readonly Pass[]
}

/**
 * Light just after a layer. Stokes vector in the display's frame (S1 > 0 along 0°, S2 > 0 along 45° as the viewer sees
 * it, S3 > 0 right-handed as named from the source); S0 is the flux, so a half-wave film keeps it and a polarizer halves it.
 */
export interface Pass {
  readonly wavelength_nm: number
  readonly layer: string
  readonly direction: 'in' | 'out'
  readonly stokes: readonly [number, number, number, number]
  /** Of the polarization ellipse, [0, 180). */
  readonly azimuth_deg: number
  /** -45 (left circular) to 45 (right circular). */
  readonly ellipticity_deg: number
  readonly degree_of_polarization: number
}

/** Needs a mirror panel: over a metal half-space the last face is the mirror. */
export function itinerary(stack: Stack, { wavelengthsNm, theta, phi }: ItineraryQuestion): Itinerary {
  const wavelengths = Float64Array.from(wavelengthsNm)
  const scene = new Scene(stack, wavelengths)
  const { solver } = scene.look(stack, theta, phi)
  const { down, up } = firstPass(solver)
  const names = [...stack.layers.map((layer) => layer.id), 'panel']
  const indices = [...stack.layers.map(meanIndexLaw), stack.panel.index].map((law) => indexAt(law, wavelengths).n)
  const passes: Pass[] = []
  wavelengthsNm.forEach((wavelength_nm, i) => {
    const at = (light: Float64Array, index: number) =>
      describe(component(light, i, wavelengths.length), index, theta, phi)
    down.forEach((light, k) => {
      const state = at(light, indices[k][i])
      passes.push({ wavelength_nm, layer: names[k], direction: 'in', ...withHand(state, 1) })
    })
    up.forEach((light, k) => {
      const layer = names.length - 2 - k
      const state = at(light, layer >= 0 ? indices[layer][i] : 1)
      passes.push({ wavelength_nm, layer: layer >= 0 ? names[layer] : 'air', direction: 'out', ...withHand(state, -1) })
    })
  })
  return { title: stack.title, theta_deg: degrees(theta), phi_deg: degrees(phi), passes }
}

function meanIndexLaw(layer: Layer) {
  return layer.kind === 'crystal' ? layer.indices[1] : layer.index
}

function component(light: Float64Array, i: number, n: number): [number, number, number, number] {
  return [light[i], light[n + i], light[2 * n + i], light[3 * n + i]]
}

/**
 * Flux and state of a tangential coherency vector in a medium of index m: Ep = Ex' √(m/cm), Es = Ey' √(m cm), over cos θ of
 * the light that fell on the screen; turned from the plane of incidence into the display's frame.
 */
function describe([x, y, u, v]: [number, number, number, number], index: number, theta: number, phi: number) {
  const sin = Math.sin(theta) / index
  const cos = Math.sqrt(Math.max(0, 1 - sin * sin))
  const scale = index / Math.cos(theta)
  const p = (x * scale) / cos
  const s = y * scale * cos
  const re = 2 * u * scale
  const s3 = -2 * v * scale
  const [c, d] = [Math.cos(2 * phi), Math.sin(2 * phi)]
  return { s0: p + s, s1: c * (p - s) + d * re, s2: d * (p - s) - c * re, s3 }
}

/** `sense` +1 for light going in (along the solver's z), -1 coming back: the hand is named along the propagation. */
function withHand({ s0, s1, s2, s3 }: ReturnType<typeof describe>, sense: 1 | -1) {
  const hand = sense * s3
  const polarized = Math.hypot(s1, s2, hand)
  const azimuth = degrees(Math.atan2(s2, s1) / 2)
  return {
    stokes: [s0, s1, s2, hand] as const,
    azimuth_deg: azimuth < 0 ? azimuth + 180 : azimuth,
    ellipticity_deg: polarized > 0 ? degrees(Math.asin(Math.max(-1, Math.min(1, hand / polarized))) / 2) : 0,
    degree_of_polarization: s0 > 0 ? Math.min(1, polarized / s0) : 0,
  }
}
