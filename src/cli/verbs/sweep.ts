import { jsonText } from '../../report/jsonText.js'
import { sweepCsv } from '../../report/sweepCsv.js'
import { sweepSheets } from '../../report/sweepSheets.js'
import { sweepText } from '../../report/sweepText.js'
import { readSweep } from '../../studies/readSweep.js'
import { sweep } from '../../studies/sweep.js'
import { chartFiles } from '../chartFiles.js'
import type { Context } from '../context.js'
import { type DirectionOptions, directionOf } from '../directionOptions.js'
import { EXIT, type ExitCode } from '../exitCode.js'
import { loadStack } from '../loadStack.js'
import { runStudy } from '../runStudy.js'
import { stemOf } from '../stemOf.js'
import { writeResults } from '../writeResults.js'
import { checkFolder } from '../writeWhole.js'

interface SweepOptions extends DirectionOptions {
  readonly vary?: readonly string[]
  readonly metric?: readonly string[]
  readonly band: number
}

export async function run(context: Context<SweepOptions>): Promise<ExitCode> {
  const { options, terminal } = context
  const { stack } = await loadStack(context)
  const question = await readSweep(stack, {
    vary: options.vary ?? [],
    metrics: options.metric ?? [],
    direction: directionOf(options, stack),
    bandNm: options.band,
  })
  if (options.out !== undefined) await checkFolder(options.out)
  const found = await runStudy(context, 'sweep', (hooks, map) => sweep(stack, question, hooks, map))
  terminal.print(options.json ? jsonText(found) : sweepText(found, terminal.paint))
  const stem = stemOf(context.file)
  await writeResults(
    context,
    async () =>
      new Map<string, string | Uint8Array>([
        [`${stem}.sweep.json`, jsonText(found)],
        [`${stem}.sweep.csv`, sweepCsv(found)],
        ...(await chartFiles(stem, sweepSheets(stack, found))),
      ]),
  )
  return found.interrupted ? EXIT.interrupted : EXIT.done
}
