/**
 * Joining by amplitudes: a face above, a coherent layer under it, and what is joined below already (Redheffer's star
 * product of 2×2 blocks; R. Redheffer, J. Math. Phys. 41, 1 (1962)). With ρ = P' r_low P, τ = t_low P, τ' = P' tUp_low and
 * the sum of round trips in the layer G = (I - rBelow_face ρ)⁻¹:
 *
 *   r = r_face + tUp_face ρ G t_face      t = τ G t_face
 *   tUp = tUp_face (I + ρ G rBelow_face) τ'   rBelow = rBelow_low + τ G rBelow_face τ'
 */
import type { LayerModes } from './layerModes.js'
import { add2, multiply2, sumRoundTrips2 } from './matrix2.js'
import type { Packet } from './packet.js'

export class Joiner {
  private readonly folded: Packet
  private readonly trips: Float64Array
  private readonly a: Float64Array
  private readonly b: Float64Array

  constructor(private readonly count: number) {
    const eight = () => new Float64Array(8 * count)
    this.folded = { diagonal: false, r: eight(), t: eight(), rBelow: eight(), tUp: eight() }
    this.trips = eight()
    this.a = eight()
    this.b = eight()
  }

  /** Takes the layer with `modes` on top of `packet` into the packet: r ← P' r P, t ← t P, tUp ← P' tUp. In place. */
  fold(packet: Packet, modes: LayerModes): void {
    const n = this.count
    if (modes.diagonal) {
      foldDiagonal(packet, modes.p, n)
      return
    }
    const { a } = this
    const pBack = modes.tilted ? modes.pBack : modes.p
    multiply2(packet.r, modes.p, a, n)
    multiply2(pBack, a, packet.r, n)
    multiply2(packet.t, modes.p, a, n)
    packet.t.set(a)
    multiply2(pBack, packet.tUp, a, n)
    packet.tUp.set(a)
    packet.diagonal = false
  }

  /** packet ← face · layer · packet, the coherent layer between them. In place. */
  join(face: Packet, layer: LayerModes, packet: Packet): void {
    const n = this.count
    const { folded, trips, a, b } = this
    for (const part of ['r', 't', 'rBelow', 'tUp'] as const) folded[part].set(packet[part])
    folded.diagonal = packet.diagonal
    this.fold(folded, layer)
    multiply2(face.rBelow, folded.r, trips, n)
    sumRoundTrips2(trips, n)

    multiply2(trips, face.t, a, n) // G t
    multiply2(folded.t, a, packet.t, n)
    multiply2(folded.r, a, b, n)
    multiply2(face.tUp, b, a, n)
    add2(face.r, a, packet.r, n)

    multiply2(trips, face.rBelow, a, n) // G rBelow
    multiply2(folded.r, a, b, n)
    addIdentity(b, n)
    multiply2(b, folded.tUp, trips, n)
    multiply2(face.tUp, trips, packet.tUp, n)
    multiply2(a, folded.tUp, b, n)
    multiply2(folded.t, b, a, n)
    add2(folded.rBelow, a, packet.rBelow, n)
    packet.diagonal = face.diagonal && folded.diagonal
  }
}

/** fold for P = diag(p, s): rows and columns are scaled. */
function foldDiagonal({ r, t, tUp }: Packet, p: Float64Array, n: number): void {
  for (let i = 0; i < n; i++) {
    const pRe = p[i]
    const pIm = p[n + i]
    const sRe = p[6 * n + i]
    const sIm = p[7 * n + i]
    scaleAt(r, 0, n, i, pRe * pRe - pIm * pIm, 2 * pRe * pIm)
    scaleAt(r, 2, n, i, pRe * sRe - pIm * sIm, pRe * sIm + pIm * sRe)
    scaleAt(r, 4, n, i, pRe * sRe - pIm * sIm, pRe * sIm + pIm * sRe)
    scaleAt(r, 6, n, i, sRe * sRe - sIm * sIm, 2 * sRe * sIm)
    scaleAt(t, 0, n, i, pRe, pIm)
    scaleAt(t, 2, n, i, sRe, sIm)
    scaleAt(t, 4, n, i, pRe, pIm)
    scaleAt(t, 6, n, i, sRe, sIm)
    scaleAt(tUp, 0, n, i, pRe, pIm)
    scaleAt(tUp, 2, n, i, pRe, pIm)
    scaleAt(tUp, 4, n, i, sRe, sIm)
    scaleAt(tUp, 6, n, i, sRe, sIm)
  }
}

function scaleAt(m: Float64Array, component: number, n: number, i: number, re: number, im: number): void {
  const k = component * n + i
  const mRe = m[k]
  m[k] = mRe * re - m[k + n] * im
  m[k + n] = mRe * im + m[k + n] * re
}

function addIdentity(a: Float64Array, n: number): void {
  for (let i = 0; i < n; i++) {
    a[i] += 1
    a[6 * n + i] += 1
  }
}
