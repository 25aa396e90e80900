import { jsonText } from '../../report/jsonText.js'
import { plural } from '../../report/wording.js'
import { InputError, type Problem } from '../../stack/problem.js'
import { readStack } from '../../stack/readStack.js'
import type { Stack } from '../../stack/stack.js'
import type { Context } from '../context.js'
import { EXIT, type ExitCode } from '../exitCode.js'
import { loadStack } from '../loadStack.js'
import { readText } from '../readText.js'
import { stackFilesOnDisk } from '../stackFilesOnDisk.js'

export async function run(context: Context): Promise<ExitCode> {
  if (context.options.json) return checkToJson(context)
  const { stack } = await loadStack(context)
  context.terminal.print(`${context.file}: no errors; ${contents(stack)}\n`)
  return EXIT.done
}

/** Problems are the result here, so they go to stdout; a file that cannot be read at all is one problem. */
async function checkToJson({ file, options, terminal }: Context): Promise<ExitCode> {
  const problems = await problemsOf(file, options.set)
  const ok = problems.every(({ severity }) => severity !== 'error')
  terminal.print(jsonText({ file, ok, problems }))
  return ok ? EXIT.done : EXIT.input
}

async function problemsOf(file: string, sets: readonly string[]): Promise<readonly Problem[]> {
  try {
    const reading = await readStack(readText(file), { file, files: stackFilesOnDisk(file), sets })
    return reading.ok ? reading.warnings : reading.problems
  } catch (error) {
    if (error instanceof InputError) return error.problems
    throw error
  }
}

function contents({ layers, conditions, limits, ...stack }: Stack): string {
  const questions = (['optimize', 'tolerance', 'compare', 'fit'] as const).filter((key) => stack[key] !== undefined)
  const counts = [
    plural(layers.length, 'layer'),
    plural(conditions.directions.length, 'direction'),
    plural(limits.length, 'limit'),
  ]
  return [...counts, ...(questions.length > 0 ? [`asks for ${questions.join(', ')}`] : [])].join(', ')
}
