import { describe, expect, it } from 'vitest'
import { type GlobalOptions, type GlobalResult, globalSearch } from '../../src/search/globalSearch.js'
import { nelderMead } from '../../src/search/nelderMead.js'
import type { SearchProblem } from '../../src/search/problem.js'
import { runSearchJob, type SearchJobMap, searchInline } from '../../src/search/searchJob.js'
import { Space, type Variable } from '../../src/search/variables.js'
import { FILM_PAIR, filmPair, filmPairScreen, WIDE_FILM_PAIR } from './filmPair.js'
import { HIMMELBLAU_MINIMA, himmelblau, rastrigin } from './standardFunctions.js'

const SEEDS = Array.from({ length: 10 }, (_, k) => k + 1)
const unused = new Float64Array(8)

function search(problem: SearchProblem, options?: GlobalOptions): Promise<GlobalResult> {
  return globalSearch(problem.variables, searchInline(problem, options?.stopped), options)
}

/** The slow, obvious way: a dense grid, and a polish from each of its best points. */
function gridAndPolish(variables: readonly Variable[], steps: number): number {
  const points: { x: number[]; value: number }[] = []
  const walk = (x: number[]): void => {
    if (x.length === variables.length) points.push({ x, value: filmPair(x) })
    else {
      const { lower, upper } = variables[x.length]
      for (let k = 0; k < steps; k++) walk([...x, lower + ((k + 0.5) / steps) * (upper - lower)])
    }
  }
  walk([])
  points.sort((a, b) => a.value - b.value)
  return Math.min(...points.slice(0, 150).map(({ x }) => nelderMead(filmPair, variables, x).value))
}

describe('on the landscape of a film pair', () => {
  const leastOfFilmPair = gridAndPolish(FILM_PAIR, 12)

  const withDifferences = (x: Float64Array, gradient: Float64Array): number => {
    for (let i = 0; i < 4; i++) {
      const h = i < 2 ? 1e-5 : 1e-3
      gradient[i] = (filmPair(x.with(i, x[i] + h)) - filmPair(x.with(i, x[i] - h))) / (2 * h)
    }
    return filmPair(x)
  }

  it.each([
    ['the box of the trade', FILM_PAIR, 6_000],
    ['a wide box, with twice as many families', WIDE_FILM_PAIR, 20_000],
  ] as const)('finds the best of near-equal families with every seed in %s', async (_, variables, most) => {
    const oracle = variables === FILM_PAIR ? leastOfFilmPair : gridAndPolish(variables, 12)
    for (const seed of SEEDS) {
      const result = await search({ variables, objective: filmPair }, { seed })
      expect(result.value).toBeLessThan(oracle + 3e-9)
      expect(result.evaluations).toBeLessThan(most)
      expect(result.families.length).toBeGreaterThan(2)
      expect(result.families[0]).toMatchObject({ x: result.x, value: result.value, violation: 0 })
      for (const { x, value } of result.families) {
        expect(filmPair(x)).toBe(value)
        expect(value).toBeLessThanOrEqual(1.05 * result.value)
      }
      expect(apart(variables, result)).toBeGreaterThan(0.05)
    }
  })

  it('needs a sixth of the evaluations where there is a gradient, and chooses starts as well by fewer wavelengths', async () => {
    const problem = {
      variables: FILM_PAIR,
      objective: filmPair,
      objectiveWithGradient: withDifferences,
      screen: filmPairScreen,
    }
    for (const seed of SEEDS) {
      const result = await search(problem, { seed })
      expect(result.reason).toBe('converged')
      expect(result.value).toBeLessThan(leastOfFilmPair + 3e-9)
      expect(result.evaluations).toBeLessThan(1_000)
    }
  })

  it('gives the same digits again, and in whatever order the jobs are done', async () => {
    const problem = { variables: FILM_PAIR, objective: filmPair }
    const backwards: SearchJobMap = async (jobs) =>
      jobs.map((_, k) => runSearchJob(problem, structuredClone(jobs[jobs.length - 1 - k]))).reverse()
    const once = await search(problem, { seed: 3 })
    expect(await search(problem, { seed: 3 })).toEqual(once)
    expect(await globalSearch(FILM_PAIR, backwards, { seed: 3 })).toEqual(once)
    expect((await search(problem, { seed: 4 })).evaluations).not.toBe(once.evaluations)
  })

  it('tells its progress, and keeps the best so far where it is stopped or out of evaluations', async () => {
    const problem = { variables: FILM_PAIR, objective: filmPair }
    const bests: number[] = []
    const shares: number[] = []
    const whole = await search(problem, {
      progress: (done, best) => {
        shares.push(done)
        bests.push(best.value)
      },
    })
    expect(bests).toEqual(bests.toSorted((a, b) => b - a))
    expect(shares).toEqual(shares.toSorted((a, b) => a - b))
    expect(Math.max(...shares)).toBeLessThanOrEqual(1)
    const { history } = whole
    expect(history[history.length - 1]).toEqual({ evaluations: whole.evaluations, value: whole.value })
    expect(history).toEqual(history.toSorted((a, b) => a.evaluations - b.evaluations || b.value - a.value))
    for (const polls of [0, 1, 100, 700]) {
      let asked = 0
      let least = Number.POSITIVE_INFINITY
      const watched = (x: ArrayLike<number>): number => {
        const value = filmPair(x)
        least = Math.min(least, value)
        return value
      }
      const stopped = await search({ variables: FILM_PAIR, objective: watched }, { stopped: () => ++asked > polls })
      expect(stopped).toMatchObject({ reason: 'stopped', value: least })
      const limited = await search(problem, { maxEvaluations: 200 + polls })
      expect(limited.reason).toBe('limit')
      expect(limited.evaluations).toBeLessThanOrEqual(200 + polls)
      expect(filmPair(limited.x)).toBe(limited.value)
    }
  })

  it('begins with the point in hand, and does no worse', async () => {
    const start = [0.3, 1.3, 250, 130]
    const { value } = await search({ variables: FILM_PAIR, objective: filmPair }, { start, maxEvaluations: 120 })
    expect(value).toBeLessThan(filmPair(start))
  })

  it('takes the best of listed angles, as enumeration has it', async () => {
    const listed = [0, 15, 30, 45, 60, 75, 90, 105, 120, 135, 150, 165].map((degrees) => (degrees * Math.PI) / 180)
    const variables = FILM_PAIR.map((variable, i) => (i < 2 ? { ...variable, values: listed } : variable))
    const enumerated = Math.min(
      ...listed.flatMap((a) => listed.map((b) => nelderMead(filmPair, variables, [a, b, 260, 130]).value)),
    )
    const mixed = await search({ variables, objective: filmPair })
    expect(mixed.value).toBeLessThan(enumerated + 3e-9)
    expect(listed).toContain(mixed.x[0])
    const all = variables.map((variable, i) => (i < 2 ? variable : { ...variable, values: [i === 2 ? 270 : 135] }))
    const exact = Math.min(...listed.flatMap((a) => listed.map((b) => filmPair([a, b, 270, 135]))))
    expect(await search({ variables: all, objective: filmPair })).toMatchObject({ value: exact, evaluations: 144 })
  })
})

/** Least distance of any two families. */
function apart(variables: readonly Variable[], { families }: GlobalResult): number {
  const space = new Space(variables)
  return Math.min(...families.flatMap((a, k) => families.slice(k + 1).map((b) => space.distance(a.x, b.x))))
}

describe('on standard functions', () => {
  const box = (lower: number, upper: number, count: number): Variable[] =>
    Array.from({ length: count }, () => ({ lower, upper }))

  it('finds the four minima of Himmelblau as families', async () => {
    const variables = box(-5, 5, 2)
    for (const seed of SEEDS) {
      const { families } = await search({ variables, objective: (x) => himmelblau(x, unused) }, { seed })
      const space = new Space(variables)
      expect(families).toHaveLength(4)
      for (const minimum of HIMMELBLAU_MINIMA) {
        expect(Math.min(...families.map(({ x }) => space.distance(x, minimum)))).toBeLessThan(1e-5)
      }
    }
  })

  it('finds the least of the hundred minima of Rastrigin', async () => {
    for (const seed of SEEDS) {
      const problem = { variables: box(-4.1, 5.9, 2), objective: (x: Float64Array) => rastrigin(x, unused) }
      const { value, x } = await search(problem, { seed })
      expect(value).toBeLessThan(1e-8)
      expect(Math.max(...x.map(Math.abs))).toBeLessThan(1e-5)
    }
  })

  it('ends in a valley of equal designs, and in a bowl', async () => {
    const turn: Variable = { lower: 0, upper: Math.PI, period: Math.PI }
    const valley = await search({ variables: [turn, turn], objective: ([a, b]) => 2 - Math.cos(2 * (a - b) - 0.4) })
    expect(valley.reason).toBe('converged')
    expect(valley.value).toBeCloseTo(1, 8)
    const bowl = await search({
      variables: box(-1, 1, 3),
      objective: (x) => x.reduce((sum, c) => sum + (c - 0.2) ** 2, 0),
    })
    expect(bowl.reason).toBe('converged')
    expect(bowl.families).toHaveLength(1)
    expect(bowl.value).toBeLessThan(1e-8)
  })

  it('exchanges listed values one by one where their combinations are too many to try', async () => {
    const values = Array.from({ length: 10 }, (_, k) => k)
    const variables = [...Array.from({ length: 6 }, () => ({ lower: 0, upper: 9, values })), { lower: 0, upper: 1 }]
    const wanted = [3, 1, 4, 1, 5, 9, 0.26]
    const objective = (x: Float64Array): number => x.reduce((sum, c, i) => sum + (c - wanted[i]) ** 2, 0)
    const { x, value } = await search({ variables, objective })
    expect([...x.subarray(0, 6)]).toEqual(wanted.slice(0, 6))
    expect(value).toBeLessThan(1e-8)
  })

  it('says so where no point has a value', async () => {
    const nowhere = await search({ variables: box(0, 1, 2), objective: () => Number.NaN }, { maxEvaluations: 2_000 })
    expect(nowhere).toMatchObject({ value: Number.POSITIVE_INFINITY, families: [], reason: 'limit' })
  })
})
