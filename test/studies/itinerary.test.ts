import { describe, expect, it } from 'vitest'
import type { PolarizerLayer, Stack } from '../../src/stack/stack.js'
import { type ItineraryQuestion, itinerary } from '../../src/studies/itinerary.js'
import { DEG, glass, polarizer, retarder, stackOf } from './builtStack.js'

const HEAD_ON: ItineraryQuestion = { wavelengthsNm: [550], theta: 0, phi: 0 }

function pass(stack: Stack, layer: string, direction: 'in' | 'out', question = HEAD_ON) {
  const found = itinerary(stack, question).passes.filter((p) => p.layer === layer && p.direction === direction)
  if (found.length !== 1) throw new Error(`${found.length} passes of ${layer}, ${direction}`)
  return found[0]
}

/** Azimuths are directions without sense: 179.99° is next to 0°. */
function expectAzimuth(actualDeg: number, expectedDeg: number): void {
  expect(Math.abs(Math.sin((actualDeg - expectedDeg) * DEG))).toBeLessThan(1e-4)
}

it('tells azimuths from 0 to below 180°, also where rounding leaves a hair below 0', () => {
  const sheet: PolarizerLayer = {
    ...{ id: 'sheet', kind: 'polarizer', index: 1.5, thickness: 12_000, coherent: false },
    ...{ absorption_axis: 90 * DEG, single_transmittance: 0.43, polarization_efficiency: 0.999 },
  }
  const stack = stackOf([sheet, retarder('quarter', 45, 137.5)])
  const wavelengthsNm = Array.from({ length: 81 }, (_, k) => 380 + 5 * k)
  const azimuths = itinerary(stack, { wavelengthsNm, theta: 0, phi: 0 }).passes.map((p) => p.azimuth_deg)
  expect(Math.min(...azimuths)).toBeGreaterThanOrEqual(0)
  expect(Math.max(...azimuths)).toBeLessThan(180)
})

/** Common practice, no source: what a polarizer with a quarter-wave film over a mirror does. */
describe('polarizer and quarter-wave film over a mirror', () => {
  const stack = stackOf([polarizer(0), retarder('quarter', 45, 137.5)])

  it('passes linear light of half the flux', () => {
    const { stokes, azimuth_deg, ellipticity_deg, degree_of_polarization } = pass(stack, 'polarizer', 'in')
    expect(stokes[0]).toBeCloseTo(0.5, 5)
    expectAzimuth(azimuth_deg, 0)
    expect(ellipticity_deg).toBeCloseTo(0, 3)
    expect(degree_of_polarization).toBeCloseTo(1, 6)
  })

  it('makes it circular, the mirror turns the hand', () => {
    const hand = pass(stack, 'quarter', 'in').ellipticity_deg
    expect(Math.abs(hand)).toBeCloseTo(45, 3)
    expect(pass(stack, 'panel', 'in').ellipticity_deg).toBeCloseTo(hand, 3)
    const [s0, , , s3] = pass(stack, 'quarter', 'in').stokes
    expect(s3 / s0).toBeCloseTo(Math.sign(hand), 5)
  })

  it('sends it back linear, turned by 90°, and stops it at the polarizer', () => {
    const back = pass(stack, 'quarter', 'out')
    expectAzimuth(back.azimuth_deg, 90)
    expect(back.ellipticity_deg).toBeCloseTo(0, 2)
    expect(back.stokes[0]).toBeCloseTo(0.5, 5)
    expect(pass(stack, 'polarizer', 'out').stokes[0]).toBeCloseTo(0, 5)
    expect(pass(stack, 'air', 'out').stokes[0]).toBeCloseTo(0, 5)
  })

  /**
   * Head-on, light going in along -z of the display frame: E = x̂ at the polarizer. With the slow axis at +45° the component
   * along it lags by a quarter period: E(t) = (cos ωt ê_fast + sin ωt ê_slow)/√2, ê_slow = (1, 1)/√2, ê_fast = (1, -1)/√2 or
   * its opposite; x̂ = (ê_slow + ê_fast)/√2 with ê_fast = (1, -1)/√2. The tip goes from ê_fast (at -45°) to ê_slow (at +45°):
   * counter-clockwise as the viewer sees it, hence clockwise seen along the propagation. Thumb along -z, the right hand's
   * fingers turn clockwise for the viewer: this light is left-handed, named from the source.
   */
  it('names the hand from the source: slow axis 45° counter-clockwise of the transmission axis makes left-handed light', () => {
    expect(pass(stack, 'quarter', 'in').ellipticity_deg).toBeCloseTo(-45, 3)
    expect(pass(stackOf([polarizer(0), retarder('quarter', -45, 137.5)]), 'quarter', 'in').ellipticity_deg).toBeCloseTo(
      45,
      3,
    )
  })

  it('turned as one, turns what it makes', () => {
    const turned = stackOf([polarizer(20), retarder('quarter', 65, 137.5)])
    expectAzimuth(pass(turned, 'polarizer', 'in').azimuth_deg, 20)
    expect(pass(turned, 'quarter', 'in').ellipticity_deg).toBeCloseTo(-45, 3)
    expectAzimuth(pass(turned, 'quarter', 'out').azimuth_deg, 110)
  })
})

describe('single parts (common practice, no source)', () => {
  it.each([0, 20, 45, 77])('a linear polarizer passes half of circular light, also at %d°', (deg) => {
    const analyzer = { ...polarizer(deg), id: 'analyzer' }
    const stack = stackOf([polarizer(0), retarder('quarter', 45, 137.5), analyzer])
    expect(pass(stack, 'analyzer', 'in').stokes[0]).toBeCloseTo(0.25, 5)
  })

  it('light of one hand passes the pair that makes it and is stopped by the other', () => {
    const analyzer = { ...polarizer(0), id: 'analyzer' }
    const through = (second: number) =>
      pass(
        stackOf([polarizer(0), retarder('q1', 45, 137.5), retarder('q2', second, 137.5), analyzer]),
        'analyzer',
        'in',
      )
    expect(through(-45).stokes[0]).toBeCloseTo(0.5, 5)
    expect(through(45).stokes[0]).toBeCloseTo(0, 5)
  })

  it('a half-wave film turns +45° to −45°, on the sphere by half a turn through circular light', () => {
    const half = pass(stackOf([polarizer(45), retarder('half', 0, 275)]), 'half', 'in')
    expectAzimuth(half.azimuth_deg, -45)
    expect(half.stokes[0]).toBeCloseTo(0.5, 5)
    const within = half.within ?? []
    expect(within).toHaveLength(17)
    expect(Math.abs(within[8][3]) / within[8][0]).toBeCloseTo(1, 4)
  })

  it('a half-wave film at 15° turns light of 0° to 30°', () => {
    expectAzimuth(pass(stackOf([polarizer(0), retarder('half', 15, 275)]), 'half', 'in').azimuth_deg, 30)
  })
})

describe('partly polarized light', () => {
  it('is unpolarized above the polarizer', () => {
    const stack = stackOf([glass('cover', 1.5), polarizer(0)])
    const { stokes, degree_of_polarization } = pass(stack, 'cover', 'in')
    expect(degree_of_polarization).toBeCloseTo(0, 12)
    // Fresnel at n = 1.5.
    expect(stokes[0]).toBeCloseTo(0.96, 12)
  })

  it('comes from a panel that depolarizes a share of what it returns', () => {
    const stack = stackOf([polarizer(0)], { panel: { reflectance: 0.4, depolarized: 0.25 } })
    const { stokes, degree_of_polarization } = pass(stack, 'panel', 'out')
    expect(stokes[0]).toBeCloseTo(0.2, 5)
    expect(degree_of_polarization).toBeCloseTo(0.75, 5)
  })

  it('passes a real polarizer with (k1 − k2)/(k1 + k2)', () => {
    const { degree_of_polarization } = pass(stackOf([polarizer(0, 0.9, 0.1)]), 'polarizer', 'in')
    expect(degree_of_polarization).toBeCloseTo(0.8, 5)
  })
})

describe('seen obliquely', () => {
  // Fresnel at 60° on n = 1.5: 17.657 % of s, 0.180 % of p are reflected (closed form).
  it.each([0, 90, 210])('the transmitted p light lies in the plane of incidence, φ = %d°', (phiDeg) => {
    const question = { wavelengthsNm: [550], theta: 60 * DEG, phi: phiDeg * DEG }
    const { stokes, azimuth_deg, degree_of_polarization } = pass(
      stackOf([glass('plate', 1.5)]),
      'plate',
      'in',
      question,
    )
    const [p, s] = [1 - 0.0018, 1 - 0.17657]
    expect(stokes[0]).toBeCloseTo((p + s) / 2, 4)
    expect(degree_of_polarization).toBeCloseTo((p - s) / (p + s), 4)
    expectAzimuth(azimuth_deg, phiDeg)
  })
})

describe('energy', () => {
  it.each([0, 50])('is never gained on the way, at %d°', (thetaDeg) => {
    const layers = [
      glass('hard', 1.6),
      { ...polarizer(0, 0.92, 1e-3), index: 1.5, thickness: 12e3 },
      retarder('half', 16, 270, { index: 1.53, thickness: 30e3, nz: 1.2 }),
      glass('adhesive', 1.47),
      retarder('quarter', 74, 140, { index: 1.53, thickness: 25e3 }),
    ]
    const stack = stackOf(layers, { panel: { index: 1.55, reflectance: 0.45 } })
    const { passes } = itinerary(stack, { wavelengthsNm: [550], theta: thetaDeg * DEG, phi: 1 })
    const fluxes = [1, ...passes.map(({ stokes }) => stokes[0])]
    for (let k = 1; k < fluxes.length; k++) expect(fluxes[k]).toBeLessThanOrEqual(fluxes[k - 1] + 1e-12)
  })
})

describe('over a metal', () => {
  it('the panel is its face: aluminum at 600 nm, 1.26232 + 7.1855i, returns 0.91103 (handbook value of the bare face)', () => {
    const metal = { kind: 'metal', index: { n: 1.26232, k: 7.1855 } } as const
    const stack = { ...stackOf([]), panel: metal }
    const question = { wavelengthsNm: [600], theta: 0, phi: 0 }
    expect(pass(stack, 'panel', 'in', question).stokes[0]).toBeCloseTo(1, 12)
    expect(pass(stack, 'panel', 'out', question).stokes[0]).toBeCloseTo(0.91103, 5)
    expect(pass(stack, 'air', 'out', question).stokes[0]).toBeCloseTo(0.91103, 5)
  })
})

describe('several wavelengths', () => {
  it('follow one another, each with the whole way', () => {
    const stack = stackOf([polarizer(0), retarder('quarter', 45, 137.5)])
    const { passes } = itinerary(stack, { ...HEAD_ON, wavelengthsNm: [450, 650] })
    const way = ['polarizer', 'quarter', 'panel', 'panel', 'quarter', 'polarizer', 'air']
    expect(passes.map((p) => p.layer)).toEqual([...way, ...way])
    expect(passes.map((p) => p.wavelength_nm)).toEqual([...way.map(() => 450), ...way.map(() => 650)])
  })
})
