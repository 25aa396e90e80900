import { describe, expect, it } from 'vitest'
import { fitFromStarts } from '../../src/search/fitFromStarts.js'
import { InputError } from '../../src/stack/problem.js'
import type { RetarderLayer } from '../../src/stack/stack.js'
import { type Fit, fit } from '../../src/studies/fit.js'
import { fitProblem } from '../../src/studies/fitProblem.js'
import { DEG } from './builtStack.js'
import {
  asking,
  type DirectionDeg,
  FOUR_PARAMETERS,
  laminate,
  measure,
  noisy,
  SIX_DIRECTIONS,
} from './measuredStack.js'
import { boxMuller, lehmer } from './twoFilms.js'

/** Of one reading: a good spectrophotometer's (common practice, no source). */
const NOISE = 0.0005
/** What the sample is, nm and degrees; the file says 22.5, 270, 90, 140. */
const TRUTH: Readonly<Record<string, number>> = {
  'half.slow_axis': 23.4,
  'half.retardance': 266,
  'quarter.slow_axis': 91.3,
  'quarter.retardance': 142.5,
}
const SAMPLE = laminate({
  half: { slow_axis: 23.4 * DEG, retardance: 266 },
  quarter: { slow_axis: 91.3 * DEG, retardance: 142.5 },
})
const CLEAN = measure(SAMPLE, SIX_DIRECTIONS)

const normalFrom = (seed: number) => boxMuller(lehmer(seed))

async function fitted(directions: readonly DirectionDeg[], vary = FOUR_PARAMETERS): Promise<Fit> {
  const measured = { directions: noisy(measure(SAMPLE, directions), NOISE, normalFrom(3)) }
  return fit(asking(laminate(), { vary, noise: NOISE }), measured, { seed: 1, starts: 3 })
}

describe('six noisy directions of a sample made by the slow solver', async () => {
  const measured = { directions: noisy(CLEAN, NOISE, normalFrom(11)) }

  it('give back angles and retardances within their own errors', async () => {
    const found = await fit(asking(laminate(), { vary: FOUR_PARAMETERS, noise: NOISE }), measured, { seed: 1 })
    for (const [path, { value, std_error }] of Object.entries(found.parameters)) {
      expect(Math.abs(value - TRUTH[path]), path).toBeLessThan(3 * (std_error ?? 0))
      // Fit to decide on: a tenth of a degree, half a nanometer.
      expect(std_error, path).toBeLessThan(path.endsWith('axis') ? 0.1 : 0.5)
    }
    // χ² of 66 readings and 4 parameters: 62 ± 11, so that the rms is the noise to 18 % at two standard deviations.
    expect(found.residual_rms / NOISE).toBeGreaterThan(0.79)
    expect(found.residual_rms / NOISE).toBeLessThan(1.15)
    expect(found.unresolved).toEqual([])
    expect(found.reason).toBe('converged')
  })

  it('tell their noise where the file does not', async () => {
    const stated = await fit(asking(laminate(), { vary: FOUR_PARAMETERS, noise: NOISE }), measured, {
      seed: 1,
      starts: 1,
    })
    const estimated = await fit(asking(laminate(), { vary: FOUR_PARAMETERS }), measured, { seed: 1, starts: 1 })
    expect(estimated.noise_is_stated).toBe(false)
    expect(estimated.noise).toBeCloseTo(Math.sqrt(66 / 62) * estimated.residual_rms, 9)
    for (const [path, { value, std_error }] of Object.entries(estimated.parameters)) {
      expect(value).toBeCloseTo(stated.parameters[path].value, 4)
      // The covariance is that of the stated noise, times the estimated over the stated.
      const scaled = ((stated.parameters[path].std_error ?? 0) * estimated.noise) / NOISE
      expect((std_error ?? 0) / scaled).toBeCloseTo(1, 4)
    }
  })
})

describe('a hundred repetitions of the noise', () => {
  it.each([
    ['stated', NOISE],
    ['estimated', undefined],
  ])('are covered by 90 to 99 of the intervals meant to cover 95, noise %s', (_, noise) => {
    const paths = Object.keys(FOUR_PARAMETERS)
    const covered = new Map(paths.map((path) => [path, 0]))
    const normal = normalFrom(2024)
    const start = [23.4 * DEG, 266, 91.3 * DEG, 142.5]
    for (let repetition = 0; repetition < 100; repetition++) {
      const directions = noisy(CLEAN, NOISE, normal)
      const question = { vary: FOUR_PARAMETERS, ...(noise !== undefined && { noise }) }
      const problem = fitProblem(laminate(), { directions }, question)
      const { x, certainty } = fitFromStarts(problem, { start: [22.5 * DEG, 270, 90 * DEG, 140], starts: 0 })
      paths.forEach((path, k) => {
        // 1.96: the normal's 97.5th percentile; Student's at 62 degrees of freedom is 2.00.
        const inside = Math.abs(x[k] - start[k]) <= 1.96 * certainty.standardErrors[k]
        covered.set(path, (covered.get(path) ?? 0) + Number(inside))
      })
    }
    for (const [path, count] of covered) {
      expect(count, path).toBeGreaterThanOrEqual(90)
      expect(count, path).toBeLessThanOrEqual(99)
    }
  })
})

describe('what the measurement cannot tell apart', async () => {
  const HALF_AND_QUARTER_TURNED = { ...FOUR_PARAMETERS, 'polarizer.absorption_axis': { from: 80 * DEG, to: 100 * DEG } }

  it('is named in words: seen head-on, all axes turn as one', async () => {
    const { unresolved } = await fitted([[0, 0]], HALF_AND_QUARTER_TURNED)
    expect(unresolved.length).toBeGreaterThan(0)
    const [first] = unresolved
    expect(first.parameters).toEqual(expect.arrayContaining(['half.slow_axis', 'quarter.slow_axis']))
    expect(first.sentence).toMatch(/ and .* move together: measure at theta \d+ deg, phi \d+ deg as well$/)
  })

  it.each<[string, readonly DirectionDeg[], typeof FOUR_PARAMETERS]>([
    ['head-on, three axes', [[0, 0]], HALF_AND_QUARTER_TURNED],
    ['head-on, with Nz', [[0, 0]], { ...FOUR_PARAMETERS, 'quarter.nz': { from: 0.5, to: 2 } }],
    [
      'one azimuth along the polarizer',
      [
        [0, 0],
        [30, 0],
      ],
      { ...HALF_AND_QUARTER_TURNED, 'half.nz': { from: 0.5, to: 2 } },
    ],
  ])('is told apart by the direction advised: %s', async (_, directions, vary) => {
    const before = await fitted(directions, vary)
    const advised = before.unresolved.flatMap(({ measure }) => (measure === undefined ? [] : [measure]))
    expect(advised.length).toBeGreaterThan(0)
    const [{ theta_deg, phi_deg }] = advised
    const after = await fitted([...directions, [theta_deg, phi_deg]], vary)
    const cured = before.unresolved.filter(({ measure }) => measure !== undefined)
    for (const { parameters } of cured) {
      const still = after.unresolved.filter((other) => parameters.every((path) => other.parameters.includes(path)))
      expect(still).toEqual([])
    }
  })

  it('is not promised a cure where no direction has one', async () => {
    // Reflectance and depolarized share of a panel without films above differ in nothing that is seen.
    const bare = laminate({ half: { retardance: 0 }, quarter: { retardance: 0 } })
    const stack = asking(
      { ...bare, layers: bare.layers.filter(({ kind }) => kind === 'isotropic') },
      {
        vary: { 'panel.reflectance': { from: 0.3, to: 0.6 }, 'panel.depolarized': { from: 0, to: 0.1 } },
        noise: NOISE,
      },
    )
    const measured = { directions: measure(stack, SIX_DIRECTIONS) }
    const { unresolved } = await fit(stack, measured, { seed: 1, starts: 1 })
    expect(unresolved.map(({ parameters }) => parameters)).toEqual([['panel.depolarized']])
    expect(unresolved[0].measure).toBeUndefined()
    expect(unresolved[0].sentence).toMatch(/^panel.depolarized hardly changes what was measured: measure one of them/)
  })
})

describe('a single fault', async () => {
  const dispersion = (re450: number, re650: number) => ({ dispersion: { re450, re650 } })

  it.each<[string, Readonly<Record<string, Partial<RetarderLayer>>>, object]>([
    ['half.slow_axis', { half: { slow_axis: 24 * DEG } }, {}],
    ['quarter.slow_axis', { quarter: { slow_axis: 88.5 * DEG } }, {}],
    ['half.retardance', { half: { retardance: 263 } }, {}],
    ['quarter.retardance', { quarter: { retardance: 145 } }, {}],
    ['half.dispersion', { half: dispersion(1.09, 0.95) }, {}],
    ['quarter.dispersion', { quarter: dispersion(0.95, 1.02) }, {}],
    ['panel.reflectance', {}, { reflectance: 0.52 }],
    ['panel.depolarized', {}, { depolarized: 0.025 }],
    ['nothing', {}, {}],
  ])('planted in %s is named first', async (planted, changes, panel) => {
    const measured = { directions: noisy(measure(laminate(changes, panel), SIX_DIRECTIONS), NOISE, normalFrom(7)) }
    const stack = asking(laminate(), { vary: { 'half.slow_axis': FOUR_PARAMETERS['half.slow_axis'] }, noise: NOISE })
    const { single_faults } = await fit(stack, measured, { seed: 1, starts: 0 })
    expect(single_faults[0].fault).toBe(planted)
    expect(single_faults[0].delta_bic).toBe(0)
    // Kass and Raftery 1995: a difference above 10 is very strong evidence; each parameter that is not needed costs ln 66 = 4.2.
    expect(single_faults[1].delta_bic).toBeGreaterThan(planted === 'nothing' ? 0 : 10)
  })

  it('has the criterion of its definition', async () => {
    const measured = { directions: noisy(CLEAN, NOISE, normalFrom(7)) }
    const vary = { 'half.slow_axis': FOUR_PARAMETERS['half.slow_axis'] }
    for (const noise of [NOISE, undefined]) {
      const { single_faults } = await fit(asking(laminate(), { vary, ...(noise && { noise }) }), measured, {
        seed: 1,
        starts: 0,
      })
      // n ln(RSS/n) + k ln n, or χ² + k ln n (G. Schwarz, Ann. Stat. 6, 461 (1978)), n = 66.
      const bic = single_faults.map(({ parameters, residual_rms }) => {
        const misfit = noise === undefined ? 66 * Math.log(residual_rms ** 2) : 66 * (residual_rms / noise) ** 2
        return misfit + Object.keys(parameters).length * Math.log(66)
      })
      single_faults.forEach(({ delta_bic }, k) => {
        expect(delta_bic).toBeCloseTo(bic[k] - bic[0], 6)
      })
    }
  })
})

it('says null for the error of a parameter that the data hold at its bound', async () => {
  const { parameters } = await fitted(SIX_DIRECTIONS, {
    ...FOUR_PARAMETERS,
    'quarter.slow_axis': { from: 85 * DEG, to: 90 * DEG },
  })
  expect(parameters['quarter.slow_axis'].value).toBeCloseTo(90, 9)
  expect(parameters['quarter.slow_axis'].std_error).toBeNull()
  expect(parameters['half.slow_axis'].std_error).toBeGreaterThan(0)
})

it('keeps the best so far when stopped', async () => {
  let polled = 0
  const stack = asking(laminate(), { vary: FOUR_PARAMETERS, noise: NOISE })
  const found = await fit(stack, { directions: CLEAN }, { seed: 1 }, { stopped: () => ++polled > 2 })
  expect(found.interrupted).toBe(true)
  expect(Object.keys(found.parameters)).toEqual(Object.keys(FOUR_PARAMETERS))
})

it('refuses fewer readings than parameters', async () => {
  const three = { directions: measure(SAMPLE, [[0, 0]], [550, 600, 650]) }
  const stated = fit(asking(laminate(), { vary: FOUR_PARAMETERS, noise: NOISE }), three, { seed: 1 })
  await expect(stated).rejects.toThrow(InputError)
  const four = { directions: measure(SAMPLE, [[0, 0]], [500, 550, 600, 650]) }
  const estimated = fit(asking(laminate(), { vary: FOUR_PARAMETERS }), four, { seed: 1 })
  await expect(estimated).rejects.toThrow(/too few readings/)
})
