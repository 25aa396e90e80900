import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { pathToFileURL } from 'node:url'
import type { Browser, Locator, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { offblack } from '../cli/offblack.js'
import { launchChromium } from '../page/chromium.js'
import { REVIEWED_STACK } from './reviewedStack.js'

const AXE = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8')

let browser: Browser
let folder: string
let page: Page
/** Everything that should not happen. */
const complaints: string[] = []

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'offblack-review-'))
  writeFileSync(join(folder, 'small.stack.yaml'), REVIEWED_STACK)
  browser = await launchChromium()
  const { code, stderr } = await offblack(['report', 'small.stack.yaml', '--out', 'out'], folder)
  expect([0, 3], stderr).toContain(code)
  page = await openReport()
}, 240_000)
afterAll(async () => {
  await browser.close()
  rmSync(folder, { recursive: true, force: true })
})

async function openReport(): Promise<Page> {
  const address = pathToFileURL(join(folder, 'out', 'small.report.html')).href
  const opened = await browser.newPage({ viewport: { width: 1280, height: 900 } })
  opened.on('console', (message) => complaints.push(`console: ${message.text()}`))
  opened.on('pageerror', (error) => complaints.push(`error: ${error.message}`))
  opened.on('request', (request) => {
    const url = request.url()
    if (url !== address && !url.startsWith('data:')) complaints.push(`outside: ${url}`)
  })
  await opened.goto(address)
  return opened
}

/** Share of a canvas that is not paper. */
function inkedShare(canvas: Locator): Promise<number> {
  return canvas.evaluate((element: HTMLCanvasElement) => {
    const pixels = element.getContext('2d')?.getImageData(0, 0, element.width, element.height).data ?? []
    let inked = 0
    for (let i = 0; i < pixels.length; i += 4) if (pixels[i] + pixels[i + 1] + pixels[i + 2] < 740) inked++
    return (4 * inked) / pixels.length
  })
}

test('opened from a disk, every chart comes alive as it is scrolled to', async () => {
  const figures = await page.locator('figure.chart').all()
  expect(figures.length).toBeGreaterThan(12)
  for (const figure of figures) {
    await figure.scrollIntoViewIfNeeded()
    await figure.locator('canvas').waitFor()
    expect(await inkedShare(figure.locator('canvas'))).toBeGreaterThan(0.02)
    expect(await figure.locator('img').isVisible()).toBe(false)
  }
  expect(complaints).toEqual([])
})

test('a value shows under the pointer', async () => {
  const canvas = page.locator('figure[data-chart="sensitivity"] canvas')
  await canvas.scrollIntoViewIfNeeded()
  const before = await inkedShare(canvas)
  const box = await canvas.boundingBox()
  if (box === null) throw new Error('the chart is not shown')
  let most = 0
  // Down over the bars: where they stand is for the chart to know.
  for (let down = 0.25; down < 0.85; down += 0.05) {
    await page.mouse.move(box.x + 0.25 * box.width, box.y + down * box.height)
    await page.evaluate(() => new Promise((resolve) => requestAnimationFrame(() => requestAnimationFrame(resolve))))
    most = Math.max(most, await inkedShare(canvas))
  }
  expect(most).toBeGreaterThan(before + 0.01)
})

test('axe finds nothing, and nothing is wider than the window, at 1280 and 700 px', async () => {
  for (const width of [1280, 700]) {
    await page.setViewportSize({ width, height: 900 })
    await page.evaluate(AXE)
    const found = await page.evaluate(
      'axe.run().then(({violations}) => violations.map(({id, nodes}) => id + ": " + nodes[0].html.slice(0, 160)))',
    )
    expect(found).toEqual([])
    expect(await page.evaluate(() => document.documentElement.scrollWidth <= innerWidth)).toBe(true)
  }
})

test('printed, the vector pictures take the place of the canvases', async () => {
  await page.emulateMedia({ media: 'print' })
  const figure = page.locator('figure.live').first()
  expect(await figure.locator('img').isVisible()).toBe(true)
  expect(await figure.locator('canvas').isVisible()).toBe(false)
  await page.emulateMedia({ media: 'screen' })
})

test('the PDF has its pages and its headings', () => {
  const pdf = readFileSync(join(folder, 'out', 'small.report.pdf')).toString('latin1')
  // ISO 32000-1, 7.5.2 and 7.7.3.3: the header, and one dictionary of type Page for each page.
  expect(pdf.startsWith('%PDF-')).toBe(true)
  expect(pdf.match(/\/Type \/Page\b/g)?.length).toBeGreaterThan(5)
  for (const heading of ['The laminate', 'Viewing cone', 'What this rests on']) expect(pdf).toContain(heading)
})

test('the JSON beside it is one document with the origin and both designs', () => {
  const { origin, designs } = JSON.parse(readFileSync(join(folder, 'out', 'small.report.json'), 'utf8'))
  expect(origin.sha256).toMatch(/^[0-9a-f]{64}$/)
  expect(designs.map(({ name }: { name: string }) => name)).toEqual(['file', 'search'])
})
