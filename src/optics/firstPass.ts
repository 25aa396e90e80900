/**
 * The light on its first way down and back, without the reflections that join it later: what each layer does to its
 * state, layer by layer. For the eye of a reader; the reflectance itself sums all passes (`adding`).
 */
import { coherencyMatrix } from './coherency.js'
import { apply } from './matrix4.js'
import { createPacket, faceBetween } from './packet.js'
import type { Solver } from './solver.js'

/** Coherency vectors of the tangential field, `4 n` numbers each. */
export interface FirstPass {
  /** At the lower side of each layer, the light going in; the last is what reaches the panel. */
  readonly down: readonly Float64Array[]
  /** What leaves the panel, at the upper side of each layer from there up, and what leaves into air. */
  readonly up: readonly Float64Array[]
}

/**
 * Of unpolarized light of unit power per polarization pair in air, for the stack the solver saw last. A mirror is reached in
 * its immersion medium, a metal in the layer on it, whose face it reflects at.
 */
export function firstPass(solver: Solver): FirstPass {
  const n = solver.wavelengthsNm.length
  const { slots } = solver
  const face = createPacket(n)
  const c2 = solver.cosTheta ** 2
  let light: Float64Array = new Float64Array(4 * n)
  light.fill(c2 / 2, 0, n)
  light.fill(1 / 2, n, 2 * n)
  const end = slots.length - 1
  const down: Float64Array[] = []
  for (let k = 1; k < end; k++) {
    faceBetween(slots[k - 1].modes, slots[k].modes, face, n)
    light = mapped(face.t, light, n)
    light = mapped(slots[k].modes.p, light, n)
    down.push(light)
  }
  faceBetween(slots[end - 1].modes, slots[end].modes, face, n)
  const metal = solver.panel?.kind === 'metal'
  if (!metal) light = mapped(face.t, light, n)
  down.push(light)
  light = metal ? mapped(face.r, light, n) : returned(solver.levels[0].w, light, n)
  const up: Float64Array[] = [light]
  for (let k = end - 1; k >= 0; k--) {
    if (k < end - 1 || !metal) {
      faceBetween(slots[k].modes, slots[k + 1].modes, face, n)
      light = mapped(face.tUp, light, n)
    }
    const { modes } = slots[k]
    if (k > 0) light = mapped(modes.tilted ? modes.pBack : modes.p, light, n)
    up.push(light)
  }
  return { down, up }
}

const M = new Float64Array(16)
const X = new Float64Array(4)
const Y = new Float64Array(4)

function mapped(m: Float64Array, light: Float64Array, n: number): Float64Array {
  const out = new Float64Array(4 * n)
  for (let i = 0; i < n; i++) {
    coherencyMatrix(m, i, n, M)
    applyAt(light, out, i, n)
  }
  return out
}

function returned(w: Float64Array, light: Float64Array, n: number): Float64Array {
  const out = new Float64Array(4 * n)
  for (let i = 0; i < n; i++) {
    for (let c = 0; c < 16; c++) M[c] = w[c * n + i]
    applyAt(light, out, i, n)
  }
  return out
}

function applyAt(light: Float64Array, out: Float64Array, i: number, n: number): void {
  for (let c = 0; c < 4; c++) X[c] = light[c * n + i]
  apply(M, X, Y)
  for (let c = 0; c < 4; c++) out[c * n + i] = Y[c]
}
