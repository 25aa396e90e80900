import { labToXyz } from '../color/cielab.js'
import { linearRgbToSrgb, srgbToHex, xyzToLinearRgb } from '../color/srgb.js'

/** Colors of light on a screen, XYZ and CIELAB under the D65 white of the 2° observer (Y = 1). */

type Triple = readonly [number, number, number]

const D65_WHITE = [0.95047, 1, 1.08883] as const

/** XYZ to `#rrggbb`; what the screen cannot show is clipped. */
export function xyzToHex(xyz: Triple): string {
  return linearRgbToHex(xyzToLinearRgb(xyz, D65_WHITE))
}

/** CIELAB (D65) to `#rrggbb`. */
export function labToHex(lab: Triple): string {
  return xyzToHex(labToXyz(lab, D65_WHITE))
}

/**
 * The hue of a light of any XYZ, as bright as the screen can show it times `brightness` in [0, 1]. A light outside the
 * screen's gamut (every spectral one) is mixed with white until it is inside.
 */
export function lightToHex(xyz: Triple, brightness = 1): string {
  const rgb = xyzToLinearRgb(xyz, D65_WHITE)
  const white = Math.max(0, -Math.min(...rgb))
  const lifted = rgb.map((v) => v + white)
  const top = Math.max(...lifted, Number.MIN_VALUE)
  return linearRgbToHex(
    [lifted[0], lifted[1], lifted[2]].map((v) => (brightness * v) / top) as [number, number, number],
  )
}

function linearRgbToHex(rgb: Triple): string {
  return srgbToHex(linearRgbToSrgb(rgb))
}
