import fc from 'fast-check'
import { expect, it } from 'vitest'
import { nondominated } from '../../src/studies/pareto.js'

it('keeps what no other point betters (worked by hand)', () => {
  // b loses to a, e to d in one coordinate alone; the twins f and g do not better each other.
  const points = [
    [1, 5],
    [2, 5],
    [2, 3],
    [4, 1],
    [4, 2],
    [3, 2],
    [3, 2],
  ]
  expect(nondominated(points)).toEqual([0, 2, 3, 5, 6])
  expect(nondominated([])).toEqual([])
})

it('does not let the unknown onto the front where something is known to be as good', () => {
  expect(
    nondominated([
      [1, Number.POSITIVE_INFINITY],
      [1, 2],
    ]),
  ).toEqual([1])
})

/** The definition, word for word: nobody is at least as good everywhere and better somewhere. */
function onFront(points: readonly (readonly number[])[], k: number): boolean {
  for (const other of points) {
    let worseSomewhere = false
    let betterSomewhere = false
    other.forEach((cost, axis) => {
      if (cost > points[k][axis]) worseSomewhere = true
      if (cost < points[k][axis]) betterSomewhere = true
    })
    if (betterSomewhere && !worseSomewhere) return false
  }
  return true
}

it('agrees with the definition in two and three coordinates', () => {
  const points = fc
    .integer({ min: 2, max: 3 })
    .chain((axes) => fc.array(fc.array(fc.integer({ min: 0, max: 6 }), { minLength: axes, maxLength: axes })))
  fc.assert(
    fc.property(points, (all) => {
      expect(nondominated(all)).toEqual(all.map((_, k) => k).filter((k) => onFront(all, k)))
    }),
    { seed: 5, numRuns: 300 },
  )
})
