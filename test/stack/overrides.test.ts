import { describe, expect, it } from 'vitest'
import { filesFrom, problemsOf, stackOf } from './reading.js'

const degrees = (value: number) => (value * Math.PI) / 180
const TEXT = `format: 1
layers:
  - {id: hard, kind: isotropic, index: 1.49, thickness: &t 5 um}
  - {id: polarizer, kind: polarizer, single_transmittance: 43.2 %, polarization_efficiency: 99.98 %, thickness: *t}
  - {id: half, kind: retarder, retardance: 272 nm, nz: 1, thickness: 30 um}
  - {id: coat, kind: crystal, indices: [1.65, 1.52, {n: 1.58, k: 0.001}], thickness: 1 um}
panel: {kind: mirror, reflectance: 45 %}
`

describe('an option sets', () => {
  it.each([
    ['half.slow_axis=12deg', { layers: [{}, {}, { slow_axis: degrees(12) }, {}] }],
    ['half.slow_axis = 12 deg', { layers: [{}, {}, { slow_axis: degrees(12) }, {}] }],
    ['panel.reflectance=50%', { panel: { reflectance: 0.5 } }],
    ['conditions.observer=10 deg', { conditions: { observer: 10 } }],
    ['conditions.directions.0.theta=45deg', { conditions: { directions: [{ theta: degrees(45), phi: 0 }] } }],
    ['conditions.illuminant={cct: 5000}', { conditions: { illuminant: { cct: 5000 } } }],
    ['emission.luminance=600', { emission: { luminance: 600 } }],
    ['emission.polarization.axis=30 deg', { emission: { polarization: { axis: degrees(30), degree: 1 } } }],
    ['hard.index=1.6', { layers: [{ index: 1.6 }, {}, {}, {}] }],
    ['hard.index.k=0.01', { layers: [{ index: { n: 1.49, k: 0.01 } }, {}, {}, {}] }],
    ['half.index.n=1.6', { layers: [{}, {}, { index: { n: 1.6, k: 0 } }, {}] }],
    ['coat.indices.0.k=0.002', { layers: [{}, {}, {}, { indices: [{ n: 1.65, k: 0.002 }, 1.52, {}] }] }],
    ['half.dispersion.re450=0.85', { layers: [{}, {}, { dispersion: { re450: 0.85, re650: 1 } }, {}] }],
    ['polarizer.thickness=8 um', { layers: [{ thickness: 5000 }, { thickness: 8000 }, {}, {}] }],
    ['hard={kind: isotropic}', undefined],
  ])('%s', async (set, wanted) => {
    if (wanted === undefined) expect(await problemsOf(TEXT, { sets: [set] })).toMatchObject([{ code: 'unknown_id' }])
    else expect(await stackOf(TEXT, { sets: [set] })).toMatchObject(wanted)
  })

  it('rth, and puts nz out of force', async () => {
    const [, , half] = (await stackOf(TEXT, { sets: ['half.rth=69 nm'] })).layers
    expect(half).toMatchObject({ rth: 69 })
    expect(half).not.toHaveProperty('nz')
  })

  it('another pair of transmittances', async () => {
    const [, polarizer] = (await stackOf(TEXT, { sets: ['polarizer.k1=85%', 'polarizer.k2=0.01%'] })).layers
    expect(polarizer).toMatchObject({ k1: 0.85, k2: 0.0001 })
    expect(polarizer).not.toHaveProperty('single_transmittance')
  })

  it('the film of a layer, with other options on top', async () => {
    const card = (name: string, re: number) =>
      `{name: ${name}, kind: retarder, retardance: ${re} nm, thickness: 25 um, dispersion: {re450: 0.8, re650: 1.1}}`
    const files = filesFrom({ 'a.yaml': card('A', 130), 'b.yaml': card('B', 140) })
    const text = 'format: 1\nlayers: [{id: q, film: a.yaml}]\npanel: {kind: metal, index: 1.5}'
    const sets = ['q.dispersion.re450=0.9', 'q.film=b.yaml']
    expect((await stackOf(text, { files, sets })).layers[0]).toMatchObject({
      film: 'b.yaml',
      retardance: 140,
      dispersion: { re450: 0.9, re650: 1.1 },
    })
  })

  it('a number in place of a measured retardance, which leaves its dispersion', async () => {
    const text = TEXT.replace('272 nm', '{wavelength_nm: [450, 550], value: [290 nm, 272 nm]}')
    expect((await stackOf(text, { sets: ['half.retardance=280 nm'] })).layers[2]).toMatchObject({
      retardance: 280,
      dispersion: { value: [290, 272] },
    })
  })
})

describe('a wrong option is told with its own text', () => {
  it.each([
    ['half.slow_axi=12deg', 'unknown_key', 'slow_axis'],
    ['hlaf.slow_axis=12deg', 'unknown_id', 'half'],
    ['half.slow_axis=12 nm', 'wrong_unit', undefined],
    ['half.slow_axis', 'bad_option', undefined],
    ['half.slow_axis=', 'bad_option', undefined],
    ['=3', 'bad_option', undefined],
    ['half.slow_axis={', 'yaml', undefined],
    ['panel.reflectance=50', 'out_of_range', '50 %'],
    ['conditions.directions.3.theta=45deg', 'unknown_field', undefined],
    ['hard.thickness.x=3', 'unknown_field', undefined],
    ['polarizer.k1=85%', 'missing_partner', undefined],
  ])('%s', async (set, code, suggestion) => {
    const problems = await problemsOf(TEXT, { sets: [set] })
    expect(problems).toHaveLength(1)
    expect(problems[0]).toMatchObject({ code, file: `--set ${set}` })
    expect(problems[0].suggestion).toBe(suggestion)
    expect(problems[0]).not.toHaveProperty('range')
  })
})
