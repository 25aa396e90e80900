/** What the README shows is what the program prints. */
import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { expect, it } from 'vitest'
import { offblack, workFolder } from '../cli/offblack.js'
import { ROOT } from '../sourceFiles.js'

const COMMAND = '$ node bin/offblack.js '
/** Stands for lines left out. */
const LEFT_OUT = '…'

interface Shown {
  readonly args: readonly string[]
  readonly lines: readonly string[]
}

function shownIn(readme: string): Shown[] {
  const blocks = [...readme.matchAll(/^```console\n(.*?)^```$/gms)].map(([, block]) => block.trimEnd().split('\n'))
  return blocks.map(([command, ...lines]) => {
    if (!command.startsWith(COMMAND)) throw new Error(`not a command of offblack: ${command}`)
    return { args: command.slice(COMMAND.length).split(' '), lines }
  })
}

/** The first line that the output does not hold where it should stand; undefined where all agree. */
function firstStray(shown: readonly string[], printed: readonly string[]): string | undefined {
  let next = 0
  let maySkip = false
  for (const line of shown) {
    if (line === LEFT_OUT) {
      maySkip = true
      continue
    }
    const found = maySkip ? printed.indexOf(line, next) : next
    if (found < 0 || printed[found] !== line) return line
    next = found + 1
    maySkip = false
  }
  return undefined
}

it('quotes what the commands print, in the order of the tour', { timeout: 900_000 }, async () => {
  const tour = shownIn(readFileSync(join(ROOT, 'README.md'), 'utf8'))
  const folder = workFolder()
  const strays: unknown[] = []
  for (const { args, lines } of tour) {
    const { stdout, stderr } = await offblack(args, folder)
    const line = firstStray(lines, stdout.split('\n'))
    if (line !== undefined) strays.push({ command: args.join(' '), line, stderr })
  }
  expect(tour.length).toBeGreaterThan(8)
  expect(strays).toEqual([])
})
