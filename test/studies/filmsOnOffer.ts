/** A laminate with film cards for its slots, built in place: ideal sheets, so that the twin formulas of `twoFilms.ts` hold. */
import type { Direction, FilmCard, Layer, Limit, OptimizeQuestion, Stack } from '../../src/stack/stack.js'
import { DEG, polarizer, retarder, stackOf } from './builtStack.js'

export function card(name: string, layer: Layer, price_per_m2?: number): FilmCard {
  return { name, file: `films/${name}.film.yaml`, ...(price_per_m2 !== undefined && { price_per_m2 }), layer }
}

export const HALVES_NM = [240, 255, 270, 285]
export const QUARTERS_NM = [105, 120, 135, 150, 165]

/** Dearer films are nearer to 270 nm and 135 nm. */
export const HALVES = HALVES_NM.map((nm, k) => card(`half-${nm}`, retarder('half', 0, nm, { thickness: 20e6 }), 10 + k))
export const QUARTERS = QUARTERS_NM.map((nm, k) => card(`quarter-${nm}`, retarder('quarter', 0, nm), 20 - 2 * k))
export const POLARIZERS = [
  card('polarizer-dense', polarizer(0, 0.8, 1e-4), 5),
  card('polarizer-clear', polarizer(0, 0.95, 2e-3), 9),
]

export const HEAD_ON: Direction = { theta: 0, phi: 0 }
export const AT_45: Direction = { theta: 45 * DEG, phi: 30 * DEG }

export interface Offer {
  readonly slots: Readonly<Record<string, readonly FilmCard[]>>
  readonly views?: readonly Direction[]
  readonly subject_to?: readonly Limit[]
  readonly limits?: readonly Limit[]
  readonly optimize?: boolean
  /** Default 10 nm. */
  readonly stepNm?: number
  readonly minimize?: Partial<OptimizeQuestion['minimize']>
}

/** Polarizer passing horizontal light, two films whose axes are free, a mirror; 400 to 700 nm. */
export function stackWithCards({ slots, views = [HEAD_ON], subject_to = [], limits = [], ...rest }: Offer): Stack {
  const bare = stackOf([polarizer(0), retarder('half', 20, 270), retarder('quarter', 80, 135)])
  return {
    ...bare,
    conditions: { ...bare.conditions, wavelengths: { from: 400, to: 700, step: rest.stepNm ?? 10 }, directions: views },
    limits,
    compare: { slots, optimize: rest.optimize ?? true },
    optimize: {
      vary: {
        'half.slow_axis': { from: 0, to: 180 * DEG },
        'quarter.slow_axis': { from: 0, to: 180 * DEG },
        // Of a slot's film only the axis is free: the retardance comes with the card.
        'quarter.retardance': { from: 100, to: 170 },
      },
      minimize: {
        metric: 'luminous_reflectance',
        sense: 1,
        views: views.map((view) => ({ ...view, weight: 1 })),
        ...rest.minimize,
      },
      subject_to,
    },
  }
}
