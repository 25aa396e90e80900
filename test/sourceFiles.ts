import { readdirSync, readFileSync } from 'node:fs'
import { dirname, join, relative, resolve } from 'node:path'

export const ROOT = resolve(import.meta.dirname, '..')
const SRC = join(ROOT, 'src')

export interface SourceFile {
  /** Relative to `src/`, e.g. `color/cielab.ts`. */
  readonly path: string
  /** First folder; empty for a file that stands in `src/` itself. */
  readonly room: string
  readonly text: string
  /** Files of `src/` it imports, relative to `src/`; types and late imports too. */
  readonly imports: readonly string[]
  /** Packages and Node modules it imports. */
  readonly packages: readonly string[]
}

/** Every source of the program, with its type declarations. */
export function readSources(): SourceFile[] {
  const paths = readdirSync(SRC, { recursive: true, encoding: 'utf8' }).filter((path) => /\.(tsx?|js)$/.test(path))
  return paths.sort().map((path) => {
    const text = readFileSync(join(SRC, path), 'utf8')
    const names = importedNames(text)
    return {
      path,
      room: path.includes('/') ? path.slice(0, path.indexOf('/')) : '',
      text,
      imports: names.filter((name) => name.startsWith('.')).map((name) => fileOf(path, name, paths)),
      packages: names.filter((name) => !name.startsWith('.')),
    }
  })
}

/** The names after `from`, in `import '…'` and in `import('…')`. */
function importedNames(text: string): string[] {
  const code = text.replace(/\/\*[\s\S]*?\*\//g, '').replace(/^\s*\/\/.*$/gm, '')
  const found = code.matchAll(
    /^\s*(?:import|export)\s+(?:[\w$*{},\s]+?\sfrom\s+)?['"]([^'"]+)['"]|\bimport\(\s*['"]([^'"]+)['"]/gm,
  )
  return [...found].map((match) => match[1] ?? match[2])
}

function fileOf(importer: string, name: string, paths: readonly string[]): string {
  const target = relative(SRC, resolve(SRC, dirname(importer), name))
  return paths.find((path) => path.replace(/\.tsx?$/, '.js') === target) ?? target
}
