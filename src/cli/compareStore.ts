import { createHash } from 'node:crypto'
import { appendFileSync, existsSync, mkdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { version } from '../../package.json'
import type { Stack } from '../stack/stack.js'
import type { CompareStore } from '../studies/compare.js'
import type { SearchedCandidate } from '../studies/compareJob.js'

interface Line {
  readonly question: string
  readonly key: string
  readonly candidate: SearchedCandidate
}

/**
 * Results of a comparison as they come, a JSON line each, so that an interrupted one goes on where it stopped. Lines carry
 * the digest of program, stack and seed: those of another question are passed over, and so is a last line cut short.
 */
export function compareStore(folder: string, stem: string, stack: Stack, seed: number): CompareStore {
  const path = join(folder, `${stem}.compare.jsonl`)
  const question = createHash('sha256')
    .update(JSON.stringify([version, stack, seed]))
    .digest('hex')
    .slice(0, 16)
  mkdirSync(folder, { recursive: true })
  const known = new Map(
    linesOf(path).flatMap((line) => (line.question === question ? [[line.key, line.candidate]] : [])),
  )
  return {
    known,
    keep: (key, candidate) => appendFileSync(path, `${JSON.stringify({ question, key, candidate } satisfies Line)}\n`),
  }
}

function linesOf(path: string): Line[] {
  if (!existsSync(path)) return []
  return readFileSync(path, 'utf8')
    .split('\n')
    .flatMap((text) => {
      try {
        return text === '' ? [] : [JSON.parse(text) as Line]
      } catch {
        return []
      }
    })
}
