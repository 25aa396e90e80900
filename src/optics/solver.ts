/**
 * One direction, many wavelengths: layers → packets → reflectance and emission, kept between calls.
 *
 * Everything a layer, a packet or a level of the adding recursion depends on is compared with the call before, and only
 * what changed is computed again: a search that turns one film recomputes that film, its two packets and the levels above
 * it; a cone that moves in azimuth alone keeps every isotropic layer. Give each direction of a search a solver of its own.
 */
import { type Above, closeStack, createAbove, extendAbove, extendAboveDiagonal, startAbove } from './above.js'
import { addPacket, type Below, createBelow } from './adding.js'
import { endMedium } from './endMedium.js'
import { Joiner } from './joining.js'
import { createMedium, type Medium, type OpticalLayer, type PanelEnd } from './opticalLayer.js'
import { createPacket, faceBetween, type Packet } from './packet.js'
import { type EmissionStokes, fillMirror } from './panel.js'
import { perfectFace } from './perfectFace.js'
import { createSlot, fillSlot, type Slot } from './slot.js'
import { muellerOf, stokesOf } from './stokes.js'

const UNPOLARIZED: EmissionStokes = [1, 0, 0, 0]

/** The faces and coherent layers above the first thick layer: as they are, or reflecting nothing. */
export type Front = 'real' | 'perfect'

/** Slots from the thick medium above to the thick medium below a packet. */
export interface Segment {
  readonly first: number
  readonly last: number
  readonly packet: Packet
}

export class Solver {
  /** Reflectance for unpolarized light, n fractions. */
  readonly reflectance: Float64Array
  /** Reflectance of the first packet alone (air to the first thick layer), n fractions. */
  readonly frontReflectance: Float64Array
  /** Light emitted to the eye, `4 n` numbers on the coherency vector of the tangential field in air. */
  private readonly emitted: Float64Array
  private readonly waveNumbers: Float64Array
  private readonly air: Medium
  private readonly joiner: Joiner
  private readonly face: Packet
  /** Air, the layers, the medium at the end, and what that is: read by `firstPass`. */
  slots: readonly Slot[] = []
  panel: PanelEnd | undefined
  /** Packets from the panel up, and what lies below each: read by `Sensitivity`. */
  segments: readonly Segment[] = []
  levels: readonly Below[] = []
  /** Levels up to this one hold. */
  private levelsKept = 0
  private readonly above: Above
  /** Highest packet that changed in the call before. */
  private highestBefore = -1
  private stokes: EmissionStokes = UNPOLARIZED
  private panelXi = Number.NaN
  /** Of the last call. */
  private layers: OpticalLayer[] = []
  private phiRad = 0
  private thetaRad = Number.NaN
  private xi = 0
  cosTheta = 1
  private trial: Slot[] = []

  /** `front: 'perfect'` puts a perfect antireflection (`perfectFace`) in the place of the first packet. */
  constructor(
    readonly wavelengthsNm: Float64Array,
    private readonly front: Front = 'real',
  ) {
    const n = wavelengthsNm.length
    this.reflectance = new Float64Array(n)
    this.frontReflectance = new Float64Array(n)
    this.emitted = new Float64Array(4 * n)
    this.waveNumbers = wavelengthsNm.map((nm) => (2 * Math.PI) / nm)
    const one = { n: new Float64Array(n).fill(1), k: new Float64Array(n) }
    this.air = createMedium(one, one, one)
    this.joiner = new Joiner(n)
    this.face = createPacket(n)
    this.above = createAbove(n)
  }

  /**
   * Computes `reflectance`, `frontReflectance` and the emission seen from (theta, phi), theta in [0, π/2).
   * `stokes` is the state a mirror panel emits in the (p, s) frame.
   */
  solve(
    layers: readonly OpticalLayer[],
    panel: PanelEnd,
    thetaRad: number,
    phiRad: number,
    stokes: EmissionStokes = UNPOLARIZED,
  ): void {
    const n = this.wavelengthsNm.length
    const xi = Math.sin(thetaRad)
    if (thetaRad !== this.thetaRad) this.above.from = -1
    this.thetaRad = thetaRad
    this.cosTheta = Math.cos(thetaRad)
    this.xi = xi
    this.phiRad = phiRad
    this.arrange(layers, panel)
    this.updateSlot(0, this.air, 0, 0, 0, xi)
    for (let k = 0; k < layers.length; k++) {
      const layer = layers[k]
      this.layers[k] = layer
      this.updateSlot(k + 1, layer.medium, layer.azimuthRad - phiRad, layer.tiltRad, layer.thicknessNm, xi)
    }
    const panelChanged = this.updatePanel(layers.length + 1, panel, xi, stokes)
    let lowest = panelChanged ? 0 : Number.POSITIVE_INFINITY
    let highest = -1
    const top = this.segments.length - 1
    for (let j = 0; j <= top; j++) {
      if (!this.updatePacket(j)) continue
      lowest = Math.min(lowest, j)
      highest = j
    }
    if (lowest > top) return
    if (highest === top) this.fillFrontReflectance(this.segments[top].packet.r)
    this.levelsKept = Math.min(this.levelsKept, lowest)
    this.renewAbove(highest)
    this.fillLevels(this.above.from)
    closeStack(this.above, this.levels[this.above.from], this.cosTheta ** 2, this.reflectance, this.emitted, n)
  }

  /**
   * Keeps the block above the changes. Where the same packets change time after time it is grown down to them, so that
   * the calls that follow do not climb through what stays.
   */
  private renewAbove(highest: number): void {
    const { above, segments } = this
    const n = this.wavelengthsNm.length
    const c2 = this.cosTheta ** 2
    const top = segments.length - 1
    if (above.from < 0 || highest >= above.from) {
      startAbove(above, segments[top].packet, top, c2, n)
      for (let j = top; segments[j].packet.diagonal && j > 0 && segments[j - 1].packet.diagonal; j--) {
        extendAboveDiagonal(above, segments[j - 1].packet, c2, n)
      }
    }
    const repeated = highest === this.highestBefore
    this.highestBefore = highest
    if (!repeated) return
    while (above.from > highest + 1) extendAbove(above, segments[above.from - 1].packet, c2, n)
  }

  /** Brings the adding recursion up to level `to` (what lies below packet `to`). */
  fillLevels(to: number): void {
    const n = this.wavelengthsNm.length
    for (let j = this.levelsKept; j < to; j++) addPacket(this.segments[j].packet, this.levels[j], this.levels[j + 1], n)
    this.levelsKept = Math.max(this.levelsKept, to)
  }

  /** Flux that leaves to the eye for unit flux emitted in the immersion medium, n fractions, into `out`. Mirror panels only. */
  emissionTransmittance(out: Float64Array): void {
    const n = this.wavelengthsNm.length
    const c2 = this.cosTheta * this.cosTheta
    for (let i = 0; i < n; i++) out[i] = (this.emitted[i] / c2 + this.emitted[n + i]) * this.fluxFactor(i)
  }

  /**
   * Stokes vector of what leaves to the eye for unit emitted flux, `4 n` numbers (S0 is the emission transmittance), in the
   * frame Ep = Ex'/cos θ, Es = Ey' of the solver. S3 > 0 is right-handed as named from the source: +2 Im Ep Es* for light
   * that comes out. Mirror panels only.
   */
  emissionStokes(out: Float64Array): void {
    const n = this.wavelengthsNm.length
    stokesOf(this.emitted, this.cosTheta, out, n)
    for (let c = 0; c < 4; c++) for (let i = 0; i < n; i++) out[c * n + i] *= this.fluxFactor(i)
  }

  /**
   * Mueller matrix of reflection, `16 n` numbers (row-major components). Both beams are described by Ep = Ex'/cos θ,
   * Es = Ey' of the solver frame: S = (|Ep|² + |Es|², |Ep|² - |Es|², 2 Re Ep Es*, S3), with S3 > 0 right-handed as named from
   * the source, so -2 Im Ep Es* going in and +2 Im Ep Es* coming out: an ideal mirror is diag(1, 1, 1, -1).
   */
  mueller(out: Float64Array): void {
    this.fillLevels(this.segments.length)
    muellerOf(this.levels[this.segments.length].w, this.cosTheta, out, this.wavelengthsNm.length)
  }

  /** cos θ in air over m cos θm in the immersion medium: from tangential fields to flux. */
  fluxFactor(i: number, panel = this.panel): number {
    if (panel === undefined || panel.kind !== 'mirror') return Number.NaN
    const m2 = panel.index[i] * panel.index[i]
    return this.cosTheta / Math.sqrt(m2 - this.xi * this.xi)
  }

  /** Lays out slots, packets and levels anew where layers came, went, or changed between coherent and thick. */
  private arrange(layers: readonly OpticalLayer[], panel: PanelEnd): void {
    if (this.isArrangedFor(layers, panel)) return
    this.layers = layers.slice()
    const n = this.wavelengthsNm.length
    const end = layers.length + 1
    this.slots = Array.from({ length: end + 1 }, () => createSlot(n))
    const segments: Segment[] = []
    let last = end
    for (let k = end - 1; k >= 0; k--) {
      if (k > 0 && layers[k - 1].coherent) continue
      segments.push({ first: k, last, packet: createPacket(n) })
      last = k
    }
    this.segments = segments
    this.levels = [...segments, undefined].map(() => createBelow(n))
    this.levelsKept = 0
    this.above.from = -1
    this.highestBefore = -1
    this.trial = []
    this.panel = undefined
  }

  private isArrangedFor(layers: readonly OpticalLayer[], panel: PanelEnd): boolean {
    if (this.panel?.kind !== panel.kind || this.layers.length !== layers.length) return false
    for (let k = 0; k < layers.length; k++) if (layers[k].coherent !== this.layers[k].coherent) return false
    return true
  }

  private updateSlot(
    k: number,
    medium: Medium,
    azimuthRad: number,
    tilt: number,
    thicknessNm: number,
    xi: number,
  ): void {
    fillSlot(this.slots[k], medium, azimuthRad, tilt, thicknessNm, xi, this.waveNumbers)
  }

  /** The medium at the end and what it sends back; true where that changed. */
  private updatePanel(k: number, panel: PanelEnd, xi: number, stokes: EmissionStokes): boolean {
    if (this.panel === panel && this.panelXi === xi && sameState(this.stokes, stokes)) {
      this.slots[k].changed = false
      return false
    }
    this.panel = panel
    this.panelXi = xi
    this.stokes = stokes
    this.updateSlot(k, endMedium(panel, this.slots[k].medium), 0, 0, 0, xi)
    const { w, e } = this.levels[0]
    if (panel.kind === 'mirror') fillMirror(panel, xi, stokes, this.levels[0], this.wavelengthsNm.length)
    else {
      w.fill(0)
      e.fill(0)
    }
    return true
  }

  /** Joins the faces and coherent layers of packet j, and the thick layer above it; true where anything in it changed. */
  private updatePacket(j: number): boolean {
    const { first, last, packet } = this.segments[j]
    let changed = false
    for (let k = first; k <= last; k++) changed = changed || this.slots[k].changed
    if (changed) this.joinSegment(this.slots, first, last, packet)
    return changed
  }

  private joinSegment(slots: readonly Slot[], first: number, last: number, packet: Packet): void {
    const n = this.wavelengthsNm.length
    if (first === 0 && this.front === 'perfect') {
      perfectFace(slots[0].modes, slots[last].modes, packet, n)
      return
    }
    faceBetween(slots[last - 1].modes, slots[last].modes, packet, n)
    for (let k = last - 1; k > first; k--) {
      faceBetween(slots[k - 1].modes, slots[k].modes, this.face, n)
      this.joiner.join(this.face, slots[k].modes, packet)
    }
    if (first > 0) this.joiner.fold(packet, slots[first].modes)
  }

  /**
   * Packet j of a stack that differs from the present one in few layers, into `out`, without touching what is kept;
   * false (and nothing computed) where none of the layers of the packet differs. `phiRad` is that of the last call.
   */
  packetOf(j: number, layers: readonly OpticalLayer[], panel: PanelEnd, out: Packet): boolean {
    const { first, last } = this.segments[j]
    const n = this.wavelengthsNm.length
    const end = this.slots.length - 1
    let differs = false
    for (let k = Math.max(first, 1); k <= Math.min(last, end - 1); k++) {
      if (layers[k - 1] !== this.layers[k - 1]) differs = true
    }
    if (last === end && panel !== this.panel) differs = true
    if (!differs) return false
    while (this.trial.length <= end) this.trial.push(createSlot(n))
    const mixed = this.slots.slice()
    for (let k = Math.max(first, 1); k <= Math.min(last, end - 1); k++) {
      const layer = layers[k - 1]
      if (layer === this.layers[k - 1]) continue
      mixed[k] = this.trial[k]
      const { medium, azimuthRad, tiltRad, thicknessNm } = layer
      fillSlot(mixed[k], medium, azimuthRad - this.phiRad, tiltRad, thicknessNm, this.xi, this.waveNumbers)
    }
    if (last === end && panel !== this.panel) {
      mixed[end] = this.trial[end]
      fillSlot(mixed[end], endMedium(panel, this.slots[end].medium), 0, 0, 0, this.xi, this.waveNumbers)
    }
    this.joinSegment(mixed, first, last, out)
    return true
  }

  /** What another panel would send back at the present direction. */
  panelLevel(panel: PanelEnd): Below {
    const n = this.wavelengthsNm.length
    const below = createBelow(n)
    if (panel.kind === 'mirror') fillMirror(panel, this.xi, this.stokes, below, n)
    return below
  }

  /** Unpolarized light on the first packet alone. */
  private fillFrontReflectance(r: Float64Array): void {
    const n = this.wavelengthsNm.length
    const c2 = this.cosTheta * this.cosTheta
    const power = (component: number, i: number) => r[component * n + i] ** 2 + r[(component + 1) * n + i] ** 2
    for (let i = 0; i < n; i++) {
      this.frontReflectance[i] = (power(0, i) + power(6, i) + power(2, i) / c2 + power(4, i) * c2) / 2
    }
  }
}

function sameState(a: EmissionStokes, b: EmissionStokes): boolean {
  return a[0] === b[0] && a[1] === b[1] && a[2] === b[2] && a[3] === b[3]
}
