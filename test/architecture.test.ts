import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, test } from 'vitest'
import { ROOT, readSources } from './sourceFiles.js'

/** The rooms in the order in which a datum passes through them, each with the rooms it may not import although they stand above. */
const ROOMS: readonly (readonly [room: string, not: readonly string[]])[] = [
  ['numeric', []],
  ['units', []],
  ['color', []],
  ['materials', []],
  ['optics', []],
  ['stack', []],
  ['appearance', []],
  ['search', []],
  ['studies', []],
  ['charts', []],
  ['report', []],
  ['pool', []],
  ['cli', []],
  ['page', ['cli']],
]
const NAMES = ROOMS.map(([room]) => room)
const OUTER = ['cli', 'page']
/** Tells the version; the core does without. */
const PACKAGE = '../package.json'

const sources = readSources()
const core = sources.filter(({ room }) => !OUTER.includes(room))

function allowedFor(room: string): string[] {
  const place = NAMES.indexOf(room)
  if (place < 0) return NAMES.filter((name) => !OUTER.includes(name))
  const not = ROOMS[place][1]
  return NAMES.slice(0, place + 1).filter((name) => !not.includes(name))
}

describe('rooms', () => {
  test('every source stands in a room of the table; only the library entry stands before the doors', () => {
    const strays = sources.filter(({ room, path }) => !NAMES.includes(room) && path !== 'library.ts')
    expect(strays.map(({ path }) => path)).toEqual([])
  })

  test.each([...NAMES, ''])('%s imports only from rooms above', (room) => {
    const allowed = allowedFor(room)
    const wrong = sources
      .filter((source) => source.room === room)
      .flatMap(({ path, imports }) => imports.map((target) => ({ path, target })))
      .filter(({ target }) => target !== PACKAGE && !allowed.some((name) => target.startsWith(`${name}/`)))
    expect(wrong).toEqual([])
  })

  test('no import leads back to where it came from', () => {
    expect(findCircle(new Map(sources.map(({ path, imports }) => [path, imports])))).toEqual([])
  })

  test('the table of DEVELOPERS.md is this one', () => {
    expect(roomsOfDevelopersPage()).toEqual(ROOMS)
  })
})

describe('the core', () => {
  test('imports nothing of Node', () => {
    const wrong = core.flatMap(({ path, packages }) =>
      packages.filter((name) => name.startsWith('node:')).map((name) => ({ path, name })),
    )
    expect(wrong).toEqual([])
  })

  test('does not know its own version', () => {
    expect(core.filter(({ imports }) => imports.includes(PACKAGE)).map(({ path }) => path)).toEqual([])
  })

  test('prints nothing, reads no clock and draws no unseeded number', () => {
    const outside =
      /\bconsole\.|\bDate\.now\b|\bnew Date\(\)|\bperformance\.now\b|\bMath\.random\b|\bprocess\.|\bglobalThis\b/
    expect(core.filter(({ text }) => outside.test(text)).map(({ path }) => path)).toEqual([])
  })
})

describe('files', () => {
  test('no drawers: a file is named for what it exports', () => {
    const drawers = sources.filter(({ path }) =>
      /(^|\/)(utils?|common|helpers?|index|misc|shared|types)(\.|\/)/i.test(path),
    )
    expect(drawers.map(({ path }) => path)).toEqual([])
  })

  test('no barrels: only the library entry passes on what others export', () => {
    const barrels = sources.filter(({ path, text }) => path !== 'library.ts' && /^export\s+\*\s+from/m.test(text))
    expect(barrels.map(({ path }) => path)).toEqual([])
  })

  test('imports name files that exist', () => {
    const known = new Set(sources.map(({ path }) => path))
    const missing = sources.flatMap(({ path, imports }) =>
      imports.filter((target) => !known.has(target) && !target.endsWith('.json')).map((target) => ({ path, target })),
    )
    expect(missing).toEqual([])
  })
})

/** The files along the first circle found. */
function findCircle(importsOf: ReadonlyMap<string, readonly string[]>): string[] {
  const finished = new Set<string>()
  const walk = (path: string, trail: readonly string[]): string[] => {
    if (trail.includes(path)) return [...trail.slice(trail.indexOf(path)), path]
    if (finished.has(path)) return []
    for (const next of importsOf.get(path) ?? []) {
      const circle = walk(next, [...trail, path])
      if (circle.length > 0) return circle
    }
    finished.add(path)
    return []
  }
  for (const path of importsOf.keys()) {
    const circle = walk(path, [])
    if (circle.length > 0) return circle
  }
  return []
}

/** Rows such as ``| `page/` | the tuning page | rooms above but `cli/` |`` as [room, rooms it may not import]. */
function roomsOfDevelopersPage(): [string, string[]][] {
  const page = readFileSync(join(ROOT, 'DEVELOPERS.md'), 'utf8')
  const rows = [...page.matchAll(/^\| `(\w+)\/` \|[^|]*\|([^|]*)\|$/gm)]
  return rows.map(([, room, may], place) => {
    const above = rows.slice(0, place).map(([, name]) => name)
    const named = [...may.matchAll(/`(\w+)\/?`/g)].map(([, name]) => name)
    if (/rooms above but/.test(may)) return [room, named]
    return [room, may.includes('rooms above') ? [] : above.filter((name) => !named.includes(name))]
  })
}
