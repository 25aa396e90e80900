import { labToHex } from './screenColor.js'

/**
 * Color scale of the maps, computed in CIELAB: lightness rises evenly, so that equal steps of the value are equal steps of
 * lightness, in gray print and to every kind of color vision; the hue turns from indigo to a pale green-blue, the chroma
 * swells in between. Dark is a dark screen.
 */
function ramp(lightnessFrom: number, lightnessTo: number): (t: number) => string {
  return (t) => {
    const s = Math.min(1, Math.max(0, t))
    const hueRad = ((295 - 125 * s) * Math.PI) / 180
    const chroma = 12 + 20 * Math.sin(Math.PI * s)
    return labToHex([
      lightnessFrom + (lightnessTo - lightnessFrom) * s,
      chroma * Math.cos(hueRad),
      chroma * Math.sin(hueRad),
    ])
  }
}

export const paperRamp = ramp(20, 95)
/** Starts lighter, to stand off the dark surround. */
export const darkRamp = ramp(26, 95)
