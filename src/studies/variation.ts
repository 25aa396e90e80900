import { createLatinHypercube } from '../numeric/latinHypercube.js'
import type { PointSet } from '../numeric/pointSet.js'
import { createRandomPoints } from '../numeric/randomPoints.js'
import { createSobol } from '../numeric/sobol.js'
import { findParameter } from '../stack/parameters.js'
import type { Stack, ToleranceQuestion } from '../stack/stack.js'
import { spreadOffset } from './spreads.js'

/** What moves by one draw: a parameter, or several that are given `together`. */
export interface Factor {
  /** The paths, joined by ` + `. */
  readonly name: string
  readonly paths: readonly string[]
}

/** How the parameters of a stack vary in production, as a map from the unit cube (one coordinate per factor). */
export interface Variation {
  readonly factors: readonly Factor[]
  /** All paths, in the order of the values. */
  readonly paths: readonly string[]
  /** Values of the file, nm, rad, fractions. */
  readonly nominal: Float64Array
  /** Values at a point of the unit cube; `scales` multiplies the spread of each factor (default: all 1). */
  valuesAt(point: Float64Array, out: Float64Array, scales?: ArrayLike<number>): void
  /** Values for a design other than the file's; `center` and `out` in the order of the paths. */
  valuesAround(center: ArrayLike<number>, point: Float64Array, out: Float64Array, scales?: ArrayLike<number>): void
  /** Whether a value stands at the limit of what is physical (a share above 1 is drawn as 1). */
  isHeld(path: number, value: number): boolean
}

export function createVariation(stack: Stack, question: ToleranceQuestion): Variation {
  const factors = factorsOf(question)
  const paths = Object.keys(question.vary)
  const infos = paths.map((path) => {
    const info = findParameter(stack, path)
    if (info === undefined) throw new Error(`not a parameter of this stack: ${path}`)
    return info
  })
  const offsets = paths.map((path) => spreadOffset(question.vary[path]))
  const factorOf = paths.map((path) => factors.findIndex((factor) => factor.paths.includes(path)))
  const nominal = Float64Array.from(infos, (info) => info.value)
  const valuesAround: Variation['valuesAround'] = (center, point, out, scales) => {
    for (let k = 0; k < paths.length; k++) {
      const factor = factorOf[k]
      const [least, most] = infos[k].range
      const value = center[k] + (scales?.[factor] ?? 1) * offsets[k](point[factor])
      out[k] = Math.min(most, Math.max(least, value))
    }
  }
  return {
    factors,
    paths,
    nominal,
    valuesAround,
    valuesAt: (point, out, scales) => valuesAround(nominal, point, out, scales),
    isHeld: (path, value) => value <= infos[path].range[0] || value >= infos[path].range[1],
  }
}

/** The question's draws in the unit cube, each found by its number. */
export function drawsOf({ sampling, samples, seed }: ToleranceQuestion, dimensions: number): PointSet {
  switch (sampling) {
    case 'random':
      return createRandomPoints(dimensions, seed)
    case 'latin_hypercube':
      return createLatinHypercube(samples, dimensions, seed)
    case 'sobol':
      return createSobol(dimensions, seed)
  }
}

function factorsOf({ vary, together }: ToleranceQuestion): Factor[] {
  const grouped = new Set(together.flat())
  const single = Object.keys(vary).filter((path) => !grouped.has(path))
  return [...together, ...single.map((path) => [path])].map((paths) => ({ name: paths.join(' + '), paths }))
}
