import { randomBytes } from 'node:crypto'
import { statSync } from 'node:fs'
import { basename, dirname } from 'node:path'
import { fileURLToPath } from 'node:url'
import { InputError } from '../../stack/problem.js'
import type { Context } from '../context.js'
import { EXIT, type ExitCode } from '../exitCode.js'
import { readText } from '../readText.js'
import { readPageFiles } from '../server/pageFiles.js'
import { ServedFolder } from '../server/servedFolder.js'
import { startTuneServer } from '../server/tuneServer.js'

interface TuneOptions {
  readonly port: number
}

/** The build puts the page beside the program. */
const PAGE_FOLDER = new URL('./page/', import.meta.url)

export async function run({ file, options, terminal }: Context<TuneOptions>): Promise<ExitCode> {
  const { folder, name } = placeOf(file)
  const token = randomBytes(24).toString('base64url')
  const page = readPageFiles(fileURLToPath(PAGE_FOLDER))
  const setup = { folder: new ServedFolder(folder), page, token }
  const { server, port } = await startTuneServer(setup, options.port).catch((error: unknown) => {
    throw portError(options.port, error)
  })
  const opened = name === undefined ? '' : `file=${encodeURIComponent(name)}&`
  terminal.print(`http://127.0.0.1:${port}/#${opened}token=${token}\n`)
  terminal.note(
    `Open this address in a browser on this machine. It serves the stack files in ${folder}; Ctrl-C ends it.\n`,
  )
  await interrupted()
  server.close()
  server.closeAllConnections()
  return EXIT.done
}

/** A folder, or a file and the folder it is in. */
function placeOf(path: string): { folder: string; name?: string } {
  if (statSync(path, { throwIfNoEntry: false })?.isDirectory()) return { folder: path }
  readText(path)
  return { folder: dirname(path), name: basename(path) }
}

function portError(port: number, error: unknown): unknown {
  const code = error instanceof Error && 'code' in error ? String(error.code) : ''
  if (code !== 'EADDRINUSE' && code !== 'EACCES') return error
  const message = code === 'EACCES' ? 'no permission to listen on this port' : 'another program listens on this port'
  const next = 'leave --port out: a free port is found'
  return new InputError([
    { severity: 'error', code: 'bad_option', path: '', file: `--port ${port}`, message, received: `${port}`, next },
  ])
}

function interrupted(): Promise<void> {
  return new Promise((resolve) => {
    for (const signal of ['SIGINT', 'SIGTERM'] as const) process.once(signal, () => resolve())
  })
}
