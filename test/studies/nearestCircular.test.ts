import { describe, expect, it } from 'vitest'
import { nearestCircular } from '../../src/studies/nearestCircular.js'

const DEG = Math.PI / 180
const film = (retardanceNm: number, axisDeg: number) => ({
  retardance: (2 * Math.PI * retardanceNm) / 550,
  slowAxis: axisDeg * DEG,
})

function expectFilms(
  found: ReturnType<typeof nearestCircular>,
  expected: readonly (readonly [number, number])[],
): void {
  expect(found).toHaveLength(expected.length)
  expected.forEach(([nm, deg], k) => {
    expect(((found?.[k].retardance ?? 0) * 550) / (2 * Math.PI)).toBeCloseTo(nm, 6)
    expect((found?.[k].slowAxis ?? 0) / DEG).toBeCloseTo(deg, 6)
  })
}

describe('the nearest circular polarizer', () => {
  // Common practice, no source: a quarter-wave film at 45° to the polarizer makes circular light.
  it.each([
    [140.5, 46, 45],
    [130, 43, 45],
    [150, 129, 135],
  ])('a film of %d nm at %d° becomes a quarter wave at %d°', (nm, from, to) => {
    expectFilms(nearestCircular(0, [film(nm, from)]), [[137.5, to]])
  })

  it('turns with the polarizer', () => {
    expectFilms(nearestCircular(30 * DEG, [film(140, 76)]), [[137.5, 75]])
  })

  // Half-wave at α, quarter-wave at 2α + 45° (rule: Destriau, Prouteau, J. Phys. Radium 10, 53 (1949); from memory).
  it.each([
    [15, 75],
    [10, 65],
    [22.5, 90],
  ])('leaves the half-wave film at %d° with the quarter-wave film at %d° alone', (half, quarter) => {
    expectFilms(nearestCircular(0, [film(275, half), film(137.5, quarter)]), [
      [275, half],
      [137.5, quarter],
    ])
  })

  it('spreads an error over the films: the nearest design is nearer than undoing the error in the film that has it', () => {
    const start = [film(275, 15), film(140.5, 76)]
    const found = nearestCircular(0, start)
    const moved = (found ?? []).flatMap((f, k) => [f.retardance - start[k].retardance, f.slowAxis - start[k].slowAxis])
    const undone = Math.hypot((2 * Math.PI * 3) / 550, 1 * DEG)
    expect(Math.hypot(...moved)).toBeGreaterThan(0)
    expect(Math.hypot(...moved)).toBeLessThan(undone)
  })

  it('is not found where the film cannot help: none, or one along the polarizer', () => {
    expect(nearestCircular(0, [])).toBeUndefined()
    expect(nearestCircular(0, [film(137.5, 0)])).toBeUndefined()
  })
})
