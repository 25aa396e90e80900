/**
 * Maxwell's equations for one plane wave in one homogeneous layer (D. W. Berreman, J. Opt. Soc. Am. 62, 502 (1972)).
 *
 * exp(−iωt), complex index n + ik with k ≥ 0. Display frame: x right, y up, z to the viewer. Solver frame for the
 * azimuth φ: x' = (cos φ, sin φ, 0), y' = (sin φ, −cos φ, 0), z' = (0, 0, −1) into the panel; all fields go with
 * exp(i k0 ξ x'). With H scaled by the impedance of free space, ψ = (Ex', Ey', Hy', −Hx') obeys ψ' = i k0 Δ ψ.
 */
import { add, type Complex, div, mul, neg, ONE, real, scale, sub, sum, ZERO } from './complex.js'
import { type Matrix, product, transpose } from './complexMatrix.js'

/** The axes of a layer. Indices of the first, second and third principal axis; angles in radians. */
export interface PrincipalFrame {
  readonly principal: readonly [Complex, Complex, Complex]
  /** Of the first axis, counter-clockwise as the viewer sees it, 0 along x. */
  readonly azimuthRad: number
  /** Of the first axis out of the film plane, towards the viewer. The second axis stays in the film plane. */
  readonly tiltRad: number
}

/** ε in the solver frame, 3×3. */
export function permittivity(frame: PrincipalFrame, phiRad: number): Matrix {
  const axes = principalAxes(frame.azimuthRad, frame.tiltRad)
  const basis = [
    [Math.cos(phiRad), Math.sin(phiRad), 0],
    [Math.sin(phiRad), -Math.cos(phiRad), 0],
    [0, 0, -1],
  ]
  const axesInSolverFrame: Matrix = basis.map((row) =>
    axes.map((axis) => real(row[0] * axis[0] + row[1] * axis[1] + row[2] * axis[2])),
  )
  const diagonal = frame.principal.map((n, i) => frame.principal.map((_, j) => (i === j ? mul(n, n) : ZERO)))
  return product(axesInSolverFrame, diagonal, transpose(axesInSolverFrame))
}

/** The three principal directions in the display frame. */
function principalAxes(azimuthRad: number, tiltRad: number): readonly (readonly [number, number, number])[] {
  const [ca, sa] = [Math.cos(azimuthRad), Math.sin(azimuthRad)]
  const [ct, st] = [Math.cos(tiltRad), Math.sin(tiltRad)]
  return [
    [ct * ca, ct * sa, st],
    [-sa, ca, 0],
    [-st * ca, -st * sa, ct],
  ]
}

/**
 * Δ, 4×4. From curl E = i k0 H and curl H = −i k0 ε E:
 * ∂Ex = i k0 (Hy + ξ Ez), ∂Ey = i k0 (−Hx), ∂Hy = i k0 Dx, ∂(−Hx) = i k0 (Dy − ξ² Ey), with ∂ along z', all in the solver
 * frame, and ε_zz Ez = −ξ Hy − ε_zx Ex − ε_zy Ey.
 */
export function berremanMatrix(epsilon: Matrix, xi: number): Matrix {
  const [[exx, exy, exz], [eyx, eyy, eyz], [ezx, ezy, ezz]] = epsilon
  /** Ez as a row acting on ψ. */
  const ez: readonly Complex[] = [neg(div(ezx, ezz)), neg(div(ezy, ezz)), div(real(-xi), ezz), ZERO]
  const rowEx = ez.map((v, j) => add(scale(xi, v), j === 2 ? ONE : ZERO))
  const rowEy = [ZERO, ZERO, ZERO, ONE]
  const rowHy = ez.map((v, j) => sum([mul(exz, v), j === 0 ? exx : ZERO, j === 1 ? exy : ZERO]))
  const rowHx = ez.map((v, j) => sum([mul(eyz, v), j === 0 ? eyx : ZERO, j === 1 ? sub(eyy, real(xi * xi)) : ZERO]))
  return [rowEx, rowEy, rowHy, rowHx]
}
