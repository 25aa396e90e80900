import { execFileSync } from 'node:child_process'
import { existsSync } from 'node:fs'
import { type Browser, chromium } from 'playwright-core'

const PLACES = [
  '/usr/bin/chromium',
  '/usr/bin/chromium-browser',
  '/usr/bin/google-chrome',
  '/usr/lib/chromium/chromium',
]

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
  return chromium.launch({ executablePath: findChromium() ?? installChromium(), args: FLAGS })
}

function findChromium(): string | undefined {
  const named = process.env.CHROMIUM
  return [...(named === undefined ? [] : [named]), ...PLACES].find((path) => existsSync(path))
}

function installChromium(): string {
  const advice =
    'No Chromium was found. Install one (Debian: apt-get install chromium), or name the program in the variable CHROMIUM.'
  if (process.getuid?.() !== 0 || !existsSync('/usr/bin/apt-get')) throw new Error(advice)
  try {
    const quiet = { stdio: ['ignore', 'ignore', 'inherit'] } as const
    execFileSync('apt-get', ['update', '-qq'], quiet)
    execFileSync('apt-get', ['install', '-y', '-qq', '--no-install-recommends', 'chromium', 'fonts-liberation'], quiet)
  } catch (error) {
    throw new Error(`${advice} Installing Debian's failed: ${error instanceof Error ? error.message : error}`)
  }
  const found = findChromium()
  if (found === undefined) throw new Error(advice)
  return found
}
