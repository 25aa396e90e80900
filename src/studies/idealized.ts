/**
 * The stack of a file with only some of its imperfections; each of the others is replaced by what an ideal part would do.
 * The front face and the direction are not in the stack: whoever looks at it takes them away.
 */
import { meanIndexOf } from '../appearance/meanIndex.js'
import { REFERENCE_NM, retardanceAt550 } from '../stack/retardanceAt550.js'
import type { CrystalLayer, Layer, PolarizerLayer, RetarderLayer, Stack } from '../stack/stack.js'
import {
  withImmersion,
  withMeanIndex,
  withoutLeakage,
  withProportionalDispersion,
  withRetardance,
} from './idealParts.js'
import { nearestCircular } from './nearestCircular.js'

/** In the order they are told. */
export const IMPERFECTIONS = [
  'front_face',
  'inner_faces',
  'polarizer_leakage',
  'retardance_550',
  'dispersion',
  'axis_error',
  'depolarized',
  'oblique',
] as const
export type Imperfection = (typeof IMPERFECTIONS)[number]

export interface Idealizer {
  /** The stack as the file has it, less the imperfections that are not present. */
  readonly stackWith: (present: ReadonlySet<Imperfection>) => Stack
  /** Those of `IMPERFECTIONS` that the stack cannot have, or that cannot be told apart in it, and why. */
  readonly missing: ReadonlyMap<Imperfection, string>
}

/** Retardance in nm at 550 nm, axis in rad. */
interface Film {
  readonly retardanceNm: number
  readonly slowAxis: number
}

export function createIdealizer(stack: Stack, wavelengthsNm: Float64Array): Idealizer {
  const { layers, panel } = stack
  const missing = new Map<Imperfection, string>()
  const films = idealFilms(stack)
  if (typeof films === 'string') {
    for (const name of ['retardance_550', 'dispersion', 'axis_error'] as const) missing.set(name, films)
  }
  if (!layers.some((layer) => layer.kind === 'polarizer')) missing.set('polarizer_leakage', 'there is no polarizer')
  if (panel.kind === 'metal') missing.set('depolarized', 'a metal panel returns no unpolarized light')
  const front = layers.findIndex((layer) => !layer.coherent)
  if (front < 0) {
    const why = 'every layer is coherent, so that front and panel reflect as one'
    for (const name of ['front_face', 'inner_faces'] as const) missing.set(name, why)
  }
  const withPart = (layer: Layer, k: number, present: ReadonlySet<Imperfection>): Layer => {
    if (layer.kind === 'polarizer')
      return present.has('polarizer_leakage') ? layer : withoutLeakage(layer, wavelengthsNm)
    const film = typeof films === 'string' ? undefined : films.get(k)
    return layer.kind === 'retarder' && film !== undefined ? idealRetarder(layer, film, present) : layer
  }
  const match = front < 0 ? undefined : indexMatcher(stack, front, wavelengthsNm)
  return {
    missing,
    stackWith: (present) => {
      const changed = { ...stack, layers: layers.map((layer, k) => withPart(layer, k, present)) }
      const matched = match === undefined || present.has('inner_faces') ? changed : match(changed)
      if (matched.panel.kind === 'metal' || present.has('depolarized')) return matched
      return { ...matched, panel: { ...matched.panel, depolarized: 0 } }
    },
  }
}

/**
 * Everything below the first thick layer with the mean index of that layer, so that no inner face reflects and the front
 * stays what it is. Coherent films on a metal belong to the panel: with it they make its reflectance.
 */
function indexMatcher(stack: Stack, front: number, wavelengthsNm: Float64Array): (changed: Stack) => Stack {
  const mean = meanIndexOf(stack.layers[front], wavelengthsNm)
  const metal = stack.panel.kind === 'metal'
  const last = metal ? stack.layers.findLastIndex((layer) => !layer.coherent) : stack.layers.length - 1
  return (changed) => ({
    ...changed,
    layers: changed.layers.map((layer, k) =>
      k > front && k <= last ? withMeanIndex(layer, mean, wavelengthsNm) : layer,
    ),
    panel: metal ? changed.panel : withImmersion(changed.panel, mean, wavelengthsNm),
  })
}

function idealRetarder(layer: RetarderLayer, film: Film, present: ReadonlySet<Imperfection>): RetarderLayer {
  let ideal = layer
  if (!present.has('retardance_550')) ideal = withRetardance(ideal, film.retardanceNm)
  if (!present.has('axis_error')) ideal = { ...ideal, slow_axis: film.slowAxis }
  return present.has('dispersion') ? ideal : withProportionalDispersion(ideal)
}

/** The nearest films that make circular light at 550 nm, by their place in the stack; or why there are none. */
function idealFilms({ layers }: Stack): ReadonlyMap<number, Film> | string {
  const lowest = layers.findLastIndex((layer) => layer.kind === 'polarizer')
  if (lowest < 0) return 'there is no polarizer'
  const below = layers.map((layer, k) => ({ layer, k })).filter(({ k }) => k > lowest)
  if (below.some(({ layer }) => layer.kind === 'crystal' && retards(layer))) {
    return 'for a stack with crystal layers no nearest ideal design is defined; what they leave is part of "ideal"'
  }
  const films = below.filter(
    (part): part is { layer: RetarderLayer; k: number } =>
      part.layer.kind === 'retarder' && retardanceAt550(part.layer) !== 0,
  )
  if (films.length === 0) return 'there is no retardation film below the polarizer'
  const polarizer = layers[lowest] as PolarizerLayer
  const found = nearestCircular(
    polarizer.absorption_axis + Math.PI / 2,
    films.map(({ layer }) => ({ retardance: phase(retardanceAt550(layer)), slowAxis: layer.slow_axis })),
  )
  if (found === undefined) return 'no design that makes circular light lies near these films'
  return new Map(
    films.map(({ k }, m) => [k, { retardanceNm: found[m].retardance / phase(1), slowAxis: found[m].slowAxis }]),
  )
}

/** Whether a crystal film may turn light head-on (laws that only look different are taken as different). */
function retards({ indices, tilt }: CrystalLayer): boolean {
  return tilt !== 0 || indices[0] !== indices[1]
}

/** rad, at 550 nm. */
function phase(retardanceNm: number): number {
  return (2 * Math.PI * retardanceNm) / REFERENCE_NM
}
