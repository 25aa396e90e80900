import type { Problem } from '../../src/stack/problem.js'
import { type ReadOptions, readStack } from '../../src/stack/readStack.js'
import type { Stack } from '../../src/stack/stack.js'
import type { StackFiles } from '../../src/stack/stackFiles.js'

/** The checked stack; throws with the problems where there are any. */
export async function stackOf(text: string, options: Partial<ReadOptions> = {}): Promise<Stack> {
  const reading = await readStack(text, { file: 'test.stack.yaml', ...options })
  if (reading.ok) return reading.stack
  throw new Error(reading.problems.map(({ path, message }) => `${path}: ${message}`).join('\n'))
}

/** The problems; none where the file is right. */
export async function problemsOf(text: string, options: Partial<ReadOptions> = {}): Promise<readonly Problem[]> {
  const reading = await readStack(text, { file: 'test.stack.yaml', ...options })
  return reading.ok ? [] : reading.problems
}

/** Files kept in memory, `*` in the last part of a pattern alone. */
export function filesFrom(texts: Readonly<Record<string, string>>): StackFiles {
  return {
    read: (path) => (Object.hasOwn(texts, path) ? texts[path] : undefined),
    list: (glob) => {
      const [head, tail] = glob.split('*')
      const matches = (path: string) =>
        tail === undefined ? path === head : path.startsWith(head) && path.endsWith(tail)
      return Object.keys(texts).filter(matches).sort()
    },
  }
}
