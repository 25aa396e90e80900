import { eyewearCsv } from '../../report/eyewearCsv.js'
import { eyewearSheet } from '../../report/eyewearSheet.js'
import { eyewearText } from '../../report/eyewearText.js'
import { jsonText } from '../../report/jsonText.js'
import { InputError } from '../../stack/problem.js'
import { eyewear } from '../../studies/eyewear.js'
import { chartFiles } from '../chartFiles.js'
import type { Context } from '../context.js'
import { type DirectionOptions, directionOf } from '../directionOptions.js'
import { EXIT, type ExitCode } from '../exitCode.js'
import { loadStack } from '../loadStack.js'
import { stemOf } from '../stemOf.js'
import { writeResults } from '../writeResults.js'

interface EyewearOptions extends DirectionOptions {
  readonly rollStep: number
  readonly lensLeakage: number
}

export async function run(context: Context<EyewearOptions>): Promise<ExitCode> {
  const { file, options, terminal } = context
  const { stack } = await loadStack(context)
  if (stack.panel.kind === 'metal') throw metalPanel(file)
  const found = eyewear(stack, { ...options, ...directionOf(options, stack) })
  terminal.print(options.json ? jsonText(found) : eyewearText(found, terminal.paint))
  const stem = stemOf(file)
  await writeResults(
    context,
    async () =>
      new Map<string, string | Uint8Array>([
        [`${stem}.eyewear.json`, jsonText(found)],
        [`${stem}.eyewear.csv`, eyewearCsv(found)],
        ...(await chartFiles(stem, [eyewearSheet(found)])),
      ]),
  )
  return EXIT.done
}

function metalPanel(file: string): InputError {
  return new InputError([
    {
      severity: 'error',
      code: 'not_applicable',
      path: 'panel.kind',
      file,
      message: 'a metal half-space emits nothing that eyewear could take away',
      received: 'metal',
      allowed: 'mirror',
      next: 'describe the panel as a mirror with its measured reflectance',
    },
  ])
}
