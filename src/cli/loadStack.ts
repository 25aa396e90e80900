import { problemText } from '../report/problemText.js'
import { InputError } from '../stack/problem.js'
import { readStack } from '../stack/readStack.js'
import type { Stack } from '../stack/stack.js'
import type { Context } from './context.js'
import { readText } from './readText.js'
import { stackFilesOnDisk } from './stackFilesOnDisk.js'

export interface LoadedStack {
  readonly stack: Stack
  /** The file as it was, without what `--set` changed. */
  readonly text: string
}

/**
 * The stack of the command line, `--set` applied; warnings are told.
 * @throws InputError with every problem
 */
export async function loadStack({ file, options, terminal }: Context): Promise<LoadedStack> {
  const text = readText(file)
  const reading = await readStack(text, { file, files: stackFilesOnDisk(file), sets: options.set })
  if (!reading.ok) throw new InputError(reading.problems, reading.texts)
  if (reading.warnings.length > 0)
    terminal.note(`${problemText(reading.warnings, reading.texts, terminal.notePaint)}\n`)
  return { stack: reading.stack, text }
}

/** The question a verb answers; an error that says how to ask it where the file does not. */
export function requireQuestion<Key extends 'optimize' | 'tolerance' | 'compare' | 'fit'>(
  stack: Stack,
  key: Key,
  file: string,
): NonNullable<Stack[Key]> {
  const question = stack[key]
  if (question !== undefined) return question as NonNullable<Stack[Key]>
  throw new InputError([
    {
      severity: 'error',
      code: 'missing_section',
      path: key,
      file,
      message: `the file has no section "${key}", which is what this verb answers`,
      next: `add a section "${key}"; offblack schema tells its fields, stacks/dive-computer.stack.yaml has one`,
    },
  ])
}
