import { describe, expect, it } from 'vitest'
import { setParameters } from '../../src/stack/parameters.js'
import type { MetricRequest, Stack } from '../../src/stack/stack.js'
import { evaluate } from '../../src/studies/evaluate.js'
import { type SweepAxis, type SweepLink, type SweepQuestion, sweep } from '../../src/studies/sweep.js'
import { DEG, polarizer, retarder, stackOf } from './builtStack.js'

const HEAD_ON: MetricRequest = { metric: 'luminous_reflectance', theta: 0, phi: 0 }

function ask(axes: readonly SweepAxis[], rest: Partial<SweepQuestion> = {}): SweepQuestion {
  return { axes, links: [], requests: [HEAD_ON], bandNm: 10, ...rest }
}

const angles = (path: string, ...deg: readonly number[]): SweepAxis => ({
  path,
  kind: 'angle',
  values: deg.map((value) => value * DEG),
})
const lengths = (path: string, ...values: readonly number[]): SweepAxis => ({ path, kind: 'length', values })
const follow = (path: string, expression: string): SweepLink => ({ path, kind: 'angle', expression })

/** Through an ideal polarizer an ideal mirror returns ½ L of unpolarized light: L in % from R. */
const leakage = (reflectance: number) => 200 * reflectance

const PAIR = stackOf([polarizer(0), retarder('half', 15, 275), retarder('quarter', 75, 137.5)])
const SINGLE = stackOf([polarizer(0), retarder('quarter', 45, 137.5)])

describe('one axis', () => {
  // D65 mean of L in % of 15°/75°, films of 275 and 137.5 nm without dispersion: L = 1 - S3² (Poincaré sphere, any textbook).
  it.each([
    ['half.slow_axis', [14, 15, 16], [0.686, 0.047, 0.363]],
    ['quarter.slow_axis', [74, 75, 76], [0.086, 0.047, 0.248]],
  ] as const)('%s: angle errors of a two-film laminate', async (path, deg, expected) => {
    const { metrics, axes } = await sweep(PAIR, ask([angles(path, ...deg)]))
    expect(axes).toEqual([{ path, unit: 'angle', values: deg }])
    metrics.luminous_reflectance.forEach((value, k) => {
      expect(leakage(value)).toBeCloseTo(expected[k], 3)
    })
  })

  it('finds the best constant film of 137.68 nm, D65 L = 1.37039 % (same source)', async () => {
    const values = Array.from({ length: 21 }, (_, k) => 137.58 + 0.01 * k)
    const { luminous_reflectance } = (await sweep(SINGLE, ask([lengths('quarter.retardance', ...values)]))).metrics
    const least = Math.min(...luminous_reflectance)
    expect(leakage(least)).toBeCloseTo(1.37039, 5)
    expect(values[luminous_reflectance.indexOf(least)]).toBeCloseTo(137.68, 9)
  })

  it('wavelength: L of a quarter-wave film at 450, 500, 600 and 650 nm (same source)', async () => {
    const axis = lengths('wavelength', 450, 500, 600, 650)
    const { luminous_reflectance } = (await sweep(SINGLE, ask([axis], { bandNm: 0.01 }))).metrics
    const expected = [11.6978, 2.4472, 1.7037, 5.7272]
    luminous_reflectance.forEach((value, k) => {
      expect(leakage(value)).toBeCloseTo(expected[k], 4)
    })
  })

  it('theta and phi are the direction of the eye', async () => {
    const directions = [10, 40, 70].map((deg) => ({ theta: deg * DEG, phi: 0.3 }))
    const seen = evaluate({ ...PAIR, conditions: { ...PAIR.conditions, directions } }).directions
    const overTheta = await sweep(PAIR, ask([angles('theta', 10, 40, 70)], { requests: [{ ...HEAD_ON, phi: 0.3 }] }))
    overTheta.metrics.luminous_reflectance.forEach((value, k) => {
      expect(value).toBeCloseTo(seen[k].luminous_reflectance, 12)
    })
    const overPhi = await sweep(PAIR, ask([angles('phi', 0, 90)], { requests: [{ ...HEAD_ON, theta: 1 }] }))
    expect(overPhi.metrics.luminous_reflectance[0]).not.toBeCloseTo(overPhi.metrics.luminous_reflectance[1], 3)
  })
})

describe('links', () => {
  // Common practice, no source: only the angles between the layers matter, not the absolute ones.
  it('turn the laminate as one: head-on nothing changes; half-wave −1° and quarter-wave −1° do (same source)', async () => {
    const axis = angles('polarizer.absorption_axis', 90, 100, 135, 180, 200)
    const links = [
      follow('half.slow_axis', 'polarizer.absorption_axis - 75'),
      follow('quarter.slow_axis', 'polarizer.absorption_axis - 15'),
    ]
    const { luminous_reflectance } = (await sweep(PAIR, ask([axis], { links }))).metrics
    for (const value of luminous_reflectance) expect(leakage(value)).toBeCloseTo(0.0468, 4)
    const films = [follow('quarter.slow_axis', 'half.slow_axis + 60')]
    const together = (await sweep(PAIR, ask([angles('half.slow_axis', 14, 16)], { links: films }))).metrics
    expect(leakage(together.luminous_reflectance[0])).toBeCloseTo(0.249, 3)
    expect(leakage(together.luminous_reflectance[1])).toBeCloseTo(0.088, 3)
  })

  it('hold Destriau and Prouteau’s rule 2α + 45° over the half-wave angle (from memory): dark at 550 nm for every α', async () => {
    const links = [follow('quarter.slow_axis', '2 * half.slow_axis + 45')]
    const question = ask([angles('half.slow_axis', 5, 15, 22.5, 30, 40)], { links })
    const conditions = { ...PAIR.conditions, wavelengths: { from: 550, to: 550, step: 5 } }
    const { luminous_reflectance } = (await sweep({ ...PAIR, conditions }, question)).metrics
    for (const value of luminous_reflectance) expect(value).toBeCloseTo(0, 7)
  })
})

describe('two axes', () => {
  const grid = ask(
    [
      lengths('quarter.retardance', ...Array.from({ length: 7 }, (_, k) => 125 + 4 * k)),
      angles('quarter.slow_axis', ...Array.from({ length: 11 }, (_, k) => 40 + k)),
    ],
    { requests: [HEAD_ON, { metric: 'chroma', theta: 30 * DEG, phi: 60 * DEG }] },
  )
  const at = (nm: number, deg: number): Stack =>
    setParameters(SINGLE, { 'quarter.retardance': nm, 'quarter.slow_axis': deg * DEG })

  it('run the last fastest, through every point', async () => {
    const { metrics } = await sweep(SINGLE, grid)
    const [reflectance, chroma] = [metrics['luminous_reflectance@0,0'], metrics['chroma@30,60']]
    expect(reflectance).toHaveLength(77)
    for (const [i, k] of [
      [0, 0],
      [2, 10],
      [3, 0],
      [6, 9],
    ] as const) {
      const stack = at(125 + 4 * i, 40 + k)
      const directions = [HEAD_ON, { theta: 30 * DEG, phi: 60 * DEG }]
      const [straight, aside] = evaluate({ ...stack, conditions: { ...stack.conditions, directions } }).directions
      expect(reflectance[11 * i + k]).toBeCloseTo(straight.luminous_reflectance, 12)
      expect(chroma[11 * i + k]).toBeCloseTo(aside.chroma, 8)
    }
  })

  it('stopped half way, keep what leads', async () => {
    let polled = 0
    const { metrics, interrupted } = await sweep(SINGLE, grid, { stopped: () => polled++ >= 1 })
    expect(interrupted).toBe(true)
    expect(metrics['luminous_reflectance@0,0']).toHaveLength(32)
  })
})
