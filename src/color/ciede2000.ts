/**
 * Color difference ΔE00: ISO/CIE 11664-6, kL = kC = kH = 1. Written after the notes of G. Sharma, W. Wu, E. N. Dalal, Color
 * Res. Appl. 30, 21 (2005), which settle the hue angles.
 */
type Triple = readonly [number, number, number]

const RADIANS = Math.PI / 180
const POWER_25_7 = 25 ** 7

/** ΔE00 of two colors in L*, a*, b*. */
export function ciede2000([l1, a1, b1]: Triple, [l2, a2, b2]: Triple): number {
  const meanChroma7 = ((Math.hypot(a1, b1) + Math.hypot(a2, b2)) / 2) ** 7
  const g = (1 - Math.sqrt(meanChroma7 / (meanChroma7 + POWER_25_7))) / 2
  const [p1, p2] = [a1 * (1 + g), a2 * (1 + g)]
  const [c1, c2] = [Math.hypot(p1, b1), Math.hypot(p2, b2)]
  const [h1, h2] = [hueDegrees(p1, b1), hueDegrees(p2, b2)]
  const gray = c1 * c2 === 0
  const dHue = gray ? 0 : withinHalfTurn(h2 - h1)
  const dH = 2 * Math.sqrt(c1 * c2) * Math.sin((dHue / 2) * RADIANS)
  const hue = gray ? h1 + h2 : meanHueDegrees(h1, h2)
  const t =
    1 -
    0.17 * Math.cos((hue - 30) * RADIANS) +
    0.24 * Math.cos(2 * hue * RADIANS) +
    0.32 * Math.cos((3 * hue + 6) * RADIANS) -
    0.2 * Math.cos((4 * hue - 63) * RADIANS)
  const [l, c] = [(l1 + l2) / 2, (c1 + c2) / 2]
  const sL = 1 + (0.015 * (l - 50) ** 2) / Math.sqrt(20 + (l - 50) ** 2)
  const sC = 1 + 0.045 * c
  const sH = 1 + 0.015 * c * t
  const rotation = 30 * Math.exp(-(((hue - 275) / 25) ** 2))
  const rT = -2 * Math.sqrt(c ** 7 / (c ** 7 + POWER_25_7)) * Math.sin(2 * rotation * RADIANS)
  const [dL, dC] = [(l2 - l1) / sL, (c2 - c1) / sC]
  return Math.sqrt(dL * dL + dC * dC + (dH / sH) ** 2 + rT * dC * (dH / sH))
}

function hueDegrees(a: number, b: number): number {
  if (a === 0 && b === 0) return 0
  const hue = Math.atan2(b, a) / RADIANS
  return hue < 0 ? hue + 360 : hue
}

/** -180 to 180, both ends kept as they come. */
function withinHalfTurn(degrees: number): number {
  if (degrees > 180) return degrees - 360
  return degrees < -180 ? degrees + 360 : degrees
}

function meanHueDegrees(h1: number, h2: number): number {
  const sum = h1 + h2
  if (Math.abs(h1 - h2) <= 180) return sum / 2
  return sum < 360 ? (sum + 360) / 2 : (sum - 360) / 2
}
