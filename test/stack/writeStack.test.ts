import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { getParameter, parameterPaths, setParameters } from '../../src/stack/parameters.js'
import { STARTER_FILE } from '../../src/stack/starterFile.js'
import { applyToText } from '../../src/stack/writeStack.js'
import { filesFrom, stackOf } from './reading.js'

const RAD = Math.PI / 180

async function rewritten(text: string, values: Record<string, number>, sets: string[] = []) {
  return applyToText(text, await stackOf(text, { sets }), values, sets)
}

const small = (layer: string, rest = '') => `format: 1
layers:
${layer}
panel: {kind: mirror, index: 1.5, reflectance: 45 %}
${rest}`

describe('values written into the text', () => {
  it('change only their own characters', async () => {
    const text = small(`  - id: half   # the first film
    kind: retarder
    retardance:   272 nm    # from the data sheet
    slow_axis: "105 deg"
    thickness: '30um'
    nz: 1`)
    const result = await rewritten(text, {
      'half.retardance': 270.5,
      'half.slow_axis': 15 * RAD,
      'half.thickness': 25_500,
      'half.nz': 0.5,
      'panel.reflectance': 0.435,
    })
    expect(result).toBe(
      text
        .replace('272 nm', '270.5 nm')
        .replace('"105 deg"', '"15 deg"')
        .replace("'30um'", "'25.5um'")
        .replace('nz: 1', 'nz: 0.5')
        .replace('45 %', '43.5 %'),
    )
  })

  it('keep a bare number bare', async () => {
    const text = small('  - {id: half, kind: retarder, retardance: 272, slow_axis: 105, thickness: 30000}')
    expect(await rewritten(text, { 'half.retardance': 140, 'half.slow_axis': 45 * RAD })).toBe(
      text.replace('272', '140').replace('105', '45'),
    )
  })

  it('are added where the file is silent, in a flow and in a block mapping', async () => {
    const flow = small('  - {id: half, kind: retarder, retardance: 272 nm, thickness: 30 um}')
    expect(await rewritten(flow, { 'half.slow_axis': 45 * RAD })).toContain('thickness: 30 um, slow_axis: 45 deg}')
    const block = small(`  - id: half
    kind: retarder
    thickness: 30 um
    retardance: 272 nm   # measured
  - {id: glue, kind: isotropic, index: 1.475, thickness: 15 um}`)
    expect(await rewritten(block, { 'half.slow_axis': 45 * RAD })).toContain(
      '    retardance: 272 nm   # measured\n    slow_axis: 45 deg\n  - {id: glue',
    )
  })

  it('take the place of what they put out of force', async () => {
    const text = small(`  - id: half
    kind: retarder
    rth: 69 nm   # thick
    retardance: 138 nm
    thickness: 25 um`)
    expect(await rewritten(text, { 'half.nz': 0.6 })).toBe(text.replace('rth: 69 nm', 'nz: 0.6'))
  })

  it('reach into what stood as one number, or not at all', async () => {
    const text = small('  - {id: half, kind: retarder, index: 1.6, retardance: 138 nm, thickness: 25 um}')
    const result = await rewritten(text, { 'half.index.k': 0.001, 'half.dispersion.re450': 0.9 })
    expect(result).toContain('index: {n: 1.6, k: 0.001}')
    expect(result).toContain('dispersion: {re450: 0.9, re650: 1}')
  })

  it('leave a measured retardance its dispersion', async () => {
    const table = '{wavelength_nm: [450, 550, 650], value: [150, 140, 136]}'
    const text = small(`  - {id: half, kind: retarder, retardance: ${table}, thickness: 25 um}`)
    const result = await rewritten(text, { 'half.retardance': 120 })
    expect(result).toContain('retardance: 120 nm')
    expect(result.replaceAll(' ', '')).toContain(`dispersion:${table.replaceAll(' ', '')}`)
    const before = await stackOf(text)
    expect(await stackOf(result)).toEqual(setParameters(before, { 'half.retardance': 120 }))
  })

  it('leave what an anchor shares with other places', async () => {
    const text = small(`  - {id: glue, kind: isotropic, index: 1.475, thickness: &glue 15 um}   # anchored
  - {id: half, kind: retarder, retardance: 272 nm, thickness: *glue, dispersion: &flat {re450: 1, re650: 1}}
  - {id: quarter, kind: retarder, retardance: 138 nm, thickness: *glue, dispersion: *flat}`)
    const one = await rewritten(text, { 'half.thickness': 20_000 })
    expect(one).toBe(text.replace('thickness: *glue, dispersion: &', 'thickness: 20 um, dispersion: &'))
    const anchored = await rewritten(text, { 'glue.thickness': 20_000, 'quarter.dispersion.re450': 0.9 })
    expect(anchored).toContain('thickness: &glue 20 um}   # anchored')
    expect(await stackOf(anchored)).toEqual(
      setParameters(await stackOf(text), { 'glue.thickness': 20_000, 'quarter.dispersion.re450': 0.9 }),
    )
  })

  it('go onto the layer where a film card holds the field', async () => {
    const card =
      'name: A\nkind: retarder\nretardance: 138 nm\nthickness: 25 um\nrth: 69 nm\ndispersion: {re450: 0.85, re650: 1.05}\n'
    const files = filesFrom({ 'films/a.film.yaml': card })
    const text = small('  - {id: quarter, film: films/a.film.yaml, slow_axis: 45 deg}')
    const stack = await stackOf(text, { files })
    const values = { 'quarter.retardance': 140, 'quarter.nz': 0.5, 'quarter.dispersion.re450': 0.9 }
    const result = applyToText(text, stack, values)
    expect(result).toContain(
      '{id: quarter, film: films/a.film.yaml, slow_axis: 45 deg, retardance: 140 nm, nz: 0.5, dispersion: {re450: 0.9, re650: 1.05}}',
    )
    expect(await stackOf(result, { files })).toEqual(setParameters(stack, values))
  })

  it('come after the options of the command line', async () => {
    const text = small('  - {id: half, kind: retarder, retardance: 272 nm, thickness: 30 um}')
    const result = await rewritten(text, { 'half.retardance': 270 }, [
      'half.slow_axis=12deg',
      'conditions.observer=10 deg',
    ])
    expect(result).toContain('{id: half, kind: retarder, retardance: 270 nm, thickness: 30 um, slow_axis: 12deg}')
    expect((await stackOf(result)).conditions.observer).toBe(10)
  })

  it('keep a JSON file JSON', async () => {
    const text = JSON.stringify(
      {
        format: 1,
        layers: [{ id: 'half', kind: 'retarder', retardance: '272 nm', rth: '10 nm', thickness: '30 um' }],
        panel: { kind: 'metal', index: { n: 1, k: 6 } },
      },
      null,
      2,
    )
    const result = await rewritten(text, { 'half.nz': 0.6, 'half.slow_axis': 30 * RAD, 'panel.index.k': 6.5 })
    expect(JSON.parse(result).layers[0]).toEqual({
      id: 'half',
      kind: 'retarder',
      retardance: '272 nm',
      nz: 0.6,
      thickness: '30 um',
      slow_axis: '30 deg',
    })
    expect(JSON.parse(result).panel.index.k).toBe(6.5)
  })

  it('keep line ends', async () => {
    const text = small('  - id: half\n    kind: retarder\n    retardance: 272 nm\n    thickness: 30 um').replaceAll(
      '\n',
      '\r\n',
    )
    const result = await rewritten(text, { 'half.slow_axis': 0.5, 'half.retardance': 270 })
    expect(result.replaceAll('\r\n', '')).not.toContain('\n')
    expect(getParameter(await stackOf(result), 'half.slow_axis')).toBeCloseTo(0.5, 12)
  })
})

describe('the starter file', () => {
  it('reads without problem or warning', async () => {
    const stack = await stackOf(STARTER_FILE)
    expect(stack.layers.map(({ id }) => id)).toEqual(['cover', 'polarizer', 'half', 'adhesive', 'quarter'])
  })

  it('reads back what is written into it, to 1e-12, for any parameters', async () => {
    const stack = await stackOf(STARTER_FILE)
    const parameters = parameterPaths(stack).filter(
      ({ path }) => !/index\.n$|rth$|^polarizer\.(single|polariz)/.test(path),
    )
    const changes = fc.dictionary(
      fc.constantFrom(...parameters.map(({ path }) => path)),
      fc.double({ min: 0, max: 1, noNaN: true }),
    )
    await fc.assert(
      fc.asyncProperty(changes, async (shares) => {
        const values = Object.fromEntries(
          Object.entries(shares).map(([path, share]) => {
            const [from, to] = parameters.find((parameter) => parameter.path === path)?.usual ?? [0, 0]
            return [path, path.endsWith('.thickness') ? to * (1 + share) : from + share * (to - from)]
          }),
        )
        const read = await stackOf(applyToText(STARTER_FILE, stack, values))
        const wanted = setParameters(stack, values)
        for (const { path, value } of parameterPaths(wanted)) {
          expect(Math.abs(getParameter(read, path) - value)).toBeLessThanOrEqual(1e-12 * Math.abs(value))
        }
      }),
      { seed: 20, numRuns: 60 },
    )
  })
})
