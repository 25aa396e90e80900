import { type ExecFileSyncOptions, execFileSync } from 'node:child_process'
import { existsSync } from 'node:fs'
import { type Browser, chromium } from 'playwright-core'
import { BROWSER_VARIABLE, findBrowser } from '../../src/cli/findBrowser.js'

/** Without these, a browser calls home at every start; a container has no sandbox to give. */
const FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
]

/** A headless Chromium: the one at hand, or Debian's, installed where the user may. */
export async function launchChromium(): Promise<Browser> {
  return chromium.launch({ executablePath: findBrowser() ?? installChromium(), args: FLAGS })
}

function installChromium(): string {
  const advice = `No Chromium was found. Install one (Debian: apt-get install chromium), or name one in the variable ${BROWSER_VARIABLE}.`
  if (process.getuid?.() !== 0 || !existsSync('/usr/bin/apt-get')) throw new Error(advice)
  try {
    const quiet: ExecFileSyncOptions = { stdio: ['ignore', 'ignore', 'inherit'] }
    execFileSync('apt-get', ['update', '-qq'], quiet)
    execFileSync('apt-get', ['install', '-y', '-qq', '--no-install-recommends', 'chromium', 'fonts-liberation'], quiet)
  } catch (error) {
    throw new Error(`${advice} Installing Debian's failed: ${error instanceof Error ? error.message : error}`)
  }
  const found = findBrowser()
  if (found === undefined) throw new Error(advice)
  return found
}
