import { createCanvas } from '@napi-rs/canvas'
import { vi } from 'vitest'

/** A text as it was drawn: what, how large, and the upright box around it in CSS pixels of the sheet. */
export interface WrittenText {
  readonly text: string
  readonly font: string
  readonly sizePx: number
  readonly left: number
  readonly right: number
  readonly top: number
  readonly bottom: number
}

/** Height of capitals and digits over the em, DejaVu Sans (read off the font: 1493/2048). */
const CAP_HEIGHT = 0.73

/** Records every text written on any PNG canvas while `draw` runs. */
export async function writtenTexts(draw: () => Promise<unknown>, scale: number): Promise<WrittenText[]> {
  const written = new Map<string, WrittenText>()
  const context = Object.getPrototypeOf(createCanvas(1, 1).getContext('2d'))
  const original = context.fillText as CanvasRenderingContext2D['fillText']
  const spy = vi.spyOn(context, 'fillText').mockImplementation(function (
    this: CanvasRenderingContext2D,
    ...args: unknown[]
  ) {
    const [text, x, y] = args as [string, number, number]
    if (text !== '') {
      const found = boxOf(this, text, x, y, scale)
      written.set(JSON.stringify([text, Math.round(found.left), Math.round(found.top)]), found)
    }
    return original.call(this, text, x, y)
  })
  try {
    await draw()
  } finally {
    spy.mockRestore()
  }
  return [...written.values()]
}

function boxOf(pen: CanvasRenderingContext2D, text: string, x: number, y: number, scale: number): WrittenText {
  const sizePx = Number(/(\d+(?:\.\d+)?)px/.exec(pen.font)?.[1])
  const width = pen.measureText(text).width
  const height = CAP_HEIGHT * sizePx
  const toLeft = { left: 0, start: 0, center: 0.5, right: 1, end: 1 }[pen.textAlign]
  const toTop = { top: 0, hanging: 0, middle: 0.5, alphabetic: 1, ideographic: 1, bottom: 1 }[pen.textBaseline]
  const matrix = pen.getTransform()
  const corners = [0, 1].flatMap((i) =>
    [0, 1].map((j) => {
      const [u, v] = [x + (i - toLeft) * width, y + (j - toTop) * height]
      return [(matrix.a * u + matrix.c * v + matrix.e) / scale, (matrix.b * u + matrix.d * v + matrix.f) / scale]
    }),
  )
  const [xs, ys] = [corners.map((c) => c[0]), corners.map((c) => c[1])]
  const box = { left: Math.min(...xs), right: Math.max(...xs), top: Math.min(...ys), bottom: Math.max(...ys) }
  return { text, font: pen.font, sizePx, ...box }
}

/** Pairs of texts that cover one another. */
export function overlapping(texts: readonly WrittenText[]): string[] {
  return texts.flatMap((a, i) =>
    texts
      .slice(i + 1)
      .filter((b) => a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom)
      .map((b) => `“${a.text}” on “${b.text}”`),
  )
}
