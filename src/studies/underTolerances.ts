/**
 * An objective as production sees it: its quantile when the parameters of a design, and all else that is tolerated, vary.
 * The same draws serve every design (common random numbers), and the quantile is a smooth mean of many of them, so that the
 * objective moves evenly with the design.
 */
import { harrellDavisWeights } from '../numeric/harrellDavis.js'
import { createSobol } from '../numeric/sobol.js'
import { getParameter } from '../stack/parameters.js'
import type { Stack, ToleranceQuestion } from '../stack/stack.js'
import { createVariation } from './variation.js'

export interface RobustQuestion {
  readonly tolerance: ToleranceQuestion
  /** Paths of the design's parameters. */
  readonly paths: readonly string[]
  /**
   * Of the quantile, between 0 and 1. So close to an end that 1024 draws hold fewer than three beyond it, the quantile is no
   * more than the end of those draws.
   */
  readonly share: number
}

/** Of the parameters of a design, in the order of its paths: nm, rad, fractions. */
export type RobustObjective = (parameters: ArrayLike<number>) => number
/** The same, with its derivative by each parameter into `gradient`. */
export type RobustObjectiveWithGradient = (parameters: ArrayLike<number>, gradient: Float64Array) => number

/** @param objectiveOf the objective of one laminate, as a function of the values of the paths it is given */
export function underTolerances(
  stack: Stack,
  question: RobustQuestion,
  objectiveOf: (paths: readonly string[]) => (values: Float64Array) => number,
): RobustObjective {
  const production = createProduction(stack, question)
  const objective = objectiveOf(production.paths)
  const results = new Float64Array(production.weights.length)
  return (parameters) => {
    production.forEachDraw(parameters, (laminate, draw) => {
      results[draw] = objective(laminate)
    })
    results.sort()
    return results.reduce((sum, value, rank) => sum + production.weights[rank] * value, 0)
  }
}

/** @param gradientOf the objective of one laminate and its gradient, by the values of the paths it is given */
export function underTolerancesWithGradient(
  stack: Stack,
  question: RobustQuestion,
  gradientOf: (paths: readonly string[]) => (values: Float64Array, gradient: Float64Array) => number,
): RobustObjectiveWithGradient {
  const production = createProduction(stack, question)
  const objective = gradientOf(production.paths)
  const results = Array.from(production.weights, () => ({
    value: 0,
    gradient: new Float64Array(production.paths.length),
  }))
  return (parameters, gradient) => {
    production.forEachDraw(parameters, (laminate, draw) => {
      const result = results[draw]
      result.value = objective(laminate, result.gradient)
    })
    gradient.fill(0)
    // A draw differs from the design by a constant, so a step of the design is the same step of each draw.
    const ranked = results.toSorted((a, b) => a.value - b.value)
    return ranked.reduce((sum, result, rank) => {
      for (let k = 0; k < gradient.length; k++) gradient[k] += production.weights[rank] * result.gradient[k]
      return sum + production.weights[rank] * result.value
    }, 0)
  }
}

interface Production {
  /** Those of the design, then what else is tolerated. */
  readonly paths: readonly string[]
  /** Of the draws' results in ascending order, for the quantile. */
  readonly weights: Float64Array
  /** `laminate` is overwritten by the next draw. */
  forEachDraw(design: ArrayLike<number>, visit: (laminate: Float64Array, draw: number) => void): void
}

function createProduction(stack: Stack, { tolerance, paths, share }: RobustQuestion): Production {
  const variation = createVariation(stack, tolerance)
  const all = [...paths, ...variation.paths.filter((path) => !paths.includes(path))]
  const places = variation.paths.map((path) => all.indexOf(path))
  const points = evenPoints(drawsFor(share), variation.factors.length, tolerance.seed)
  const nominal = Float64Array.from(all, (path) => getParameter(stack, path))
  const laminate = nominal.slice()
  const center = new Float64Array(places.length)
  const varied = new Float64Array(places.length)
  return {
    paths: all,
    weights: harrellDavisWeights(points.length, share),
    forEachDraw(design, visit) {
      laminate.set(nominal)
      laminate.set(design)
      places.forEach((place, k) => {
        center[k] = laminate[place]
      })
      points.forEach((point, draw) => {
        variation.valuesAround(center, point, varied)
        places.forEach((place, k) => {
          laminate[place] = varied[k]
        })
        visit(laminate, draw)
      })
    },
  }
}

function evenPoints(count: number, dimensions: number, seed: number): Float64Array[] {
  const sobol = createSobol(dimensions, seed)
  return Array.from({ length: count }, (_, draw) => {
    const point = new Float64Array(dimensions)
    sobol.point(draw, point)
    return point
  })
}

const LEAST_DRAWS = 64
const MOST_DRAWS = 1024
/** Draws wanted beyond the quantile. */
const BEYOND = 3

/** A power of two, for which the points are most even. */
function drawsFor(share: number): number {
  const enough = 2 ** Math.ceil(Math.log2(BEYOND / Math.min(share, 1 - share)))
  return Math.min(MOST_DRAWS, Math.max(LEAST_DRAWS, enough))
}
