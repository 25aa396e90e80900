import { closeSync, fstatSync, openSync, readdirSync, readSync } from 'node:fs'
import { basename, dirname, join } from 'node:path'
import { nearestName } from '../stack/nearestName.js'
import { InputError, type Problem } from '../stack/problem.js'

/** Largest file read, bytes: a hundred thousand rows of a measurement are 4 MB. */
const LARGEST_BYTES = 32 * 1024 * 1024
const CHUNK_BYTES = 1024 * 1024

/**
 * The text of a file, UTF-8, without byte order mark.
 * @throws InputError where there is no such file, or where it is no text or too large
 */
export function readText(path: string): string {
  const bytes = readBytes(path)
  if (bytes.includes(0)) {
    const next = 'save it as UTF-8 text'
    throw inputError(path, {
      code: 'not_text',
      message: 'the file is not UTF-8 text',
      received: 'a zero byte, which no text holds',
      next,
    })
  }
  return new TextDecoder().decode(bytes)
}

function readBytes(path: string): Buffer {
  let file: number | undefined
  try {
    file = openSync(path, 'r')
    return readToBound(file, path)
  } catch (error) {
    throw error instanceof InputError ? error : inputError(path, openingFault(error, path))
  } finally {
    if (file !== undefined) closeSync(file)
  }
}

/** Counts as it reads: a pipe or device does not say its size beforehand. */
function readToBound(file: number, path: string): Buffer {
  const chunks: Buffer[] = []
  let total = 0
  for (;;) {
    const chunk = Buffer.allocUnsafe(CHUNK_BYTES)
    const count = readSync(file, chunk)
    if (count === 0) return Buffer.concat(chunks, total)
    chunks.push(chunk.subarray(0, count))
    total += count
    if (total > LARGEST_BYTES) throw inputError(path, tooLarge(Math.max(total, fstatSync(file).size)))
  }
}

type FileFault = Pick<Problem, 'code' | 'message' | 'received' | 'allowed' | 'suggestion' | 'next'>

function openingFault(error: unknown, path: string): FileFault {
  const code = error instanceof Error && 'code' in error ? String(error.code) : ''
  if (code === 'ENOENT' || code === 'ENOTDIR') {
    const suggestion = neighborOf(path)
    const next = 'check the name and the folder'
    return {
      code: 'missing_file',
      message: 'there is no such file',
      next,
      ...(suggestion !== undefined && { suggestion }),
    }
  }
  if (code === 'EISDIR') return { code: 'unreadable_file', message: 'this is a folder', next: 'name a file in it' }
  if (code === 'EACCES' || code === 'EPERM') {
    return { code: 'unreadable_file', message: 'no permission to read the file', next: 'ask its owner for permission' }
  }
  return { code: 'unreadable_file', message: `the file cannot be read (${code || String(error)})` }
}

/** The file of a similar name in the same folder. */
function neighborOf(path: string): string | undefined {
  try {
    const near = nearestName(basename(path), readdirSync(dirname(path)))
    return near === undefined ? undefined : join(dirname(path), near)
  } catch {
    return undefined
  }
}

function tooLarge(size: number): FileFault {
  const megabytes = (bytes: number): string => `${Math.round(bytes / 1024 / 1024)} MB`
  return {
    code: 'too_large',
    message: 'the file is too large',
    received: megabytes(size),
    allowed: `at most ${megabytes(LARGEST_BYTES)}`,
    next: 'keep only the rows and columns that are needed',
  }
}

function inputError(file: string, fault: FileFault): InputError {
  return new InputError([{ severity: 'error', path: '', file, ...fault }])
}
