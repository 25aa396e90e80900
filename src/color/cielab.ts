/** CIELAB: ISO/CIE 11664-4. */

type Triple = readonly [number, number, number]

const DELTA = 6 / 29

/** L*, a*, b* of XYZ against a white. */
export function xyzToLab(xyz: Triple, white: Triple): [number, number, number] {
  const fx = compress(xyz[0] / white[0])
  const fy = compress(xyz[1] / white[1])
  const fz = compress(xyz[2] / white[2])
  return [116 * fy - 16, 500 * (fx - fy), 200 * (fy - fz)]
}

export function labToXyz([l, a, b]: Triple, white: Triple): [number, number, number] {
  const fy = (l + 16) / 116
  return [white[0] * expand(fy + a / 500), white[1] * expand(fy), white[2] * expand(fy - b / 200)]
}

/** C*ab. */
export function chroma(lab: Triple): number {
  return Math.sqrt(lab[1] * lab[1] + lab[2] * lab[2])
}

function compress(t: number): number {
  return t > DELTA ** 3 ? Math.cbrt(t) : t / (3 * DELTA * DELTA) + 4 / 29
}

/** Slopes of the compressed X, Y, Z: L* = 116 fY - 16, a* = 500 (fX - fY), b* = 200 (fY - fZ), by X, Y and Z. */
export function compressionSlopes(xyz: Triple, white: Triple): [number, number, number] {
  const slope = (axis: 0 | 1 | 2) => compressionSlope(xyz[axis] / white[axis]) / white[axis]
  return [slope(0), slope(1), slope(2)]
}

function compressionSlope(t: number): number {
  return t > DELTA ** 3 ? 1 / (3 * Math.cbrt(t) ** 2) : 1 / (3 * DELTA * DELTA)
}

function expand(f: number): number {
  return f > DELTA ? f ** 3 : 3 * DELTA * DELTA * (f - 4 / 29)
}
