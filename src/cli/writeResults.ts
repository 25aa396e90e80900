import type { Context } from './context.js'
import { writeInto } from './writeWhole.js'

/** Writes the files of a result into the folder of `--out`, where one is named. */
export async function writeResults(
  { options: { out }, terminal }: Context,
  makeFiles: (folder: string) => Promise<ReadonlyMap<string, string | Uint8Array>>,
): Promise<void> {
  if (out === undefined) return
  const files = await makeFiles(out)
  await writeInto(out, files)
  terminal.note(`\nwritten to ${out}:\n${[...files.keys()].map((name) => `  ${name}\n`).join('')}`)
}
