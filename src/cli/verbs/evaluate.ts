import { appearanceSheets } from '../../report/appearanceSheets.js'
import { evaluateText } from '../../report/evaluateText.js'
import { jsonText } from '../../report/jsonText.js'
import { spectraCsv } from '../../report/spectraCsv.js'
import { evaluate } from '../../studies/evaluate.js'
import { chartFiles } from '../chartFiles.js'
import type { Context } from '../context.js'
import { EXIT, type ExitCode } from '../exitCode.js'
import { loadStack } from '../loadStack.js'
import { stemOf } from '../stemOf.js'
import { writeResults } from '../writeResults.js'

export async function run(context: Context): Promise<ExitCode> {
  const { options, terminal } = context
  const { stack } = await loadStack(context)
  const evaluation = evaluate(stack)
  terminal.print(options.json ? jsonText(evaluation) : evaluateText(evaluation, terminal.paint))
  const stem = stemOf(context.file)
  await writeResults(context, async () => {
    const charts = await chartFiles(stem, appearanceSheets(stack, [{ name: 'design', evaluation }]))
    return new Map<string, string | Uint8Array>([
      [`${stem}.evaluate.json`, jsonText(evaluation)],
      [`${stem}.spectra.csv`, spectraCsv(evaluation)],
      ...charts,
    ])
  })
  return evaluation.limits.every(({ met }) => met) ? EXIT.done : EXIT.limitMissed
}
