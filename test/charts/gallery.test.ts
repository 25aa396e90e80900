import { mkdirSync, writeFileSync } from 'node:fs'
import { createCanvas, loadImage } from '@napi-rs/canvas'
import { describe, expect, it } from 'vitest'
import { DARK, PAPER, type Theme } from '../../src/charts/theme.js'
import { drawChart } from '../../src/cli/drawChart.js'
import { type Exhibit, GALLERY } from './gallery.js'
import { overlapping, writtenTexts } from './writtenTexts.js'

const SCALE = 2
const folder = new URL('../../out/charts-gallery/', import.meta.url)
mkdirSync(folder, { recursive: true })

/** RGBA of a PNG or SVG file, drawn at `width` × `height`. */
async function pixelsOf(bytes: Buffer, width: number, height: number): Promise<Uint8ClampedArray> {
  const pen = createCanvas(width, height).getContext('2d')
  pen.drawImage(await loadImage(bytes), 0, 0, width, height)
  return pen.getImageData(0, 0, width, height).data
}

/** Share of the sheet that is not bare. */
function inkedShare(pixels: Uint8ClampedArray, paper: string): number {
  const bare = Number.parseInt(paper.slice(1), 16)
  let inked = 0
  for (let i = 0; i < pixels.length; i += 4) {
    if ((pixels[i] << 16) + (pixels[i + 1] << 8) + pixels[i + 2] !== bare) inked++
  }
  return (4 * inked) / pixels.length
}

describe.each(GALLERY)('$name', ({ name, build, width, height }: Exhibit) => {
  it('is a PNG of twice the size, on its paper from edge to edge', async () => {
    const bytes = await drawChart(build(PAPER), { width, height, scale: SCALE, format: 'png' })
    writeFileSync(new URL(`${name}.png`, folder), bytes)
    // Signature and header chunk: PNG specification (W3C, third edition), 5.2 and 11.2.1.
    expect([...bytes.subarray(0, 8)]).toEqual([137, 80, 78, 71, 13, 10, 26, 10])
    expect([bytes.readUInt32BE(16), bytes.readUInt32BE(20)]).toEqual([SCALE * width, SCALE * height])
    const pixels = await pixelsOf(bytes, SCALE * width, SCALE * height)
    for (const corner of [0, pixels.length - 4])
      expect([...pixels.subarray(corner, corner + 4)]).toEqual([255, 255, 255, 255])
    expect(inkedShare(pixels, PAPER.paper)).toBeGreaterThan(0.02)
  })

  it('is the same picture as an SVG that needs no font and no other file', async () => {
    const svg = await drawChart(build(PAPER), { width, height, format: 'svg' })
    writeFileSync(new URL(`${name}.svg`, folder), svg)
    const text = svg.toString('utf8')
    expect(text).toMatch(new RegExp(`<svg[^>]*width="${width}"[^>]*height="${height}"`))
    expect(text).not.toContain('<text')
    expect(text).not.toMatch(/href="(?!#)/)
    const png = await pixelsOf(await drawChart(build(PAPER), { width, height, scale: 1, format: 'png' }), width, height)
    const drawn = await pixelsOf(svg, width, height)
    let apart = 0
    for (let i = 0; i < png.length; i += 4) if (Math.abs(png[i] - drawn[i]) > 96) apart++
    // Edges of letters are smoothed differently; a missing curve or text would be ten times as much.
    expect((4 * apart) / png.length).toBeLessThan(0.01)
  })

  it.each([
    ['paper', PAPER],
    ['dark', DARK],
  ] as const)('has texts that can be read on %s', async (shade: string, theme: Theme) => {
    const config = build(theme)
    let bytes: Buffer | undefined
    const texts = await writtenTexts(async () => {
      bytes = await drawChart(config, { width, height, scale: SCALE, format: 'png' })
    }, SCALE)
    if (bytes && shade === 'dark') writeFileSync(new URL(`${name}-dark.png`, folder), bytes)
    const words = texts.map(({ text }) => text)
    for (const line of config.options?.plugins?.title?.text ?? ['no title']) expect(words).toContain(line)
    for (const { label } of config.data.datasets) if (label) expect(words).toContain(label)
    expect(overlapping(texts)).toEqual([])
    for (const written of texts) {
      expect(written.sizePx, written.text).toBeGreaterThanOrEqual(11)
      expect(written.font, written.text).toContain('DejaVu Sans')
      expect(written.left, written.text).toBeGreaterThanOrEqual(0)
      expect(written.top, written.text).toBeGreaterThanOrEqual(0)
      expect(written.right, written.text).toBeLessThanOrEqual(width)
      expect(written.bottom, written.text).toBeLessThanOrEqual(height)
    }
  })
})
