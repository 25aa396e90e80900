import { compareSheets } from '../../report/compareSheets.js'
import { compareText } from '../../report/compareText.js'
import { csvText } from '../../report/csvText.js'
import { jsonText } from '../../report/jsonText.js'
import { plural } from '../../report/wording.js'
import { type Comparison, compare } from '../../studies/compare.js'
import { readFront } from '../../studies/frontAxis.js'
import { chartFiles } from '../chartFiles.js'
import { compareStore } from '../compareStore.js'
import type { Context } from '../context.js'
import { EXIT, type ExitCode } from '../exitCode.js'
import { loadStack, requireQuestion } from '../loadStack.js'
import { runStudy } from '../runStudy.js'
import { stemOf } from '../stemOf.js'
import { writeResults } from '../writeResults.js'
import { checkFolder } from '../writeWhole.js'

interface CompareOptions {
  readonly seed: number
  readonly keep: number
  readonly exhaustive: boolean
  readonly front?: readonly string[]
}

export async function run(context: Context<CompareOptions>): Promise<ExitCode> {
  const { file, options, terminal } = context
  const { stack } = await loadStack(context)
  requireQuestion(stack, 'compare', file)
  const { seed, keep, exhaustive } = options
  const front = options.front && readFront(stack, options.front)
  if (options.out !== undefined) await checkFolder(options.out)
  const stem = stemOf(file)
  const store = options.out === undefined ? undefined : compareStore(options.out, stem, stack, seed)
  if (store !== undefined && store.known.size > 0)
    terminal.note(`in hand from an earlier run: ${plural(store.known.size, 'result')}\n`)
  const comparison = await runStudy(context, 'compare', (hooks, map) =>
    compare(stack, { seed, keep, exhaustive, ...(front && { front }) }, hooks, map, store),
  )
  const json = jsonText(comparison)
  terminal.print(options.json ? json : compareText(stack, comparison, terminal.paint))
  await writeResults(context, async () => {
    const charts = await chartFiles(stem, compareSheets(stack, comparison))
    return new Map<string, string | Uint8Array>([
      [`${stem}.compare.json`, json],
      [`${stem}.compare.csv`, candidatesCsv(comparison)],
      ...charts,
    ])
  })
  if (comparison.interrupted) return EXIT.interrupted
  return comparison.candidates[0]?.limits_met === true ? EXIT.done : EXIT.limitMissed
}

function candidatesCsv({ slots, candidates, front }: Comparison): string {
  const [any] = candidates
  const parameters = Object.keys(any?.parameters ?? {})
  const metrics = Object.keys(any?.metrics ?? {})
  const headings = [
    'rank',
    ...slots,
    'objective',
    ...parameters,
    ...metrics,
    'price_per_m2',
    'thickness_nm',
    'limits_met',
    'on_front',
  ]
  const rows = candidates.map((candidate, k) => [
    k + 1,
    ...slots.map((slot) => candidate.films[slot]),
    candidate.objective,
    ...parameters.map((path) => candidate.parameters[path]),
    ...metrics.map((name) => candidate.metrics[name]),
    candidate.price_per_m2,
    candidate.thickness_nm,
    String(candidate.limits_met),
    String(front.includes(k)),
  ])
  return csvText(headings, rows)
}
