/**
 * The slow solver: one wavelength, one direction, everything of the physics by its plainest route. It shares nothing
 * with the fast one: general 4×4 Berreman matrix and its eigenvalues for every layer, one linear system per coherent
 * packet, one linear system for all incoherent round trips. Frames in `berreman.ts`, Stokes vectors in `stokes.ts`.
 */
import { berremanMatrix, type PrincipalFrame, permittivity } from './berreman.js'
import { coherentPacket, type Medium, type Packet } from './coherentPacket.js'
import { type Complex, real, ZERO } from './complex.js'
import { kroneckerWithConjugate, type Matrix, product, zeros } from './complexMatrix.js'
import { incoherentBalance } from './incoherentBalance.js'
import { type LayerModes, layerModes, passDown, passUp } from './layerModes.js'
import {
  type Mueller,
  outgoingStokes,
  reflectionMueller,
  type Stokes,
  unpolarizedCoherency,
  unpolarizedShare,
} from './stokes.js'

export interface OracleLayer extends PrincipalFrame {
  readonly thicknessNm: number
  readonly coherent: boolean
}

export type OraclePanel =
  | {
      readonly kind: 'mirror'
      /** Lossless immersion index. */
      readonly index: number
      readonly reflectance: number
      /** Share of the returned light that returns unpolarized. */
      readonly depolarized: number
    }
  | { readonly kind: 'metal'; readonly index: Complex }

export interface OraclePoint {
  readonly wavelengthNm: number
  /** Of the eye from the normal, below π/2. */
  readonly thetaRad: number
  readonly phiRad: number
  /** From the viewer's side to the panel. */
  readonly layers: readonly OracleLayer[]
  readonly panel: OraclePanel
}

export interface OracleResult {
  readonly reflectance: number
  /** Of the first packet alone: air to the first thick layer, or to the panel's medium. */
  readonly frontReflectance: number
  /** Of reflection, flux to flux in air, row-major; `mueller[0][0]` is the reflectance. */
  readonly mueller: Mueller
  /** Flux that reaches the eye of unpolarized unit flux started in the panel's medium; absent over a metal. */
  readonly emissionTransmittance?: number
  /** Of what leaves; its first component is the emission transmittance. */
  readonly emissionStokes?: Stokes
}

export type SolvePoint = (point: OraclePoint) => OracleResult

const AIR_INDEX = 1

export function solvePoint(point: OraclePoint): OracleResult {
  const xi = AIR_INDEX * Math.sin(point.thetaRad)
  const cosTheta = Math.cos(point.thetaRad)
  const { packets, thick } = packetsOf(point, xi)
  const balance = incoherentBalance(packets, thick, panelReturn(point.panel, xi))
  const mueller = reflectionMueller(balance.fromAbove, cosTheta)
  const front = kroneckerWithConjugate(packets[0].reflectAbove)
  const reflection = {
    reflectance: mueller[0][0],
    frontReflectance: unpolarizedShare(front, cosTheta),
    mueller,
  }
  if (point.panel.kind === 'metal') return reflection
  const emissionStokes = emission(balance.fromPanel, point.panel.index, xi, cosTheta)
  return { ...reflection, emissionTransmittance: emissionStokes[0], emissionStokes }
}

/** Cuts the stack at its thick layers: packets of coherent layers (maybe none) with a thick layer between each two. */
function packetsOf(point: OraclePoint, xi: number): { packets: readonly Packet[]; thick: readonly Medium[] } {
  const packets: Packet[] = []
  const thick: Medium[] = []
  let above = isotropicModes(real(AIR_INDEX), xi)
  let coherent: Medium[] = []
  for (const layer of point.layers) {
    const medium = layerMedium(layer, point, xi)
    if (layer.coherent) {
      coherent.push(medium)
      continue
    }
    packets.push(coherentPacket(above, coherent, medium.modes))
    thick.push(medium)
    above = medium.modes
    coherent = []
  }
  const panelIndex = point.panel.kind === 'mirror' ? real(point.panel.index) : point.panel.index
  packets.push(coherentPacket(above, coherent, isotropicModes(panelIndex, xi)))
  return { packets, thick }
}

function layerMedium(layer: OracleLayer, point: OraclePoint, xi: number): Medium {
  const modes = layerModes(berremanMatrix(permittivity(layer, point.phiRad), xi))
  const k0TimesThickness = (2 * Math.PI * layer.thicknessNm) / point.wavelengthNm
  return { modes, down: passDown(modes, k0TimesThickness), up: passUp(modes, k0TimesThickness) }
}

const isotropicModes = (index: Complex, xi: number): LayerModes =>
  layerModes(berremanMatrix(permittivity({ principal: [index, index, index], azimuthRad: 0, tiltRad: 0 }, 0), xi))

/** cos of the angle of the wave in a lossless medium. */
const cosineIn = (index: number, xi: number): number => Math.sqrt(1 - (xi / index) ** 2)

/**
 * ρ[(1 − δ) M_mirror + δ M_depolarizer] on the coherency vector of the immersion medium. The mirror turns the
 * tangential field over, which its coherency vector does not feel. The depolarizer shares the flux |Ep|² + |Es|²
 * equally, with Ex' = Ep cos θ. A metal returns nothing beyond what its face does: zero.
 */
function panelReturn(panel: OraclePanel, xi: number): Matrix {
  if (panel.kind === 'metal') return zeros(4, 4)
  const cos2 = cosineIn(panel.index, xi) ** 2
  const mirrored = panel.reflectance * (1 - panel.depolarized)
  const scattered = (panel.reflectance * panel.depolarized) / 2
  return [
    [real(mirrored + scattered), ZERO, ZERO, real(scattered * cos2)],
    [ZERO, real(mirrored), ZERO, ZERO],
    [ZERO, ZERO, real(mirrored), ZERO],
    [real(scattered / cos2), ZERO, ZERO, real(mirrored + scattered)],
  ]
}

/** Unpolarized light of unit flux from the panel; fluxes are n cos θ (|Ep|² + |Es|²) on both sides. */
function emission(fromPanel: Matrix, panelIndex: number, xi: number, cosTheta: number): Stokes {
  const cosPanel = cosineIn(panelIndex, xi)
  const leaving = product(fromPanel, unpolarizedCoherency(cosPanel))
  return outgoingStokes(leaving, cosTheta, (AIR_INDEX * cosTheta) / (panelIndex * cosPanel))
}
