/**
 * How reflectance and emission answer to small changes, for any number of parameters from one pass down the stack.
 *
 * Light that comes down on packet j (v), light that goes up under it (a), and their importances, the change of the
 * result per unit of light going up above it (u) or down under it (z), follow from the adding levels kept by the solver:
 *
 *   x = (I - rBelow W)⁻¹ (t v + rBelow e),  a = e + W x,  z = u tUp W (I - rBelow W)⁻¹,  y = u tUp + z rBelow,
 *
 * with x and y the v and u of the packet below. A change of the packets' matrices then changes the result by
 *
 *   Σ_j [u dr v + z dt v + z d(rBelow) a + u d(tUp) a]  +  y dW_panel x + y de_panel:
 *
 * the adjoint of the adding recursion. With coherency matrices J of v or a and hermitian importances U of u or z, each
 * term is tr(U m J m†), whose change is 2 Re tr(dm J m† U): the 2×2 products J m† U are kept per packet, and a parameter
 * costs its own layer, its two faces and a few dot products. dm is the central difference of the closed forms of the
 * packets the parameter touches: exact to the square of the step.
 */
import { coherencyMatrix } from './coherency.js'
import { apply, applyRow, RoundTrips } from './matrix4.js'
import type { OpticalLayer, PanelEnd } from './opticalLayer.js'
import { createPacket, type Packet } from './packet.js'
import type { Solver } from './solver.js'

export type Response = 'reflectance' | 'front_reflectance' | 'emission'

const PARTS = ['r', 't', 'rBelow', 'tUp'] as const

const M = new Float64Array(16)
const W = new Float64Array(16)
const TRIPS = new RoundTrips()
const ROW = new Float64Array(4)
const V = new Float64Array(4)
const U = new Float64Array(4)
const X = new Float64Array(4)
const Z = new Float64Array(4)
const E = new Float64Array(4)
const A_UP = new Float64Array(4)
const Y = new Float64Array(4)

/** Follows one solver; `prepare` after each of its calls, then `derivative` for each parameter. */
export class Sensitivity {
  private adjoints: Packet[] = []
  /** Light onto and importance of what comes off the panel, `4 n` numbers each. */
  private readonly down: Float64Array
  private readonly up: Float64Array
  private readonly plus: Packet
  private readonly minus: Packet
  private response: Response = 'reflectance'

  constructor(private readonly solver: Solver) {
    const n = solver.wavelengthsNm.length
    this.down = new Float64Array(4 * n)
    this.up = new Float64Array(4 * n)
    this.plus = createPacket(n)
    this.minus = createPacket(n)
  }

  /** One pass from the top down at the solver's present state, for the response asked. */
  prepare(response: Response): void {
    this.response = response
    const { segments, levels, cosTheta } = this.solver
    this.solver.fillLevels(segments.length - 1)
    const n = this.solver.wavelengthsNm.length
    while (this.adjoints.length < segments.length) this.adjoints.push(createPacket(n))
    const c2 = cosTheta * cosTheta
    const incoming = response === 'emission' ? 0 : 0.5
    for (let i = 0; i < n; i++) {
      setVector(V, incoming * c2, incoming, 0, 0)
      setVector(U, 1 / c2, 1, 0, 0)
      if (response === 'emission') for (let c = 0; c < 4; c++) U[c] *= this.solver.fluxFactor(i)
      for (let j = segments.length - 1; j >= 0; j--) {
        const packet = segments[j].packet
        const adjoint = this.adjoints[j]
        if (response === 'front_reflectance') {
          Z.fill(0)
          A_UP.fill(0)
        } else this.crossPacket(packet, levels[j], response === 'emission', i, n)
        backproject(V, packet.r, U, adjoint.r, i, n)
        backproject(V, packet.t, Z, adjoint.t, i, n)
        backproject(A_UP, packet.rBelow, Z, adjoint.rBelow, i, n)
        backproject(A_UP, packet.tUp, U, adjoint.tUp, i, n)
        if (response === 'front_reflectance') {
          U.fill(0)
          continue
        }
        V.set(X)
        U.set(ROW)
      }
      for (let c = 0; c < 4; c++) {
        this.down[c * n + i] = V[c]
        this.up[c * n + i] = response === 'front_reflectance' ? 0 : U[c]
      }
    }
  }

  /**
   * Derivative of the prepared response over wavelength, into `out`, along the change between two stacks that lie `2 h`
   * apart, half on either side of the solver's present one.
   */
  derivative(
    plus: { layers: readonly OpticalLayer[]; panel: PanelEnd },
    minus: { layers: readonly OpticalLayer[]; panel: PanelEnd },
    twoH: number,
    out: Float64Array,
  ): void {
    const n = this.solver.wavelengthsNm.length
    out.fill(0)
    for (let j = 0; j < this.solver.segments.length; j++) {
      if (!this.solver.packetOf(j, plus.layers, plus.panel, this.plus)) continue
      this.solver.packetOf(j, minus.layers, minus.panel, this.minus)
      const adjoint = this.adjoints[j]
      const here = this.solver.segments[j].packet
      for (const part of PARTS) {
        addTrace(this.plus[part], here[part], adjoint[part], 2 / twoH, out, n)
        addTrace(this.minus[part], here[part], adjoint[part], -2 / twoH, out, n)
      }
    }
    this.addPanelChange(plus.panel, minus.panel, twoH, out)
  }

  /** X, A_UP, Z and ROW (= y) of one packet at one wavelength. */
  private crossPacket(
    packet: Packet,
    level: { w: Float64Array; e: Float64Array },
    emits: boolean,
    i: number,
    n: number,
  ): void {
    for (let c = 0; c < 16; c++) W[c] = level.w[c * n + i]
    for (let c = 0; c < 4; c++) E[c] = emits ? level.e[c * n + i] : 0
    coherencyMatrix(packet.t, i, n, M)
    apply(M, V, X)
    coherencyMatrix(packet.tUp, i, n, M)
    applyRow(U, M, ROW) // u tUp
    applyRow(ROW, W, Z)
    coherencyMatrix(packet.rBelow, i, n, M)
    TRIPS.factor(M, W)
    apply(M, E, A_UP)
    for (let c = 0; c < 4; c++) X[c] += A_UP[c]
    TRIPS.solve(X)
    TRIPS.solveRow(Z)
    apply(W, X, A_UP)
    for (let c = 0; c < 4; c++) A_UP[c] += E[c]
    applyRow(Z, M, Y)
    for (let c = 0; c < 4; c++) ROW[c] += Y[c]
  }

  private addPanelChange(plus: PanelEnd, minus: PanelEnd, twoH: number, out: Float64Array): void {
    if (plus === minus) return
    const n = this.solver.wavelengthsNm.length
    const above = this.solver.panelLevel(plus)
    const below = this.solver.panelLevel(minus)
    const emits = this.response === 'emission'
    for (let i = 0; i < n; i++) {
      let sum = 0
      for (let row = 0; row < 4; row++) {
        let change = emits ? above.e[row * n + i] - below.e[row * n + i] : 0
        for (let column = 0; column < 4; column++) {
          const k = (4 * row + column) * n + i
          change += (above.w[k] - below.w[k]) * this.down[column * n + i]
        }
        sum += this.up[row * n + i] * change
      }
      out[i] += sum / twoH
    }
    if (emits) this.addFluxChange(plus, minus, twoH, out)
  }

  /** The flux that unit emitted flux stands for depends on the immersion medium. */
  private addFluxChange(plus: PanelEnd, minus: PanelEnd, twoH: number, out: Float64Array): void {
    const { solver } = this
    const emission = new Float64Array(out.length)
    solver.emissionTransmittance(emission)
    for (let i = 0; i < out.length; i++) {
      const change = solver.fluxFactor(i, plus) - solver.fluxFactor(i, minus)
      out[i] += (emission[i] * change) / (solver.fluxFactor(i) * twoH)
    }
  }
}

function setVector(out: Float64Array, a: number, b: number, c: number, d: number): void {
  out[0] = a
  out[1] = b
  out[2] = c
  out[3] = d
}

/**
 * out = J m† U at wavelength i, with J = [[X, U+iV], [U-iV, Y]] of the light `s` and U = [[u0, w], [w*, u1]], w = (u2 + i u3)/2, of
 * the importance: the change of u·(m ⊗ m*)·s is 2 Re tr(dm out).
 */
function backproject(s: Float64Array, m: Float64Array, u: Float64Array, out: Float64Array, i: number, n: number): void {
  const jRe = s[2]
  const jIm = s[3]
  const wRe = u[2] / 2
  const wIm = u[3] / 2
  for (let row = 0; row < 2; row++) {
    // Row `row` of J m†: J[row][0] m[c][0]* + J[row][1] m[c][1]* for c = 0, 1.
    const aRe = row === 0 ? s[0] : jRe
    const aIm = row === 0 ? 0 : -jIm
    const bRe = row === 0 ? jRe : s[1]
    const bIm = row === 0 ? jIm : 0
    const p0Re = aRe * m[i] + aIm * m[n + i] + bRe * m[2 * n + i] + bIm * m[3 * n + i]
    const p0Im = aIm * m[i] - aRe * m[n + i] + bIm * m[2 * n + i] - bRe * m[3 * n + i]
    const p1Re = aRe * m[4 * n + i] + aIm * m[5 * n + i] + bRe * m[6 * n + i] + bIm * m[7 * n + i]
    const p1Im = aIm * m[4 * n + i] - aRe * m[5 * n + i] + bIm * m[6 * n + i] - bRe * m[7 * n + i]
    const k = 4 * row * n + i
    out[k] = p0Re * u[0] + p1Re * wRe + p1Im * wIm
    out[k + n] = p0Im * u[0] + p1Im * wRe - p1Re * wIm
    out[k + 2 * n] = p0Re * wRe - p0Im * wIm + p1Re * u[1]
    out[k + 3 * n] = p0Re * wIm + p0Im * wRe + p1Im * u[1]
  }
}

/**
 * out += factor Re tr(e^{-iψ} m adjoint), with ψ the phase of m over that of `here` as a whole, from tr(here† m). Only m ⊗ m* counts, so
 * such a phase changes nothing; but that of a thick layer runs so fast that its difference would drown the rest.
 */
function addTrace(
  m: Float64Array,
  here: Float64Array,
  adjoint: Float64Array,
  factor: number,
  out: Float64Array,
  n: number,
): void {
  for (let i = 0; i < n; i++) {
    let alongRe = 0
    let alongIm = 0
    let sumRe = 0
    let sumIm = 0
    for (let entry = 0; entry < 4; entry++) {
      const k = 2 * entry * n + i
      const t = 2 * TRANSPOSED[entry] * n + i
      alongRe += here[k] * m[k] + here[k + n] * m[k + n]
      alongIm += here[k] * m[k + n] - here[k + n] * m[k]
      sumRe += m[k] * adjoint[t] - m[k + n] * adjoint[t + n]
      sumIm += m[k] * adjoint[t + n] + m[k + n] * adjoint[t]
    }
    const along = Math.hypot(alongRe, alongIm)
    out[i] += factor * (along > 0 ? (sumRe * alongRe + sumIm * alongIm) / along : sumRe)
  }
}

/** Place of an entry of a 2×2, row-major, in its transpose. */
const TRANSPOSED = [0, 2, 1, 3] as const
