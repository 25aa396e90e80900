import { appearanceSheets } from '../../report/appearanceSheets.js'
import { jsonText } from '../../report/jsonText.js'
import { optimizeText } from '../../report/optimizeText.js'
import { searchSheet } from '../../report/searchSheet.js'
import { setParameters } from '../../stack/parameters.js'
import type { Stack } from '../../stack/stack.js'
import { bestValues } from '../../studies/bestValues.js'
import { evaluate } from '../../studies/evaluate.js'
import { optimize } from '../../studies/optimize.js'
import { chartFiles } from '../chartFiles.js'
import type { Context } from '../context.js'
import { EXIT, type ExitCode } from '../exitCode.js'
import { improvedStack } from '../improvedStack.js'
import { loadStack, requireQuestion } from '../loadStack.js'
import { runStudy } from '../runStudy.js'
import { stemOf } from '../stemOf.js'
import { writeResults } from '../writeResults.js'
import { checkFolder } from '../writeWhole.js'

interface OptimizeOptions {
  readonly seed: number
}

export async function run(context: Context<OptimizeOptions>): Promise<ExitCode> {
  const { file, options, terminal } = context
  const { stack, text } = await loadStack(context)
  requireQuestion(stack, 'optimize', file)
  if (options.out !== undefined) await checkFolder(options.out)
  const optimum = await runStudy(context, 'optimize', (hooks, map) =>
    optimize(stack, { seed: options.seed }, hooks, map),
  )
  const values = bestValues(stack, optimum)
  const improved = setParameters(stack, values)
  const { limits } = evaluate(improved)
  const json = jsonText({ ...optimum, limits })
  terminal.print(options.json ? json : optimizeText(stack, optimum, limits, terminal.paint))
  const stem = stemOf(file)
  await writeResults(context, async (folder) => {
    const charts = await chartFiles(stem, [...beforeAndAfter(stack, improved), searchSheet(optimum)])
    return new Map<string, string | Uint8Array>([
      [`${stem}.optimized.stack.yaml`, improvedStack({ file, text, stack, sets: options.set }, values, folder)],
      [`${stem}.optimize.json`, json],
      ...charts,
    ])
  })
  if (optimum.interrupted) return EXIT.interrupted
  return limits.every(({ met }) => met) && optimum.best.violation === 0 ? EXIT.done : EXIT.limitMissed
}

function beforeAndAfter(stack: Stack, improved: Stack) {
  return appearanceSheets(stack, [
    { name: 'before', evaluation: evaluate(stack) },
    { name: 'after', evaluation: evaluate(improved) },
  ])
}
