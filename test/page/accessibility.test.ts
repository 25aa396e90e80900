import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { launchChromium } from './chromium.js'
import { startTune, type TuneProcess } from './tuneProcess.js'
import { figure, shown, visit } from './visit.js'

const FILE = 'dive-computer.stack.yaml'
const AXE = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8')

let browser: Browser
let tune: TuneProcess
beforeAll(async () => {
  ;[browser, tune] = await Promise.all([launchChromium(), startTune(FILE)])
})
afterAll(async () => {
  await browser.close()
  await tune.stop()
})

interface Finding {
  readonly id: string
  readonly nodes: readonly { readonly html: string }[]
}

async function violations(page: Page): Promise<string[]> {
  await page.evaluate(AXE)
  const found = (await page.evaluate('axe.run().then(({violations}) => violations)')) as readonly Finding[]
  return found.flatMap(({ id, nodes }) => nodes.map(({ html }) => `${id}: ${html.slice(0, 160)}`))
}

const ROOMS = (['light', 'dark'] as const).flatMap((colorScheme) =>
  [1280, 820].map((width) => [colorScheme, width] as const),
)

test.each(ROOMS)('axe finds nothing, %s at %d px', async (colorScheme, width) => {
  const { page, complaints } = await visit(browser, tune.address, { colorScheme, viewport: { width, height: 1000 } })
  await shown(page)
  await page.getByRole('button', { name: 'half', exact: true }).click()
  await page.getByRole('button', { name: 'hold to compare' }).click()
  await page.locator('.budget').waitFor()
  expect(await violations(page)).toEqual([])
  await page.getByRole('button', { name: 'open' }).click()
  await page.getByRole('dialog').waitFor()
  expect(await violations(page)).toEqual([])
  expect(await page.evaluate(() => document.documentElement.scrollWidth <= innerWidth)).toBe(true)
  expect(complaints).toEqual([])
})

/** Presses Tab until the element of that role and name has the focus. */
async function tabTo(page: Page, role: 'button' | 'slider', name: string | RegExp): Promise<void> {
  const target = page.getByRole(role, { name, exact: typeof name === 'string' }).first()
  await target.waitFor()
  for (let k = 0; k < 150; k++) {
    if (await target.evaluate((element) => element === document.activeElement)) return
    await page.keyboard.press('Tab')
  }
  throw new Error(`the keyboard does not reach ${name}`)
}

test('keyboard alone loads, turns a film, optimizes, saves', async () => {
  const { page } = await visit(browser, `${tune.origin}/#token=${tune.token}`)
  await tabTo(page, 'button', FILE)
  await page.keyboard.press('Enter')
  await shown(page)
  const before = await figure(page, 'luminous_reflectance')
  await tabTo(page, 'slider', 'half axis')
  await page.keyboard.press('ArrowUp')
  await expect.poll(() => figure(page, 'luminous_reflectance')).not.toBe(before)
  await tabTo(page, 'button', 'optimize')
  await page.keyboard.press('Enter')
  await page.locator('.families li').first().waitFor({ timeout: 120_000 })
  await tabTo(page, 'button', 'save *')
  await page.keyboard.press('Enter')
  await page.getByText(`saved ${FILE}`).waitFor()
}, 240_000)
