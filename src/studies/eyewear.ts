/**
 * The lit screen through polarized eyewear: luminance and color at every roll angle of the lens. A retarder in front of the
 * polarizer is just another layer of the stack.
 */
import { type Look, Scene } from '../appearance/scene.js'
import { illuminantAt } from '../color/illuminant.js'
import { createColorWeights } from '../color/weights.js'
import { spectrumToXyz } from '../color/xyz.js'
import type { Direction, Stack } from '../stack/stack.js'
import { degrees } from './evaluate.js'

export interface EyewearQuestion extends Direction {
  /** rad; the roll runs from 0 to below 180°. */
  readonly rollStep: number
  /** Transmittance of the lens across its axis over that along it (0: an ideal polarizer). */
  readonly lensLeakage?: number
}

export interface Eyewear {
  readonly title: string
  readonly theta_deg: number
  readonly phi_deg: number
  /** X, Y, Z of the lit screen without the lens, Y = 100. */
  readonly bare_xyz: Xyz
  readonly rolls: readonly EyewearRoll[]
  readonly summary: {
    readonly darkest: EyewearRoll
    readonly brightest: EyewearRoll
    readonly largest_color_shift: EyewearRoll
  }
}

type Xyz = readonly [number, number, number]

/** Seen through the lens with its transmission axis at `roll_deg`, counter-clockwise from three o'clock. */
export interface EyewearRoll {
  readonly roll_deg: number
  /** Share of the screen's luminance that passes a lens which is clear along its axis: ½ of unpolarized light. */
  readonly transmittance: number
  /** cd/m2, where the stack file states the luminance. */
  readonly luminance?: number
  /** X, Y, Z with Y = 100 for the screen without the lens. */
  readonly xyz: Xyz
  /** CIE 1976 u'v' distance from the screen without the lens; absent of rolls all but black (1 % of the brightest). */
  readonly delta_uv?: number
}

/** Rolls darker than this share of the brightest have no color to speak of. */
const BLACK = 0.01

/** Needs a mirror panel, whose emission the stack file describes. */
export function eyewear(stack: Stack, { theta, phi, rollStep, lensLeakage = 0 }: EyewearQuestion): Eyewear {
  const scene = new Scene(stack)
  const look = scene.look(stack, theta, phi)
  const light = polarizedXyz(stack, scene, look)
  const luminance = stack.emission.luminance * scene.emissionShare(stack, look)
  const seen = rollAngles(rollStep).map((roll) => {
    const xyz = throughLens(light, phi - roll, lensLeakage)
    const transmittance = xyz[1] / 100
    return {
      roll_deg: degrees(roll),
      transmittance,
      ...(luminance > 0 && { luminance: luminance * transmittance }),
      xyz,
      delta_uv: uvDistance(xyz, light[0]),
    }
  })
  const visible = BLACK * Math.max(...seen.map(({ transmittance }) => transmittance))
  const rolls = seen.map(({ delta_uv, ...roll }) => (roll.transmittance < visible ? roll : { ...roll, delta_uv }))
  return {
    title: stack.title,
    theta_deg: degrees(theta),
    phi_deg: degrees(phi),
    bare_xyz: light[0],
    rolls,
    summary: summarize(rolls),
  }
}

function rollAngles(step: number): number[] {
  const count = Math.max(1, Math.round(Math.PI / step))
  return Array.from({ length: count }, (_, k) => (k * Math.PI) / count)
}

/** X, Y, Z of the Stokes components S0, S1, S2 of the light to the eye, Y of S0 being 100. */
function polarizedXyz(stack: Stack, { wavelengthsNm }: Scene, { solver }: Look): [Xyz, Xyz, Xyz] {
  const n = wavelengthsNm.length
  const stokes = new Float64Array(4 * n)
  solver.emissionStokes(stokes)
  const emitted = illuminantAt(stack.emission.spectrum, wavelengthsNm)
  const weights = createColorWeights(wavelengthsNm, stack.conditions.observer, emitted)
  const [s0, s1, s2] = [0, 1, 2].map((k) => spectrumToXyz(weights, stokes.subarray(k * n, (k + 1) * n)))
  const relative = ([x, y, z]: Xyz): Xyz => [(100 * x) / s0[1], (100 * y) / s0[1], (100 * z) / s0[1]]
  return [relative(s0), relative(s1), relative(s2)]
}

/** `angle` from the axis of the lens to the plane of incidence; y' lies clockwise of x' as the viewer sees it. */
function throughLens([s0, s1, s2]: readonly [Xyz, Xyz, Xyz], angle: number, leakage: number): Xyz {
  const [c, s] = [Math.cos(2 * angle), Math.sin(2 * angle)]
  const through = (k: 0 | 1 | 2) => ((1 + leakage) * s0[k] + (1 - leakage) * (c * s1[k] + s * s2[k])) / 2
  return [through(0), through(1), through(2)]
}

function summarize(rolls: readonly EyewearRoll[]): Eyewear['summary'] {
  const extreme = (value: (roll: EyewearRoll) => number) => rolls.reduce((a, b) => (value(b) > value(a) ? b : a))
  return {
    darkest: extreme(({ transmittance }) => -transmittance),
    brightest: extreme(({ transmittance }) => transmittance),
    largest_color_shift: extreme(({ delta_uv }) => delta_uv ?? -1),
  }
}

/** Distance in the CIE 1976 uniform chromaticity diagram (ISO/CIE 11664-5); 0 where nothing comes through. */
function uvDistance(a: Xyz, b: Xyz): number {
  const [first, second] = [chromaticity(a), chromaticity(b)]
  if (first === undefined || second === undefined) return 0
  return Math.hypot(first[0] - second[0], first[1] - second[1])
}

function chromaticity([x, y, z]: Xyz): [number, number] | undefined {
  const sum = x + 15 * y + 3 * z
  return sum > 1e-9 ? [(4 * x) / sum, (9 * y) / sum] : undefined
}
