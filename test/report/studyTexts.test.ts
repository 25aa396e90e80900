import { parse } from 'csv-parse/sync'
import { describe, expect, it } from 'vitest'
import { budgetCsv } from '../../src/report/budgetCsv.js'
import { budgetText } from '../../src/report/budgetText.js'
import { coneCsv } from '../../src/report/coneCsv.js'
import { coneText } from '../../src/report/coneText.js'
import { eyewearCsv } from '../../src/report/eyewearCsv.js'
import { eyewearText } from '../../src/report/eyewearText.js'
import { itineraryCsv } from '../../src/report/itineraryCsv.js'
import { itineraryText } from '../../src/report/itineraryText.js'
import { sweepCsv } from '../../src/report/sweepCsv.js'
import { sweepText } from '../../src/report/sweepText.js'
import { budget } from '../../src/studies/budget.js'
import { cone } from '../../src/studies/cone.js'
import { eyewear } from '../../src/studies/eyewear.js'
import { itinerary } from '../../src/studies/itinerary.js'
import { readSweep } from '../../src/studies/readSweep.js'
import { sweep } from '../../src/studies/sweep.js'
import { DEG, darkerThan, polarizer, retarder, stackOf } from '../studies/builtStack.js'

/** Texts and tables of the studies, over sheets whose answers are known: an ideal circular polarizer with a film 1° off. */
const STACK = stackOf([polarizer(0), retarder('quarter', 46, 137.5)], {
  emission: { luminance: 500, dark_luminance: 0, spectrum: 'D65', polarization: 'none' },
  ambient: [500],
  limits: [darkerThan(0.01)],
})

const rowsOf = (csv: string): Record<string, string>[] => parse(csv, { columns: true })
const blanks = (text: string): string => text.replace(/ +/g, ' ')

describe('budget', () => {
  const found = budget(STACK, { theta: 0, phi: 0 })

  it('names every term in words and says what alone means', () => {
    const text = blanks(budgetText(found))
    expect(text).toContain('seen from θ 0° φ 0°')
    // L = 0.1218 % at 1° off, half of which leaves the polarizer (Poincaré sphere, any textbook).
    expect(text).toMatch(/\naxis error 0\.061 /)
    for (const words of ['front face', 'retardance off at 550 nm', 'ideal stack', 'rest', 'total', '"alone" is']) {
      expect(text).toContain(words)
    }
  })

  it('is a table whose parts add up', () => {
    const rows = rowsOf(budgetCsv(found))
    const parts = rows.slice(0, -1).reduce((sum, row) => sum + Number(row.alone), 0)
    expect(rows.at(-1)?.term).toBe('total')
    expect(parts).toBeCloseTo(Number(rows.at(-1)?.alone), 12)
    expect(rows.find((row) => row.term === 'axis_error')?.if_removed).toBe(
      String(found.terms.find(({ name }) => name === 'axis_error')?.if_removed),
    )
  })
})

describe('cone', async () => {
  const found = await cone(STACK, { thetaMax: 40 * DEG, thetaStep: 20 * DEG, phiStep: 90 * DEG })

  it('tells each ring, the worst direction and the limit', () => {
    const text = blanks(coneText(found))
    for (const ring of [/\n 0° /, /\n ?20° /, /\n ?40° /]) expect(text).toMatch(ring)
    expect(text).toMatch(/worst: [\d.]+ % at θ 40°/)
    expect(text).toMatch(/[\d.]+ % of the cone's solid angle is within 1\.000 %/)
    expect(text).toContain('half the azimuths computed')
  })

  it('is a table with a line for each direction', () => {
    const rows = rowsOf(coneCsv(found))
    expect(rows).toHaveLength(12)
    expect([rows[7].theta_deg, rows[7].phi_deg]).toEqual(['20', '270'])
    expect(Number(rows[7].luminous_reflectance)).toBe(found.luminous_reflectance[1][3])
    expect(Number(rows[7]['ambient_contrast/500lx'])).toBe(found.ambient_contrast?.[0].ratio[1][3])
  })
})

describe('sweep', () => {
  const asked = async (vary: readonly string[]) =>
    sweep(
      STACK,
      await readSweep(STACK, { vary, metrics: ['luminous_reflectance'], direction: { theta: 0, phi: 0 }, bandNm: 10 }),
    )

  it('tells a line for each value, and the least with its place', async () => {
    const text = blanks(sweepText(await asked(['quarter.slow_axis=44:46:1'])))
    expect(text).toContain('quarter.slow_axis from 44° to 46°, seen from θ 0° φ 0°')
    expect(text).toMatch(/\n ?44° [\d.]+\n ?45° [\d.]+\n ?46° [\d.]+\n/)
    expect(text).toMatch(/least [\d.]+ % at quarter\.slow_axis 45°/)
  })

  it('tells a grid of two axes, the first down', async () => {
    const found = await asked(['quarter.retardance=130:140:5', 'quarter.slow_axis=44:45:1'])
    const text = blanks(sweepText(found))
    expect(text).toMatch(/quarter\.retardance \\ quarter\.slow_axis 44° 45°\n/)
    expect(text).toMatch(/\n ?130 nm [\d.]+ [\d.]+\n ?135 nm [\d.]+ [\d.]+\n ?140 nm /)
    const rows = rowsOf(sweepCsv(found))
    expect(rows.map((row) => [row['quarter.retardance'], row['quarter.slow_axis']])).toEqual([
      ['130', '44'],
      ['130', '45'],
      ['135', '44'],
      ['135', '45'],
      ['140', '44'],
      ['140', '45'],
    ])
    expect(rows.map((row) => Number(row.luminous_reflectance))).toEqual(found.metrics.luminous_reflectance)
  })

  it('leaves a large table to a file', async () => {
    expect(sweepText(await asked(['quarter.slow_axis=0:150:1']))).toContain('--out writes it as CSV')
  })
})

describe('itinerary', () => {
  const found = itinerary(STACK, { wavelengthsNm: [550], theta: 0, phi: 0 })

  it('names what the light is', () => {
    const text = blanks(itineraryText(found))
    expect(text).toMatch(/in polarizer 50\.000 100\.00 0\.00° -?0\.00° linear/)
    expect(text).toMatch(/in quarter 50\.000 100\.00 [\d.]+° -44\.00° left-handed elliptical/)
    expect(text).toMatch(/out panel 50\.000 100\.00 [\d.]+° 44\.00° right-handed elliptical/)
  })

  it('is a table of Stokes vectors', () => {
    const rows = rowsOf(itineraryCsv(found))
    expect(rows.map(({ direction, layer }) => `${direction} ${layer}`)).toEqual([
      'in polarizer',
      'in quarter',
      'in panel',
      'out panel',
      'out quarter',
      'out polarizer',
      'out air',
    ])
    for (const { s0, s1, s2, s3, degree_of_polarization } of rows) {
      const polarized = Math.hypot(Number(s1), Number(s2), Number(s3)) / Number(s0)
      expect(polarized).toBeCloseTo(Number(degree_of_polarization), 9)
    }
  })
})

describe('eyewear', () => {
  const found = eyewear(STACK, { theta: 0, phi: 0, rollStep: 30 * DEG })

  it('tells what passes at each roll (Malus)', () => {
    const text = blanks(eyewearText(found))
    expect(text).toMatch(/\n ?0° 100\.00 500\.0 0\.0000\n ?30° 75\.00 375\.0 0\.0000\n/)
    expect(text).toMatch(/\n ?90° 0\.00 0\.0 –\n/)
    expect(text).toMatch(/darkest: 0\.00 % \(0\.0 cd\/m²\) at a roll of 90°/)
  })

  it('is a table with the color through the lens', () => {
    const rows = rowsOf(eyewearCsv(found))
    expect(rows.map(({ roll_deg }) => roll_deg)).toEqual(['0', '30', '60', '90', '120', '150'])
    expect(Number(rows[1].y)).toBeCloseTo(75, 3)
    expect(rows[3].delta_uv).toBe('')
  })
})
