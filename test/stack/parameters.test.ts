import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  compileParameters,
  findParameter,
  getParameter,
  parameterPaths,
  setParameters,
} from '../../src/stack/parameters.js'
import { stackOf } from './reading.js'

const TEXT = `format: 1
layers:
  - {id: hard, kind: isotropic, index: 1.49, thickness: 5 um}
  - {id: ar, kind: isotropic, index: {cauchy_nm: [1.38, 3000, 0]}, thickness: 90 nm}
  - {id: polarizer, kind: polarizer, single_transmittance: 43.2 %, polarization_efficiency: 99.98 %, thickness: 12 um}
  - {id: half, kind: retarder, retardance: 272 nm, rth: 100 nm, thickness: 30 um}
  - {id: plus_c, kind: retarder, retardance: 0 nm, rth: -70 nm, thickness: 1 um}
  - {id: coat, kind: crystal, indices: [1.65, 1.52, {n: 1.58, k: 0.001}], tilt: 20 deg, thickness: 1 um}
  - {id: flat, kind: crystal, indices: [1.65, 1.52, {material: tac}], thickness: 1 um}
panel: {kind: mirror, reflectance: {wavelength_nm: [400, 700], value: [0.4, 0.5]}, depolarized: 1 %}
emission: {polarization: {axis: 30 deg}}
`

const stack = await stackOf(TEXT)

describe('parameter paths', () => {
  it('name every numeric field, given or defaulted', () => {
    expect(parameterPaths(stack).map(({ path }) => path)).toEqual([
      ...['hard.thickness', 'hard.index', 'hard.index.n', 'hard.index.k'],
      ...['ar.thickness', 'ar.index.cauchy_nm.0', 'ar.index.cauchy_nm.1', 'ar.index.cauchy_nm.2'],
      ...['polarizer.thickness', 'polarizer.absorption_axis'],
      ...[
        'polarizer.single_transmittance',
        'polarizer.polarization_efficiency',
        'polarizer.index',
        'polarizer.index.n',
      ],
      ...['half.thickness', 'half.slow_axis', 'half.retardance', 'half.nz', 'half.rth'],
      ...['half.dispersion.re450', 'half.dispersion.re650', 'half.index', 'half.index.n', 'half.index.k'],
      ...['plus_c.thickness', 'plus_c.slow_axis', 'plus_c.retardance', 'plus_c.rth'],
      ...['plus_c.dispersion.re450', 'plus_c.dispersion.re650', 'plus_c.index', 'plus_c.index.n', 'plus_c.index.k'],
      ...['coat.thickness', 'coat.azimuth', 'coat.tilt'],
      ...['coat.indices.0', 'coat.indices.0.n', 'coat.indices.0.k', 'coat.indices.1', 'coat.indices.1.n'],
      ...['coat.indices.1.k', 'coat.indices.2.n', 'coat.indices.2.k'],
      ...['flat.thickness', 'flat.azimuth', 'flat.tilt'],
      ...[
        'flat.indices.0',
        'flat.indices.0.n',
        'flat.indices.0.k',
        'flat.indices.1',
        'flat.indices.1.n',
        'flat.indices.1.k',
      ],
      ...['panel.index', 'panel.index.n', 'panel.depolarized'],
      ...['emission.luminance', 'emission.dark_luminance'],
      ...['emission.polarization.axis', 'emission.polarization.ellipticity', 'emission.polarization.degree'],
    ])
  })

  it('know their period: an axis by half a turn, a tilted crystal by a whole one', () => {
    const period = (path: string) => findParameter(stack, path)?.period
    expect(['half.slow_axis', 'polarizer.absorption_axis', 'flat.azimuth'].map(period)).toEqual(Array(3).fill(Math.PI))
    expect(period('coat.azimuth')).toBe(2 * Math.PI)
    expect(period('coat.tilt')).toBeUndefined()
  })

  it('have their value within the usual bounds, and those within what is possible', () => {
    for (const { path, value, usual, range } of parameterPaths(stack)) {
      expect([path, usual[0] <= value && value <= usual[1]]).toEqual([path, true])
      expect([path, range[0] <= usual[0] + 1e-12 && usual[1] <= range[1]]).toEqual([path, true])
    }
  })

  it('turn Rth into Nz by Nz = Rth/Re + 1/2 (design convention, physics of a biaxial film)', () => {
    expect(getParameter(stack, 'half.nz')).toBeCloseTo(100 / 272 + 0.5, 14)
    const changed = setParameters(stack, { 'half.nz': 1.25 })
    expect(getParameter(changed, 'half.rth')).toBeCloseTo(0.75 * 272, 12)
    expect(changed.layers[3]).not.toHaveProperty('rth')
  })
})

describe('set parameters', () => {
  const paths = parameterPaths(stack).filter(({ path }) => !/index\.n$|indices\.[01]\.n$|half\.nz$/.test(path))
  const changes = fc
    .uniqueArray(fc.nat(paths.length - 1), { minLength: 1 })
    .chain((places) =>
      fc.tuple(
        fc.constant(places.map((place) => paths[place])),
        fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: places.length, maxLength: places.length }),
      ),
    )
  const valuesFor = (chosen: typeof paths, shares: number[]) =>
    chosen.map(({ usual: [from, to] }, i) => from + shares[i] * (to - from))

  it('are got back', () => {
    fc.assert(
      fc.property(changes, ([chosen, shares]) => {
        const values = valuesFor(chosen, shares)
        const names = chosen.map(({ path }) => path)
        const changed = setParameters(stack, Object.fromEntries(names.map((path, i) => [path, values[i]])))
        const read = new Map(parameterPaths(changed).map(({ path, value }) => [path, value]))
        names.forEach((path, i) => {
          expect([path, read.get(path) ?? read.get(`${path}.n`)]).toEqual([path, values[i]])
        })
      }),
      { seed: 11, numRuns: 300 },
    )
  })

  it('leave the stack, and share all they do not touch', () => {
    const before = JSON.stringify(stack)
    fc.assert(
      fc.property(changes, ([chosen, shares]) => {
        const names = chosen.map(({ path }) => path)
        const changed = compileParameters(stack, names)(valuesFor(chosen, shares))
        expect(JSON.stringify(stack)).toBe(before)
        const touched = new Set(names.map((path) => path.split('.')[0]))
        stack.layers.forEach((layer, i) => {
          if (!touched.has(layer.id)) expect(changed.layers[i]).toBe(layer)
        })
        if (!touched.has('panel')) expect(changed.panel).toBe(stack.panel)
      }),
      { seed: 12, numRuns: 300 },
    )
  })

  it('keep the layer object of the call before where its values stay', () => {
    const at = compileParameters(stack, ['half.slow_axis', 'hard.thickness'])
    const first = at([0.1, 5000])
    const second = at([0.2, 5000])
    expect(second.layers[0]).toBe(first.layers[0])
    expect(second.layers[3]).not.toBe(first.layers[3])
  })

  it('refuse what is no parameter', () => {
    for (const path of [
      'half',
      'half.',
      'half.id',
      'flat.indices.2',
      'panel.reflectance',
      '__proto__.x',
      'half.constructor',
    ]) {
      expect(() => setParameters(stack, { [path]: 1 })).toThrow('not a parameter')
      expect(findParameter(stack, path)).toBeUndefined()
    }
  })
})
