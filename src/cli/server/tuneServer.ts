/** The tuning page's own server: the page, and the stack files of one folder, on this machine alone. */
import { createServer, type IncomingMessage, type Server, type ServerResponse } from 'node:http'
import type { AddressInfo } from 'node:net'
import { OutputError } from '../outputError.js'
import type { PageFile } from './pageFiles.js'
import { readBody } from './readBody.js'
import { Refusal } from './refusal.js'
import { checkSender, checkToken } from './requestGate.js'
import type { ServedFolder } from './servedFolder.js'

export interface TuneServerSetup {
  readonly folder: ServedFolder
  readonly page: ReadonlyMap<string, PageFile>
  /** What every request for files must carry. */
  readonly token: string
}

/** Nothing from elsewhere, nothing written into the page, no page around it. */
const HEADERS: Readonly<Record<string, string>> = {
  'content-security-policy':
    "default-src 'none'; script-src 'self'; style-src 'self'; img-src 'self' data: blob:; font-src 'self'; worker-src 'self'; connect-src 'self'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'",
  'x-content-type-options': 'nosniff',
  'referrer-policy': 'no-referrer',
  'cross-origin-opener-policy': 'same-origin',
  'cross-origin-resource-policy': 'same-origin',
  'cache-control': 'no-store',
}

/** Listens on the loopback address; port 0 takes a free one. */
export async function startTuneServer(setup: TuneServerSetup, port: number): Promise<{ server: Server; port: number }> {
  const server = createServer((request, response) => void serve(setup, request, response))
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject)
    server.listen(port, '127.0.0.1', resolve)
  })
  return { server, port: portOf(server) }
}

function portOf(server: Server): number {
  return (server.address() as AddressInfo).port
}

async function serve(setup: TuneServerSetup, request: IncomingMessage, response: ServerResponse): Promise<void> {
  try {
    checkSender(request, request.socket.localPort ?? 0)
    const { pathname, searchParams } = addressOf(request)
    if (!pathname.startsWith('/api/')) return sendPage(setup, request, response, pathname)
    checkToken(request, setup.token)
    sendJson(response, 200, await answer(setup.folder, request, pathname, searchParams))
  } catch (error) {
    const { status, message } = refusalOf(error)
    // What is left of a body that was refused is not read.
    response.setHeader('connection', 'close')
    sendJson(response, status, { message })
  }
}

function addressOf({ url }: IncomingMessage): URL {
  try {
    return new URL(url ?? '/', 'http://127.0.0.1')
  } catch {
    throw new Refusal(400, 'this is no address')
  }
}

function sendPage(
  { page }: TuneServerSetup,
  request: IncomingMessage,
  response: ServerResponse,
  pathname: string,
): void {
  if (request.method !== 'GET' && request.method !== 'HEAD') throw new Refusal(405, 'the page is only read')
  const file = page.get(pathname)
  if (file === undefined) throw new Refusal(404, 'there is nothing here')
  response.writeHead(200, { ...HEADERS, 'content-type': file.type, 'content-length': file.bytes.length })
  response.end(request.method === 'HEAD' ? undefined : file.bytes)
}

async function answer(folder: ServedFolder, request: IncomingMessage, pathname: string, asked: URLSearchParams) {
  const route = `${request.method} ${pathname}`
  const file = asked.get('file') ?? ''
  switch (route) {
    case 'GET /api/stacks':
      return { folder: folder.name, files: folder.list() }
    case 'GET /api/stack':
      return folder.open(file)
    case 'PUT /api/stack': {
      const text = await readBody(request)
      return { version: await folder.save(file, text, request.headers['if-match']) }
    }
    default:
      throw new Refusal(404, 'there is nothing here')
  }
}

function refusalOf(error: unknown): { status: number; message: string } {
  if (error instanceof Refusal) return error
  if (error instanceof OutputError) return { status: 500, message: `cannot write ${error.message}; ${error.next}` }
  return { status: 500, message: 'a fault of the program, not of your input' }
}

function sendJson(response: ServerResponse, status: number, value: unknown): void {
  if (response.headersSent) return void response.end()
  const text = JSON.stringify(value)
  response.writeHead(status, {
    ...HEADERS,
    'content-type': 'application/json; charset=utf-8',
    'content-length': Buffer.byteLength(text),
  })
  response.end(text)
}
