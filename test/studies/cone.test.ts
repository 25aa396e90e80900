import { describe, expect, it } from 'vitest'
import { cone } from '../../src/studies/cone.js'
import { evaluate } from '../../src/studies/evaluate.js'
import { DEG, darkerThan, glass, polarizer, retarder, stackOf } from './builtStack.js'

const QUESTION = { thetaMax: 60 * DEG, thetaStep: 15 * DEG, phiStep: 30 * DEG }

/** All of one index: inner faces reflect next to nothing. */
const inside = { index: 1.5, thickness: 50e3 }
const ideal = { ...polarizer(0), index: 1.5 }

describe('a bare plate of n = 1.5 over a black panel', () => {
  const stack = stackOf([glass('plate', 1.5)], { panel: { index: 1.5, reflectance: 0 } })

  it('reflects 9.178 % of diffuse light (Lambertian-hemispherical, closed form of the Fresnel equations)', async () => {
    const { summary } = await cone(stack, QUESTION)
    expect(summary.diffuse_reflectance).toBeCloseTo(0.09178, 4)
  })

  it('is alike in every azimuth, Fresnel in θ', async () => {
    const found = await cone(stack, QUESTION)
    // n = 1.5: s and p 9.201, 0.847 % at 45°, 17.657, 0.180 % at 60°.
    const rows = [
      [0, 0.04],
      [3, 0.05024],
      [4, 0.089185],
    ] as const
    for (const [row, expected] of rows) {
      for (const value of found.luminous_reflectance[row]) expect(value).toBeCloseTo(expected, 5)
    }
    expect(found.summary.worst.theta_deg).toBe(60)
    expect(found.theta_deg).toEqual([0, 15, 30, 45, 60])
    expect(found.phi_deg).toEqual([0, 30, 60, 90, 120, 150, 180, 210, 240, 270, 300, 330])
  })
})

describe('half-wave plus quarter-wave film (Kim et al., Opt. Express 22, A1725 (2014))', () => {
  const pair = (nz: number) =>
    stackOf([ideal, retarder('half', 15, 275, { ...inside, nz }), retarder('quarter', 75, 137.5, { ...inside, nz })], {
      panel: { index: 1.5 },
    })
  const fromFilms = async (nz: number) => {
    const [found, bare] = [await cone(pair(nz), QUESTION), await cone(front, QUESTION)]
    return Math.max(
      ...found.luminous_reflectance.flatMap((row, t) => row.map((value, p) => value - bare.luminous_reflectance[t][p])),
    )
  }
  const front = stackOf([ideal], { panel: { index: 1.5, reflectance: 0 } })

  /**
   * The abstract gives the finding, not this figure: of the half of the light that an ideal mirror gets, less than a
   * twentieth up to 60°, and less than a twentieth of what the pair with Nz = 1.5 lets out.
   */
  it('with Nz = 0.5 is dark from every direction, with Nz = 1.5 leaks', async () => {
    const [dark, leaking] = [await fromFilms(0.5), await fromFilms(1.5)]
    expect(dark).toBeLessThan(0.025)
    expect(dark).toBeLessThan(leaking / 20)
    expect(leaking).toBeGreaterThan(0.25)
  })
})

/** Everything real, invented. */
const LAMINATE = stackOf(
  [
    glass('hard', 1.6),
    { ...polarizer(0, 0.92, 1e-3), index: 1.5, thickness: 12e3 },
    retarder('half', 16, 270, { index: 1.53, thickness: 30e3, nz: 1.2 }),
    retarder('quarter', 74, 140, { index: 1.53, thickness: 25e3 }),
  ],
  {
    panel: { index: 1.55, reflectance: 0.45, depolarized: 0.01 },
    emission: { luminance: 600, dark_luminance: 0, spectrum: 'D65', polarization: 'none' },
    ambient: [500, 10000],
  },
)

describe('symmetry', () => {
  it('of half a turn, once proven, saves half the azimuths and changes no digit', async () => {
    const found = await cone(LAMINATE, QUESTION)
    expect(found.summary.half_turn_symmetry).toBe(true)
    const conditions = {
      ...LAMINATE.conditions,
      directions: [210, 240, 330].map((phiDeg) => ({ theta: 45 * DEG, phi: phiDeg * DEG })),
    }
    const row = found.theta_deg.indexOf(45)
    for (const seen of evaluate({ ...LAMINATE, conditions }).directions) {
      const column = found.phi_deg.indexOf(seen.phi_deg)
      expect(found.luminous_reflectance[row][column]).toBeCloseTo(seen.luminous_reflectance, 12)
      expect(found.chroma[row][column]).toBeCloseTo(seen.chroma, 8)
      expect(found.emission_transmittance?.[row][column]).toBeCloseTo(seen.emission_transmittance ?? Number.NaN, 12)
      const contrast = seen.ambient_contrast?.map(({ ratio }) => ratio) ?? []
      expect(found.ambient_contrast?.map(({ ratio }) => ratio[row][column] / contrast[0])[0]).toBeCloseTo(1, 9)
    }
  })

  it('is not claimed of a tilted crystal, whose emission differs from the two sides', async () => {
    const tilted = {
      id: 'coat',
      kind: 'crystal',
      indices: [1.7, 1.5, 1.5],
      azimuth: 0.4,
      tilt: 0.6,
      thickness: 1500,
      coherent: true,
    } as const
    const polarization = { axis: 20 * DEG, ellipticity: 0, degree: 1 }
    const layers = [LAMINATE.layers[1], tilted]
    const found = await cone({ ...LAMINATE, layers, emission: { ...LAMINATE.emission, polarization } }, QUESTION)
    expect(found.summary.half_turn_symmetry).toBe(false)
    const [, , , row] = found.emission_transmittance ?? []
    expect(Math.abs(row[3] - row[9])).toBeGreaterThan(1e-4)
    // Reflectance is the same by reciprocity: R(θ, φ) = R(θ, φ + 180°) (Helmholtz).
    expect(found.luminous_reflectance[3][3]).toBeCloseTo(found.luminous_reflectance[3][9], 9)
  })

  it('turned as a whole, the stack turns its cone', async () => {
    const turned = LAMINATE.layers.map((layer) => {
      if (layer.kind === 'polarizer') return { ...layer, absorption_axis: layer.absorption_axis + 30 * DEG }
      return layer.kind === 'retarder' ? { ...layer, slow_axis: layer.slow_axis + 30 * DEG } : layer
    })
    const [before, after] = [await cone(LAMINATE, QUESTION), await cone({ ...LAMINATE, layers: turned }, QUESTION)]
    before.luminous_reflectance.forEach((row, t) => {
      row.forEach((value, p) => {
        expect(after.luminous_reflectance[t][(p + 1) % row.length]).toBeCloseTo(value, 9)
      })
    })
    expect(after.summary.diffuse_reflectance).toBeCloseTo(before.summary.diffuse_reflectance, 5)
    // The films were in effect: azimuths differ.
    expect(Math.max(...before.luminous_reflectance[4]) - Math.min(...before.luminous_reflectance[4])).toBeGreaterThan(
      0.01,
    )
  })
})

describe('the summary', () => {
  const plate = stackOf([glass('plate', 1.5)], { panel: { index: 1.5, reflectance: 0 } })
  const fine = { thetaMax: 80 * DEG, thetaStep: 1 * DEG, phiStep: 90 * DEG }

  it('tells the share of solid angle and the largest angle within a limit', async () => {
    // Fresnel at n = 1.5 passes 5.024 % at 45°: solid angles go with 1 - cos θ.
    const { summary } = await cone({ ...plate, limits: [darkerThan(0.05024)] }, fine)
    expect(summary.limit).toBe(0.05024)
    expect(summary.theta_within_limit_deg).toBe(45)
    const share = (1 - Math.cos(45.5 * DEG)) / (1 - Math.cos(80 * DEG))
    expect(summary.share_within_limit).toBeCloseTo(share, 6)
    expect(summary.worst).toMatchObject({ theta_deg: 80 })
  })

  it('has no largest angle where even head-on misses the limit, and nothing to say without one', async () => {
    const missed = (await cone(plate, { ...fine, limit: 0.039 })).summary
    expect(missed.share_within_limit).toBe(0)
    expect(missed.theta_within_limit_deg).toBeUndefined()
    expect((await cone(plate, fine)).summary.limit).toBeUndefined()
  })

  it('measures color from head-on', async () => {
    const found = await cone(LAMINATE, QUESTION)
    for (const value of found.delta_e00[0]) expect(value).toBeCloseTo(0, 6)
    expect(Math.max(...found.delta_e00.flat())).toBeGreaterThan(2)
  })
})

describe('stopped half way', () => {
  it('keeps the rows that are done', async () => {
    let done = 0
    const found = await cone(LAMINATE, QUESTION, { progress: () => done++, stopped: () => done >= 2 })
    expect(found.interrupted).toBe(true)
    expect(found.theta_deg).toEqual([0, 15])
    expect(found.luminous_reflectance).toHaveLength(2)
  })

  it('looks head-on at least', async () => {
    const found = await cone(LAMINATE, QUESTION, { stopped: () => true })
    expect(found.interrupted).toBe(true)
    expect(found.theta_deg).toEqual([0])
    expect(found.summary.worst.luminous_reflectance).toBeCloseTo(found.luminous_reflectance[0][0], 12)
  })
})
