/**
 * Colors of light on a screen. sRGB after IEC 61966-2-1: linear RGB from XYZ (D65, Y = 1 for white), then the transfer
 * function. CIELAB after CIE 15:2018 with the D65 white of the 2° observer.
 */

const D65_WHITE = [0.95047, 1, 1.08883] as const

/** IEC 61966-2-1, equation F.7 (matrix to four decimals as printed there). */
function xyzToLinearRgb([x, y, z]: readonly [number, number, number]): [number, number, number] {
  return [
    3.2406 * x - 1.5372 * y - 0.4986 * z,
    -0.9689 * x + 1.8758 * y + 0.0415 * z,
    0.0557 * x - 0.204 * y + 1.057 * z,
  ]
}

/** Linear RGB, clipped to [0, 1], to `#rrggbb`. */
export function linearRgbToHex(rgb: readonly [number, number, number]): string {
  const byte = (linear: number): string => {
    const v = Math.min(1, Math.max(0, linear))
    const encoded = v <= 0.0031308 ? 12.92 * v : 1.055 * v ** (1 / 2.4) - 0.055
    return Math.round(255 * encoded)
      .toString(16)
      .padStart(2, '0')
  }
  return `#${rgb.map(byte).join('')}`
}

/** XYZ (Y = 1 for white) to `#rrggbb`; what the screen cannot show is clipped. */
export function xyzToHex(xyz: readonly [number, number, number]): string {
  return linearRgbToHex(xyzToLinearRgb(xyz))
}

/** CIELAB (D65) to `#rrggbb`. */
export function labToHex([lightness, a, b]: readonly [number, number, number]): string {
  const fy = (lightness + 16) / 116
  const cube = (f: number): number => (f > 6 / 29 ? f ** 3 : 3 * (6 / 29) ** 2 * (f - 4 / 29))
  return xyzToHex([D65_WHITE[0] * cube(fy + a / 500), D65_WHITE[1] * cube(fy), D65_WHITE[2] * cube(fy - b / 200)])
}

/**
 * The hue of a light of any XYZ, as bright as the screen can show it times `brightness` in [0, 1]. A light outside the
 * screen's gamut (every spectral one) is mixed with white until it is inside.
 */
export function lightToHex(xyz: readonly [number, number, number], brightness = 1): string {
  const rgb = xyzToLinearRgb(xyz)
  const white = Math.max(0, -Math.min(...rgb))
  const lifted = rgb.map((v) => v + white)
  const top = Math.max(...lifted, Number.MIN_VALUE)
  return linearRgbToHex(
    [lifted[0], lifted[1], lifted[2]].map((v) => (brightness * v) / top) as [number, number, number],
  )
}
