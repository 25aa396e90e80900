/**
 * The nearest design that makes circular light, head-on and at one wavelength, on the Poincaré sphere (S1, S2, S3).
 *
 * Linear light of azimuth a starts at (cos 2a, sin 2a, 0); a film of retardance Γ and slow axis α turns it by Γ about
 * u = (cos 2α, sin 2α, 0) (Rodrigues):  s' = s cos Γ + (u × s) sin Γ + u (u · s)(1 - cos Γ).
 * Circular means F(x) = (S1, S2) = 0 with x = (Γ1, α1, Γ2, α2, …). Of all solutions the one nearest to the start x0, found
 * by Gauss–Newton with the step of least norm counted from x0:  x ← x0 + Jᵀ (J Jᵀ)⁻¹ (J (x - x0) - F).
 */

/** Both in rad. */
export interface CircularFilm {
  readonly retardance: number
  readonly slowAxis: number
}

type Vector = readonly [number, number, number]

const MOST_STEPS = 60
const SOLVED = 1e-12
/** Of J Jᵀ, below which the films at hand cannot move the light both ways. */
const SMALLEST_DETERMINANT = 1e-9
/** rad; central differences of a function of order 1 are best at the cube root of the rounding error. */
const DIFFERENCE = 6e-6

/** Films in the order the light meets them; undefined where no circular design lies in reach. */
export function nearestCircular(azimuth: number, films: readonly CircularFilm[]): CircularFilm[] | undefined {
  const start = films.flatMap(({ retardance, slowAxis }) => [retardance, slowAxis])
  let x = start
  for (let step = 0; step < MOST_STEPS; step++) {
    const f = linearPart(azimuth, x)
    if (Math.hypot(...f) < SOLVED) return filmsOf(x)
    const next = nearerToStart(azimuth, start, x, f)
    if (next === undefined) return undefined
    x = next
  }
  return undefined
}

function nearerToStart(
  azimuth: number,
  start: readonly number[],
  x: readonly number[],
  [f1, f2]: readonly [number, number],
): number[] | undefined {
  const [j1, j2] = jacobian(azimuth, x)
  const moved = x.map((value, k) => value - start[k])
  const [a, b, d] = [dot(j1, j1), dot(j1, j2), dot(j2, j2)]
  const determinant = a * d - b * b
  if (!(determinant > SMALLEST_DETERMINANT)) return undefined
  const [r1, r2] = [dot(j1, moved) - f1, dot(j2, moved) - f2]
  const [l1, l2] = [(d * r1 - b * r2) / determinant, (a * r2 - b * r1) / determinant]
  return start.map((value, k) => value + j1[k] * l1 + j2[k] * l2)
}

/** Gradients of S1 and of S2. */
function jacobian(azimuth: number, x: readonly number[]): [number[], number[]] {
  const columns = x.map((_, k) => {
    const at = (offset: number) =>
      linearPart(
        azimuth,
        x.map((value, m) => (m === k ? value + offset : value)),
      )
    const [ahead, behind] = [at(DIFFERENCE), at(-DIFFERENCE)]
    return [(ahead[0] - behind[0]) / (2 * DIFFERENCE), (ahead[1] - behind[1]) / (2 * DIFFERENCE)]
  })
  return [columns.map(([s1]) => s1), columns.map(([, s2]) => s2)]
}

/** (S1, S2) behind the films. */
function linearPart(azimuth: number, x: readonly number[]): [number, number] {
  let s: Vector = [Math.cos(2 * azimuth), Math.sin(2 * azimuth), 0]
  for (const film of filmsOf(x)) s = turned(s, film)
  return [s[0], s[1]]
}

function turned([s1, s2, s3]: Vector, { retardance, slowAxis }: CircularFilm): Vector {
  const [u1, u2] = [Math.cos(2 * slowAxis), Math.sin(2 * slowAxis)]
  const [cos, sin] = [Math.cos(retardance), Math.sin(retardance)]
  const along = (u1 * s1 + u2 * s2) * (1 - cos)
  return [
    s1 * cos + u2 * s3 * sin + u1 * along,
    s2 * cos - u1 * s3 * sin + u2 * along,
    s3 * cos + (u1 * s2 - u2 * s1) * sin,
  ]
}

function filmsOf(x: readonly number[]): CircularFilm[] {
  return Array.from({ length: x.length / 2 }, (_, k) => ({ retardance: x[2 * k], slowAxis: x[2 * k + 1] }))
}

function dot(a: readonly number[], b: readonly number[]): number {
  return a.reduce((sum, value, k) => sum + value * b[k], 0)
}
