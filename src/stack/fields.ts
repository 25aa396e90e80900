/**
 * The numeric fields a parameter path may name, by kind of layer and panel: how each is read from and written to the
 * checked object, what quantity it is, and its period. Given in the file or defaulted makes no difference.
 */
import type { QuantityKind } from '../units/quantity.js'
import { FIELD_LIMITS, type FieldLimits } from './fieldLimits.js'
import { retardanceAt550, rthAt550 } from './retardanceAt550.js'
import type {
  CrystalLayer,
  Emission,
  IndexLaw,
  Layer,
  Panel,
  PolarizerLayer,
  RetarderLayer,
  Spectrum,
} from './stack.js'

/** A part of a stack that owns parameters: a layer, the panel or the emission. */
export type Owner = Readonly<Record<string, unknown>>

export interface Field {
  /** Path below the owner, e.g. `slow_axis`, `dispersion.re450`, `indices.0.n`. */
  readonly path: string
  readonly kind: QuantityKind
  /** rad; absent for what does not repeat. */
  readonly period?: number
  /** Values that make sense whatever the file says, nm, rad, fractions. */
  readonly range: readonly [number, number]
  /** Where a hand on a knob would look, given the present value. */
  readonly usual: (value: number) => readonly [number, number]
  readonly get: (owner: Owner) => number
  /** Copy of the owner with the field set. */
  readonly set: (owner: Owner, value: number) => Owner
}

type FieldName = keyof typeof FIELD_LIMITS

/** How near a value comes to a limit that is excluded. */
const SMALLEST = 1e-12

/** Quantity and limits of a field, which its name tells. */
function measured(name: FieldName): Pick<Field, 'kind' | 'range' | 'usual'> {
  const limits: FieldLimits = FIELD_LIMITS[name]
  const least = limits.open === 'min' ? limits.min + SMALLEST : limits.min
  return { kind: limits.quantity, range: [least, limits.max], usual: limits.usual }
}

function plain(path: FieldName, period?: number): Field {
  return {
    path,
    ...measured(path),
    ...(period !== undefined && { period }),
    get: (owner) => owner[path] as number,
    set: (owner, value) => ({ ...owner, [path]: value }),
  }
}

/** Numeric fields of a layer as it stands: a table in place of a number is not a parameter. */
export function layerFields(layer: Layer): Field[] {
  const thickness = plain('thickness')
  switch (layer.kind) {
    case 'isotropic':
      return [thickness, ...indexFields('index', layer.index)]
    case 'retarder':
      return [thickness, plain('slow_axis', Math.PI), ...retarderFields(layer), ...indexFields('index', layer.index)]
    case 'polarizer':
      return [thickness, plain('absorption_axis', Math.PI), ...polarizerFields(layer), ...clearIndexFields(layer.index)]
    case 'crystal':
      return [
        thickness,
        plain('azimuth', layer.tilt === 0 ? Math.PI : 2 * Math.PI),
        plain('tilt'),
        ...crystalIndexFields(layer),
      ]
  }
}

export function panelFields(panel: Panel): Field[] {
  if (panel.kind === 'metal') return indexFields('index', panel.index)
  return [...clearIndexFields(panel.index), ...numbersOf(panel, ['reflectance', 'depolarized'])]
}

/** Luminances, and the state of the emission where it is a given one. */
export function emissionFields({ polarization }: Emission): Field[] {
  const luminances = [plain('luminance'), plain('dark_luminance')]
  return polarization === 'none' ? luminances : [...luminances, ...stateFields]
}

const stateFields: readonly Field[] = (['axis', 'ellipticity', 'degree'] as const).map((name) => ({
  path: `polarization.${name}`,
  ...measured(name),
  ...(name === 'axis' && { period: Math.PI }),
  get: (owner) => (owner.polarization as Record<string, number>)[name],
  set: (owner, value) => ({ ...owner, polarization: { ...(owner.polarization as object), [name]: value } }),
}))

function numbersOf<Key extends FieldName>(owner: { readonly [K in Key]?: Spectrum }, keys: readonly Key[]): Field[] {
  return keys.filter((key) => typeof owner[key] === 'number').map((key) => plain(key))
}

function polarizerFields(layer: PolarizerLayer): Field[] {
  const keys = [
    'single_transmittance',
    'polarization_efficiency',
    'k1',
    'k2',
    'transmission_axis_transmittance',
    'absorption_axis_transmittance',
  ] as const
  return numbersOf(layer, keys)
}

function retarderFields(layer: RetarderLayer): Field[] {
  const hasNz = layer.nz !== undefined || retardanceAt550(layer) !== 0
  const dispersed = layer.dispersion === undefined || 're450' in layer.dispersion
  return [
    ...numbersOf(layer, ['retardance']),
    ...(hasNz ? [nzField] : []),
    rthField,
    ...(dispersed && typeof layer.retardance === 'number' ? dispersionFields : []),
  ]
}

const reOf = (owner: Owner) => retardanceAt550(owner as unknown as RetarderLayer)

/** Setting nz drops rth, and the other way round: a film is described by one of them. */
const nzField: Field = {
  path: 'nz',
  ...measured('nz'),
  get: (owner) => (owner.nz as number | undefined) ?? (owner.rth as number) / reOf(owner) + 0.5,
  set: ({ rth: _, ...owner }, value) => ({ ...owner, nz: value }),
}

const rthField: Field = {
  path: 'rth',
  ...measured('rth'),
  get: (owner) => rthAt550(owner as unknown as RetarderLayer),
  set: ({ nz: _, ...owner }, value) => ({ ...owner, rth: value }),
}

/** A flat film has both ratios at 1. */
const dispersionFields: readonly Field[] = (['re450', 're650'] as const).map((ratio) => ({
  path: `dispersion.${ratio}`,
  ...measured(ratio),
  get: (owner) => (owner.dispersion as Record<string, number> | undefined)?.[ratio] ?? 1,
  set: (owner, value) => ({
    ...owner,
    dispersion: { re450: 1, re650: 1, ...(owner.dispersion as object), [ratio]: value },
  }),
}))

/** `index`, `index.n`, `index.k`, `index.cauchy_nm.0` … as far as the law has numbers. */
function indexFields(path: string, law: IndexLaw): Field[] {
  const read = (owner: Owner) => owner[path] as IndexLaw
  const write = (owner: Owner, value: IndexLaw): Owner => ({ ...owner, [path]: value })
  return lawFields(path, law, read, write)
}

/** Of a medium that has no absorption of its own here. */
function clearIndexFields(law: IndexLaw): Field[] {
  return indexFields('index', law).filter(({ path }) => path !== 'index.k')
}

function crystalIndexFields(layer: CrystalLayer): Field[] {
  return layer.indices.flatMap((law, axis) =>
    lawFields(
      `indices.${axis}`,
      law,
      (owner) => (owner.indices as IndexLaw[])[axis],
      (owner, value) => ({
        ...owner,
        indices: (owner.indices as IndexLaw[]).map((old, k) => (k === axis ? value : old)),
      }),
    ),
  )
}

function lawFields(
  path: string,
  law: IndexLaw,
  read: (owner: Owner) => IndexLaw,
  write: (owner: Owner, value: IndexLaw) => Owner,
): Field[] {
  const parts = (owner: Owner) => complexOf(read(owner))
  const real: Field[] = [
    {
      path: `${path}.n`,
      ...measured('n'),
      get: (owner) => parts(owner).n as number,
      set: (owner, value) => write(owner, { ...parts(owner), n: value }),
    },
  ]
  const imaginary: Field = {
    path: `${path}.k`,
    ...measured('k'),
    get: (owner) => parts(owner).k as number,
    set: (owner, value) => write(owner, { ...parts(owner), k: value }),
  }
  if (typeof law === 'number') {
    const whole: Field = {
      path,
      ...measured('index'),
      get: (owner) => parts(owner).n as number,
      set: (owner, value) => write(owner, typeof read(owner) === 'number' ? value : { ...parts(owner), n: value }),
    }
    return [whole, ...real, imaginary]
  }
  if ('n' in law) return [...(typeof law.n === 'number' ? real : []), ...(typeof law.k === 'number' ? [imaginary] : [])]
  if ('cauchy_nm' in law) return cauchyFields(path, read, write)
  return []
}

function complexOf(law: IndexLaw): { n: Spectrum; k: Spectrum } {
  return typeof law === 'object' && 'n' in law ? law : { n: law as number, k: 0 }
}

function cauchyFields(
  path: string,
  read: (owner: Owner) => IndexLaw,
  write: (owner: Owner, value: IndexLaw) => Owner,
): Field[] {
  const terms = (owner: Owner) => (read(owner) as { cauchy_nm: readonly [number, number, number] }).cauchy_nm
  return [0, 1, 2].map((k) => ({
    path: `${path}.cauchy_nm.${k}`,
    ...measured('cauchy_nm'),
    get: (owner) => terms(owner)[k],
    set: (owner, value) =>
      write(owner, { cauchy_nm: terms(owner).map((old, j) => (j === k ? value : old)) as [number, number, number] }),
  }))
}
