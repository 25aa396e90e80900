import { join } from 'node:path'
import { csvText } from '../../report/csvText.js'
import { jsonText } from '../../report/jsonText.js'
import { toleranceCsv } from '../../report/toleranceCsv.js'
import { toleranceSheets } from '../../report/toleranceSheets.js'
import { toleranceText } from '../../report/toleranceText.js'
import type { ToleranceQuestion } from '../../stack/stack.js'
import type { DrawRows } from '../../studies/drawRows.js'
import { tolerance } from '../../studies/tolerance.js'
import { chartFiles } from '../chartFiles.js'
import type { Context } from '../context.js'
import { EXIT, type ExitCode } from '../exitCode.js'
import { GrowingFile } from '../growingFile.js'
import { loadStack, requireQuestion } from '../loadStack.js'
import { runStudy } from '../runStudy.js'
import { stemOf } from '../stemOf.js'
import { writeResults } from '../writeResults.js'
import { checkFolder } from '../writeWhole.js'

interface ToleranceOptions extends Partial<Pick<ToleranceQuestion, 'samples' | 'seed' | 'sampling'>> {
  readonly wantedYield: number
  readonly drawsOnly: boolean
}

/** The wanted yield is a limit too: where it is not reached, the exit code says so. */
export async function run(context: Context<ToleranceOptions>): Promise<ExitCode> {
  const { file, options, terminal } = context
  const { stack } = await loadStack(context)
  const asked = requireQuestion(stack, 'tolerance', file)
  const { samples = asked.samples, seed = asked.seed, sampling = asked.sampling, wantedYield, drawsOnly } = options
  if (options.out !== undefined) await checkFolder(options.out)
  const stem = stemOf(file)
  const draws = options.out === undefined ? undefined : new GrowingFile(join(options.out, `${stem}.draws.csv`))
  const settings = { wantedYield, drawsOnly, ...(draws && { onDraws: appendRows(draws) }) }
  try {
    const found = await runStudy(context, 'tolerance', (hooks, map) =>
      tolerance(stack, { ...asked, samples, seed, sampling }, settings, hooks, map),
    )
    await draws?.complete()
    const json = jsonText(found)
    terminal.print(options.json ? json : toleranceText(stack, found, terminal.paint))
    await writeResults(
      context,
      async () =>
        new Map<string, string | Uint8Array>([
          [`${stem}.tolerance.json`, json],
          [`${stem}.tolerance.csv`, toleranceCsv(found)],
          ...(await chartFiles(stem, toleranceSheets(found))),
        ]),
    )
    if (options.out !== undefined) terminal.note(`  ${stem}.draws.csv\n`)
    if (found.interrupted) return EXIT.interrupted
    return found.yield === undefined || found.yield >= wantedYield ? EXIT.done : EXIT.limitMissed
  } finally {
    await draws?.discard()
  }
}

/** One line a draw, parameters and metrics; the headings before the first. */
function appendRows(file: GrowingFile): (draws: DrawRows) => Promise<void> {
  let begun = false
  return async ({ columns, rows }) => {
    const text = csvText(columns, rows)
    const headings = text.indexOf('\n') + 1
    await file.append(begun ? text.slice(headings) : text)
    begun = true
  }
}
