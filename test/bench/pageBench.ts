/**
 * How long the tuning page computes and draws when a film is turned: `npm run build && npm run bench:page`. A nine-layer
 * laminate at 81 wavelengths (the dive computer) is turned fifty times in a real browser; medians, in the page and in
 * its engine. Beside them the same questions asked of the command, start of the program and reading of the files included.
 */

import { spawnSync } from 'node:child_process'
import { join } from 'node:path'
import { launchChromium } from '../page/chromium.js'
import { startTune } from '../page/tuneProcess.js'
import { shown, visit } from '../page/visit.js'
import { ROOT } from '../sourceFiles.js'

const FILE = 'dive-computer.stack.yaml'
const TURNS = 50
const COMMANDS = 5

interface Turn {
  readonly viewMs: number
  readonly drawMs: number
  readonly coneMs: number
}

const tune = await startTune(FILE)
const browser = await launchChromium()
try {
  const { page } = await visit(browser, tune.address)
  await shown(page)
  const turns: Turn[] = []
  for (let k = 0; k < TURNS; k++) turns.push(await page.evaluate(turnOnce))
  report(
    'page: figures and spectra, computed',
    turns.map(({ viewMs }) => viewMs),
    16,
  )
  report(
    'page: charts of one turn, drawn',
    turns.map(({ drawMs }) => drawMs),
  )
  report(
    'page: cone 10° × 15° to 60°, computed',
    turns.map(({ coneMs }) => coneMs),
    100,
  )
  report('command: evaluate, from start to end', commandTimes('evaluate', FILE, '--json'))
  report(
    'command: cone, from start to end',
    commandTimes('cone', FILE, '--json', '--theta-max', '60', '--theta-step', '10', '--phi-step', '15'),
  )
} finally {
  await browser.close()
  await tune.stop()
}

/** Runs in the page: one degree further, until figures and cone have followed. */
async function turnOnce(): Promise<Turn> {
  const frame = (): Promise<number> => new Promise((resolve) => requestAnimationFrame(resolve))
  const figure = (): string => document.querySelector('tr[data-metric="luminous_reflectance"] td')?.textContent ?? ''
  const footer = (): DOMStringMap => document.querySelector('footer')?.dataset ?? {}
  const [before, coneBefore] = [figure(), footer().coneMs]
  performance.clearMeasures('draw')
  const dial = document.querySelector('[role="slider"][aria-label="quarter axis"]')
  dial?.dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowUp', bubbles: true }))
  while (figure() === before) await frame()
  for (let k = 0; k < 600 && footer().coneMs === coneBefore; k++) await frame()
  await frame()
  const drawn = performance.getEntriesByName('draw').reduce((sum, { duration }) => sum + duration, 0)
  return { viewMs: Number(footer().viewMs), drawMs: drawn, coneMs: Number(footer().coneMs) }
}

function commandTimes(...args: string[]): number[] {
  const times: number[] = []
  for (let k = 0; k < COMMANDS; k++) {
    const start = performance.now()
    // Exit code 3: a limit is not met.
    spawnSync(process.execPath, [join(ROOT, 'bin', 'offblack.js'), ...args], { cwd: tune.folder })
    times.push(performance.now() - start)
  }
  return times
}

function report(name: string, times: readonly number[], budgetMs?: number): void {
  const sorted = [...times].sort((a, b) => a - b)
  const median = sorted[Math.floor(sorted.length / 2)]
  const budget = budgetMs === undefined ? '' : `  (budget ${budgetMs} ms)`
  console.log(`${name.padEnd(42)} ${median.toFixed(1).padStart(8)} ms, median of ${times.length}${budget}`)
}
