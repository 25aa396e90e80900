/** One candidate of a comparison, searched: by itself, or quickly from what others taught. */
import { globalSearch } from '../search/globalSearch.js'
import { byMerit, type Candidate, type SearchProblem, violationOf } from '../search/problem.js'
import { runSearchJob, searchInline } from '../search/searchJob.js'
import { StartPoints } from '../search/startPoints.js'
import { Space } from '../search/variables.js'
import { getParameter } from '../stack/parameters.js'
import type { Objective, OptimizeQuestion, Stack } from '../stack/stack.js'
import { wavelengthsOf } from '../stack/wavelengths.js'
import { type Choice, slotsOf, stackOf } from './candidate.js'
import { coarseWavelengths, designProblem, designVariables } from './designProblem.js'
import type { Task } from './parallel.js'
import { prepareStack } from './prepareStack.js'

export interface CompareShared {
  readonly stack: Stack
  /** Absent where every angle stays as the file has it. */
  readonly question?: OptimizeQuestion
  readonly seed: number
}

export type CompareJob =
  /** A search of its own from the file's values, which also tells the other good designs. */
  | { readonly kind: 'pilot'; readonly choice: Choice }
  /** On a few wavelengths, from the designs that did well with other films. */
  | { readonly kind: 'quick'; readonly choice: Choice; readonly designs: readonly (readonly number[])[] }
  /** A search of its own from where the quick one ended. */
  | { readonly kind: 'full'; readonly choice: Choice; readonly from: readonly number[] }

/** Optimum in internal units: nm, rad, fractions; the objective with the sign of a minimum. */
export interface SearchedCandidate {
  readonly x: readonly number[]
  /** At `x`, on all wavelengths. */
  readonly value: number
  /** Largest constraint missed there; 0 where all are met. */
  readonly violation: number
  /** The distinct good designs found, best first. */
  readonly designs: readonly (readonly number[])[]
  /** Of a quick search: without its constraints it would have ended elsewhere. */
  readonly isHeld?: boolean
}

export const compareJob: Task<CompareShared, CompareJob, SearchedCandidate> = {
  name: 'compareJob',
  prepare: async (shared) => {
    const { stack } = shared
    await prepareStack(stack)
    const slots = slotsOf(stack)
    for (const card of slots.cards.flat()) await prepareStack({ ...stack, layers: [card.layer] })
    return (job) => searchCandidate(stackOf(stack, slots, job.choice), shared, job)
  },
}

function searchCandidate(
  stack: Stack,
  { question, seed }: CompareShared,
  job: CompareJob,
): SearchedCandidate | Promise<SearchedCandidate> {
  if (question === undefined) return fixedCandidate(stack)
  if (job.kind === 'quick') return quickSearch(stack, question, seed, job.designs)
  const start = job.kind === 'full' ? job.from : Object.keys(question.vary).map((path) => getParameter(stack, path))
  return fullSearch(stack, question, seed, start)
}

/** Angles as the file has them: the objective is the file's, or the color-weighted reflectance head-on. */
function fixedCandidate(stack: Stack): SearchedCandidate {
  const { minimize = HEAD_ON, subject_to = [] } = stack.optimize ?? {}
  const problem = designProblem(stack, { vary: {}, minimize, subject_to })
  return { ...at(problem, new Float64Array(0)), x: [], designs: [] }
}

export const HEAD_ON: Objective = {
  metric: 'color_weighted_reflectance',
  sense: 1,
  views: [{ theta: 0, phi: 0, weight: 1 }],
}

async function fullSearch(
  stack: Stack,
  question: OptimizeQuestion,
  seed: number,
  start: readonly number[],
): Promise<SearchedCandidate> {
  const problem = designProblem(stack, question)
  const found = await globalSearch(designVariables(stack, question), searchInline(problem), { seed, start })
  const { x, value, violation } = found
  return { x: Array.from(x), value, violation, designs: found.families.map((family) => Array.from(family.x)) }
}

/** Even points tried beside the designs of others, and how many of all of these are polished. */
const EVEN_POINTS = 64
const POLISHED = 6
/** Designs nearer than this share of the ranges lead to the same optimum. */
const APART = 0.05
const QUICK_TOLERANCE = 1e-4
const QUICK_EVALUATIONS = 600
/** Starts from which constraints are heeded once one is missed. */
const HEEDED = 3

function quickSearch(
  stack: Stack,
  question: OptimizeQuestion,
  seed: number,
  designs: readonly (readonly number[])[],
): SearchedCandidate {
  const coarse = designProblem(stack, question, coarseWavelengths(wavelengthsOf(stack.conditions)))
  const full = designProblem(stack, question)
  const space = new Space(designVariables(stack, question))
  const even = new StartPoints(space, seed)
  const points = [
    ...designs.map((design) => space.nearest(design)),
    ...Array.from({ length: EVEN_POINTS }, (_, k) => even.point(k)),
  ]
  const { end, isHeld } = quickEnd(coarse, promising(coarse, space, points))
  const onAll = at(full, end.x)
  // Few wavelengths may let pass what misses a constraint on all.
  const { x, value, violation } = end.violation === 0 && onAll.violation > 0 ? polished(full, end.x) : onAll
  return { x: Array.from(x), value, violation, designs: [], isHeld }
}

/** Constraints are often idle, and heeding them is dear without a gradient: they are left aside until one is missed. */
function quickEnd(coarse: SearchProblem, starts: readonly Float64Array[]): { end: Candidate; isHeld: boolean } {
  const { constraints: _, ...free } = coarse
  const ends = starts.map((start) => at(coarse, polished(free, start).x))
  const lowest = ends.reduce((a, b) => (b.value < a.value ? b : a))
  if (lowest.violation === 0) return { end: lowest, isHeld: false }
  const heeded = [lowest.x, ...starts.slice(0, HEEDED)].map((start) => polished(coarse, start))
  return { end: [...ends, ...heeded].sort(byMerit)[0], isHeld: true }
}

function polished(problem: SearchProblem, start: Float64Array): Candidate {
  const options = { tolerance: QUICK_TOLERANCE, step: APART, maxEvaluations: QUICK_EVALUATIONS }
  return runSearchJob(problem, { kind: 'polish', start, ...options }).candidates[0]
}

/** The best of the points that lie apart from each other. */
function promising(problem: SearchProblem, space: Space, points: readonly Float64Array[]): Float64Array[] {
  const ranked = points.map((x) => at(problem, x)).sort(byMerit)
  const chosen: Float64Array[] = []
  for (const { x } of ranked) {
    if (chosen.length === POLISHED) break
    if (chosen.every((other) => space.distance(other, x) >= APART)) chosen.push(x)
  }
  return chosen
}

function at(problem: SearchProblem, x: Float64Array): Candidate {
  return { x, value: problem.objective(x), violation: violationOf(problem.constraints?.(x) ?? []) }
}
