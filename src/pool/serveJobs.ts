import type { Task } from '../studies/parallel.js'
import type { Fault, PoolPort, ToWorker } from './messages.js'

type Run = (job: unknown) => unknown

/** The worker's side of a pool: prepares tasks and runs jobs as they are asked for. */
export function serveJobs(port: PoolPort, tasks: ReadonlyMap<string, Task<never, never, unknown>>): void {
  const setups = new Map<number, Promise<Run>>()
  port.listen((message) => {
    if (message.kind === 'prepare') {
      const run = prepare(tasks, message)
      // The jobs that need it report the failure.
      run.catch(() => undefined)
      setups.set(message.setup, run)
    } else if (message.kind === 'forget') setups.delete(message.setup)
    else void answer(port, setups.get(message.setup), message)
  })
}

async function prepare(
  tasks: ReadonlyMap<string, Task<never, never, unknown>>,
  { task: name, shared }: Extract<ToWorker, { kind: 'prepare' }>,
): Promise<Run> {
  const task = tasks.get(name)
  if (task === undefined)
    throw new Error(`this worker knows no task "${name}"; it knows ${[...tasks.keys()].join(', ')}`)
  return (await task.prepare(shared as never)) as Run
}

async function answer(
  port: PoolPort,
  setup: Promise<Run> | undefined,
  { ticket, job }: Extract<ToWorker, { kind: 'run' }>,
): Promise<void> {
  try {
    if (setup === undefined) throw new Error('the task of this job was not prepared')
    const run = await setup
    port.post({ kind: 'done', ticket, result: await run(job) })
  } catch (error) {
    port.post({ kind: 'failed', ticket, fault: faultOf(error) })
  }
}

function faultOf(error: unknown): Fault {
  if (!(error instanceof Error)) return { message: String(error) }
  return { message: error.message, ...(error.stack !== undefined && { stack: error.stack }) }
}
