import { CommanderError } from 'commander'
import { InputError } from '../stack/problem.js'
import { EXIT, type ExitCode } from './exitCode.js'
import { OutputError } from './outputError.js'
import { createProgram } from './program.js'
import { createTerminal, leaveWhenUnread } from './terminal.js'

leaveWhenUnread()
process.on('uncaughtException', (error) => {
  process.exit(tellError(error))
})
createProgram((code) => {
  process.exitCode = code
})
  .parseAsync()
  .catch(async (error: unknown) => {
    process.exitCode = error instanceof InputError ? await tellProblems(error) : tellError(error)
  })

async function tellProblems({ problems, texts }: InputError): Promise<ExitCode> {
  const { problemText } = await import('../report/problemText.js')
  const { warn, notePaint } = createTerminal(false)
  warn(problemText(problems, texts, notePaint))
  return EXIT.input
}

function tellError(error: unknown): ExitCode {
  // Commander has printed its message already.
  if (error instanceof CommanderError) return error.exitCode === 0 ? EXIT.done : EXIT.input
  const { warn } = createTerminal(false)
  if (error instanceof OutputError) {
    warn(`cannot write ${error.message}\n  next      ${error.next}\n`)
    return EXIT.input
  }
  const message = error instanceof Error ? error.message : String(error)
  warn(`offblack: a fault of the program, not of your input: ${message.slice(0, 500)}\n`)
  if (process.env.OFFBLACK_DEBUG === '1') warn(`${error instanceof Error ? error.stack : ''}\n`)
  else warn('Please report it with the command and the stack file; OFFBLACK_DEBUG=1 shows where it happened.\n')
  return EXIT.fault
}
