/**
 * The part of a 2-D canvas context the charts draw with, on paper and on the page alike. Declared here so that the core is
 * type-checked without the browser's types.
 */
export interface Pen {
  fillStyle: unknown
  strokeStyle: unknown
  lineWidth: number
  lineCap: 'butt' | 'round' | 'square'
  lineJoin: 'bevel' | 'miter' | 'round'
  globalAlpha: number
  font: string
  textAlign: 'start' | 'end' | 'left' | 'right' | 'center'
  textBaseline: 'top' | 'hanging' | 'middle' | 'alphabetic' | 'ideographic' | 'bottom'
  save(): void
  restore(): void
  translate(x: number, y: number): void
  rotate(angleRad: number): void
  beginPath(): void
  closePath(): void
  moveTo(x: number, y: number): void
  lineTo(x: number, y: number): void
  arc(x: number, y: number, radius: number, fromRad: number, toRad: number, counterclockwise?: boolean): void
  rect(x: number, y: number, width: number, height: number): void
  clip(): void
  fill(rule?: 'nonzero' | 'evenodd'): void
  stroke(): void
  fillRect(x: number, y: number, width: number, height: number): void
  strokeRect(x: number, y: number, width: number, height: number): void
  fillText(text: string, x: number, y: number): void
  measureText(text: string): { readonly width: number }
  setLineDash(dash: readonly number[]): void
}

/** A point in pixels: x to the right, y down. */
export type Pixel = readonly [x: number, y: number]

/** Adds an open polyline to the current path. */
export function trace(pen: Pen, points: readonly Pixel[]): void {
  points.forEach(([x, y], i) => {
    if (i === 0) pen.moveTo(x, y)
    else pen.lineTo(x, y)
  })
}

export interface Stroke {
  readonly color: string
  /** Default 1. */
  readonly width?: number
  /** Default solid. */
  readonly dash?: readonly number[]
}

/** Strokes one straight line. */
export function strokeSegment(pen: Pen, from: Pixel, to: Pixel, style: Stroke): void {
  strokeLine(pen, [from, to], style)
}

/** Strokes one polyline. */
export function strokeLine(pen: Pen, points: readonly Pixel[], style: Stroke): void {
  pen.save()
  pen.strokeStyle = style.color
  pen.lineWidth = style.width ?? 1
  pen.lineJoin = 'round'
  pen.setLineDash(style.dash ?? [])
  pen.beginPath()
  trace(pen, points)
  pen.stroke()
  pen.restore()
}
