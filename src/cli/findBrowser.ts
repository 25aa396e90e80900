import { accessSync, constants } from 'node:fs'
import { delimiter, join } from 'node:path'

/** Names under which Chromium and its relatives stand in PATH. */
const COMMANDS = [
  'chromium',
  'chromium-browser',
  'google-chrome-stable',
  'google-chrome',
  'microsoft-edge-stable',
  'microsoft-edge',
]

const PROGRAM_FOLDERS = ['PROGRAMFILES', 'PROGRAMFILES(X86)', 'LOCALAPPDATA']

const PLACES: Partial<Readonly<Record<NodeJS.Platform, readonly string[]>>> = {
  darwin: [
    '/Applications/Google Chrome.app/Contents/MacOS/Google Chrome',
    '/Applications/Chromium.app/Contents/MacOS/Chromium',
    '/Applications/Microsoft Edge.app/Contents/MacOS/Microsoft Edge',
  ],
  win32: PROGRAM_FOLDERS.flatMap((variable) => process.env[variable] ?? []).flatMap((folder) => [
    join(folder, 'Google', 'Chrome', 'Application', 'chrome.exe'),
    join(folder, 'Microsoft', 'Edge', 'Application', 'msedge.exe'),
  ]),
}

/** Variable that names a browser to be used instead of the one found. */
export const BROWSER_VARIABLE = 'OFFBLACK_BROWSER'

/** A Chromium, Chrome or Edge of this machine; undefined where there is none. */
export function findBrowser(): string | undefined {
  const named = process.env[BROWSER_VARIABLE]
  if (named !== undefined && named !== '') return isProgram(named) ? named : undefined
  const folders = (process.env.PATH ?? '').split(delimiter).filter((folder) => folder !== '')
  const inPath = folders.flatMap((folder) => COMMANDS.map((command) => join(folder, command)))
  return [...(PLACES[process.platform] ?? []), ...inPath].find(isProgram)
}

function isProgram(path: string): boolean {
  try {
    accessSync(path, constants.X_OK)
    return true
  } catch {
    return false
  }
}
