import type { StackFiles } from './stackFiles.js'

/** What was asked of the files around a stack file, and what came: enough to read the stack again where there is no disk. */
export interface FilesRecord {
  readonly reads: Readonly<Record<string, string>>
  readonly lists: Readonly<Record<string, readonly string[]>>
}

/** A stack file with all it needs, as plain data. */
export interface StackBundle extends FilesRecord {
  /** Name shown in problems. */
  readonly file: string
  readonly text: string
}

/** Passes every question on and writes question and answer down. */
export function recordingFiles(files: StackFiles): { readonly files: StackFiles; readonly record: () => FilesRecord } {
  const reads = new Map<string, string>()
  const lists = new Map<string, readonly string[]>()
  return {
    files: {
      read: (path) => {
        const text = files.read(path)
        if (text !== undefined) reads.set(path, text)
        return text
      },
      list: (glob) => {
        const found = files.list(glob)
        lists.set(glob, found)
        return found
      },
    },
    record: () => ({ reads: Object.fromEntries(reads), lists: Object.fromEntries(lists) }),
  }
}

/**
 * Files that answer as they did when the record was made. A pattern nobody asked for then is matched against the files that
 * were read.
 */
export function recordedFiles({ reads, lists }: FilesRecord): StackFiles {
  return {
    read: (path) => (Object.hasOwn(reads, path) ? reads[path] : undefined),
    list: (glob) => (Object.hasOwn(lists, glob) ? lists[glob] : Object.keys(reads).filter(matching(glob)).sort()),
  }
}

function matching(glob: string): (path: string) => boolean {
  const pieces = glob.split(/\*+/).map((piece) => piece.replace(/[.+?^${}()|[\]\\]/g, '\\$&'))
  const pattern = new RegExp(`^${pieces.join('[^/]*')}$`)
  return (path) => pattern.test(path)
}
