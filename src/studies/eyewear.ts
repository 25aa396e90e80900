/**
 * The lit screen through polarized eyewear: luminance and color at every roll angle of the lens. A retarder in front of the
 * polarizer is just another layer of the stack.
 */
import { Scene } from '../appearance/scene.js'
import { illuminantAt } from '../color/illuminant.js'
import { createColorWeights } from '../color/weights.js'
import type { Stack } from '../stack/stack.js'
import { degrees } from './evaluate.js'

export interface EyewearQuestion {
  readonly theta: number
  readonly phi: number
  /** rad; the roll runs from 0 to below 180°. */
  readonly rollStep: number
  /** Transmittance of the lens across its axis over that along it (0: an ideal polarizer). */
  readonly lensLeakage?: number
}

export interface Eyewear {
  readonly title: string
  readonly theta_deg: number
  readonly phi_deg: number
  readonly rolls: readonly EyewearRoll[]
  readonly summary: {
    readonly darkest: EyewearRoll
    readonly brightest: EyewearRoll
    readonly largest_color_shift: EyewearRoll
  }
}

/** Seen through the lens with its transmission axis at `roll_deg`, counter-clockwise from three o'clock. */
export interface EyewearRoll {
  readonly roll_deg: number
  /** Against the same screen emitting unpolarized light: 1 means the lens takes no more than from any lamp. */
  readonly relative_luminance: number
  /** X, Y, Z with Y = 100 for the same screen emitting unpolarized light. */
  readonly xyz: readonly [number, number, number]
  /** CIE 1976 u'v' distance from the screen seen without the lens. */
  readonly delta_uv: number
}

/** Needs a mirror panel, whose emission the stack file describes. */
export function eyewear(stack: Stack, question: EyewearQuestion): Eyewear {
  const scene = new Scene(stack)
  const n = scene.wavelengthsNm.length
  const { solver } = scene.look(stack, question.theta, question.phi)
  const stokes = new Float64Array(4 * n)
  solver.emissionStokes(stokes)
  const emitted = illuminantAt(stack.emission.spectrum, scene.wavelengthsNm)
  const weights = createColorWeights(scene.wavelengthsNm, stack.conditions.observer, emitted)
  const tristimulus = (light: (i: number) => number): [number, number, number] => {
    const sum: [number, number, number] = [0, 0, 0]
    for (let i = 0; i < n; i++) {
      const value = light(i)
      sum[0] += weights.x[i] * value
      sum[1] += weights.y[i] * value
      sum[2] += weights.z[i] * value
    }
    return sum
  }
  const bare = tristimulus((i) => stokes[i])
  const leakage = question.lensLeakage ?? 0
  const contrast = (1 - leakage) / (1 + leakage)
  const rolls: EyewearRoll[] = []
  const count = Math.max(1, Math.round(Math.PI / question.rollStep))
  for (let k = 0; k < count; k++) {
    const roll = (k * Math.PI) / count
    // Axis of the lens to the plane of incidence, y' lying clockwise of x' as the viewer sees it.
    const angle = 2 * (question.phi - roll)
    const through = tristimulus(
      (i) => stokes[i] + contrast * (Math.cos(angle) * stokes[n + i] + Math.sin(angle) * stokes[2 * n + i]),
    )
    const xyz = through.map((value) => (100 * value) / bare[1]) as [number, number, number]
    rolls.push({ roll_deg: degrees(roll), relative_luminance: xyz[1] / 100, xyz, delta_uv: uvDistance(through, bare) })
  }
  const extreme = (better: (a: EyewearRoll, b: EyewearRoll) => boolean) =>
    rolls.reduce((a, b) => (better(b, a) ? b : a))
  return {
    title: stack.title,
    theta_deg: degrees(question.theta),
    phi_deg: degrees(question.phi),
    rolls,
    summary: {
      darkest: extreme((a, b) => a.relative_luminance < b.relative_luminance),
      brightest: extreme((a, b) => a.relative_luminance > b.relative_luminance),
      largest_color_shift: extreme((a, b) => a.delta_uv > b.delta_uv),
    },
  }
}

/** Distance in the CIE 1976 uniform chromaticity diagram (ISO/CIE 11664-5); 0 where nothing comes through. */
function uvDistance(a: readonly [number, number, number], b: readonly [number, number, number]): number {
  const [first, second] = [chromaticity(a), chromaticity(b)]
  if (first === undefined || second === undefined) return 0
  return Math.hypot(first[0] - second[0], first[1] - second[1])
}

function chromaticity([x, y, z]: readonly [number, number, number]): [number, number] | undefined {
  const sum = x + 15 * y + 3 * z
  return sum > 1e-9 ? [(4 * x) / sum, (9 * y) / sum] : undefined
}
