import { budgetCsv } from '../../report/budgetCsv.js'
import { budgetSheet } from '../../report/budgetSheet.js'
import { budgetText } from '../../report/budgetText.js'
import { jsonText } from '../../report/jsonText.js'
import { budget } from '../../studies/budget.js'
import { chartFiles } from '../chartFiles.js'
import type { Context } from '../context.js'
import { type DirectionOptions, directionOf } from '../directionOptions.js'
import { EXIT, type ExitCode } from '../exitCode.js'
import { loadStack } from '../loadStack.js'
import { stemOf } from '../stemOf.js'
import { writeResults } from '../writeResults.js'

export async function run(context: Context<DirectionOptions>): Promise<ExitCode> {
  const { options, terminal } = context
  const { stack } = await loadStack(context)
  const found = budget(stack, directionOf(options, stack))
  terminal.print(options.json ? jsonText(found) : budgetText(found, terminal.paint))
  const stem = stemOf(context.file)
  await writeResults(
    context,
    async () =>
      new Map<string, string | Uint8Array>([
        [`${stem}.budget.json`, jsonText(found)],
        [`${stem}.budget.csv`, budgetCsv(found)],
        ...(await chartFiles(stem, [budgetSheet(found)])),
      ]),
  )
  return EXIT.done
}
