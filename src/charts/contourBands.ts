import { contours } from 'd3-contour'

/** Everything at or above `level`, as rings in the unit square of the map (u to the right, v up); holes are rings too. */
export interface Band {
  readonly level: number
  readonly rings: readonly (readonly (readonly [u: number, v: number])[])[]
}

/** Samples along one side of the map, and beyond each edge, so that no ring closes along the edge itself. */
const CELLS = 150
const BEYOND = 2

/**
 * Marching squares over a finely sampled field. `valueAt(u, v)` is asked a little outside [0, 1] too and should continue
 * the field there; NaN is taken as below every level.
 */
export function contourBands(valueAt: (u: number, v: number) => number, levels: readonly number[]): Band[] {
  const side = CELLS + 1 + 2 * BEYOND
  const samples = new Array<number>(side * side)
  for (let row = 0; row < side; row++) {
    for (let column = 0; column < side; column++) {
      samples[row * side + column] = valueAt((column - BEYOND) / CELLS, (row - BEYOND) / CELLS)
    }
  }
  // d3-contour puts the sample of column i at x = i + 0.5.
  const unit = (x: number): number => (x - 0.5 - BEYOND) / CELLS
  return contours()
    .size([side, side])
    .thresholds([...levels])(samples)
    .map((found) => ({
      level: found.value,
      rings: found.coordinates.flatMap((polygon) =>
        polygon.map((ring) => ring.map(([x, y]) => [unit(x), unit(y)] as const)),
      ),
    }))
}
