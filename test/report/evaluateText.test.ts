import { describe, expect, test } from 'vitest'
import { evaluateText } from '../../src/report/evaluateText.js'
import { optimizeText } from '../../src/report/optimizeText.js'
import { readStack } from '../../src/stack/readStack.js'
import type { DirectionEvaluation, Evaluation, LimitEvaluation } from '../../src/studies/evaluate.js'
import type { Optimum } from '../../src/studies/optimize.js'
import { SMALL_STACK } from '../cli/smallStack.js'

/** Invented figures. */
const headOn: DirectionEvaluation = {
  theta_deg: 0,
  phi_deg: 0,
  luminous_reflectance: 0.0466,
  color_weighted_reflectance: 0.05,
  front_reflectance: 0.0391,
  inner_reflectance: 0.0075,
  xyz: [4.6, 4.66, 5.2],
  lab: [25.71, 1.5, -2],
  chroma: 2.5,
  spectrum: { wavelength_nm: [], reflectance: [], front_reflectance: [] },
}
const lit = { ...headOn, emission_transmittance: 0.44, ambient_contrast: [{ illuminance_lx: 500, ratio: 81.44 }] }
const limit: LimitEvaluation = {
  metric: 'luminous_reflectance',
  theta_deg: 0,
  phi_deg: 0,
  max: 0.045,
  value: 0.0466,
  margin: -0.0016,
  met: false,
}
const evaluation: Evaluation = { title: 'Invented', directions: [lit], limits: [limit] }

describe('evaluate', () => {
  test('tells every figure with its unit, one row each', () => {
    const text = evaluateText(evaluation)
    for (const row of [
      /^luminous reflectance +% +4\.660$/m,
      /^ {2}of the front faces +% +3\.910$/m,
      /^ {2}from inside +% +0\.750$/m,
      /^color-weighted reflectance +% +5\.000$/m,
      /^lightness L\* +25\.71$/m,
      /^b\* +-2\.00$/m,
      /^chroma C\*ab +2\.50$/m,
      /^emission transmittance +% +44\.000$/m,
      /^contrast at 500 lx +: 1 +81\.4$/m,
    ]) {
      expect(text).toMatch(row)
    }
  })

  test('tells of a limit what is asked, what came and by how much it is missed', () => {
    expect(evaluateText(evaluation)).toMatch(
      /^limits: 0 of 1 met\n {2}luminous reflectance {2}θ 0° φ 0° {2}at most 4\.5 % {2}4\.660 % {2}missed by 0\.160 %$/m,
    )
  })

  test('a limit that does not apply to the stack is missed, not met by a number', () => {
    const nowhere = { ...limit, metric: 'emission_transmittance' as const, value: Number.NaN, margin: Number.NaN }
    expect(evaluateText({ ...evaluation, limits: [nowhere] })).toContain('missed: does not apply to this stack')
  })

  test('says in one line that it is an estimate to be confirmed', () => {
    expect(evaluateText(evaluation).trimEnd().split('\n').at(-1)).toMatch(/estimate.*samples.*standard/)
  })

  test('rows that do not apply are absent; many directions go into further tables', () => {
    const many = { ...evaluation, directions: new Array<DirectionEvaluation>(8).fill(headOn) }
    const text = evaluateText(many)
    expect(text).not.toContain('emission')
    expect(text.match(/^seen from/gm)).toHaveLength(2)
    expect(Math.max(...text.split('\n').map((line) => line.length))).toBeLessThanOrEqual(100)
  })
})

describe('optimize', () => {
  const design = {
    objective: 0.05,
    parameters: { 'quarter.slow_axis': 30, 'quarter.retardance': 120 },
    metrics: { chroma: 9 },
    violation: 0,
  }
  const best = {
    ...design,
    objective: 0.04,
    parameters: { 'quarter.slow_axis': 45, 'quarter.retardance': 138 },
    metrics: { chroma: 1 },
  }
  const optimum: Optimum = {
    title: 'Invented',
    objective: { metric: 'luminous_reflectance', sense: 'minimize', views: [{ theta_deg: 0, phi_deg: 0, weight: 1 }] },
    seed: 7,
    start: design,
    best,
    families: [{ ...best, above_best: 0, found: 4 }],
    family_margin: 0.05,
    evaluations: 1200,
    starts_screened: 64,
    starts_polished: 8,
    reason: 'converged',
    interrupted: false,
    history: [],
  }

  async function textOf(changed: Partial<Optimum> = {}): Promise<string> {
    const reading = await readStack(SMALL_STACK, { file: 'small.stack.yaml' })
    if (!reading.ok) throw new Error('the small stack is wrong')
    return optimizeText(reading.stack, { ...optimum, ...changed }, [limit])
  }

  test('sets before and after side by side, parameters with their units', async () => {
    const text = await textOf()
    expect(text).toMatch(/^objective +% +5\.000 +4\.000$/m)
    expect(text).toMatch(/^quarter\.slow_axis +deg +30\.00 +45\.00$/m)
    expect(text).toMatch(/^quarter\.retardance +nm +120\.00 +138\.00$/m)
    expect(text).toMatch(/^chroma C\*ab +9\.00 +1\.00$/m)
    expect(text).toMatch(/^1\. +4\.000 +4× +45\.00 +138\.00$/m)
    expect(text).toContain('1200 evaluations, 64 starts screened, 8 polished, seed 7')
  })

  test('says when it was interrupted, and when no design meets the constraints', async () => {
    expect(await textOf({ reason: 'stopped' })).toContain('interrupted: this is the best so far')
    expect(await textOf({ best: { ...best, violation: 0.0123 } })).toMatch(/No design .* misses by 0\.0123/)
  })
})
