import { type ChildProcess, spawn } from 'node:child_process'
import { cpSync, mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { ROOT } from '../sourceFiles.js'

export interface TuneProcess {
  /** A copy of the demo stacks, served. */
  readonly folder: string
  /** With the token. */
  readonly address: string
  readonly origin: string
  readonly token: string
  readonly stop: () => Promise<void>
}

/** `offblack tune` over a copy of the demo stacks; `file` is opened at once. */
export async function startTune(file?: string): Promise<TuneProcess> {
  const folder = mkdtempSync(join(tmpdir(), 'offblack-tune-'))
  cpSync(join(ROOT, 'stacks'), folder, { recursive: true })
  const target = file === undefined ? folder : join(folder, file)
  const child = spawn(process.execPath, [join(ROOT, 'bin/offblack.js'), 'tune', target], { stdio: 'pipe' })
  const address = await firstLine(child)
  const { origin, hash } = new URL(address)
  return {
    folder,
    address,
    origin,
    token: new URLSearchParams(hash.slice(1)).get('token') ?? '',
    stop: async () => {
      const ended = new Promise((resolve) => child.once('exit', resolve))
      child.kill('SIGTERM')
      await ended
      rmSync(folder, { recursive: true, force: true })
    },
  }
}

function firstLine(child: ChildProcess): Promise<string> {
  return new Promise((resolve, reject) => {
    let out = ''
    let notes = ''
    child.stderr?.on('data', (chunk) => {
      notes += chunk
    })
    child.stdout?.on('data', (chunk) => {
      out += chunk
      if (out.includes('\n')) resolve(out.slice(0, out.indexOf('\n')))
    })
    child.once('exit', (code) => reject(new Error(`tune ended with ${code}: ${notes}`)))
  })
}
