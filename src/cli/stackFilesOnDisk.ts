import { readdirSync } from 'node:fs'
import { dirname, isAbsolute, join } from 'node:path'
import { InputError } from '../stack/problem.js'
import type { StackFiles } from '../stack/stackFiles.js'
import { readText } from './readText.js'

/** The files around a stack file: paths are relative to it, or absolute. */
export function stackFilesOnDisk(stackFile: string): StackFiles {
  const folder = dirname(stackFile)
  const place = (path: string): string => (isAbsolute(path) ? path : join(folder, path))
  return {
    read: (path) => readIfThere(place(path)),
    list: (glob) => matches('', glob.split('/'), (path) => namesIn(place(path))),
  }
}

/** Undefined where there is no such file; a file that is there but cannot be used is told with its own reason. */
function readIfThere(path: string): string | undefined {
  try {
    return readText(path)
  } catch (error) {
    if (error instanceof InputError && error.problems[0].code === 'missing_file') return undefined
    throw error
  }
}

/** Paths under `base` that match the parts of a pattern; `*` stands for any characters but `/`, and for no hidden file. */
function matches(base: string, [part, ...rest]: readonly string[], namesOf: (path: string) => string[]): string[] {
  const names = part.includes('*') ? namesOf(base || '.').filter(patternOf(part)) : [part]
  const paths = names.map((name) => `${base}${name}`)
  if (rest.length > 0) return paths.flatMap((path) => matches(`${path}/`, rest, namesOf))
  return part.includes('*') ? paths : paths.filter((path) => namesOf(base || '.').includes(path.slice(base.length)))
}

/** Takes the pieces between the stars one after the other, each at its first place: no pattern makes this slow. */
function patternOf(part: string): (name: string) => boolean {
  const [head, ...pieces] = part.split(/\*+/)
  const tail = pieces.pop() ?? ''
  return (name) => {
    if (name.startsWith('.') && !part.startsWith('.')) return false
    if (!name.startsWith(head) || !name.endsWith(tail) || name.length < head.length + tail.length) return false
    const middle = name.slice(head.length, name.length - tail.length)
    let from = 0
    return pieces.every((piece) => {
      const found = middle.indexOf(piece, from)
      from = found + piece.length
      return found >= 0
    })
  }
}

function namesIn(folder: string): string[] {
  try {
    return readdirSync(folder).sort()
  } catch {
    return []
  }
}
