/**
 * The light on its first way down and back, without the reflections that join it later: what each layer does to its
 * state, layer by layer. For the eye of a reader; the reflectance itself sums all passes (`adding`).
 *
 * A state of polarization and its flux are plain only in an isotropic medium, so each is told as a medium of the layer's
 * mean real index would receive it, laid to the side where the light leaves the layer (less what a face of half the
 * layer's birefringence reflects: 1e-6 for stretched films, 1e-4 for liquid-crystal coats).
 */
import { coherencyMatrix } from './coherency.js'
import { fillDiagonalModes } from './diagonalModes.js'
import { createLayerModes, type LayerModes } from './layerModes.js'
import { apply } from './matrix4.js'
import { createMedium, type Medium } from './opticalLayer.js'
import { createPacket, faceBetween, type Packet } from './packet.js'
import type { Slot } from './slot.js'
import type { Solver } from './solver.js'

/** Light at a place of its way. */
export interface PassedLight {
  /** Coherency vector of the tangential field, `4 n` numbers. */
  readonly coherency: Float64Array
  /** Index of the medium that receives it, n numbers. */
  readonly index: Float64Array
}

export interface FirstPass {
  /** Behind each layer, going in; the last is what reaches the panel. */
  readonly down: readonly PassedLight[]
  /** What leaves the panel, in front of each layer from there up, and what leaves into air. */
  readonly up: readonly PassedLight[]
}

/**
 * Of unpolarized light of unit power per polarization pair in air, for the stack the solver saw last. A mirror is reached in
 * its immersion medium, a metal in the layer on it, whose face it reflects at.
 */
export function firstPass(solver: Solver): FirstPass {
  const { slots } = solver
  const end = slots.length - 1
  const walk = new Walk(solver)
  const metal = solver.panel?.kind === 'metal'
  const down: PassedLight[] = []
  for (let k = 1; k < end; k++) {
    walk.crossDown(k)
    walk.passDown(k)
    down.push(walk.received(k, 'down'))
  }
  if (!metal) walk.crossDown(end)
  const last = metal ? end - 1 : end
  down.push(walk.received(last, 'down'))
  if (metal) walk.reflectAt(end)
  else walk.returnFrom(solver.levels[0].w)
  const up = [walk.received(last, 'up')]
  for (let k = end - 1; k >= 0; k--) {
    if (k < last) walk.crossUp(k)
    if (k > 0) walk.passUp(k)
    up.push(walk.received(k, 'up'))
  }
  return { down, up }
}

const M = new Float64Array(16)
const X = new Float64Array(4)
const Y = new Float64Array(4)

/** One light on its way through the slots of a solver. */
class Walk {
  private readonly n: number
  private readonly face: Packet
  private readonly receiver: LayerModes
  private readonly slots: readonly Slot[]
  private readonly waveNumbers: Float64Array
  private light: Float64Array

  constructor({ wavelengthsNm, slots, cosTheta }: Solver) {
    const n = wavelengthsNm.length
    this.n = n
    this.slots = slots
    this.face = createPacket(n)
    this.receiver = createLayerModes(n)
    this.waveNumbers = wavelengthsNm.map((nm) => (2 * Math.PI) / nm)
    this.light = new Float64Array(4 * n)
    this.light.fill(cosTheta ** 2 / 2, 0, n)
    this.light.fill(1 / 2, n, 2 * n)
  }

  /** Through the face above slot k. */
  crossDown(k: number): void {
    faceBetween(this.slots[k - 1].modes, this.slots[k].modes, this.face, this.n)
    this.light = this.mapped(this.face.t)
  }

  passDown(k: number): void {
    this.light = this.mapped(this.slots[k].modes.p)
  }

  reflectAt(k: number): void {
    faceBetween(this.slots[k - 1].modes, this.slots[k].modes, this.face, this.n)
    this.light = this.mapped(this.face.r)
  }

  /** Sent back by a panel: `w` is 4×4 over wavelength. */
  returnFrom(w: Float64Array): void {
    this.light = this.transformed((i) => {
      for (let c = 0; c < 16; c++) M[c] = w[c * this.n + i]
    })
  }

  /** Through the face below slot k. */
  crossUp(k: number): void {
    faceBetween(this.slots[k].modes, this.slots[k + 1].modes, this.face, this.n)
    this.light = this.mapped(this.face.tUp)
  }

  passUp(k: number): void {
    const { modes } = this.slots[k]
    this.light = this.mapped(modes.tilted ? modes.pBack : modes.p)
  }

  /** As the mean medium of slot k receives it. */
  received(k: number, way: 'down' | 'up'): PassedLight {
    const { medium, modes, xi } = this.slots[k]
    const index = meanIndex(medium, this.n)
    const lossless = { n: index, k: new Float64Array(this.n) }
    fillDiagonalModes(this.receiver, createMedium(lossless, lossless, lossless), 0, xi, this.waveNumbers)
    if (way === 'down') faceBetween(modes, this.receiver, this.face, this.n)
    else faceBetween(this.receiver, modes, this.face, this.n)
    return { coherency: this.mapped(way === 'down' ? this.face.t : this.face.tUp), index }
  }

  private mapped(m: Float64Array): Float64Array {
    return this.transformed((i) => coherencyMatrix(m, i, this.n, M))
  }

  private transformed(fillMatrix: (i: number) => void): Float64Array {
    const { n, light } = this
    const out = new Float64Array(4 * n)
    for (let i = 0; i < n; i++) {
      fillMatrix(i)
      for (let c = 0; c < 4; c++) X[c] = light[c * n + i]
      apply(M, X, Y)
      for (let c = 0; c < 4; c++) out[c * n + i] = Y[c]
    }
    return out
  }
}

/** Mean real index of the three axes. */
function meanIndex(medium: Medium | undefined, n: number): Float64Array {
  const index = new Float64Array(n)
  if (medium === undefined) throw new Error('the solver has seen no stack')
  for (let axis = 0; axis < 3; axis++) {
    for (let i = 0; i < n; i++) {
      const re = medium.permittivity[2 * axis * n + i]
      const im = medium.permittivity[(2 * axis + 1) * n + i]
      index[i] += Math.sqrt((Math.hypot(re, im) + re) / 2) / 3
    }
  }
  return index
}
