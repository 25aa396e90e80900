import { type Pen, type Pixel, strokeSegment } from './pen.js'
import { fontOf, type Theme } from './theme.js'

/** Pixels; left < right, top < bottom. */
export interface Box {
  readonly left: number
  readonly right: number
  readonly top: number
  readonly bottom: number
}

const DISTANCES_PX = [9, 22, 38, 56, 78]
/** Tried in this order: right, above right, below right, left, above left, below left, above, below. */
const SIDES: readonly (readonly [number, number])[] = [
  [1, 0],
  [0.8, -0.8],
  [0.8, 0.8],
  [-1, 0],
  [-0.8, -0.8],
  [-0.8, 0.8],
  [0, -1],
  [0, 1],
]

/**
 * Sets small texts beside points so that none covers another: the nearest free place, with a leader line when it is not
 * next to the point. A text that finds no place is left out (its point still has its value under the pointer).
 */
export class LabelPlacer {
  private readonly taken: Box[] = []

  constructor(
    private readonly pen: Pen,
    private readonly theme: Theme,
    private readonly bounds: Box,
  ) {}

  /** Keeps texts off a marker or a text already there. */
  reserve(x: number, y: number, halfWidthPx: number, halfHeightPx = halfWidthPx): void {
    this.taken.push({ left: x - halfWidthPx, right: x + halfWidthPx, top: y - halfHeightPx, bottom: y + halfHeightPx })
  }

  /** Keeps texts off a straight line. */
  reserveLine([x0, y0]: Pixel, [x1, y1]: Pixel): void {
    const count = Math.ceil(Math.hypot(x1 - x0, y1 - y0) / 6)
    for (let i = 0; i <= count; i++) this.reserve(x0 + ((x1 - x0) * i) / count, y0 + ((y1 - y0) * i) / count, 3)
  }

  /** True if the text found a place beside (x, y). */
  beside(text: string, x: number, y: number, color = this.theme.ink): boolean {
    this.setFont()
    const width = this.pen.measureText(text).width
    for (const distance of DISTANCES_PX) {
      for (const [dx, dy] of SIDES) {
        const left = x + dx * distance + (dx > 0 ? 0 : dx < 0 ? -width : -width / 2)
        const box = this.boxAt(left, y + dy * distance, width)
        if (!this.isFree(box)) continue
        if (distance > DISTANCES_PX[0]) this.lead(x, y, box)
        this.write(text, box, color)
        return true
      }
    }
    return false
  }

  /** True if the text fitted centered on (x, y); on a patch of paper so that it reads on any ground. */
  centered(text: string, x: number, y: number, patch: string | null = this.theme.paper): boolean {
    this.setFont()
    const width = this.pen.measureText(text).width
    const box = this.boxAt(x - width / 2, y, width)
    if (!this.isFree(box)) return false
    if (patch !== null) {
      this.pen.save()
      this.pen.globalAlpha = 0.82
      this.pen.fillStyle = patch
      this.pen.fillRect(box.left - 3, box.top, width + 6, box.bottom - box.top)
      this.pen.restore()
    }
    this.write(text, box, this.theme.ink)
    return true
  }

  /** True if the text fitted just above or below a horizontal line, as far right as it is free. */
  alongLine(text: string, y: number, color: string): boolean {
    this.setFont()
    const width = this.pen.measureText(text).width
    const lift = this.theme.smallSize * 0.62 + 2
    for (let left = this.bounds.right - width - 6; left > this.bounds.left; left -= 12) {
      for (const middle of [y - lift, y + lift]) {
        const box = this.boxAt(left, middle, width)
        if (!this.isFree(box)) continue
        this.write(text, box, color)
        return true
      }
    }
    return false
  }

  private setFont(): void {
    this.pen.font = fontOf(this.theme, this.theme.smallSize)
  }

  private boxAt(left: number, middle: number, width: number): Box {
    const half = this.theme.smallSize * 0.62
    return { left, right: left + width, top: middle - half, bottom: middle + half }
  }

  private isFree(box: Box): boolean {
    const { bounds } = this
    const inside =
      box.left >= bounds.left && box.right <= bounds.right && box.top >= bounds.top && box.bottom <= bounds.bottom
    return inside && !this.taken.some((other) => overlap(box, other))
  }

  private lead(x: number, y: number, box: Box): void {
    const toX = Math.min(box.right, Math.max(box.left, x))
    const toY = Math.min(box.bottom, Math.max(box.top, y))
    strokeSegment(this.pen, [x, y], [toX, toY], { color: this.theme.faint })
  }

  private write(text: string, box: Box, color: string): void {
    this.pen.textAlign = 'left'
    this.pen.textBaseline = 'middle'
    this.pen.fillStyle = color
    this.pen.fillText(text, box.left, (box.top + box.bottom) / 2)
    this.taken.push({ left: box.left - 6, right: box.right + 6, top: box.top, bottom: box.bottom })
  }
}

function overlap(a: Box, b: Box): boolean {
  return a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom
}

/**
 * Moves positions (px, ascending) apart to at least `gapPx` with the least total shift upward and downward: runs that touch
 * are set evenly about their common middle.
 */
export function spreadApart(positions: readonly number[], gapPx: number): number[] {
  const runs: { middle: number; count: number }[] = []
  for (const position of positions) {
    let run = { middle: position, count: 1 }
    for (
      let last = runs.at(-1);
      last && run.middle - last.middle < (gapPx * (run.count + last.count)) / 2;
      last = runs.at(-1)
    ) {
      const count = run.count + last.count
      run = { middle: (run.middle * run.count + last.middle * last.count) / count, count }
      runs.pop()
    }
    runs.push(run)
  }
  return runs.flatMap(({ middle, count }) =>
    Array.from({ length: count }, (_, i) => middle + gapPx * (i - (count - 1) / 2)),
  )
}
