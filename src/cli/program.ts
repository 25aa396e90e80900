import { availableParallelism } from 'node:os'
import { Command, Option } from 'commander'
import { version } from '../../package.json'
import type { Context, SharedOptions } from './context.js'
import type { ExitCode } from './exitCode.js'
import { Interrupt } from './interrupt.js'
import { collected, wholeNumber } from './optionValues.js'
import { createTerminal } from './terminal.js'
import { VERBS, type Verb } from './verbs.js'

/** The command line as commander knows it; `finish` gets the exit code of the verb that ran. */
export function createProgram(finish: (code: ExitCode) => void): Command {
  const program = new Command('offblack')
    .description('Choose and prove the anti-reflection laminate over an OLED or LCD panel.')
    .version(version, '--version', 'print the version')
    .helpOption('--help', 'print this help')
    .helpCommand(false)
    .exitOverride()
    .showHelpAfterError('See offblack --help.')
    .addHelpText(
      'after',
      `\nExample:\n  offblack ${VERBS[0].example}\n\nExit codes: 0 done, 1 a fault of the program, 2 wrong input,\n3 a limit of the file is not met, 130 interrupted (best so far kept)`,
    )
  for (const verb of VERBS) addVerb(program, verb, finish)
  return program
}

const ARGUMENTS = {
  stack: 'the stack file',
  new: 'the file to be made',
  folder: 'a stack file, or the folder of some',
} as const

function addVerb(program: Command, verb: Verb, finish: (code: ExitCode) => void): void {
  const command = program
    .command(verb.name)
    .summary(verb.summary)
    .description(sentence(verb.summary))
    .helpOption('--help', 'print this help')
    .showHelpAfterError(`See offblack ${verb.name} --help.`)
    .addHelpText('after', `\nExample:\n  offblack ${verb.example}`)
  if (verb.file !== undefined) command.argument('<file>', ARGUMENTS[verb.file])
  for (const option of [...(verb.options ?? []), ...(verb.file === 'stack' ? sharedOptions() : [])])
    command.addOption(option)
  command.action(async (...given: unknown[]) => {
    const { run } = await verb.load()
    finish(await run(contextOf(command, given) as Context<never>))
  })
}

const DEFAULTS: SharedOptions = { set: [], json: false, workers: availableParallelism(), quiet: false }

function contextOf(command: Command, given: readonly unknown[]): Context {
  const options = { ...DEFAULTS, ...command.opts<Partial<SharedOptions>>() }
  const terminal = createTerminal(options.quiet)
  const interrupt = new Interrupt(() =>
    terminal.note('\nstopping; the best so far is kept (Ctrl-C again leaves at once)\n'),
  )
  return { file: typeof given[0] === 'string' ? given[0] : '', options, terminal, interrupt }
}

function sharedOptions(): Option[] {
  return [
    new Option('--set <path=value>', 'change a number of the file for this run; may be repeated').argParser(collected),
    new Option('--json', 'print one JSON document to stdout, and nothing else there'),
    new Option('--out <dir>', 'write files into this folder as well'),
    new Option('--workers <n>', 'threads').argParser(wholeNumber(1, 256)).default(DEFAULTS.workers),
    new Option('--quiet', 'no progress and no notes'),
  ]
}

function sentence(summary: string): string {
  const first = summary.charAt(0).toUpperCase() + summary.slice(1)
  return /[?.]$/.test(first) ? first : `${first}.`
}
