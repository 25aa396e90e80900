/**
 * The lit screen through polarized eyewear: luminance and color at every roll angle of the lens. A retarder in front of the
 * polarizer is just another layer of the stack.
 */
import { Scene } from '../appearance/scene.js'
import { illuminantAt } from '../color/illuminant.js'
import { createColorWeights } from '../color/weights.js'
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
  const n = scene.wavelengthsNm.length
  const look = scene.look(stack, theta, phi)
  const stokes = new Float64Array(4 * n)
  look.solver.emissionStokes(stokes)
  const luminance = stack.emission.luminance * scene.emissionShare(stack, look)
  const tristimulus = createTristimulus(stack, scene.wavelengthsNm)
  const bare = tristimulus((i) => stokes[i])
  const relative = (xyz: Xyz): Xyz => [(100 * xyz[0]) / bare[1], (100 * xyz[1]) / bare[1], (100 * xyz[2]) / bare[1]]
  const seen = rollAngles(rollStep).map((roll) => {
    // From the plane of incidence to the axis of the lens; y' lies clockwise of x' as the viewer sees it.
    const angle = 2 * (phi - roll)
    const [c, s] = [Math.cos(angle), Math.sin(angle)]
    const through = tristimulus((i) => {
      const [all, linear] = [stokes[i], c * stokes[n + i] + s * stokes[2 * n + i]]
      return ((1 + lensLeakage) * all + (1 - lensLeakage) * linear) / 2
    })
    const transmittance = through[1] / bare[1]
    return {
      roll_deg: degrees(roll),
      transmittance,
      ...(luminance > 0 && { luminance: luminance * transmittance }),
      xyz: relative(through),
      delta_uv: uvDistance(through, bare),
    }
  })
  const visible = BLACK * Math.max(...seen.map(({ transmittance }) => transmittance))
  const rolls = seen.map(({ delta_uv, ...roll }) => (roll.transmittance < visible ? roll : { ...roll, delta_uv }))
  return {
    title: stack.title,
    theta_deg: degrees(theta),
    phi_deg: degrees(phi),
    bare_xyz: relative(bare),
    rolls,
    summary: summarize(rolls),
  }
}

function rollAngles(step: number): number[] {
  const count = Math.max(1, Math.round(Math.PI / step))
  return Array.from({ length: count }, (_, k) => (k * Math.PI) / count)
}

/** X, Y, Z of light given relative to what the panel emits. */
function createTristimulus(stack: Stack, wavelengthsNm: Float64Array): (light: (i: number) => number) => Xyz {
  const emitted = illuminantAt(stack.emission.spectrum, wavelengthsNm)
  const weights = createColorWeights(wavelengthsNm, stack.conditions.observer, emitted)
  return (light) => {
    const sum: [number, number, number] = [0, 0, 0]
    for (let i = 0; i < wavelengthsNm.length; i++) {
      const value = light(i)
      sum[0] += weights.x[i] * value
      sum[1] += weights.y[i] * value
      sum[2] += weights.z[i] * value
    }
    return sum
  }
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
