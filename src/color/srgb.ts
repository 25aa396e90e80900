/**
 * Colors of light on a screen: XYZ under any white, adapted to the screen's white by the Bradford transform, then sRGB after
 * IEC 61966-2-1.
 */
type Triple = readonly [number, number, number]
type Matrix = readonly [Triple, Triple, Triple]

/** White of sRGB, x = 0.3127, y = 0.3290, Y = 1. */
export const SRGB_WHITE = [0.3127 / 0.329, 1, (1 - 0.3127 - 0.329) / 0.329] as const

/** To cone responses: K. M. Lam's Bradford matrix as in ICC.1 annex E and CIE 160. */
const BRADFORD: Matrix = [
  [0.8951, 0.2664, -0.1614],
  [-0.7502, 1.7135, 0.0367],
  [0.0389, -0.0685, 1.0296],
]
/** Its inverse. */
const BRADFORD_INVERSE: Matrix = [
  [0.9869929055, -0.1470542564, 0.1599626517],
  [0.4323052697, 0.5183602715, 0.0492912282],
  [-0.0085286646, 0.0400428217, 0.9684866958],
]
/**
 * From the primaries (0.64, 0.33), (0.30, 0.60), (0.15, 0.06) and the white of IEC 61966-2-1: its printed matrix, which has
 * four decimals and does not quite give white for white, to ten.
 */
const XYZ_TO_RGB: Matrix = [
  [3.2409699419, -1.5373831776, -0.4986107603],
  [-0.9692436363, 1.8759675015, 0.0415550574],
  [0.0556300797, -0.2039769589, 1.0569715142],
]

/** Linear RGB, 1 for the white on every channel; below 0 or above 1 where the screen cannot follow. */
export function xyzToLinearRgb(xyz: Triple, white: Triple): [number, number, number] {
  const from = times(BRADFORD, white)
  const to = times(BRADFORD, SRGB_WHITE)
  const [l, m, s] = times(BRADFORD, xyz)
  return times(
    XYZ_TO_RGB,
    times(BRADFORD_INVERSE, [(l * to[0]) / from[0], (m * to[1]) / from[1], (s * to[2]) / from[2]]),
  )
}

/** Linear RGB, clipped to what a screen can show, to sRGB in [0, 1]. */
export function linearRgbToSrgb(linear: Triple): [number, number, number] {
  return [encode(linear[0]), encode(linear[1]), encode(linear[2])]
}

/** sRGB in [0, 1] to `#rrggbb`. */
export function srgbToHex(srgb: Triple): string {
  const byte = (value: number) =>
    Math.round(255 * value)
      .toString(16)
      .padStart(2, '0')
  return `#${byte(srgb[0])}${byte(srgb[1])}${byte(srgb[2])}`
}

function encode(linear: number): number {
  const value = Math.min(1, Math.max(0, linear))
  return value <= 0.0031308 ? 12.92 * value : 1.055 * value ** (1 / 2.4) - 0.055
}

function times(matrix: Matrix, [x, y, z]: Triple): [number, number, number] {
  const row = ([a, b, c]: Triple) => a * x + b * y + c * z
  return [row(matrix[0]), row(matrix[1]), row(matrix[2])]
}
