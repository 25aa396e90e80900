import { createHash } from 'node:crypto'
import { readdirSync, realpathSync, statSync } from 'node:fs'
import { basename, dirname, join, relative, resolve, sep } from 'node:path'
import { problemText } from '../../report/problemText.js'
import { InputError } from '../../stack/problem.js'
import { readStack } from '../../stack/readStack.js'
import { recordingFiles, type StackBundle } from '../../stack/recordedFiles.js'
import type { StackFiles } from '../../stack/stackFiles.js'
import { readText } from '../readText.js'
import { stackFilesOnDisk } from '../stackFilesOnDisk.js'
import { writeWhole } from '../writeWhole.js'
import { Refusal } from './refusal.js'

/** What the page may save, by name. */
const STACK_FILE = /^[^\\\0]+\.stack\.ya?ml$/
/** Folders below the served one that are listed, and files at most. */
const DEEPEST = 4
const MOST_LISTED = 2000

export interface ServedStack extends StackBundle {
  /** Digest of the text; a file that changed on disk meanwhile is not overwritten. */
  readonly version: string
}

/** The stack files of one folder, and nothing outside it: paths are checked as written and again with links followed. */
export class ServedFolder {
  private readonly root: string

  constructor(folder: string) {
    this.root = realpathSync(folder)
  }

  get name(): string {
    return basename(this.root)
  }

  /** Paths of the stack files, relative to the folder, with `/`. */
  list(): string[] {
    const found: string[] = []
    const visit = (folder: string, depth: number): void => {
      for (const entry of readdirSync(folder, { withFileTypes: true }).sort((a, b) => a.name.localeCompare(b.name))) {
        if (entry.name.startsWith('.') || entry.name === 'node_modules' || found.length >= MOST_LISTED) continue
        const path = join(folder, entry.name)
        if (entry.isDirectory() && depth < DEEPEST) visit(path, depth + 1)
        else if (entry.isFile() && STACK_FILE.test(entry.name)) found.push(this.shown(path))
      }
    }
    visit(this.root, 0)
    return found
  }

  /** The stack file with all the files it names. */
  async open(file: string): Promise<ServedStack> {
    const path = this.existing(file)
    if (path === undefined || !STACK_FILE.test(file))
      throw new Refusal(404, `there is no stack file ${file} in the folder`)
    const { files, record } = recordingFiles(this.filesAbout(file))
    try {
      const text = readText(path)
      await readStack(text, { file, files })
      return { file, text, ...record(), version: versionOf(text) }
    } catch (error) {
      if (error instanceof InputError) throw new Refusal(422, problemText(error.problems, error.texts))
      throw error
    }
  }

  /**
   * Writes a stack file that reads without an error; `version` is that of the text it replaces, undefined for a new file.
   * Returns the new version.
   */
  async save(file: string, text: string, version: string | undefined): Promise<string> {
    const path = this.forWriting(file)
    const present = this.existing(file)
    if (present !== undefined && version !== versionOf(readText(present))) {
      throw new Refusal(412, `${file} changed on disk since it was opened: open it again, or download the copy`)
    }
    const reading = await readStack(text, { file, files: this.filesAbout(file) })
    if (!reading.ok) throw new Refusal(422, problemText(reading.problems, reading.texts))
    await writeWhole(path, text)
    return versionOf(text)
  }

  private filesAbout(file: string): StackFiles {
    const folder = dirname(resolve(this.root, file))
    const disk = stackFilesOnDisk(join(folder, basename(file)))
    const inside = (path: string): boolean => this.existing(relative(this.root, resolve(folder, path))) !== undefined
    return {
      read: (path) => (inside(path) ? disk.read(path) : undefined),
      list: (glob) => (this.contains(resolve(folder, glob)) ? disk.list(glob).filter(inside) : []),
    }
  }

  /** Where a regular file of the folder really is; undefined where there is none inside. */
  private existing(file: string): string | undefined {
    const path = resolve(this.root, file)
    if (file.includes('\0') || !this.contains(path)) return undefined
    try {
      const real = realpathSync(path)
      return this.contains(real) && statSync(real).isFile() ? real : undefined
    } catch {
      return undefined
    }
  }

  private forWriting(file: string): string {
    const path = resolve(this.root, file)
    const outside = new Refusal(403, 'only stack files (*.stack.yaml) inside the served folder are written')
    if (!STACK_FILE.test(file) || !this.contains(path)) throw outside
    const folder = realpathOf(dirname(path))
    if (folder === undefined || !this.containsOrIs(folder)) throw outside
    const target = join(folder, basename(path))
    const real = realpathOf(target)
    if (real !== undefined && (!this.contains(real) || !statSync(real).isFile())) throw outside
    return real ?? target
  }

  private contains(path: string): boolean {
    return path.startsWith(this.root + sep)
  }

  private containsOrIs(path: string): boolean {
    return path === this.root || this.contains(path)
  }

  private shown(path: string): string {
    return relative(this.root, path).split(sep).join('/')
  }
}

function realpathOf(path: string): string | undefined {
  try {
    return realpathSync(path)
  } catch {
    return undefined
  }
}

function versionOf(text: string): string {
  return createHash('sha256').update(text).digest('hex').slice(0, 32)
}
