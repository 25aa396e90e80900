/** Everything a design review asks of one stack: the file's design, the one the search found, and what is to be known of it. */
import { setParameters } from '../stack/parameters.js'
import type { Stack } from '../stack/stack.js'
import { bestValues } from './bestValues.js'
import { type Budget, budget } from './budget.js'
import { type Comparison, compare } from './compare.js'
import { type Cone, cone } from './cone.js'
import { type Evaluation, evaluate } from './evaluate.js'
import type { Hooks } from './hooks.js'
import { type Itinerary, itinerary, USUAL_WAVELENGTHS_NM } from './itinerary.js'
import { type LaminateFacts, laminateFacts } from './laminateFacts.js'
import { type OffStateSwatch, offStateSwatches } from './offStateSwatches.js'
import { type Optimum, optimize } from './optimize.js'
import { mapInline, type ParallelMap } from './parallel.js'
import type { ReviewPart } from './reviewParts.js'
import { stageHooks } from './stageHooks.js'
import { type Tolerance, tolerance } from './tolerance.js'

export interface ReviewSettings {
  /** A part whose question the file does not ask is left out. */
  readonly parts: ReadonlySet<ReviewPart>
  readonly seed: number
}

export interface Review {
  readonly title: string
  /** The file's, then the search's where there was one: what follows is about the last. */
  readonly designs: readonly ReviewedDesign[]
  readonly optimum?: Optimum
  /** Head-on or nearly, and the most oblique direction of the file. */
  readonly budgets?: readonly Budget[]
  readonly itinerary?: Itinerary
  readonly tolerance?: Tolerance
  readonly comparison?: Comparison
  readonly interrupted: boolean
}

export interface ReviewedDesign {
  readonly name: 'file' | 'search'
  /** nm, rad, fractions, unlike the studies (nm, degrees, fractions). */
  readonly stack: Stack
  readonly laminate: LaminateFacts
  readonly evaluation: Evaluation
  readonly swatches: readonly OffStateSwatch[]
  readonly cone?: Cone
}

const DEGREE = Math.PI / 180
const CONE = { thetaMax: 80 * DEGREE, thetaStep: 5 * DEGREE, phiStep: 10 * DEGREE }
/** About how the time divides: search, cones, tolerance, comparison. */
const STAGES = { search: 0.3, cone: 0.35, tolerance: 0.6 }

export async function review(
  stack: Stack,
  { parts, seed }: ReviewSettings,
  hooks: Hooks = {},
  map: ParallelMap = mapInline,
): Promise<Review> {
  const stage = (from: number, to: number, note: string) => stageHooks(hooks, from, to, note)
  const optimum =
    parts.has('search') && stack.optimize !== undefined
      ? await optimize(stack, { seed }, stage(0, STAGES.search, 'search'), map)
      : undefined
  const found = optimum === undefined ? [] : [setParameters(stack, bestValues(stack, optimum))]
  const designs: ReviewedDesign[] = []
  for (const design of [stack, ...found]) {
    const seen = parts.has('cone')
      ? await cone(design, CONE, stage(STAGES.search, STAGES.cone, 'cone'), map)
      : undefined
    designs.push(describeDesign(design, designs.length === 0 ? 'file' : 'search', seen))
  }
  const subject = designs[designs.length - 1].stack
  const spread =
    parts.has('tolerance') && stack.tolerance !== undefined && hooks.stopped?.() !== true
      ? await tolerance(subject, subject.tolerance, {}, stage(STAGES.cone, STAGES.tolerance, 'tolerance'), map)
      : undefined
  const comparison =
    parts.has('compare') && stack.compare !== undefined && hooks.stopped?.() !== true
      ? await compare(stack, { seed }, stage(STAGES.tolerance, 1, 'compare'), map)
      : undefined
  return {
    title: stack.title,
    designs,
    ...(optimum && { optimum }),
    ...(parts.has('budget') && { budgets: budgetsOf(subject) }),
    ...(parts.has('itinerary') && { itinerary: itineraryOf(subject) }),
    ...(spread && { tolerance: spread }),
    ...(comparison && { comparison }),
    interrupted: hooks.stopped?.() === true,
  }
}

/** A cone that was interrupted is left out. */
function describeDesign(stack: Stack, name: ReviewedDesign['name'], seen: Cone | undefined): ReviewedDesign {
  return {
    name,
    stack,
    laminate: laminateFacts(stack),
    evaluation: evaluate(stack),
    swatches: offStateSwatches(stack),
    ...(seen && !seen.interrupted && { cone: seen }),
  }
}

function budgetsOf(stack: Stack): Budget[] {
  const [first, ...others] = stack.conditions.directions
  const widest = others.reduce((a, b) => (b.theta > a.theta ? b : a), first)
  return [...new Set([first, widest])].map((direction) => budget(stack, direction))
}

function itineraryOf(stack: Stack): Itinerary {
  const [first] = stack.conditions.directions
  return itinerary(stack, { ...first, wavelengthsNm: USUAL_WAVELENGTHS_NM })
}
