/**
 * The numeric fields a parameter path may name, by kind of layer and panel: how each is read from and written to the
 * checked object, what quantity it is, and its period. Given in the file or defaulted makes no difference.
 */
import type { QuantityKind } from '../units/quantity.js'
import type { CrystalLayer, IndexLaw, Layer, Panel, PolarizerLayer, RetarderLayer, Spectrum } from './stack.js'

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
  readonly get: (owner: Owner) => number
  /** Copy of the owner with the field set. */
  readonly set: (owner: Owner, value: number) => Owner
}

const LENGTH: readonly [number, number] = [0, 1e7]
const ANGLE: readonly [number, number] = [-2 * Math.PI, 2 * Math.PI]
const RETARDANCE: readonly [number, number] = [-1e5, 1e5]
const SHARE: readonly [number, number] = [0, 1]

function plain(path: string, kind: QuantityKind, range: readonly [number, number], period?: number): Field {
  return {
    path,
    kind,
    range,
    ...(period !== undefined && { period }),
    get: (owner) => owner[path] as number,
    set: (owner, value) => ({ ...owner, [path]: value }),
  }
}

/** Numeric fields of a layer as it stands: a table in place of a number is not a parameter. */
export function layerFields(layer: Layer): Field[] {
  const thickness = plain('thickness', 'length', LENGTH)
  switch (layer.kind) {
    case 'isotropic':
      return [thickness, ...indexFields('index', layer.index)]
    case 'retarder':
      return [
        thickness,
        plain('slow_axis', 'angle', ANGLE, Math.PI),
        ...retarderFields(layer),
        ...indexFields('index', layer.index),
      ]
    case 'polarizer':
      return [
        thickness,
        plain('absorption_axis', 'angle', ANGLE, Math.PI),
        ...polarizerFields(layer),
        ...indexFields('index', layer.index),
      ]
    case 'crystal':
      return [
        thickness,
        plain('azimuth', 'angle', ANGLE, layer.tilt === 0 ? Math.PI : 2 * Math.PI),
        plain('tilt', 'angle', [-Math.PI / 2, Math.PI / 2]),
        ...crystalIndexFields(layer),
      ]
  }
}

export function panelFields(panel: Panel): Field[] {
  if (panel.kind === 'metal') return indexFields('index', panel.index)
  return [...indexFields('index', panel.index), ...numbersOf(panel, ['reflectance', 'depolarized'], 'share', SHARE)]
}

export const EMISSION_FIELDS: readonly Field[] = [
  plain('luminance', 'luminance', [0, 1e6]),
  plain('dark_luminance', 'luminance', [0, 1e6]),
]

function numbersOf<Key extends string>(
  owner: { readonly [K in Key]?: Spectrum },
  keys: readonly Key[],
  kind: QuantityKind,
  range: readonly [number, number],
): Field[] {
  return keys.filter((key) => typeof owner[key] === 'number').map((key) => plain(key, kind, range))
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
  return numbersOf(layer, keys, 'share', SHARE)
}

function retarderFields(layer: RetarderLayer): Field[] {
  const fields = typeof layer.retardance === 'number' ? [plain('retardance', 'length', RETARDANCE)] : []
  const dispersed = layer.dispersion === undefined || 're450' in layer.dispersion
  return [...fields, nzField, rthField, ...(dispersed && fields.length > 0 ? dispersionFields : [])]
}

/** Re at 550 nm, to turn one of nz and rth into the other. */
function retardanceOf(owner: Owner): number {
  const retardance = owner.retardance as Spectrum
  if (typeof retardance === 'number') return retardance
  const middle = retardance.wavelength_nm.findIndex((nm) => nm >= 550)
  return retardance.value[Math.max(0, middle)]
}

/** Setting nz drops rth, and the other way round: a film is described by one of them. */
const nzField: Field = {
  path: 'nz',
  kind: 'number',
  range: [-1e3, 1e3],
  get: (owner) => (owner.nz as number | undefined) ?? (owner.rth as number) / retardanceOf(owner) + 0.5,
  set: ({ rth: _, ...owner }, value) => ({ ...owner, nz: value }),
}

const rthField: Field = {
  path: 'rth',
  kind: 'length',
  range: RETARDANCE,
  get: (owner) => (owner.rth as number | undefined) ?? retardanceOf(owner) * ((owner.nz as number) - 0.5),
  set: ({ nz: _, ...owner }, value) => ({ ...owner, rth: value }),
}

/** A flat film has both ratios at 1. */
const dispersionFields: readonly Field[] = (['re450', 're650'] as const).map((ratio) => ({
  path: `dispersion.${ratio}`,
  kind: 'number',
  range: [0, 3],
  get: (owner) => (owner.dispersion as Record<string, number> | undefined)?.[ratio] ?? 1,
  set: (owner, value) => ({
    ...owner,
    dispersion: { re450: 1, re650: 1, ...(owner.dispersion as object), [ratio]: value },
  }),
}))

const INDEX_RANGE: readonly [number, number] = [0.01, 10]
const EXTINCTION_RANGE: readonly [number, number] = [0, 20]

/** `index`, `index.n`, `index.k`, `index.cauchy_nm.0` … as far as the law has numbers. */
function indexFields(path: string, law: IndexLaw): Field[] {
  const read = (owner: Owner) => owner[path] as IndexLaw
  const write = (owner: Owner, value: IndexLaw): Owner => ({ ...owner, [path]: value })
  return lawFields(path, law, read, write)
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
      kind: 'number',
      range: INDEX_RANGE,
      get: (owner) => parts(owner).n as number,
      set: (owner, value) => write(owner, { ...parts(owner), n: value }),
    },
  ]
  const imaginary: Field = {
    path: `${path}.k`,
    kind: 'number',
    range: EXTINCTION_RANGE,
    get: (owner) => parts(owner).k as number,
    set: (owner, value) => write(owner, { ...parts(owner), k: value }),
  }
  if (typeof law === 'number') {
    const whole: Field = {
      path,
      kind: 'number',
      range: INDEX_RANGE,
      get: (owner) => parts(owner).n as number,
      set: (owner, value) => write(owner, value),
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
    kind: 'number',
    range: [-1e12, 1e12],
    get: (owner) => terms(owner)[k],
    set: (owner, value) =>
      write(owner, { cauchy_nm: terms(owner).map((old, j) => (j === k ? value : old)) as [number, number, number] }),
  }))
}
