import { readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { offblack } from '../cli/offblack.js'
import { launchChromium } from './chromium.js'
import { startTune, type TuneProcess } from './tuneProcess.js'
import { figure, shown, visit } from './visit.js'

const FILE = 'dive-computer.stack.yaml'

let browser: Browser
let tune: TuneProcess
beforeAll(async () => {
  ;[browser, tune] = await Promise.all([launchChromium(), startTune(FILE)])
})
afterAll(async () => {
  await browser.close()
  await tune.stop()
})

const field = (page: Page, path: string) => page.locator(`input[data-path="${path}"]`).first()
const dial = (page: Page, layer: string) => page.getByRole('slider', { name: `${layer} axis` })
const axisOf = async (page: Page, layer: string) => Number(await dial(page, layer).getAttribute('aria-valuenow'))

/** Head-on luminous reflectance by the command, percent with the page's decimals. */
async function byCommand(...sets: string[]): Promise<number> {
  const { stdout } = await offblack(['evaluate', FILE, '--json', ...sets.flatMap((set) => ['--set', set])], tune.folder)
  return Number((100 * JSON.parse(stdout).directions[0].luminous_reflectance).toFixed(3))
}

describe('turning a film', () => {
  test('by number: figures are those of the command, undo and redo go back and forth', async () => {
    const { page, complaints } = await visit(browser, tune.address)
    await shown(page)
    const before = await byCommand()
    expect(await figure(page, 'luminous_reflectance')).toBe(before)
    await field(page, 'quarter.retardance').fill('0.15 um')
    await field(page, 'quarter.retardance').press('Enter')
    await expect.poll(() => figure(page, 'luminous_reflectance')).toBe(await byCommand('quarter.retardance=150nm'))
    await page.getByRole('button', { name: 'undo' }).click()
    await expect.poll(() => figure(page, 'luminous_reflectance')).toBe(before)
    expect(await field(page, 'quarter.retardance').inputValue()).toBe('140 nm')
    await page.getByRole('button', { name: 'redo' }).click()
    await expect.poll(() => field(page, 'quarter.retardance').inputValue()).toBe('150 nm')
    expect(complaints).toEqual([])
  })

  test('by number: what is no length is told as such and changes nothing', async () => {
    const { page } = await visit(browser, tune.address)
    await shown(page)
    await field(page, 'half.retardance').fill('270 deg')
    await field(page, 'half.retardance').press('Enter')
    await page.getByText('allowed: a length such as 138 nm').waitFor()
    expect(await page.getByRole('button', { name: 'undo' }).isDisabled()).toBe(true)
  })

  test('by dragging its axis, as one step; the wrong way round never', async () => {
    const { page, complaints } = await visit(browser, tune.address)
    await shown(page)
    const box = (await dial(page, 'half').boundingBox()) ?? { x: 0, y: 0, width: 0, height: 0 }
    const [cx, cy] = [box.x + box.width / 2, box.y + box.height / 2]
    const at = (degrees: number): [number, number] => [
      cx + 60 * Math.cos((degrees * Math.PI) / 180),
      cy - 60 * Math.sin((degrees * Math.PI) / 180),
    ]
    await page.mouse.move(cx + 18, cy)
    await page.mouse.down()
    for (let degrees = 0; degrees <= 30; degrees += 3) await page.mouse.move(...at(degrees))
    await page.mouse.up()
    // Thirty degrees counter-clockwise, as the viewer sees it, within a pixel at 60 px.
    expect(Math.abs((await axisOf(page, 'half')) - 52.5)).toBeLessThan(1)
    const turned = await axisOf(page, 'half')
    await expect.poll(() => figure(page, 'luminous_reflectance')).toBe(await byCommand(`half.slow_axis=${turned}deg`))
    await page.getByRole('button', { name: 'undo' }).click()
    await expect.poll(() => axisOf(page, 'half')).toBe(22.5)
    expect(complaints).toEqual([])
  })

  test('by keyboard: 1°, with Shift 5°, with Alt 0.1°', async () => {
    const { page } = await visit(browser, tune.address)
    await shown(page)
    await dial(page, 'quarter').focus()
    await page.keyboard.press('ArrowUp')
    await expect.poll(() => axisOf(page, 'quarter')).toBe(91)
    await page.keyboard.press('Shift+ArrowUp')
    await expect.poll(() => axisOf(page, 'quarter')).toBe(96)
    await page.keyboard.press('Alt+ArrowDown')
    await expect.poll(() => axisOf(page, 'quarter')).toBe(95.9)
  })
})

describe('keeping a state', () => {
  test('a copied link restores it, without the token in it', async () => {
    const { page } = await visit(browser, tune.address, { permissions: ['clipboard-read', 'clipboard-write'] })
    await shown(page)
    await field(page, 'half.slow_axis').fill('15.25 deg')
    await field(page, 'half.slow_axis').press('Enter')
    await page.getByRole('button', { name: 'copy link' }).click()
    await page.getByText('copied').waitFor()
    const link = await page.evaluate(() => navigator.clipboard.readText())
    expect(link).not.toContain(tune.token)
    const wanted = await byCommand('half.slow_axis=15.25deg')
    await page.reload()
    await shown(page)
    await expect.poll(() => figure(page, 'luminous_reflectance')).toBe(wanted)
    const other = await page.context().newPage()
    await other.goto(link)
    await shown(other)
    expect(await field(other, 'half.slow_axis').inputValue()).toBe('15.25 deg')
  })

  test('two states stand side by side', async () => {
    const { page } = await visit(browser, tune.address)
    await shown(page)
    await page.getByRole('button', { name: 'hold to compare' }).click()
    await field(page, 'half.slow_axis').fill('15 deg')
    await field(page, 'half.slow_axis').press('Enter')
    const row = page.locator('tr[data-metric="luminous_reflectance"] td')
    await expect
      .poll(() => row.allTextContents())
      .toEqual([(await byCommand()).toFixed(3), (await byCommand('half.slow_axis=15deg')).toFixed(3), '%'])
    await page.locator('canvas[data-chart="cone-before"]').waitFor()
    await page.getByRole('button', { name: 'back to before' }).click()
    await expect.poll(() => axisOf(page, 'half')).toBe(22.5)
  })

  test('a file that changed on disk is not overwritten', async () => {
    const path = join(tune.folder, 'survey-watch.stack.yaml')
    const { page } = await visit(browser, tune.address.replace(FILE, 'survey-watch.stack.yaml'))
    await shown(page)
    const changed = `${readFileSync(path, 'utf8')}\n# changed by another hand\n`
    writeFileSync(path, changed)
    await page.getByRole('button', { name: 'save' }).click()
    await page.getByText('changed on disk since it was opened').waitFor()
    expect(readFileSync(path, 'utf8')).toBe(changed)
  })
})

test('a bad file is told in the words of the command', async () => {
  const text = readFileSync(join(tune.folder, FILE), 'utf8')
  const bad = text.replace('retardance: 270 nm', 'retardanse: 270 nm').replace('slow_axis: 90 deg', 'slow_axis: 90 nm')
  writeFileSync(join(tune.folder, 'bad.stack.yaml'), bad)
  const { stderr, code } = await offblack(['check', 'bad.stack.yaml'], tune.folder)
  expect(code).toBe(2)
  const { page } = await visit(browser, tune.address.replace(FILE, 'bad.stack.yaml'))
  const told = (await page.locator('.problems').textContent()) ?? ''
  expect(told.trim()).toBe(stderr.trim())
  expect(told).toContain('bad.stack.yaml:')
})
