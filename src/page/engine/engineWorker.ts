/** The engine of the page, off the thread that draws. */
import { Bench } from './bench.js'
import { browserWorkers } from './browserWorkers.js'
import type { FromEngine, Kind, Requests, ToEngine } from './messages.js'

const pool = browserWorkers()
let bench: Bench | undefined
let stopAsked = false

type Answers = {
  [K in Kind]: (ask: Requests[K]['ask'], call: number) => Requests[K]['answer'] | Promise<Requests[K]['answer']>
}

const answers: Answers = {
  open: async (bundle) => {
    bench = await Bench.open(bundle, pool)
    return bench.opening
  },
  view: ({ values, direction }) => timed(() => opened().view(values, direction)),
  cone: ({ values }) => timed(() => opened().cone(values)),
  budget: ({ values, direction }) => opened().budget(values, direction),
  optimize: ({ values }, call) => {
    stopAsked = false
    const progress = (done: number, note = '') => post({ call, kind: 'progress', done, note })
    return opened().optimize(values, { progress, stopped: () => stopAsked })
  },
  stop: () => {
    stopAsked = true
    return null
  },
  write: ({ values }) => opened().write(values),
}

self.addEventListener('message', ({ data }: MessageEvent<ToEngine>) => void answer(data))

async function answer<K extends Kind>({ call, kind, ask }: ToEngine<K>): Promise<void> {
  try {
    post({ call, kind: 'answer', answer: await answers[kind](ask, call) })
  } catch (error) {
    post({ call, kind: 'failed', message: error instanceof Error ? error.message : String(error) })
  }
}

function post(message: FromEngine): void {
  self.postMessage(message)
}

function opened(): Bench {
  if (bench === undefined) throw new Error('no stack file is open')
  return bench
}

/** The result with the time it took, ms. */
async function timed<T extends object>(work: () => T | Promise<T>): Promise<T & { computeMs: number }> {
  const start = performance.now()
  const result = await work()
  return { ...result, computeMs: performance.now() - start }
}
