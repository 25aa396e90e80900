/** The files around a stack file, passed in by whoever has a disk; paths are relative to the stack file, with `/`. */
export interface StackFiles {
  /** Text of the file; undefined where it cannot be read. */
  read(path: string): string | undefined
  /** Files that match a pattern with `*`, sorted. */
  list(glob: string): readonly string[]
}

/** No file can be reached. */
export const NO_FILES: StackFiles = { read: () => undefined, list: () => [] }

/** `path` as seen from the folder of `file`. */
export function besideFile(file: string, path: string): string {
  const folder = file.slice(0, file.lastIndexOf('/') + 1)
  return isAbsolute(path) ? path : withoutDots(folder + path)
}

function isAbsolute(path: string): boolean {
  return path.startsWith('/') || /^[A-Za-z]:[\\/]/.test(path)
}

function withoutDots(path: string): string {
  const kept: string[] = []
  for (const part of path.split('/')) {
    if (part === '.') continue
    const climbs = part === '..' && kept.length > 0 && kept.at(-1) !== '..' && kept.at(-1) !== ''
    if (climbs) kept.pop()
    else kept.push(part)
  }
  return kept.join('/')
}
