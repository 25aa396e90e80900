import { describe, expect, it } from 'vitest'
import { type Budget, budget } from '../../src/studies/budget.js'
import { evaluate } from '../../src/studies/evaluate.js'
import type { Imperfection } from '../../src/studies/idealized.js'
import { DEG, glass, polarizer, retarder, stackOf } from './builtStack.js'

const HEAD_ON = { theta: 0, phi: 0 }
/** Flat in angle: Re proportional to λ. */
const PROPORTIONAL = { dispersion: { wavelength_nm: [100, 1000], value: [100, 1000] } }

function term({ terms }: Budget, name: Imperfection) {
  const found = terms.find((candidate) => candidate.name === name)
  if (found === undefined) throw new Error(`no term ${name}`)
  return found
}

function expectSum(found: Budget): void {
  const parts = found.terms.reduce((sum, { alone }) => sum + alone, 0)
  expect(found.ideal + parts + found.rest).toBeCloseTo(found.total, 12)
}

describe('one imperfection at a time: the whole reflection is its own', () => {
  /** Through an ideal polarizer an ideal mirror returns ½ L of unpolarized light, L = 1 - S3² (Poincaré sphere, any textbook). */
  it.each([
    // S3 = cos 2ε sin Γ: 1° → 0.12180 %, 3 nm at 550 nm → 0.11741 %.
    ['axis_error', retarder('quarter', 46, 137.5, PROPORTIONAL), 0.001218],
    ['retardance_550', retarder('quarter', 45, 140.5, PROPORTIONAL), 0.0011741],
    // Mean of cos² Γ(λ) under D65, 380 to 780 nm by 5 nm.
    ['dispersion', retarder('quarter', 45, 137.5), 0.013708],
  ] as const)('%s', (name, film, leakage) => {
    const found = budget(stackOf([polarizer(0), film]), HEAD_ON)
    expect(term(found, name).alone).toBeCloseTo(leakage / 2, 6)
    expect(term(found, name).if_removed).toBeCloseTo(leakage / 2, 6)
    expect(found.total).toBeCloseTo(leakage / 2, 6)
    for (const other of found.terms) if (other.name !== name) expect(other.alone).toBeCloseTo(0, 6)
    expectSum(found)
  })

  it('front_face: Fresnel at n = 1.5 is 4.00 %, and goes where it is removed', () => {
    const layers = [glass('cover', 1.5), { ...polarizer(0), index: 1.5 }]
    const film = retarder('quarter', 45, 137.5, { ...PROPORTIONAL, index: 1.5 })
    const found = budget(stackOf([...layers, film], { panel: { index: 1.5 } }), HEAD_ON)
    expect(term(found, 'front_face').alone).toBeCloseTo(0.04, 6)
    expect(term(found, 'front_face').if_removed).toBeCloseTo(0.04, 6)
    expect(found.total).toBeCloseTo(0.04, 6)
    expectSum(found)
  })

  it('polarizer_leakage: Rm k1 k2 with circular light (Jones calculus)', () => {
    const film = retarder('quarter', 45, 137.5, PROPORTIONAL)
    const found = budget(stackOf([polarizer(0, 0.9, 0.02), film], { panel: { reflectance: 0.45 } }), HEAD_ON)
    expect(term(found, 'polarizer_leakage').alone).toBeCloseTo(0.45 * 0.9 * 0.02, 6)
    expectSum(found)
  })

  it('depolarized: half of what comes back unpolarized passes the polarizer, ¼ k1² Rm δ', () => {
    const film = retarder('quarter', 45, 137.5, PROPORTIONAL)
    const panel = { reflectance: 0.45, depolarized: 0.1 }
    const found = budget(stackOf([polarizer(0, 0.9), film], { panel }), HEAD_ON)
    expect(term(found, 'depolarized').alone).toBeCloseTo((0.45 * 0.1 * 0.81) / 4, 6)
    expectSum(found)
  })

  it('inner_faces: of the light at the face behind the polarizer ρ/(1 + ρ) comes back through it', () => {
    const layers = [polarizer(0), retarder('quarter', 45, 137.5, { ...PROPORTIONAL, index: 1.3 })]
    const found = budget(stackOf(layers, { panel: { index: 1.3 } }), HEAD_ON)
    // Fresnel at 1 to 1.3. The film and an ideal mirror turn the light by 90° at each round trip; what the face sends down
    // again passes at every second: ρ + (1 - ρ)² (ρ + ρ³ + …) = 2ρ/(1 + ρ) of the half that entered.
    const rho = (0.3 / 2.3) ** 2
    expect(term(found, 'inner_faces').alone).toBeCloseTo(rho / (1 + rho), 6)
    expectSum(found)
  })
})

// Fresnel at n = 1.5, mean of s and p: 9.201 and 0.847 % at 45°, 17.657 and 0.180 % at 60° (closed form).
it.each([
  [45, 0.05024],
  [60, 0.08919],
])('front_face over a dark panel at %d°', (thetaDeg, expected) => {
  const stack = stackOf([glass('plate', 1.5)], { panel: { index: 1.5, reflectance: 0 } })
  const found = budget(stack, { theta: thetaDeg * DEG, phi: 0 })
  expect(term(found, 'front_face').alone).toBeCloseTo(expected, 5)
  expect(term(found, 'oblique').alone).toBe(0)
})

/** Everything at once, in index 1.5 under a harder coat; invented. */
const LAMINATE = stackOf(
  [
    glass('hard', 1.6),
    { ...polarizer(0, 0.92, 1e-3), index: 1.5, thickness: 12e3 },
    glass('adhesive', 1.47),
    retarder('half', 16, 270, { index: 1.53, thickness: 30e3 }),
    retarder('quarter', 74, 140, { index: 1.53, thickness: 25e3 }),
  ],
  { panel: { index: 1.55, reflectance: 0.45, depolarized: 0.01 } },
)

describe.each([0, 30, 60])('a whole laminate at %d°', (thetaDeg) => {
  const direction = { theta: thetaDeg * DEG, phi: 0.7 }
  const found = budget(LAMINATE, direction)

  it('adds up to what evaluate says', () => {
    expectSum(found)
    const conditions = { ...LAMINATE.conditions, directions: [direction] }
    const [seen] = evaluate({ ...LAMINATE, conditions }).directions
    expect(found.total).toBe(seen.luminous_reflectance)
  })

  it('has next to nothing left in the ideal stack', () => {
    expect(found.ideal).toBeGreaterThanOrEqual(0)
    // The films keep their Δn of 0.009: a face between two of them reflects about (Δn/4n)².
    expect(found.ideal).toBeLessThan(5e-6)
  })

  it('tells of the oblique geometry only where there is one', () => {
    expect(found.terms.some(({ name }) => name === 'oblique')).toBe(thetaDeg > 0)
    expect(found.notes).toEqual([])
  })
})

describe('what does not apply', () => {
  it('is left out and told: a bare glass plate', () => {
    const found = budget(stackOf([glass('plate', 1.5)], { panel: { index: 1.5, reflectance: 0 } }), HEAD_ON)
    expect(found.terms.map(({ name }) => name)).toEqual(['front_face', 'inner_faces', 'depolarized'])
    expect(found.notes.join()).toMatch(/polarizer_leakage.*no polarizer/)
    expect(term(found, 'front_face').alone).toBeCloseTo(0.04, 12)
  })

  it('a tilted crystal has no nearest ideal design; what it leaves is part of the ideal stack', () => {
    const layer = {
      id: 'coat',
      kind: 'crystal',
      indices: [1.6, 1.5, 1.5],
      azimuth: 45 * DEG,
      tilt: 30 * DEG,
      thickness: 1900,
      coherent: true,
    } as const
    const found = budget(stackOf([polarizer(0), layer]), HEAD_ON)
    expect(found.terms.map(({ name }) => name)).toEqual([
      'front_face',
      'inner_faces',
      'polarizer_leakage',
      'depolarized',
    ])
    expect(found.ideal).toBeGreaterThan(1e-3)
    expect(found.notes.join()).toMatch(/retardance_550, dispersion, axis_error left out: .*crystal/)
    expectSum(found)
  })
})
