import type { QuantityKind } from '../units/quantity.js'

/** A numeric field of the stack file: what it measures and which values make physical sense, in internal units. */
export interface FieldLimits {
  readonly quantity: QuantityKind
  readonly min: number
  readonly max: number
  /** The limits themselves are excluded. */
  readonly open?: 'min' | 'max'
  /** Where a hand on a knob would look, given the present value. */
  readonly usual: (value: number) => readonly [number, number]
}

/** At least from `a` to `b`, and as far as the value. */
const spanning = (a: number, b: number) => (value: number) => [Math.min(a, value), Math.max(b, value)] as const
/** From nothing to twice the value. */
const uptoTwice = (least: number) => (value: number) => [0, Math.max(least, 2 * value)] as const

const TURN = 2 * Math.PI
const axis: FieldLimits = { quantity: 'angle', min: -TURN, max: TURN, usual: spanning(0, Math.PI) }
const share: FieldLimits = { quantity: 'share', min: 0, max: 1, usual: spanning(0, 1) }
const internalShare: FieldLimits = { ...share, open: 'min' }
const ratio: FieldLimits = { quantity: 'number', min: -10, max: 10, usual: spanning(0.7, 1.3) }
const plain: FieldLimits = { quantity: 'number', min: -1e12, max: 1e12, usual: uptoTwice(1) }

/** By the field's name, which means the same wherever it stands. */
export const FIELD_LIMITS = {
  thickness: { quantity: 'length', min: 0, max: 1e7, usual: uptoTwice(100) },
  slow_axis: axis,
  absorption_axis: axis,
  azimuth: axis,
  tilt: { ...axis, min: -Math.PI / 2, max: Math.PI / 2, usual: spanning(0, Math.PI / 2) },
  retardance: { quantity: 'length', min: -50_000, max: 50_000, usual: uptoTwice(300) },
  rth: { quantity: 'length', min: -50_000, max: 50_000, usual: spanning(-300, 300) },
  nz: { quantity: 'number', min: -1000, max: 1000, usual: spanning(-1, 2) },
  re450: ratio,
  re650: ratio,
  index: { quantity: 'number', min: 0.001, max: 20, usual: spanning(1.3, 2) },
  n: { quantity: 'number', min: 0.001, max: 20, usual: spanning(1.3, 2) },
  k: { quantity: 'number', min: 0, max: 100, usual: uptoTwice(0.01) },
  cauchy_nm: plain,
  single_transmittance: share,
  polarization_efficiency: share,
  k1: share,
  k2: share,
  transmission_axis_transmittance: internalShare,
  absorption_axis_transmittance: internalShare,
  reflectance: share,
  depolarized: share,
  luminance: { quantity: 'luminance', min: 0, max: 1e6, usual: uptoTwice(1000) },
  dark_luminance: { quantity: 'luminance', min: 0, max: 1e6, usual: uptoTwice(1) },
  axis,
  ellipticity: { ...axis, min: -Math.PI / 4, max: Math.PI / 4, usual: spanning(-Math.PI / 4, Math.PI / 4) },
  degree: share,
} as const satisfies Record<string, FieldLimits>

/** Quantities of the file that are no parameters. */
export const CONDITION_LIMITS = {
  wavelength: { quantity: 'length', min: 200, max: 2500 },
  step: { quantity: 'length', min: 0, max: 1000, open: 'min' },
  theta: { quantity: 'angle', min: 0, max: Math.PI / 2, open: 'max' },
  phi: { quantity: 'angle', min: -TURN, max: TURN },
  illuminance: { quantity: 'illuminance', min: 0, max: 1e6 },
  weight: { quantity: 'number', min: 0, max: 1e6 },
  quantile: { quantity: 'share', min: 0.001, max: 0.999 },
  noise: { quantity: 'share', min: 0, max: 1, open: 'min' },
} as const satisfies Record<string, Omit<FieldLimits, 'usual'>>

/** The field a parameter path ends in: `half.dispersion.re450`, `coat.indices.2.k`, `glass.index.cauchy_nm.1`. */
export function limitsOfPath(path: string): FieldLimits | undefined {
  const keys = path.split('.')
  while (keys.length > 1 && /^\d+$/.test(keys[keys.length - 1])) keys.pop()
  const name = keys[keys.length - 1] === 'indices' ? 'index' : keys[keys.length - 1]
  return Object.hasOwn(FIELD_LIMITS, name) ? FIELD_LIMITS[name as keyof typeof FIELD_LIMITS] : undefined
}
