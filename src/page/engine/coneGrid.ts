const DEGREE = Math.PI / 180
export const CONE_STEP_RAD = { theta: 10 * DEGREE, phi: 15 * DEGREE } as const
const THETA_MAX_RAD = 60 * DEGREE

/** Directions of the cone that follows the hand, rad: θ from 0 to 60° (beyond that a screen is hardly read), φ all round. */
export function coneGrid(): { readonly thetas: readonly number[]; readonly phis: readonly number[] } {
  return { thetas: steps(THETA_MAX_RAD, CONE_STEP_RAD.theta, 1), phis: steps(2 * Math.PI, CONE_STEP_RAD.phi, 0) }
}

/** From 0 to `to`, the end counted in where `ends` is 1. */
function steps(to: number, step: number, ends: 0 | 1): number[] {
  return Array.from({ length: Math.round(to / step) + ends }, (_, k) => k * step)
}
