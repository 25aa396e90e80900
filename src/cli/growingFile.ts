import { type FileHandle, mkdir, open, rename, rm } from 'node:fs/promises'
import { basename, dirname, join } from 'node:path'
import { outputErrorFrom } from './outputError.js'

/**
 * A file too long for memory, written while its content comes. It grows beside its name and takes the name when it is
 * complete, so that a reader finds the old file or the new one.
 */
export class GrowingFile {
  private readonly partial: string
  private handle: FileHandle | undefined

  constructor(private readonly path: string) {
    this.partial = join(dirname(path), `.${basename(path)}.${process.pid}.partial`)
  }

  /** @throws OutputError */
  async append(text: string): Promise<void> {
    try {
      this.handle ??= await this.begin()
      await this.handle.appendFile(text)
    } catch (error) {
      await this.discard()
      throw outputErrorFrom(error, this.path)
    }
  }

  /** Gives the file its name; nothing where nothing was written. @throws OutputError */
  async complete(): Promise<void> {
    if (this.handle === undefined) return
    try {
      await this.handle.sync()
      await this.handle.close()
      await rename(this.partial, this.path)
    } catch (error) {
      await this.discard()
      throw outputErrorFrom(error, this.path)
    }
  }

  /** Leaves no trace of it. */
  async discard(): Promise<void> {
    await this.handle?.close().catch(() => undefined)
    await rm(this.partial, { force: true }).catch(() => undefined)
  }

  private async begin(): Promise<FileHandle> {
    await mkdir(dirname(this.path), { recursive: true })
    return open(this.partial, 'w')
  }
}
