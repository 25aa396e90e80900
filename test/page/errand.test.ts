import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { offblack } from '../cli/offblack.js'
import { launchChromium } from './chromium.js'
import { startTune, type TuneProcess } from './tuneProcess.js'
import { shown, visit } from './visit.js'

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

test('an engineer opens the dive computer, sees limits missed, optimizes, saves; the command agrees to the digit', async () => {
  const { page, complaints } = await visit(browser, tune.address)
  await shown(page)
  await expect.poll(() => page.locator('.verdict').textContent()).toBe('3 of 5 met')
  expect(await page.locator('.limits .missed').count()).toBe(2)

  const command = await offblack(['optimize', FILE, '--json'], tune.folder)
  await page.getByRole('button', { name: 'optimize' }).click()
  await page.getByRole('button', { name: /^stop/ }).waitFor()
  await page.locator('.families li').first().waitFor({ timeout: 120_000 })
  await expect.poll(() => page.locator('.verdict').textContent()).not.toBe('3 of 5 met')

  const before = readFileSync(join(tune.folder, FILE), 'utf8')
  await page.getByRole('button', { name: 'save *' }).click()
  await page.getByText(`saved ${FILE}`).waitFor()
  const after = readFileSync(join(tune.folder, FILE), 'utf8')
  expect(after).not.toBe(before)
  // Comments are the engineer's own and stay.
  expect(after.match(/#.*/g)).toEqual(before.match(/#.*/g))

  await page.getByText('export', { exact: true }).click()
  const download = page.waitForEvent('download')
  await page.getByRole('button', { name: 'spectra, CSV' }).click()
  const csv = readFileSync(await (await download).path(), 'utf8')
  const evaluated = JSON.parse((await offblack(['evaluate', FILE, '--json'], tune.folder)).stdout)
  const spectra: number[] = evaluated.directions.flatMap((d: Evaluated) => d.spectrum.reflectance)
  // Two releases of the JavaScript engine: a sine may differ in its last bit, 1e-16.
  const differences = reflectances(csv).map((value, k) => Math.abs(value - spectra[k]))
  expect(differences.length).toBe(spectra.length)
  expect(Math.max(...differences)).toBeLessThan(1e-15)
  for (const limit of evaluated.limits) {
    expect(await page.locator('.limits').textContent()).toContain(shownAs(limit))
  }
  // The same search as the command's: same seed, same digits.
  const best = JSON.parse(command.stdout).best.objective
  expect(await page.locator('.families button').first().textContent()).toBe(`${(100 * best).toFixed(3)} %`)
  expect(complaints).toEqual([])
}, 240_000)

interface Evaluated {
  readonly spectrum: { readonly reflectance: readonly number[] }
}

function reflectances(csv: string): number[] {
  const [heading, ...rows] = csv.trim().split('\r\n')
  const column = heading.split(',').indexOf('reflectance')
  return rows.map((row) => Number(row.split(',')[column]))
}

function shownAs({ metric, value }: { readonly metric: string; readonly value: number }): string {
  return metric === 'chroma' ? value.toFixed(2) : `${(100 * value).toFixed(3)} %`
}
