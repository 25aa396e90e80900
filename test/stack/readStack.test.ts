import { describe, expect, it } from 'vitest'
import { readStack } from '../../src/stack/readStack.js'
import { filesFrom, problemsOf, stackOf } from './reading.js'

const DEG = Math.PI / 180
const PANEL = 'panel: {kind: mirror, reflectance: 45 %}'
const QUARTER = '  - {id: quarter, kind: retarder, retardance: 138 nm, thickness: 25 um}'
const withLayers = (...layers: string[]) => ['format: 1', 'layers:', ...layers, PANEL].join('\n')

describe('defaults', () => {
  it('are those of the design', async () => {
    const stack = await stackOf(withLayers(QUARTER))
    expect(stack).toEqual({
      format: 1,
      title: 'Untitled laminate',
      conditions: {
        wavelengths: { from: 380, to: 780, step: 5 },
        observer: 2,
        illuminant: 'D65',
        directions: [{ theta: 0, phi: 0 }],
        color_weights: [1, 1, 1],
      },
      layers: [
        {
          id: 'quarter',
          kind: 'retarder',
          retardance: 138,
          thickness: 25_000,
          slow_axis: 0,
          index: 1.55,
          nz: 1,
          coherent: false,
        },
      ],
      panel: { kind: 'mirror', index: 1.5, reflectance: 0.45, depolarized: 0 },
      emission: { luminance: 0, dark_luminance: 0, spectrum: 'D65', polarization: 'none' },
      ambient: [],
      limits: [],
    })
  })

  it('of the questions', async () => {
    const stack = await stackOf(`${withLayers(QUARTER)}
optimize: {vary: {quarter.slow_axis: [15 deg, 75 deg]}, maximize: {metric: chroma}}
tolerance: {vary: {quarter.retardance: {normal: 2 nm}}}
`)
    expect(stack.optimize).toEqual({
      vary: { 'quarter.slow_axis': { values: [15 * DEG, 75 * DEG] } },
      minimize: { metric: 'chroma', sense: -1, views: [{ theta: 0, phi: 0, weight: 1 }] },
      subject_to: [],
    })
    expect(stack.tolerance).toEqual({
      samples: 2000,
      seed: 1,
      sampling: 'sobol',
      vary: { 'quarter.retardance': { normal: 2 } },
      together: [],
    })
  })

  it.each([
    ['4999 nm', true],
    ['5 um', false],
  ])('join a layer of %s by amplitudes: %s', async (thickness, coherent) => {
    const stack = await stackOf(withLayers(`  - {id: a, kind: isotropic, index: 1.5, thickness: ${thickness}}`))
    expect(stack.layers[0].coherent).toBe(coherent)
  })
})

describe('a measured retardance', () => {
  it('becomes its value at 550 nm and a dispersion', async () => {
    const table = '{wavelength_nm: [450, 500, 600], value: [150 nm, 144 nm, 138 nm]}'
    const stack = await stackOf(withLayers(`  - {id: q, kind: retarder, retardance: ${table}, thickness: 25 um}`))
    expect(stack.layers[0]).toMatchObject({
      retardance: 141,
      dispersion: { wavelength_nm: [450, 500, 600], value: [150, 144, 138] },
    })
  })
})

describe('CSV files', () => {
  const panel = (file: string) => `format: 1\nlayers: []\npanel: {kind: mirror, reflectance: {file: ${file}}}`

  it.each([
    ['commas', 'wavelength_nm,reflectance\n400,0.4\n700,0.5\n'],
    ['semicolons and decimal commas', '\ufeffWellenlänge;R\n400,0;0,4\n700,0;0,5\n'],
    ['percent in the heading, tabs', 'nm\tR (%)\n400\t40\n700\t50\n'],
    ['percent in the cells, descending, comment', '# measured\n700,50 %\n400,40%\n'],
    ['micrometers', 'wavelength_um,R\r\n0.4,0.4\r\n0.7,0.5\r\n'],
  ])('with %s are read', async (_, text) => {
    const stack = await stackOf(panel('x.csv'), { files: filesFrom({ 'x.csv': text }) })
    expect(stack.panel).toMatchObject({ reflectance: { wavelength_nm: [400, 700], value: [0.4, 0.5] } })
  })

  it.each([
    ['400,0.4\n500,abc\n', 2, 'column 2 is not a number'],
    ['400,0.4\n500\n', 2, 'the row has another number of columns than the first'],
    ['400,0.4\n500,0.5\n400,0.6\n', 3, 'the same wavelength stands twice'],
    ['0.4,0.4\n', 1, 'this is no wavelength in nm'],
    ['400,0.4,1,2\n', 1, 'wrong number of columns'],
  ])('%j is told with line %i of the file', async (text, line, message) => {
    const files = filesFrom({ 'spectra/x.csv': text })
    const reading = await readStack(panel('spectra/x.csv'), { file: 'stacks/a.yaml', files })
    expect(reading.ok).toBe(false)
    if (reading.ok) return
    expect(reading.problems).toMatchObject([
      { file: 'stacks/spectra/x.csv', code: 'bad_table', message, range: { line }, path: 'panel.reflectance.file' },
    ])
    expect(reading.texts.get('stacks/spectra/x.csv')).toBe(text)
  })

  it('with values that make no sense are told where they are named', async () => {
    const files = filesFrom({ 'x.csv': '400,45\n' })
    const [problem] = await problemsOf(panel('x.csv'), { files })
    expect(problem).toMatchObject({ code: 'out_of_range', suggestion: '45 %', range: { line: 3 } })
  })

  it('give n and k', async () => {
    const files = filesFrom({ 'nk.csv': 'nm,n,k\n400,1.9,0.1\n700,1.8,0.2\n' })
    const stack = await stackOf(withLayers('  - {id: a, kind: isotropic, thickness: 30 nm, index: {file: nk.csv}}'), {
      files,
    })
    expect(stack.layers[0]).toMatchObject({ index: { n: { value: [1.9, 1.8] }, k: { value: [0.1, 0.2] } } })
  })

  it('give a lamp', async () => {
    const files = filesFrom({ 'lamp.csv': '400;1\n700;2\n' })
    const text = `${withLayers(QUARTER)}\nconditions: {illuminant: {file: lamp.csv}}`
    expect((await stackOf(text, { files })).conditions.illuminant).toEqual({ wavelength_nm: [400, 700], value: [1, 2] })
  })
})

describe('film cards', () => {
  const card = `name: Quarter A
maker: invented
price_per_m2: 38
kind: retarder
retardance: {file: re.csv}
nz: 1.2
thickness: 25 um
`
  const files = filesFrom({
    'films/a.film.yaml': card,
    'films/b.film.yaml': card.replace('Quarter A', 'Quarter B').replace('{file: re.csv}', '140 nm'),
    'films/re.csv': '450,150\n550,140\n',
    'pol.film.yaml': 'name: P\nkind: polarizer\nthickness: 12 um\nk1: 85 %\nk2: 0.01 %\n',
    'bad.film.yaml': 'name: Bad\nkind: retarder\nretardance: 140 deg\nthicknes: 25 um\nid: x\n',
  })

  it('lie under the fields of the layer', async () => {
    const stack = await stackOf(
      withLayers('  - {id: quarter, film: films/a.film.yaml, slow_axis: 45 deg, rth: 60 nm, retardance: 130 nm}'),
      { files },
    )
    expect(stack.layers[0]).toEqual({
      id: 'quarter',
      film: 'films/a.film.yaml',
      kind: 'retarder',
      slow_axis: 45 * DEG,
      retardance: 130,
      rth: 60,
      dispersion: { wavelength_nm: [450, 550], value: [150, 140] },
      thickness: 25_000,
      index: 1.55,
      coherent: false,
    })
  })

  it('with faults are told in their own file, all at once', async () => {
    const problems = await problemsOf(withLayers('  - {id: quarter, film: bad.film.yaml}'), { files, file: 'a/b.yaml' })
    expect(problems.map(({ file, code, range, suggestion }) => [file, code, range?.line, suggestion])).toEqual([
      ['a/bad.film.yaml', 'wrong_unit', 3, undefined],
      ['a/bad.film.yaml', 'unknown_key', 4, 'thickness'],
      ['a/bad.film.yaml', 'unknown_key', 5, undefined],
    ])
  })

  it('fill the slots of a comparison', async () => {
    const text = `${withLayers('  - {id: quarter, kind: retarder, retardance: 138 nm, thickness: 25 um, slow_axis: 30 deg}')}
compare: {slots: {quarter: films/*.film.yaml}, optimize: true}`
    const { compare } = await stackOf(text, { files })
    expect(compare?.optimize).toBe(true)
    expect(compare?.slots.quarter).toMatchObject([
      {
        name: 'Quarter A',
        file: 'films/a.film.yaml',
        price_per_m2: 38,
        layer: { id: 'quarter', slow_axis: 30 * DEG, nz: 1.2 },
      },
      { name: 'Quarter B', file: 'films/b.film.yaml', layer: { retardance: 140, coherent: false } },
    ])
  })

  it('must have the fields that a robust search varies', async () => {
    const layer =
      '  - {id: pol, kind: polarizer, thickness: 12 um, single_transmittance: 43 %, polarization_efficiency: 99 %}'
    const text = (metric: string) => `${withLayers(layer)}
compare: {slots: {pol: [pol.film.yaml]}}
optimize: {vary: {pol.absorption_axis: [0, 90]}, minimize: {metric: ${metric}}}
tolerance: {vary: {pol.single_transmittance: {normal: 1 %}}}`
    expect((await stackOf(text('chroma'), { files })).compare).toBeDefined()
    const problems = await problemsOf(text('chroma, quantile: 95 %'), { files })
    expect(problems).toMatchObject([{ code: 'unknown_field', path: 'tolerance.vary.pol.single_transmittance' }])
  })

  it('found by two patterns are one candidate', async () => {
    const text = `${withLayers(QUARTER)}\ncompare: {slots: {quarter: [films/a.film.yaml, films/*.film.yaml]}}`
    const { compare } = await stackOf(text, { files })
    expect(compare?.slots.quarter.map(({ file }) => file)).toEqual(['films/a.film.yaml', 'films/b.film.yaml'])
  })

  it('that no film can be are refused in a slot as in a layer', async () => {
    const clear =
      'name: C\nkind: polarizer\nthickness: 12 um\nsingle_transmittance: 49 %\npolarization_efficiency: 99 %\n'
    const layer = '  - {id: pol, kind: polarizer, thickness: 12 um, k1: 85 %, k2: 0.01 %}'
    const text = `${withLayers(layer)}\ncompare: {slots: {pol: [clear.film.yaml]}}`
    const problems = await problemsOf(text, { files: filesFrom({ 'clear.film.yaml': clear }) })
    expect(problems).toMatchObject([{ file: 'clear.film.yaml', code: 'faces', range: { line: 4 } }])
  })

  it('of another kind than their slot are refused', async () => {
    const text = `${withLayers(QUARTER)}\ncompare: {slots: {quarter: [pol.film.yaml, none-*.film.yaml]}}`
    expect((await problemsOf(text, { files })).map(({ file, code }) => [file, code])).toEqual([
      ['test.stack.yaml', 'missing_file'],
      ['pol.film.yaml', 'wrong_kind'],
    ])
  })
})

describe('warnings', () => {
  it('tell a material outside its range, once', async () => {
    const hard = (id: string) => `  - {id: ${id}, kind: isotropic, index: {material: pmma}, thickness: 5 um}`
    const text = `${withLayers(hard('a'), hard('b'))}\nconditions: {wavelengths: {from: 250 nm, to: 2400 nm, step: 50 nm}}`
    const reading = await readStack(text, { file: 'x' })
    expect(reading).toMatchObject({
      ok: true,
      warnings: [{ code: 'index_range', severity: 'warning', range: { line: 3 } }],
    })
  })
})

describe('warnings of tables', () => {
  it('tell one that ends within the band, and what becomes of it there', async () => {
    const text = `${withLayers('  - {id: a, kind: isotropic, index: {file: nk.csv}, thickness: 5 um}')}`
    const files = filesFrom({ 'nk.csv': 'spectrum_nm,n,k\n400,1.5,0\n700,1.5,0\n' })
    expect(await readStack(text, { file: 'x', files })).toMatchObject({
      ok: true,
      warnings: [
        { code: 'index_range', message: expect.stringContaining('from 700 to 780 nm its end values are held') },
      ],
    })
  })
})

describe('all problems', () => {
  it('are told at once, in the order of the file, whatever their kind', async () => {
    const problems = await problemsOf(`format: 1
conditions:
  directions: [{theta: 95 deg}]
layers:
  - {id: hard, kind: isotropic, index: {material: pmna}, thickness: 5 um}
  - {id: quarter, kind: retarder, retardance: 138 nm, thickness: 25 um, nz: 1, rth: 3}
  - {id: quarter, kind: isotropic, index: 1.5, thickness: 20 inch}
pannel: {kind: mirror}
limits: [{metric: chromaa, max: 3}, {metric: luminous_reflectance, max: 5}]
optimize:
  vary: {quater.slow_axis: {from: 0, to: 1}, quarter.nz: {from: 2, to: 1}}
  minimize: {metric: chroma}
`)
    expect(problems.map(({ range, code }) => `${range?.line} ${code}`)).toEqual([
      '3 out_of_range',
      '5 unknown_name',
      '6 exclusive',
      '7 duplicate_id',
      '7 wrong_unit',
      '8 unknown_key',
      '9 unknown_name',
      '9 out_of_range',
      '11 unknown_id',
      '11 empty_range',
    ])
  })
})

describe('bounds', () => {
  it.each([
    ['alias bomb', aliasBomb(), 'too_large'],
    ['deep nesting', `format: 1\nnotes: ${'['.repeat(5000)}${']'.repeat(5000)}`, 'too_deep'],
    ['very deep nesting', `${'['.repeat(50_000)}`, 'too_deep'],
    ['large text', `# ${'x'.repeat(2_100_000)}`, 'too_large'],
    [
      'many layers',
      withLayers(
        ...Array.from({ length: 10_000 }, (_, i) => `  - {id: l${i}, kind: isotropic, index: 1.5, thickness: 1}`),
      ),
      'too_large',
    ],
  ])('%s is refused', async (_, text, code) => {
    const problems = await problemsOf(text)
    expect(problems[0].code).toBe(code)
    expect(problems[0].message).not.toMatch(/call stack|undefined/)
  })

  function aliasBomb(): string {
    const lines = ['a: &a [x, x, x, x, x, x, x, x, x]']
    for (const [one, next] of ['ab', 'bc', 'cd', 'de', 'ef', 'fg', 'gh', 'hi']) {
      lines.push(`${next}: &${next} [${Array(9).fill(`*${one}`).join(', ')}]`)
    }
    return lines.join('\n')
  }
})

describe('keys that JavaScript treats apart', () => {
  it.each([
    ['format: 1\n__proto__: {polluted: true}\nlayers: []'],
    ['format: 1\nlayers:\n  - {id: a, __proto__: {polluted: true}, kind: isotropic, index: 1.5, thickness: 1}'],
    ['format: 1\nlayers: []\nconstructor: {prototype: {polluted: true}}'],
    ['format: 1\nlayers: []\ntolerance: {vary: {constructor.prototype: {normal: 1}}}'],
    ['format: 1\nlayers: []\ncompare: {slots: {toString: [x]}}'],
  ])('are refused: %j', async (text) => {
    const problems = await problemsOf(`${text}\n${PANEL}`, {
      sets: ['__proto__.polluted=1', 'constructor.prototype.polluted=1'],
    })
    expect(problems.length).toBeGreaterThan(0)
    expect(({} as Record<string, unknown>).polluted).toBeUndefined()
  })
})
