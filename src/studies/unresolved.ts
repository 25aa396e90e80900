/** What a measurement cannot tell apart, and which further direction would. */
import { type Certainty, certaintyOf } from '../search/certainty.js'
import { Space } from '../search/variables.js'
import type { MeasuredSpectrum } from '../stack/readMeasured.js'
import type { Direction, FitQuestion, Stack } from '../stack/stack.js'
import { degrees } from './evaluate.js'
import { fitProblem, type Measured } from './fitProblem.js'

/** Parameters the measurement cannot tell apart, in words a person at the bench can act on. */
export interface Unresolved {
  readonly parameters: readonly string[]
  /** Standard deviation along the combination, as a share of the range searched. */
  readonly deviation: number
  readonly sentence: string
  /** A direction whose spectrum, measured as well, would tell them apart; absent where none of the usual ones would. */
  readonly measure?: { readonly theta_deg: number; readonly phi_deg: number }
}

type Blur = Pick<Unresolved, 'parameters' | 'deviation'>

/** A combination known no better than to this share of its range is called unresolved. */
const UNRESOLVED_DEVIATION = 0.15
/** Two parameters this strongly correlated move together even where both are fairly known. */
const STRONG_CORRELATION = 0.98
/** Part of a combination's direction below which a parameter is not named. */
const NAMED_SHARE = 0.25

/** At the fitted parameters x (nm, rad, fractions); `noise` is the standard deviation of one reading. */
export function unresolvedCombinations(
  stack: Stack,
  measured: Measured,
  question: FitQuestion & { readonly noise: number },
  x: Float64Array,
): Unresolved[] {
  const blurs = blursWith(stack, measured, question, x)
  if (blurs.length === 0) return []
  const further = bestFurther(stack, measured, question, x)
  return blurs.map((blur) => {
    const isCured =
      further !== undefined && !further.left.some(({ parameters }) => isWithin(blur.parameters, parameters))
    return {
      ...blur,
      sentence: `${sentence(blur.parameters)}: ${isCured ? adviceFor(further.direction) : OTHERWISE}`,
      ...(isCured && { measure: inDegrees(further.direction) }),
    }
  })
}

/**
 * The residuals are taken for zero: a parameter that the data do not see ends anywhere, even at a bound, where they would hold
 * it by chance.
 */
function blursWith(stack: Stack, measured: Measured, question: FitQuestion, x: Float64Array): Blur[] {
  const problem = fitProblem(stack, measured, question)
  const certainty = certaintyOf(problem, new Space(problem.variables), x, new Float64Array(problem.count))
  return blursOf(Object.keys(question.vary), certainty)
}

function blursOf(paths: readonly string[], certainty: Certainty): Blur[] {
  const combinations = certainty.combinations
    .filter(({ deviation }) => !(deviation < UNRESOLVED_DEVIATION))
    .map(({ direction, deviation }) => ({
      parameters: certainty.free.filter((_, k) => Math.abs(direction[k]) >= NAMED_SHARE).map((i) => paths[i]),
      deviation,
    }))
  const pairs = correlatedPairs(paths, certainty).filter(
    ({ parameters }) => !combinations.some((told) => isWithin(parameters, told.parameters)),
  )
  return [...combinations, ...pairs]
}

function correlatedPairs(paths: readonly string[], { free, correlation, combinations }: Certainty): Blur[] {
  const p = free.length
  return free.flatMap((_, b) =>
    free
      .slice(0, b)
      .flatMap((__, a) =>
        Math.abs(correlation[a * p + b]) < STRONG_CORRELATION
          ? []
          : [{ parameters: [paths[free[a]], paths[free[b]]], deviation: combinations[0].deviation }],
      ),
  )
}

function isWithin(some: readonly string[], all: readonly string[]): boolean {
  return some.every((path) => all.includes(path))
}

/** Usual directions of a variable-angle spectrophotometer, degrees. */
const USUAL_THETA_DEG = [45, 60]
const USUAL_PHI_DEG = [0, 45, 90, 135]

interface Further {
  readonly direction: Direction
  /** What would still not be resolved. */
  readonly left: readonly Blur[]
}

/** The usual direction that would leave least unresolved, measured as well as those at hand. */
function bestFurther(stack: Stack, measured: Measured, question: FitQuestion, x: Float64Array): Further | undefined {
  const [{ wavelengthNm }] = measured.directions
  const trials = USUAL_THETA_DEG.flatMap((theta) => USUAL_PHI_DEG.map((phi) => [theta, phi].map(radians)))
    .map(([theta, phi]): MeasuredSpectrum => ({ theta, phi, wavelengthNm, reflectance: wavelengthNm.map(() => 0) }))
    .map((direction) => ({
      direction,
      left: blursWith(stack, { directions: [...measured.directions, direction] }, question, x),
    }))
  const worst = ({ left }: Further): number => Math.max(0, ...left.map(({ deviation }) => deviation))
  return trials.sort((a, b) => a.left.length - b.left.length || worst(a) - worst(b))[0]
}

function sentence(parameters: readonly string[]): string {
  if (parameters.length === 1) return `${parameters[0]} hardly changes what was measured`
  return `${parameters.slice(0, -1).join(', ')} and ${parameters[parameters.length - 1]} move together`
}

function adviceFor(direction: Direction): string {
  const { theta_deg, phi_deg } = inDegrees(direction)
  return `measure at theta ${theta_deg} deg, phi ${phi_deg} deg as well`
}

const OTHERWISE = 'measure one of them by itself, or keep it at its nominal value'

function inDegrees({ theta, phi }: Direction) {
  return { theta_deg: degrees(theta), phi_deg: degrees(phi) }
}

function radians(deg: number): number {
  return (deg * Math.PI) / 180
}
