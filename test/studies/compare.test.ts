import { beforeAll, describe, expect, it } from 'vitest'
import { createWorkerPool } from '../../src/pool/workerPool.js'
import type { Stack } from '../../src/stack/stack.js'
import { type CompareSettings, type CompareStore, type Comparison, compare } from '../../src/studies/compare.js'
import { compareJob, type SearchedCandidate } from '../../src/studies/compareJob.js'
import type { Candidate } from '../../src/studies/describeCandidate.js'
import { readFront } from '../../src/studies/frontAxis.js'
import { mapInline } from '../../src/studies/parallel.js'
import { startLocalWorker } from '../pool/localWorkers.js'
import { darkerThan, polarizer, retarder } from './builtStack.js'
import {
  AT_45,
  card,
  HALVES,
  HALVES_NM,
  HEAD_ON,
  POLARIZERS,
  QUARTERS,
  QUARTERS_NM,
  stackWithCards,
} from './filmsOnOffer.js'
import { luminousReflectance } from './twoFilms.js'

const TWO_FILMS = stackWithCards({ slots: { half: HALVES, quarter: QUARTERS } })
/** 2 × 3 × 3, seen head-on and from the side, in steps fine enough for the quick search to pass over two in three. */
const SMALL = stackWithCards({
  stepNm: 5,
  slots: { polarizer: POLARIZERS, half: HALVES.slice(0, 3), quarter: QUARTERS.slice(1, 4) },
  views: [HEAD_ON, AT_45],
})

const run = (stack: Stack, settings: Partial<CompareSettings> = {}): Promise<Comparison> =>
  compare(stack, { seed: 1, ...settings })

function names({ films }: Candidate): string {
  return Object.values(films).join(' + ')
}

/** Luminous reflectance of an ideal laminate of these films, by algebra on the Poincaré sphere. */
function twin({ films }: Candidate, halfAxisDeg: number, quarterAxisDeg: number): number {
  const [halfNm, quarterNm] = [films.half, films.quarter].map((name) => Number(name.split('-')[1]))
  return luminousReflectance({ halfAxisDeg, halfNm, quarterAxisDeg, quarterNm })
}

const EVERY_3_DEG = Array.from({ length: 60 }, (_, k) => 3 * k)

describe('full enumeration', () => {
  let all: Comparison

  beforeAll(async () => {
    all = await run(TWO_FILMS, { exhaustive: true })
  }, 300_000)

  it('finds no pair of films that a grid over both axes does better with', () => {
    expect(all.candidates).toHaveLength(HALVES_NM.length * QUARTERS_NM.length)
    for (const candidate of all.candidates) {
      const { objective, parameters } = candidate
      // The polarizer leaks 1e-12, the films have faces of less than 1e-7.
      expect(objective).toBeCloseTo(twin(candidate, parameters['half.slow_axis'], parameters['quarter.slow_axis']), 6)
      const grid = EVERY_3_DEG.flatMap((half) => EVERY_3_DEG.map((quarter) => twin(candidate, half, quarter)))
      expect(objective).toBeLessThan(Math.min(...grid) + 1e-7)
    }
  })

  it('finds nothing better among the first five than the pruned search', async () => {
    const pruned = await run(TWO_FILMS, { keep: 5 })
    expect(pruned.candidates.slice(0, 5).map(names)).toEqual(all.candidates.slice(0, 5).map(names))
    expect(pruned.ruled_out).toBeGreaterThan(5)
  })
})

interface Recorded {
  readonly comparison: Comparison
  readonly results: ReadonlyMap<string, SearchedCandidate>
}

async function recorded(settings: CompareSettings): Promise<Recorded> {
  const results = new Map<string, SearchedCandidate>()
  const store: CompareStore = { known: new Map(), keep: (key, result) => results.set(key, result) }
  return { comparison: await compare(SMALL, settings, {}, mapInline, store), results }
}

describe('pruning and digits', { timeout: 300_000 }, () => {
  const settings = { seed: 1, keep: 3 }
  let pruned: Recorded
  let all: Comparison

  beforeAll(async () => {
    pruned = await recorded(settings)
    all = await run(SMALL, { exhaustive: true })
  }, 600_000)

  it('leaves the best and the five best of 2 × 3 × 3 as they are', () => {
    const { candidates, ruled_out } = pruned.comparison
    expect(ruled_out).toBeGreaterThan(0)
    expect(candidates.slice(0, 5).map(names)).toEqual(all.candidates.slice(0, 5).map(names))
    candidates.slice(0, settings.keep).forEach((candidate, k) => {
      expect(candidate.searched_in_full).toBe(true)
      expect(Math.abs(candidate.objective - all.candidates[k].objective)).toBeLessThan(1e-9)
    })
  })

  it('keeps its word: what is ruled out falls short by no more than the margin', () => {
    const { candidates, ruled_out, margins } = pruned.comparison
    const best = new Map(all.candidates.map((candidate) => [names(candidate), candidate.objective]))
    const ruledOut = candidates.filter((candidate) => !candidate.searched_in_full)
    expect(ruledOut).toHaveLength(ruled_out)
    for (const candidate of ruledOut) {
      expect(candidate.objective - (best.get(names(candidate)) ?? 0)).toBeLessThan(margins?.free ?? 0)
    }
  })

  it('has the digits of one worker with three', async () => {
    let turn = 0
    const pool = createWorkerPool(3, () => startLocalWorker([compareJob] as never[], () => 1 + (turn++ % 3)))
    const shared = await compare(SMALL, settings, {}, pool.map)
    pool.close()
    expect(shared).toEqual(pruned.comparison)
  })

  it('goes on from half of the results to the digits of an uninterrupted run', async () => {
    const known = new Map([...pruned.results].filter((_, k) => k % 2 === 0))
    let searched = 0
    const resumed = await compare(SMALL, settings, {}, mapInline, { known, keep: () => searched++ })
    expect(resumed).toEqual(pruned.comparison)
    expect(searched).toBe(pruned.results.size - known.size)
  })

  it('of what is done are kept when it is stopped', async () => {
    const results = new Map<string, SearchedCandidate>()
    const store: CompareStore = { known: new Map(), keep: (key, result) => results.set(key, result) }
    let polled = 0
    const stopped = await compare(TWO_FILMS, { seed: 1, keep: 3 }, { stopped: () => ++polled > 6 }, mapInline, store)
    expect(stopped.interrupted).toBe(true)
    expect(stopped.ruled_out).toBe(0)
    expect(stopped.candidates.length).toBe(results.size)
    expect(results.size).toBeGreaterThan(0)
  })
})

describe('what is told of a candidate', () => {
  it('price, thickness, limits and files of its films', async () => {
    const limits = [darkerThan(0.02)]
    const { candidates } = await run({ ...TWO_FILMS, limits })
    for (const { films, files, price_per_m2, thickness_nm, limits_met, objective } of candidates) {
      const [half, quarter] = [films.half, films.quarter].map((name) => Number(name.split('-')[1]))
      expect(price_per_m2).toBe(10 + HALVES_NM.indexOf(half) + 20 - 2 * QUARTERS_NM.indexOf(quarter))
      expect(thickness_nm).toBe(30e6)
      expect(limits_met).toBe(objective <= 0.02)
      expect(files.half).toBe(`films/half-${half}.film.yaml`)
    }
    expect(new Set(candidates.map(({ limits_met }) => limits_met)).size).toBe(2)
  })

  it('no price where one of the films has none, and no price on the front', async () => {
    const unpriced = card('half-unpriced', retarder('half', 0, 270))
    const { candidates, front_axes } = await run(
      stackWithCards({ slots: { half: [unpriced, HALVES[0]], quarter: QUARTERS.slice(2, 3) } }),
    )
    expect(candidates.map(({ price_per_m2 }) => price_per_m2 === undefined)).toContain(true)
    expect(front_axes).toEqual(['objective', 'emission_transmittance'])
  })

  it('the axes it was given, and nothing of the film but its axis', async () => {
    const { candidates } = await run(TWO_FILMS)
    expect(Object.keys(candidates[0].parameters)).toEqual(['half.slow_axis', 'quarter.slow_axis'])
  })
})

/** As small as it may be, for what does not depend on the search. */
const FEW = stackWithCards({
  slots: { polarizer: POLARIZERS, quarter: QUARTERS.slice(1, 4) },
  views: [HEAD_ON, AT_45],
})

describe('the front', () => {
  it('is that of the definition, in the axes asked for', async () => {
    const front = readFront(FEW, ['objective', 'chroma@45deg,30deg', 'thickness_nm'])
    const comparison = await run(FEW, { keep: 3, front })
    expect(comparison.front_axes).toEqual(['objective', 'chroma@45,30', 'thickness_nm'])
    const costs = comparison.candidates.map((c) => [c.objective, c.metrics['chroma@45,30'], c.thickness_nm])
    const betters = (a: number[], b: number[]) => a.every((cost, k) => cost <= b[k]) && a.some((cost, k) => cost < b[k])
    const expected = costs.flatMap((cost, k) => (costs.some((other) => betters(other, cost)) ? [] : [k]))
    expect(comparison.front).toEqual(expected)
    expect(comparison.front).toContain(0)
  })

  it('wants much emission and little reflectance', async () => {
    const { candidates, front } = await run(FEW, {
      keep: 3,
      front: readFront(FEW, ['objective', 'emission_transmittance']),
    })
    const emissions = front.map((k) => candidates[k].metrics['emission_transmittance@0,0'])
    // Ranked by falling darkness, each next one of the front must emit more.
    expect(emissions).toEqual(emissions.toSorted((a, b) => a - b))
    expect(front.map((k) => candidates[k].films.polarizer)).toContain('polarizer-clear')
  })
})

describe('constraints', () => {
  const bright = { metric: 'emission_transmittance', ...HEAD_ON, min: 0.45 } as const

  it('put what cannot meet them last, told as such', async () => {
    const { candidates } = await run(
      { ...FEW, optimize: FEW.optimize && { ...FEW.optimize, subject_to: [bright] } },
      { keep: 3 },
    )
    // A polarizer that passes 80 % of one polarization emits at most 40 % of unpolarized light.
    const dense = candidates.map(({ films }) => films.polarizer === 'polarizer-dense')
    expect(dense).toEqual(dense.toSorted((a, b) => Number(a) - Number(b)))
    for (const { films, violation, objective, metrics } of candidates) {
      expect(objective).toBeLessThan(1)
      if (films.polarizer === 'polarizer-dense')
        expect(violation).toBeCloseTo(0.45 - metrics['emission_transmittance@0,0'], 6)
      else expect(violation).toBe(0)
    }
  })
})

describe('angles as the file has them', () => {
  it('are kept, and the objective is that of the file', async () => {
    const fixed = stackWithCards({ slots: { half: HALVES, quarter: QUARTERS }, optimize: false })
    const { candidates, optimized, ruled_out } = await run(fixed, { keep: 2 })
    expect(optimized).toBe(false)
    expect(ruled_out).toBe(0)
    expect(candidates).toHaveLength(20)
    for (const candidate of candidates) {
      expect(candidate.parameters).toEqual({})
      expect(candidate.objective).toBeCloseTo(twin(candidate, 20, 80), 6)
    }
  })

  it('are those of the slot, not of the card', async () => {
    const turned = card('polarizer-turned', polarizer(90))
    const { candidates } = await run(stackWithCards({ slots: { polarizer: [turned] }, optimize: false }))
    const expected = luminousReflectance({ halfAxisDeg: 20, halfNm: 270, quarterAxisDeg: 80, quarterNm: 135 })
    expect(candidates[0].objective).toBeCloseTo(expected, 6)
  })
})

it('maximizes where the file does', async () => {
  const { candidates } = await run(
    stackWithCards({ slots: { half: HALVES.slice(1, 3), quarter: QUARTERS }, minimize: { sense: -1 } }),
  )
  const objectives = candidates.map(({ objective }) => objective)
  expect(objectives).toEqual(objectives.toSorted((a, b) => b - a))
  // Behind an ideal polarizer half of the light comes back at most, where both axes lie along its axis.
  expect(objectives[0]).toBeCloseTo(0.5, 6)
})
