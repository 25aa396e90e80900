import { createCanvas, loadImage } from '@napi-rs/canvas'
import { expect, test } from 'vitest'
import { PAPER } from '../../src/charts/theme.js'
import { drawChart } from '../../src/cli/drawChart.js'
import { compactSvg } from '../../src/report/html/compactSvg.js'
import { GALLERY } from '../charts/gallery.js'

async function pixelsOf(svg: string, width: number, height: number): Promise<Uint8ClampedArray> {
  const pen = createCanvas(width, height).getContext('2d')
  pen.drawImage(await loadImage(Buffer.from(svg)), 0, 0, width, height)
  return pen.getImageData(0, 0, width, height).data
}

// The canvas itself draws both: it knows nothing of how the second was made shorter.
test.each(GALLERY)('$name is the same picture in less than half the bytes', async ({ build, width, height }) => {
  const svg = (await drawChart(build(PAPER), { width, height, format: 'svg' })).toString('utf8')
  const compact = compactSvg(svg)
  expect(compact.length).toBeLessThan(0.5 * svg.length)
  const [before, after] = [await pixelsOf(svg, width, height), await pixelsOf(compact, width, height)]
  let apart = 0
  for (let i = 0; i < before.length; i++) if (Math.abs(before[i] - after[i]) > 48) apart++
  expect(apart / before.length).toBeLessThan(0.0005)
})
