/**
 * Packets joined without phase (R. Nichols, O. Arteaga, A. Martin, B. Kahr, J. Opt. Soc. Am. A 32 (2015)). In every
 * thick medium the light that goes down and the light that goes up have coherency vectors of their own,
 * (ExEx*, ExEy*, EyEx*, EyEy*); a map m of fields is m ⊗ m* on them. What stands in each medium is what its two
 * faces send into it: a linear system over all media, whose solution is the sum over all round trips.
 */

import type { Medium, Packet } from './coherentPacket.js'
import { neg, ONE, ZERO } from './complex.js'
import {
  addMatrix,
  identity,
  kroneckerWithConjugate,
  type Matrix,
  product,
  scaleMatrix,
  solveLinear,
  zeros,
} from './complexMatrix.js'

/** 4×4, from the coherency vectors that enter to the one that leaves upward on top. */
interface Balance {
  /** Of light from above the stack. */
  readonly fromAbove: Matrix
  /** Of light that starts upward just above the panel. */
  readonly fromPanel: Matrix
}

/**
 * `packets[i]` lies between medium i and medium i + 1; medium 0 is the air, `thick` are the media 1 to K, medium
 * K + 1 that of the panel, which returns `panelReturn` (4×4) of what arrives.
 *
 * Unknowns, four components each: D₀, U₀, … D_{K+1}, U_{K+1}, with D_j at the upper face of medium j going down and
 * U_j at its lower face going up. Equations: D₀ is given; each packet gives U_i and D_{i+1}; the panel gives U_{K+1}.
 */
export function incoherentBalance(packets: readonly Packet[], thick: readonly Medium[], panelReturn: Matrix): Balance {
  const media = packets.length + 1
  const down = [identity(4), ...thick.map((m) => kroneckerWithConjugate(m.down)), identity(4)]
  const up = [identity(4), ...thick.map((m) => kroneckerWithConjugate(m.up)), identity(4)]
  const D = (j: number) => 2 * j
  const U = (j: number) => 2 * j + 1
  const packetEquations = packets.flatMap((packet, i) => {
    const reflectAbove = product(kroneckerWithConjugate(packet.reflectAbove), down[i])
    const transmitDown = product(kroneckerWithConjugate(packet.transmitDown), down[i])
    const transmitUp = product(kroneckerWithConjugate(packet.transmitUp), up[i + 1])
    const reflectBelow = product(kroneckerWithConjugate(packet.reflectBelow), up[i + 1])
    return [
      equation(media, U(i), [D(i), reflectAbove], [U(i + 1), transmitUp]),
      equation(media, D(i + 1), [D(i), transmitDown], [U(i + 1), reflectBelow]),
    ]
  })
  const system = [
    equation(media, D(0)),
    ...packetEquations,
    equation(media, U(media - 1), [D(media - 1), panelReturn]),
  ].flat()
  const solution = solveLinear(system, sources(media))
  const leaving = solution.slice(4 * U(0), 4 * U(0) + 4)
  return { fromAbove: leaving.map((row) => row.slice(0, 4)), fromPanel: leaving.map((row) => row.slice(4)) }
}

/** The four rows of `unknown − Σ matrix · other unknown = source`. */
function equation(media: number, unknown: number, ...terms: readonly (readonly [number, Matrix])[]): Matrix {
  const blocks = Array.from({ length: 2 * media }, () => zeros(4, 4))
  blocks[unknown] = identity(4)
  for (const [other, matrix] of terms) blocks[other] = addMatrix(blocks[other], scaleMatrix(neg(ONE), matrix))
  return [0, 1, 2, 3].map((i) => blocks.flatMap((b) => b[i]))
}

/** Unit coherency vectors into the first equation (from above) and into the last (from the panel). */
function sources(media: number): Matrix {
  const rows = 8 * media
  return Array.from({ length: rows }, (_, i) =>
    Array.from({ length: 8 }, (_, j) => ((i === j && j < 4) || (i === rows - 8 + j && j >= 4) ? ONE : ZERO)),
  )
}
