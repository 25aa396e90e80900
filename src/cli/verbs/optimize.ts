import { appearanceSheets } from '../../report/appearanceSheets.js'
import { jsonText } from '../../report/jsonText.js'
import { optimizeText } from '../../report/optimizeText.js'
import { searchSheet } from '../../report/searchSheet.js'
import { findParameter, setParameters } from '../../stack/parameters.js'
import type { Stack } from '../../stack/stack.js'
import { evaluate } from '../../studies/evaluate.js'
import { type Optimum, optimize } from '../../studies/optimize.js'
import { fromPlain } from '../../units/quantity.js'
import { chartFiles } from '../chartFiles.js'
import type { Context } from '../context.js'
import { EXIT, type ExitCode } from '../exitCode.js'
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
  const { stack } = await loadStack(context)
  requireQuestion(stack, 'optimize', file)
  if (options.out !== undefined) await checkFolder(options.out)
  const optimum = await runStudy(context, 'optimize', (hooks, map) =>
    optimize(stack, { seed: options.seed }, hooks, map),
  )
  const improved = withParameters(stack, optimum.best.parameters)
  const { limits } = evaluate(improved)
  const json = jsonText({ ...optimum, limits })
  terminal.print(options.json ? json : optimizeText(stack, optimum, limits, terminal.paint))
  const stem = stemOf(file)
  await writeResults(context, async () => {
    const charts = await chartFiles(stem, [...beforeAndAfter(stack, improved), searchSheet(optimum)])
    return new Map<string, string | Uint8Array>([[`${stem}.optimize.json`, json], ...charts])
  })
  if (optimum.interrupted) return EXIT.interrupted
  return limits.every(({ met }) => met) && optimum.best.violation === 0 ? EXIT.done : EXIT.limitMissed
}

function withParameters(stack: Stack, plain: Optimum['best']['parameters']): Stack {
  const values = Object.entries(plain).map(([path, value]) => {
    const kind = findParameter(stack, path)?.kind ?? 'number'
    return [path, fromPlain(value, kind)] as const
  })
  return setParameters(stack, Object.fromEntries(values))
}

function beforeAndAfter(stack: Stack, improved: Stack) {
  return appearanceSheets(stack, [
    { name: 'before', evaluation: evaluate(stack) },
    { name: 'after', evaluation: evaluate(improved) },
  ])
}
