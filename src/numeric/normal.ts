/** The standard normal distribution. */

const SQRT_2_PI = Math.sqrt(2 * Math.PI)

/** Beyond this the series loses digits to the continued fraction. */
const TAIL = 3

/**
 * Φ(x). Within ±3 the series Φ = ½ + φ(x)(x + x³/3 + x⁵/(3·5) + …) of G. Marsaglia, J. Stat. Softw. 11, 4 (2004); beyond,
 * the continued fraction of Abramowitz & Stegun 26.2.14, which keeps its relative accuracy in the far tail (3e-14 at -20).
 */
export function normalCdf(x: number): number {
  if (Number.isNaN(x)) return Number.NaN
  const tail = Math.abs(x) < TAIL ? 0.5 - centralPart(Math.abs(x)) : upperTail(Math.abs(x))
  return x < 0 ? tail : 1 - tail
}

function density(x: number): number {
  return Math.exp(-0.5 * x * x) / SQRT_2_PI
}

/** Φ(x) - ½, x ≥ 0. */
function centralPart(x: number): number {
  let term = x
  let sum = x
  for (let odd = 3; sum + term !== sum; odd += 2) {
    term *= (x * x) / odd
    sum += term
  }
  return sum * density(x)
}

/** 1 - Φ(x) = φ(x)/(x + 1/(x + 2/(x + 3/(x + …)))), x ≥ 3; 120 levels are enough for 16 digits at 3. */
function upperTail(x: number): number {
  let below = x
  for (let level = 120; level >= 1; level--) below = x + level / below
  return density(x) / below
}

/**
 * Rational approximations of PPND16, Algorithm AS 241 (M. J. Wichura, Appl. Stat. 37, 477 (1988)), relative accuracy about
 * 1e-16; coefficients in ascending powers, to the digits of a double.
 */
const CENTER = {
  numerator: [
    3.3871328727963665, 133.14166789178438, 1971.5909503065513, 13731.69376550946, 45921.95393154987, 67265.7709270087,
    33430.57558358813, 2509.0809287301227,
  ],
  denominator: [
    1, 42.31333070160091, 687.1870074920579, 5394.196021424751, 21213.794301586597, 39307.89580009271,
    28729.085735721943, 5226.495278852546,
  ],
} as const
const MIDDLE = {
  numerator: [
    1.4234371107496835, 4.630337846156546, 5.769497221460691, 3.6478483247632045, 1.2704582524523684,
    0.2417807251774506, 0.022723844989269184, 0.0007745450142783414,
  ],
  denominator: [
    1, 2.053191626637759, 1.6763848301838038, 0.6897673349851, 0.14810397642748008, 0.015198666563616457,
    0.0005475938084995345, 1.0507500716444169e-9,
  ],
} as const
const FAR = {
  numerator: [
    6.657904643501103, 5.463784911164114, 1.7848265399172913, 0.29656057182850487, 0.026532189526576124,
    0.0012426609473880784, 2.7115555687434876e-5, 2.0103343992922881e-7,
  ],
  denominator: [
    1, 0.599832206555888, 0.1369298809227358, 0.014875361290850615, 0.0007868691311456133, 1.8463183175100548e-5,
    1.421511758316446e-7, 2.0442631033899397e-15,
  ],
} as const

/** x with Φ(x) = p; -Infinity at 0, Infinity at 1, NaN outside [0, 1]. */
export function inverseNormal(p: number): number {
  const q = p - 0.5
  if (Math.abs(q) <= 0.425) return q * ratio(CENTER, 0.180625 - q * q)
  if (!(p > 0 && p < 1)) return p === 0 ? -Infinity : p === 1 ? Infinity : Number.NaN
  const r = Math.sqrt(-Math.log(q < 0 ? p : 1 - p))
  return Math.sign(q) * (r <= 5 ? ratio(MIDDLE, r - 1.6) : ratio(FAR, r - 5))
}

function ratio(
  { numerator, denominator }: { numerator: readonly number[]; denominator: readonly number[] },
  x: number,
) {
  const polynomial = (coefficients: readonly number[]) => coefficients.reduceRight((sum, c) => sum * x + c, 0)
  return polynomial(numerator) / polynomial(denominator)
}
