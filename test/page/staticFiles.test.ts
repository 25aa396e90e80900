import { readFileSync } from 'node:fs'
import { createServer, type Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import { extname, join, normalize } from 'node:path'
import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { offblack } from '../cli/offblack.js'
import { ROOT } from '../sourceFiles.js'
import { launchChromium } from './chromium.js'
import { figure, shown, visit } from './visit.js'

const PAGE = join(ROOT, 'dist', 'page')
const TYPES: Readonly<Record<string, string>> = { '.html': 'text/html', '.js': 'text/javascript', '.css': 'text/css' }

let browser: Browser
let server: Server
let address: string
beforeAll(async () => {
  // Any web server: files and their types, nothing else.
  server = createServer((request, response) => {
    const { pathname } = new URL(request.url ?? '/', 'http://x')
    const path = join(PAGE, normalize(pathname === '/' ? '/index.html' : pathname))
    response.setHeader('content-type', TYPES[extname(path)] ?? 'application/octet-stream')
    response.end(readFileSync(path))
  })
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  address = `http://127.0.0.1:${(server.address() as AddressInfo).port}/`
  browser = await launchChromium()
})
afterAll(async () => {
  await browser.close()
  server.close()
})

/** Head-on luminous reflectance, percent, as the command has it. */
async function byCommand(file: string, ...options: string[]): Promise<number> {
  const { stdout } = await offblack(['evaluate', file, '--json', ...options], join(ROOT, 'stacks'))
  return Number((100 * JSON.parse(stdout).directions[0].luminous_reflectance).toFixed(3))
}

test('as plain files: a demo stack opens, a saved file is a download', async () => {
  const { page, complaints } = await visit(browser, address)
  await page.getByRole('button', { name: 'dive-computer.stack.yaml' }).click()
  await shown(page)
  await page.getByRole('slider', { name: 'half axis' }).focus()
  await page.keyboard.press('ArrowUp')
  await expect
    .poll(() => figure(page, 'luminous_reflectance'))
    .toBe(await byCommand('dive-computer.stack.yaml', '--set', 'half.slow_axis=23.5deg'))
  const download = page.waitForEvent('download')
  await page.getByRole('button', { name: 'save *' }).click()
  const text = readFileSync(await (await download).path(), 'utf8')
  expect(text).toContain('slow_axis: 23.5 deg')
  expect(complaints).toEqual([])
})

test('a picked file opens; one that misses its tables says so; a picked folder has them', async () => {
  const file = join(ROOT, 'stacks', 'tide-board.stack.yaml')
  const { page, complaints } = await visit(browser, address)
  await page.locator('input[type="file"]').first().setInputFiles(file)
  await shown(page)
  expect(await figure(page, 'luminous_reflectance')).toBe(await byCommand('tide-board.stack.yaml'))
  await page.getByRole('button', { name: 'open' }).click()
  await page
    .locator('input[type="file"]')
    .first()
    .setInputFiles(join(ROOT, 'stacks', 'dive-computer.stack.yaml'))
  await page.locator('.problems', { hasText: 'the file cannot be read' }).waitFor()
  await page.getByRole('button', { name: 'open' }).click()
  await page.locator('input[type="file"]').last().setInputFiles(join(ROOT, 'stacks'))
  await page.getByRole('heading', { name: 'picked' }).waitFor()
  await page.getByRole('button', { name: 'dive-computer.stack.yaml' }).first().click()
  await shown(page)
  expect(await figure(page, 'luminous_reflectance')).toBe(await byCommand('dive-computer.stack.yaml'))
  expect(complaints).toEqual([])
})

test('charts go out as SVG: well-formed, with the letters of the chart', async () => {
  const { page } = await visit(browser, `${address}#demo=dive-computer.stack.yaml`)
  await shown(page)
  const texts: string[] = []
  page.on('download', async (download) => void texts.push(readFileSync(await download.path(), 'utf8')))
  await page.getByText('export', { exact: true }).click()
  await page.getByRole('button', { name: 'charts, SVG' }).click()
  await expect.poll(() => texts.length).toBe(3)
  for (const text of texts) {
    const faults = await page.evaluate(
      (svg) => new DOMParser().parseFromString(svg, 'image/svg+xml').querySelectorAll('parsererror').length,
      text,
    )
    expect(faults).toBe(0)
  }
  expect(texts.join()).toContain('wavelength (nm)')
  expect(texts.join()).toContain('b*  (blue − … + yellow)')
})
