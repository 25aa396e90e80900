import { readdirSync, readFileSync } from 'node:fs'
import { extname, join, relative, sep } from 'node:path'

export interface PageFile {
  readonly type: string
  readonly bytes: Buffer
}

const TYPES: Readonly<Record<string, string>> = {
  '.html': 'text/html; charset=utf-8',
  '.js': 'text/javascript; charset=utf-8',
  '.css': 'text/css; charset=utf-8',
  '.svg': 'image/svg+xml',
  '.woff2': 'font/woff2',
}

/** The page's files by the path they are asked for, all read beforehand: no request ever reaches the disk through them. */
export function readPageFiles(folder: string): ReadonlyMap<string, PageFile> {
  const files = new Map<string, PageFile>()
  for (const entry of readdirSync(folder, { withFileTypes: true, recursive: true })) {
    const type = TYPES[extname(entry.name)]
    if (!entry.isFile() || type === undefined) continue
    const path = join(entry.parentPath, entry.name)
    files.set(`/${relative(folder, path).split(sep).join('/')}`, { type, bytes: readFileSync(path) })
  }
  const front = files.get('/index.html')
  if (front === undefined) throw new Error(`the page is missing from ${folder}: npm run build makes it`)
  return files.set('/', front)
}
