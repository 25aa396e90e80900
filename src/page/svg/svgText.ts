/** Pieces of SVG text. */

/** As of a canvas: x' = a x + c y + e, y' = b x + d y + f. */
export type Matrix = readonly [a: number, b: number, c: number, d: number, e: number, f: number]

/** First `n`, then `m`. */
export function multiply([a, b, c, d, e, f]: Matrix, n: Matrix): Matrix {
  return [
    a * n[0] + c * n[1],
    b * n[0] + d * n[1],
    a * n[2] + c * n[3],
    b * n[2] + d * n[3],
    a * n[4] + c * n[5] + e,
    b * n[4] + d * n[5] + f,
  ]
}

export function transformed([a, b, c, d, e, f]: Matrix, x: number, y: number): [number, number] {
  return [a * x + c * y + e, b * x + d * y + f]
}

/** To a hundredth of a pixel; sines and cosines of a matrix need four digits. */
export function shortNumber(value: number): string {
  return String(Number(value.toFixed(Math.abs(value) <= 1 ? 4 : 2)))
}

export function attributesText(attributes: Readonly<Record<string, string | number | undefined>>): string {
  return Object.entries(attributes)
    .filter(([, value]) => value !== undefined)
    .map(([name, value]) => ` ${name}="${String(value).replaceAll('"', '&quot;')}"`)
    .join('')
}

/** How far below the place of a text its base line lies, in sizes of the font: SVG editors know no other base line. */
export function textShift(baseline: string): number {
  return { middle: 0.35, top: 0.8, hanging: 0.8, bottom: -0.2, ideographic: -0.2 }[baseline] ?? 0
}

export function fontSizePx(font: string): number {
  return Number(/(\d+(?:\.\d+)?)px/.exec(font)?.[1] ?? 10)
}
