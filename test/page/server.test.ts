import { mkdtempSync, readdirSync, readFileSync, rmSync, symlinkSync, writeFileSync } from 'node:fs'
import { request } from 'node:http'
import { connect } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, test } from 'vitest'
import { startTune, type TuneProcess } from './tuneProcess.js'

let tune: TuneProcess
let outside: string
beforeAll(async () => {
  tune = await startTune()
  outside = mkdtempSync(join(tmpdir(), 'offblack-outside-'))
  writeFileSync(join(outside, 'secret.stack.yaml'), 'secret: 1\n')
  symlinkSync(join(outside, 'secret.stack.yaml'), join(tune.folder, 'link.stack.yaml'))
  symlinkSync(outside, join(tune.folder, 'linked'))
})
afterAll(async () => {
  await tune.stop()
  rmSync(outside, { recursive: true })
})

interface Answer {
  readonly status: number
  readonly headers: Readonly<Record<string, string | string[] | undefined>>
  readonly text: string
}

/** A raw request: paths are sent as written, headers replace those of a browser. */
function ask(
  method: string,
  path: string,
  headers: Record<string, string> = {},
  body?: string | Buffer,
): Promise<Answer> {
  const { hostname, port } = new URL(tune.origin)
  return new Promise((resolve, reject) => {
    const sent = request({ hostname, port, method, path, headers }, (response) => {
      let text = ''
      response.on('data', (chunk) => {
        text += chunk
      })
      response.on('end', () => resolve({ status: response.statusCode ?? 0, headers: response.headers, text }))
    })
    sent.on('error', reject)
    sent.end(body)
  })
}

const withToken = (more: Record<string, string> = {}) => ({ 'x-offblack-token': tune.token, ...more })
const at = (file: string): string => `/api/stack?file=${encodeURIComponent(file)}`

describe('the page', () => {
  test('comes with a policy that lets in nothing from elsewhere and no inline script', async () => {
    const { status, headers, text } = await ask('GET', '/')
    expect(status).toBe(200)
    const policy = String(headers['content-security-policy'])
    expect(policy).toContain("default-src 'none'")
    expect(policy).toContain("script-src 'self'")
    expect(policy).not.toContain('unsafe')
    expect(text).not.toMatch(/<script(?![^>]*\ssrc=)[^>]*>/)
    expect(text).not.toContain(tune.token)
    expect(headers['x-content-type-options']).toBe('nosniff')
  })

  test.each([
    '/assets/',
    '/assets',
    '/../package.json',
    '/..%2fpackage.json',
    '/%2e%2e/package.json',
    '/assets/../../package.json',
    '/assets/..%5c..%5cpackage.json',
    '//etc/passwd',
    '/index.html%00.js',
  ])('has nothing at %s', async (path) => {
    const { status, text } = await ask('GET', path)
    expect([400, 404]).toContain(status)
    expect(text).not.toContain('devDependencies')
  })

  test('is only read', async () => {
    expect((await ask('POST', '/')).status).toBe(405)
  })
})

describe('who asks', () => {
  test.each(['evil.example', 'localhost.evil.example', '127.0.0.1', '127.0.0.1:1', '[::1]:80'])(
    'Host %s is refused',
    async (host) => {
      expect((await ask('GET', '/', { host })).status).toBe(421)
      expect((await ask('GET', '/api/stacks', withToken({ host }))).status).toBe(421)
    },
  )

  test.each(['http://evil.example', 'null', 'https://127.0.0.1', 'file://'])('Origin %s is refused', async (origin) => {
    expect((await ask('GET', '/api/stacks', withToken({ origin }))).status).toBe(403)
  })

  test('another site in the same browser is refused', async () => {
    expect((await ask('GET', '/api/stacks', withToken({ 'sec-fetch-site': 'cross-site' }))).status).toBe(403)
    expect((await ask('GET', '/api/stacks', withToken({ 'sec-fetch-site': 'same-site' }))).status).toBe(403)
  })

  test('without the token nothing of the folder is told', async () => {
    for (const token of [undefined, '', `${tune.token}x`]) {
      const headers: Record<string, string> = token === undefined ? {} : { 'x-offblack-token': token }
      expect((await ask('GET', '/api/stacks', headers)).status).toBe(401)
      expect((await ask('GET', at('dive-computer.stack.yaml'), headers)).status).toBe(401)
      expect((await ask('PUT', at('new.stack.yaml'), headers, 'format: 1\n')).status).toBe(401)
    }
    expect(readdirSync(tune.folder)).not.toContain('new.stack.yaml')
  })

  test('no other interface of the machine answers', async () => {
    const { port } = new URL(tune.origin)
    const { networkInterfaces } = await import('node:os')
    const others = Object.values(networkInterfaces()).flatMap((list) => list ?? [])
    for (const { address, internal, family } of others) {
      if (internal || family !== 'IPv4') continue
      await expect(reach(address, Number(port))).rejects.toThrow()
    }
    await expect(reach('127.0.0.1', Number(port))).resolves.toBeUndefined()
  })
})

function reach(host: string, port: number): Promise<void> {
  return new Promise((resolve, reject) => {
    const socket = connect({ host, port, timeout: 2000 }, () => {
      socket.destroy()
      resolve()
    })
    socket.once('error', reject)
    socket.once('timeout', () => reject(new Error('no answer')))
  })
}

describe('reading', () => {
  test('a stack file comes with the films and tables it names', async () => {
    const { status, text } = await ask('GET', at('dive-computer.stack.yaml'), withToken({ origin: tune.origin }))
    expect(status).toBe(200)
    const opened = JSON.parse(text)
    expect(opened.text).toBe(readFileSync(join(tune.folder, 'dive-computer.stack.yaml'), 'utf8'))
    expect(Object.keys(opened.reads)).toContain('spectra/oled-panel-reflectance.csv')
  })

  test('the list names stack files alone, and no link out of the folder', async () => {
    const { files } = JSON.parse((await ask('GET', '/api/stacks', withToken())).text)
    expect(files).toContain('dive-computer.stack.yaml')
    expect(files.filter((file: string) => !file.endsWith('.stack.yaml'))).toEqual([])
    expect(files.join()).not.toContain('link')
  })

  test.each([
    '../secret.stack.yaml',
    '/etc/passwd',
    'link.stack.yaml',
    'linked/secret.stack.yaml',
    '..%2fsecret.stack.yaml',
    '....//secret.stack.yaml',
    'films/../../secret.stack.yaml',
    'films\\..\\..\\secret.stack.yaml',
    'dive-computer.stack.yaml\0.stack.yaml',
    'films/quarter-cop-138.film.yaml',
    'films',
    '',
  ])('%j is not opened', async (file) => {
    const { status, text } = await ask('GET', at(file), withToken())
    expect(status).toBe(404)
    expect(text).not.toContain('secret: 1')
  })

  test('a stack file reaches no file outside through the files it names', async () => {
    const stack = readFileSync(join(tune.folder, 'dive-computer.stack.yaml'), 'utf8')
    for (const path of ['/etc/passwd', '../../etc/passwd', 'linked/secret.stack.yaml', 'link.stack.yaml']) {
      const text = stack.replace('spectra/oled-panel-reflectance.csv', path)
      writeFileSync(join(tune.folder, 'reaching.stack.yaml'), text)
      const opened = JSON.parse((await ask('GET', at('reaching.stack.yaml'), withToken())).text)
      expect(Object.keys(opened.reads)).not.toContain(path)
      expect(JSON.stringify(opened)).not.toContain('root:')
    }
  })
})

describe('saving', () => {
  const open = async (file: string) => JSON.parse((await ask('GET', at(file), withToken())).text)

  test('replaces the file that was opened, and only that version of it', async () => {
    const file = 'tide-board.stack.yaml'
    const { text, version } = await open(file)
    const changed = text.replace('title: ', 'title: New ')
    const saved = await ask('PUT', at(file), withToken({ 'if-match': version }), changed)
    expect(saved.status).toBe(200)
    expect(readFileSync(join(tune.folder, file), 'utf8')).toBe(changed)
    const again = await ask('PUT', at(file), withToken({ 'if-match': version }), text)
    expect(again.status).toBe(412)
    expect(readFileSync(join(tune.folder, file), 'utf8')).toBe(changed)
  })

  test.each([
    'evil.sh',
    'x.yaml',
    '../x.stack.yaml',
    '/tmp/x.stack.yaml',
    'linked/x.stack.yaml',
    'link.stack.yaml',
    'missing-folder/x.stack.yaml',
    'films\\..\\..\\x.stack.yaml',
    'x.stack.yaml\0',
    '',
  ])('%j is not written', async (file) => {
    const { text } = await open('tide-board.stack.yaml')
    const { status } = await ask('PUT', at(file), withToken(), text)
    expect([400, 403, 412]).toContain(status)
  })

  test('what is no stack file is not written; the answer says why, as the command does', async () => {
    const { status, text } = await ask('PUT', at('bad.stack.yaml'), withToken(), 'format: 1\nlayrs: []\n')
    expect(status).toBe(422)
    expect(JSON.parse(text).message).toContain('bad.stack.yaml:2:1')
    expect(readdirSync(tune.folder)).not.toContain('bad.stack.yaml')
  })

  test('more than 1 MB is refused, whether the length is told or not', async () => {
    const large = Buffer.alloc(1024 * 1024 + 1, '#')
    expect((await ask('PUT', at('large.stack.yaml'), withToken(), large)).status).toBe(413)
    const chunked = await ask('PUT', at('large.stack.yaml'), withToken({ 'transfer-encoding': 'chunked' }), large)
    expect(chunked.status).toBe(413)
    expect(readdirSync(tune.folder)).not.toContain('large.stack.yaml')
  })

  test('bytes that are no text are refused', async () => {
    expect((await ask('PUT', at('x.stack.yaml'), withToken(), Buffer.from([0xff, 0xfe, 0x00]))).status).toBe(400)
  })

  test.each(['DELETE', 'POST', 'PATCH', 'OPTIONS'])('%s does nothing', async (method) => {
    expect((await ask(method, at('dive-computer.stack.yaml'), withToken())).status).toBe(404)
  })
})
