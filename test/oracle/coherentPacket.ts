/**
 * Layers joined by amplitudes, between two media that are not. Nothing but the boundary condition: tangential E and
 * H are continuous at every face. The conditions of all faces are one linear system, solved at once.
 */
import { neg, ONE, ZERO } from './complex.js'
import { block, identity, type Matrix, product, scaleMatrix, solveLinear } from './complexMatrix.js'
import type { LayerModes } from './layerModes.js'

/** A layer with the two passes through it; a bounding medium has identities there: it is looked at from its face. */
export interface Medium {
  readonly modes: LayerModes
  /** 2×2, E of the forward pair from the upper to the lower face. */
  readonly down: Matrix
  /** 2×2, E of the backward pair from the lower to the upper face. */
  readonly up: Matrix
}

/** 2×2 each, on (Ex', Ey'). */
export interface Packet {
  /** Light from above, returned. */
  readonly reflectAbove: Matrix
  /** Light from above, passed on. */
  readonly transmitDown: Matrix
  /** Light from below, passed on. */
  readonly transmitUp: Matrix
  /** Light from below, returned. */
  readonly reflectBelow: Matrix
}

const atItsFace = (modes: LayerModes): Medium => ({ modes, down: identity(2), up: identity(2) })

/**
 * Unknowns, two components each: u₀, d₁, u₁, … d_N, u_N, d_{N+1}, where d_j is E of the forward pair at the upper
 * face of medium j and u_j E of the backward pair at its lower face. Given: d₀ (from above), u_{N+1} (from below).
 */
export function coherentPacket(above: LayerModes, layers: readonly Medium[], below: LayerModes): Packet {
  const media = [atItsFace(above), ...layers, atItsFace(below)]
  const last = media.length - 1
  const system = media.slice(0, last).flatMap((upper, face) => boundaryRows(upper, media[face + 1], face, last))
  const unknowns = system.map((row) => row.slice(2, -2))
  const given = system.map((row) => [...row.slice(0, 2), ...row.slice(-2)].map(neg))
  const solution = solveLinear(unknowns, given)
  const end = solution.length - 2
  return {
    reflectAbove: block(solution, 0, 0, 2, 2),
    transmitUp: block(solution, 0, 2, 2, 2),
    transmitDown: block(solution, end, 0, 2, 2),
    reflectBelow: block(solution, end, 2, 2, 2),
  }
}

/**
 * The four equations of one face, over d₀, u₀, d₁, u₁, … d_{N+1}, u_{N+1}: E and H above it minus E and H below it.
 */
function boundaryRows(upper: Medium, lower: Medium, face: number, last: number): Matrix {
  const minus = neg(ONE)
  const blocks: readonly (readonly Matrix[])[] = [
    [upper.down, identity(2), scaleMatrix(minus, identity(2)), scaleMatrix(minus, lower.up)],
    [
      product(upper.modes.admittanceForward, upper.down),
      upper.modes.admittanceBackward,
      scaleMatrix(minus, lower.modes.admittanceForward),
      scaleMatrix(minus, product(lower.modes.admittanceBackward, lower.up)),
    ],
  ]

  return blocks.flatMap((blockRow) =>
    [0, 1].map((i) => [
      ...Array.from({ length: 4 * face }, () => ZERO),
      ...blockRow.flatMap((m) => m[i]),
      ...Array.from({ length: 4 * (last - 1 - face) }, () => ZERO),
    ]),
  )
}
