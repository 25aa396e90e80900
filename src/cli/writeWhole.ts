import { constants } from 'node:fs'
import { access, mkdir, open, realpath, rename, rm, stat } from 'node:fs/promises'
import { basename, dirname, join, resolve } from 'node:path'
import { OutputError, outputErrorFrom } from './outputError.js'

let written = 0

/**
 * Writes a file whole or not at all: the bytes go to a file beside it, onto the disk, and under the name only then. A reader, or
 * a crash at any moment, finds the old file or the new one.
 * @throws OutputError
 */
export async function writeWhole(path: string, data: string | Uint8Array): Promise<void> {
  // A link is kept, and the file it points to is replaced.
  const target = await realpath(path).catch(() => path)
  const partial = join(dirname(target), `.${basename(target)}.${process.pid}-${++written}.partial`)
  try {
    const mode = await stat(target).then(
      ({ mode }) => mode,
      () => 0o666,
    )
    const file = await open(partial, 'wx', mode)
    try {
      // Unlike a bare write, writeFile goes on after a short write: a disk that fills up is an error, not a shorter file.
      await file.writeFile(data)
      await file.sync()
    } finally {
      await file.close()
    }
    await rename(partial, target)
  } catch (error) {
    await rm(partial, { force: true }).catch(() => undefined)
    throw outputErrorFrom(error, path)
  }
}

/** Writes files into a folder, which is made where it is missing. */
export async function writeInto(folder: string, files: ReadonlyMap<string, string | Uint8Array>): Promise<void> {
  try {
    await mkdir(folder, { recursive: true })
  } catch (error) {
    throw outputErrorFrom(error, folder)
  }
  for (const [name, data] of files) await writeWhole(join(folder, name), data)
}

/**
 * Finds out before a long computation whether its results can be written into the folder; makes nothing.
 * @throws OutputError
 */
export async function checkFolder(folder: string): Promise<void> {
  let existing = resolve(folder)
  for (;;) {
    const found = await stat(existing).catch(() => undefined)
    if (found?.isDirectory()) break
    if (found !== undefined)
      throw new OutputError(folder, `${existing} is a file, not a folder`, 'name another folder with --out')
    existing = dirname(existing)
  }
  await access(existing, constants.W_OK).catch((error) => {
    throw outputErrorFrom(error, folder)
  })
}
