import { dirname, isAbsolute, join, relative, sep } from 'node:path'
import { rebaseFiles } from '../stack/rebaseFiles.js'
import type { Stack } from '../stack/stack.js'
import { applyToText } from '../stack/writeStack.js'

/** A stack file as the user wrote it, with what `--set` changed. */
export interface WrittenStack {
  readonly file: string
  readonly text: string
  readonly stack: Stack
  readonly sets: readonly string[]
}

/**
 * Text of the stack file with new values (nm, rad, fractions), to stand in `folder`: comments and order stay, and the files it
 * names are still found.
 */
export function improvedStack(
  { file, text, stack, sets }: WrittenStack,
  values: Readonly<Record<string, number>>,
  folder: string,
): string {
  const toFolder = (path: string): string => {
    if (isAbsolute(path)) return path
    return relative(folder, join(dirname(file), path))
      .split(sep)
      .join('/')
  }
  return rebaseFiles(applyToText(text, stack, values, sets), toFolder)
}
