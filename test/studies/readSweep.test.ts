import { describe, expect, it } from 'vitest'
import { InputError, type Problem } from '../../src/stack/problem.js'
import { readSweep, type SweepTexts } from '../../src/studies/readSweep.js'
import { DEG, polarizer, retarder, stackOf } from './builtStack.js'

const STACK = stackOf([polarizer(0), retarder('half', 15, 275), retarder('quarter', 75, 137.5)])
const read = (vary: readonly string[], rest: Partial<SweepTexts> = {}) =>
  readSweep(STACK, { vary, metrics: [], direction: { theta: 0, phi: 0 }, bandNm: 10, ...rest })

async function problemsOf(vary: readonly string[], rest: Partial<SweepTexts> = {}): Promise<readonly Problem[]> {
  try {
    await read(vary, rest)
  } catch (error) {
    if (error instanceof InputError) return error.problems
    throw error
  }
  throw new Error('no problem was found')
}

describe('axes', () => {
  it('take units or bare numbers, and end at the end', async () => {
    const { axes } = await read(['quarter.retardance=0.13um:140nm:2.5'])
    expect(axes).toEqual([{ path: 'quarter.retardance', kind: 'length', values: [130, 132.5, 135, 137.5, 140] }])
  })

  it('turn degrees into radians; a step that does not divide ends short', async () => {
    const { axes } = await read(['half.slow_axis=10:20:4'])
    expect(axes[0].values).toHaveLength(3)
    expect(axes[0].values[2]).toBeCloseTo(18 * DEG, 14)
  })

  it('are one or two, the view among them', async () => {
    const { axes } = await read(['theta=0:60:20', 'wavelength=400:700:100'])
    expect(axes.map(({ path, values }) => [path, values.length])).toEqual([
      ['theta', 4],
      ['wavelength', 4],
    ])
  })
})

describe('links', () => {
  it('are expressions in the axes', async () => {
    const { links } = await read(['half.slow_axis=10:20:1,quarter.slow_axis = 2*half.slow_axis + max(45, 0)'])
    expect(links).toEqual([{ path: 'quarter.slow_axis', kind: 'angle', expression: '2*half.slow_axis + max(45, 0)' }])
  })
})

describe('metrics', () => {
  it('are luminous reflectance and chroma unless named', async () => {
    const { requests } = await read(['half.slow_axis=10:20:1'], { direction: { theta: 0.5, phi: 1 } })
    expect(requests).toEqual([
      { metric: 'luminous_reflectance', theta: 0.5, phi: 1 },
      { metric: 'chroma', theta: 0.5, phi: 1 },
    ])
  })

  it('are written as the keys of the answer', async () => {
    const stack = { ...STACK, emission: { ...STACK.emission, luminance: 500 } }
    const { requests } = await readSweep(stack, {
      vary: ['half.slow_axis=10:20:1'],
      metrics: ['lightness@45,90', 'ambient_contrast/10klx@30deg,0'],
      direction: { theta: 0, phi: 0 },
      bandNm: 10,
    })
    expect(requests).toEqual([
      { metric: 'lightness', theta: 45 * DEG, phi: 90 * DEG },
      { metric: 'ambient_contrast', theta: 30 * DEG, phi: 0, illuminance: 10_000 },
    ])
  })
})

describe('wrong options are told with what is allowed', () => {
  it.each([
    ['no range', ['half.slow_axis'], /no range/, /from:to:step/],
    ['unknown layer', ['haf.slow_axis=1:2:1'], /no layer "haf"/, /half/],
    ['unknown field', ['half.slow=1:2:1'], /no field "slow"/, /half\.slow_axis/],
    ['wrong unit', ['half.slow_axis=1nm:2nm:1nm'], /unit of length/, /an angle/],
    ['falling range', ['half.slow_axis=2:1:1'], /must rise/, /from:to:step/],
    ['no step', ['half.slow_axis=1:2:0'], /must rise/, /from:to:step/],
    ['beyond sense', ['panel.reflectance=0.5:1.5:0.1'], /leaves what makes sense/, /0 % to 100 %/],
    ['beyond the wavelengths', ['wavelength=300:500:10'], /leaves what makes sense/, /380 nm to 780 nm/],
    ['too many points', ['half.slow_axis=0:180:0.0001'], /too many/, /at most 1000000/],
    ['three axes', ['theta=0:1:1', 'phi=0:1:1', 'wavelength=400:500:50'], /one axis or two/, /one or two/],
    ['no axis', [], /one axis or two/, /one or two/],
    ['the same twice', ['theta=0:1:1', 'theta=0:1:1'], /set twice/, undefined],
    ['linked to nothing', ['theta=0:1:1,half.slow_axis'], /links nothing/, /path=expression/],
    ['linked badly', ['theta=0:1:1,half.slow_axis=theta+'], /cannot be read at column/, /numbers, theta/],
    ['linked to another', ['theta=0:1:1,half.slow_axis=phi'], /cannot be read at column 1/, /theta/],
    ['linked beyond sense', ['theta=0:60:1,panel.reflectance=theta'], /linked parameter leaves/, /0 % to 100 %/],
  ])('%s', async (_name, vary, message, allowed) => {
    const [problem] = await problemsOf(vary)
    expect(problem.message).toMatch(message)
    expect(problem.file).toMatch(/^--vary/)
    if (allowed !== undefined) expect(problem.allowed).toMatch(allowed)
  })

  it.each([
    ['unknown metric', 'luminous', /no metric "luminous"/],
    ['no metric', '@1,2', /names no metric/],
    ['beside the screen', 'chroma@95,0', /in front of the screen/],
    ['no angle', 'chroma@left,0', /no such quantity|unit/],
    ['no luminance', 'ambient_contrast/500lx', /luminance of the screen/],
    ['stray light', 'chroma/500lx', /does not depend/],
  ])('%s', async (_name, metric, message) => {
    const [problem] = await problemsOf(['half.slow_axis=1:2:1'], { metrics: [metric] })
    expect(problem.message).toMatch(message)
    expect(problem.file).toBe(`--metric ${metric}`)
  })

  it('a fixed direction under a varied one', async () => {
    const [problem] = await problemsOf(['theta=0:60:10'], { metrics: ['chroma@30,0'] })
    expect(problem.message).toMatch(/fixed while theta is varied/)
  })

  it('all at once', async () => {
    expect(await problemsOf(['haf.slow_axis=1:2:1', 'half.slow_axis=2:1:1'])).toHaveLength(2)
  })

  it('names the nearest', async () => {
    expect((await problemsOf(['haf.slow_axis=1:2:1']))[0].suggestion).toBe('half.slow_axis')
    expect((await problemsOf(['theta=0:1:1'], { metrics: ['croma'] }))[0].suggestion).toBe('chroma')
  })
})
