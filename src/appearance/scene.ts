/**
 * Stack × direction → spectra → metrics: the spine. A scene belongs to one set of conditions (wavelengths, observer,
 * illuminant) and keeps a solver for each direction it looks from, so that a search which returns to the same few
 * directions pays only for what it changed.
 */
import { xyzToLab } from '../color/cielab.js'
import { ambientContrast } from '../color/contrast.js'
import { illuminantAt } from '../color/illuminant.js'
import { type ColorWeights, createColorWeights } from '../color/weights.js'
import { spectrumToXyz } from '../color/xyz.js'
import { type Front, Solver } from '../optics/solver.js'
import type { Direction, Stack } from '../stack/stack.js'
import { wavelengthsOf } from '../stack/wavelengths.js'
import { emissionStokesAt } from './emissionStokes.js'
import { OpticalStack } from './opticalStack.js'

/** What the eye gets from one direction; fractions. Spectra are views that hold until the scene looks from there again. */
export interface Look extends Direction {
  readonly reflectance: Float64Array
  readonly frontReflectance: Float64Array
  /** Absent over a metal panel. */
  readonly emissionTransmittance?: Float64Array
  readonly solver: Solver
  /** X, Y, Z relative to Y = 100 for the perfect reflecting diffuser. */
  readonly xyz: readonly [number, number, number]
  readonly lab: readonly [number, number, number]
  readonly luminousReflectance: number
  readonly colorWeightedReflectance: number
  readonly luminousFrontReflectance: number
  readonly luminousEmissionTransmittance?: number
}

interface Eye {
  readonly solver: Solver
  /** Emission transmittance over wavelength. */
  readonly emission: Float64Array
}

/** Directions whose solvers are kept. */
const SOLVERS_KEPT = 256

export class Scene {
  readonly wavelengthsNm: Float64Array
  readonly weights: ColorWeights
  readonly emissionWeights: Float64Array
  private readonly opticalStack: OpticalStack
  private readonly solvers = new Map<string, Eye>()
  readonly colorWeights: readonly [number, number, number]

  /** The conditions and the emission's spectrum of `stack` are those of all later looks. */
  constructor(
    stack: Stack,
    wavelengthsNm: Float64Array = wavelengthsOf(stack.conditions),
    private readonly front: Front = 'real',
  ) {
    const { observer, illuminant, color_weights } = stack.conditions
    this.wavelengthsNm = wavelengthsNm
    this.weights = createColorWeights(wavelengthsNm, observer, illuminantAt(illuminant, wavelengthsNm))
    const emitted = illuminantAt(stack.emission.spectrum, wavelengthsNm)
    this.emissionWeights = createColorWeights(wavelengthsNm, observer, emitted).y
    this.colorWeights = color_weights
    this.opticalStack = new OpticalStack(wavelengthsNm)
  }

  /** Looks from a direction that will be asked for again, with the stack changed: it keeps a solver of its own. */
  look(stack: Stack, theta: number, phi: number): Look {
    return this.see(this.solverAt(`${theta},${phi}`), stack, theta, phi)
  }

  /** Looks from one of many directions: a single solver moves on, keeping what the next azimuth shares with the last. */
  lookOnce(stack: Stack, theta: number, phi: number): Look {
    return this.see(this.solverAt('moving'), stack, theta, phi)
  }

  /** Optics of a stack next to the one looked at last, for `Sensitivity`. */
  variantOf(stack: Stack, base: Stack) {
    return this.opticalStack.variantOf(stack, base)
  }

  private see({ solver, emission }: Eye, stack: Stack, theta: number, phi: number): Look {
    const stokes = emissionStokesAt(stack.emission, phi)
    solver.solve(this.opticalStack.layersOf(stack), this.opticalStack.panelOf(stack), theta, phi, stokes)
    const { reflectance, frontReflectance } = solver
    const { whiteXyz } = this.weights
    const xyz = spectrumToXyz(this.weights, reflectance)
    const [wx, wy, wz] = this.colorWeights
    const look = {
      theta,
      phi,
      reflectance,
      frontReflectance,
      solver,
      xyz,
      lab: xyzToLab(xyz, whiteXyz),
      luminousReflectance: xyz[1] / 100,
      colorWeightedReflectance:
        ((wx * xyz[0]) / whiteXyz[0] + (wy * xyz[1]) / whiteXyz[1] + (wz * xyz[2]) / whiteXyz[2]) / (wx + wy + wz),
      luminousFrontReflectance: weigh(this.weights.y, frontReflectance) / 100,
    }
    if (stack.panel.kind === 'metal') return look
    solver.emissionTransmittance(emission)
    return {
      ...look,
      emissionTransmittance: emission,
      luminousEmissionTransmittance: weigh(this.emissionWeights, emission) / 100,
    }
  }

  /**
   * Contrast under uniform ambient light of `illuminanceLx`. The stack file states the luminance on axis; elsewhere it
   * goes with the emission transmittance, as from a source that radiates alike in all directions of the immersion medium.
   */
  ambientContrast(stack: Stack, look: Look, illuminanceLx: number): number {
    const { luminance, dark_luminance } = stack.emission
    const share = this.emissionShare(stack, look)
    return ambientContrast({
      onLuminance: luminance * share,
      darkLuminance: dark_luminance * share,
      illuminanceLx,
      luminousReflectance: look.luminousReflectance,
    })
  }

  /** Luminance of the lit screen in this direction over that on axis. */
  emissionShare(stack: Stack, look: Look): number {
    if (look.theta === 0 || look.luminousEmissionTransmittance === undefined) return 1
    const onAxis = this.look(stack, 0, 0).luminousEmissionTransmittance
    return onAxis === undefined ? 1 : look.luminousEmissionTransmittance / onAxis
  }

  private solverAt(key: string): Eye {
    let found = this.solvers.get(key)
    if (found === undefined) {
      if (this.solvers.size >= SOLVERS_KEPT) this.solvers.clear()
      found = {
        solver: new Solver(this.wavelengthsNm, this.front),
        emission: new Float64Array(this.wavelengthsNm.length),
      }
      this.solvers.set(key, found)
    }
    return found
  }
}

function weigh(weights: Float64Array, spectrum: Float64Array): number {
  let sum = 0
  for (let i = 0; i < weights.length; i++) sum += weights[i] * spectrum[i]
  return sum
}
