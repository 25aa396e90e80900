/** What a viewing cone comes to: its worst direction, how far it keeps a limit, its diffuse average. */
import { Scene } from '../appearance/scene.js'
import { gaussLegendre } from '../numeric/gaussLegendre.js'
import type { Stack } from '../stack/stack.js'
import { degrees } from './evaluate.js'

export interface ConeSummary {
  readonly worst: { readonly theta_deg: number; readonly phi_deg: number; readonly luminous_reflectance: number }
  readonly limit?: number
  /** Share of the cone's solid angle within the limit. */
  readonly share_within_limit?: number
  /** Largest θ up to which every azimuth meets the limit; absent where even head-on does not. */
  readonly theta_within_limit_deg?: number
  /** Luminous reflectance under uniform diffuse light: ∫ R cos θ dΩ / π over the hemisphere. */
  readonly diffuse_reflectance: number
  /** Whether half the azimuths were computed and the others taken from the half-turn symmetry. */
  readonly half_turn_symmetry: boolean
}

/** Luminous reflectance over the cone: `luminous[θ][φ]`, at least head-on; angles in rad. */
interface ConeField {
  readonly thetas: readonly number[]
  readonly phis: readonly number[]
  readonly luminous: readonly (readonly number[])[]
}

/** `limit` replaces that of the file, the first on luminous reflectance. */
export function summarizeCone(
  stack: Stack,
  field: ConeField,
  limit = limitOf(stack),
): Omit<ConeSummary, 'half_turn_symmetry' | 'diffuse_reflectance'> {
  return {
    worst: worstOf(field),
    ...(limit !== undefined && { limit, ...withinLimit(field, limit) }),
  }
}

function limitOf({ limits }: Stack): number | undefined {
  return limits.find(({ metric, max }) => metric === 'luminous_reflectance' && max !== undefined)?.max
}

function worstOf({ thetas, phis, luminous }: ConeField): ConeSummary['worst'] {
  let worst = { theta_deg: 0, phi_deg: 0, luminous_reflectance: luminous[0][0] }
  luminous.forEach((row, t) => {
    row.forEach((value, p) => {
      if (value <= worst.luminous_reflectance) return
      worst = { theta_deg: degrees(thetas[t]), phi_deg: degrees(phis[p]), luminous_reflectance: value }
    })
  })
  return worst
}

function withinLimit({ thetas, luminous }: ConeField, limit: number) {
  const step = thetas.length > 1 ? thetas[1] - thetas[0] : 0
  let solidAngle = 0
  let within = 0
  let largest: number | undefined
  let unbroken = true
  luminous.forEach((row, t) => {
    // The ring of directions nearest to this θ.
    const low = Math.max(0, thetas[t] - step / 2)
    const high = Math.min(thetas[thetas.length - 1], thetas[t] + step / 2)
    const ring = (Math.cos(low) - Math.cos(high)) / row.length
    const good = row.filter((value) => value <= limit).length
    solidAngle += ring * row.length
    within += ring * good
    unbroken = unbroken && good === row.length
    if (unbroken) largest = degrees(thetas[t])
  })
  return {
    share_within_limit: solidAngle > 0 ? within / solidAngle : Number(luminous[0]?.[0] <= limit),
    ...(largest !== undefined && { theta_within_limit_deg: largest }),
  }
}

/** Quadrature of the diffuse average: Gauss–Legendre in cos θ (where R is smooth up to grazing), equal steps in φ. */
const DIFFUSE_POLAR = 16
const DIFFUSE_AZIMUTHS = 12

/** 2 ∫ R(θ) cos θ d(cos θ), averaged over azimuth. */
export function diffuseReflectance(stack: Stack): number {
  const scene = new Scene(stack)
  const { nodes, weights } = gaussLegendre(DIFFUSE_POLAR)
  let sum = 0
  nodes.forEach((cos, k) => {
    for (let m = 0; m < DIFFUSE_AZIMUTHS; m++) {
      // By reciprocity half a turn tells all.
      const look = scene.lookOnce(stack, Math.acos(cos), (Math.PI * m) / DIFFUSE_AZIMUTHS)
      sum += (2 * cos * weights[k] * look.luminousReflectance) / DIFFUSE_AZIMUTHS
    }
  })
  return sum
}
