import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { stackFilesOnDisk } from '../../src/cli/stackFilesOnDisk.js'
import { type Reading, readStack } from '../../src/stack/readStack.js'
import type { Stack } from '../../src/stack/stack.js'
import { ROOT } from '../sourceFiles.js'

export const STACKS_FOLDER = join(ROOT, 'stacks')

/** File names of the demo stacks. */
export const DEMO_STACKS: readonly string[] = readdirSync(STACKS_FOLDER).filter((name) => name.endsWith('.stack.yaml'))

export function demoText(name: string): string {
  return readFileSync(join(STACKS_FOLDER, name), 'utf8')
}

/** Reads a demo stack; `touched` collects the files it uses, relative to `stacks/`. */
export async function readDemo(
  name: string,
  sets: readonly string[] = [],
  touched: Set<string> = new Set(),
): Promise<Reading> {
  const onDisk = stackFilesOnDisk(join(STACKS_FOLDER, name))
  const read = (path: string): string | undefined => {
    touched.add(path)
    return onDisk.read(path)
  }
  return readStack(demoText(name), { file: name, files: { ...onDisk, read }, sets })
}

/** The checked stack; throws with the problems where there are any. */
export async function demoStack(name: string, sets: readonly string[] = []): Promise<Stack> {
  const reading = await readDemo(name, sets)
  if (reading.ok) return reading.stack
  throw new Error(reading.problems.map(({ path, message }) => `${name}: ${path}: ${message}`).join('\n'))
}
