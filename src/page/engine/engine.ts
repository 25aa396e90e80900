import type { FromEngine, Kind, Requests, ToEngine } from './messages.js'

type Progress = (done: number, note: string) => void

interface Waiting {
  readonly resolve: (answer: never) => void
  readonly reject: (error: Error) => void
  readonly progress?: Progress
}

/** The page's end of the engine's worker. */
export class Engine {
  private readonly worker = new Worker(new URL('./engineWorker.ts', import.meta.url), { type: 'module' })
  private readonly waiting = new Map<number, Waiting>()
  private lastCall = 0

  constructor() {
    this.worker.addEventListener('message', ({ data }: MessageEvent<FromEngine>) => this.receive(data))
    this.worker.addEventListener('error', ({ message }) => this.failAll(message))
  }

  ask<K extends Kind>(kind: K, ask: Requests[K]['ask'], progress?: Progress): Promise<Requests[K]['answer']> {
    const call = ++this.lastCall
    return new Promise((resolve, reject) => {
      this.waiting.set(call, { resolve, reject, progress })
      this.worker.postMessage({ call, kind, ask } satisfies ToEngine)
    })
  }

  private receive(message: FromEngine): void {
    const waiting = this.waiting.get(message.call)
    if (message.kind === 'progress') {
      waiting?.progress?.(message.done, message.note)
      return
    }
    this.waiting.delete(message.call)
    if (message.kind === 'answer') waiting?.resolve(message.answer as never)
    else waiting?.reject(new Error(message.message))
  }

  private failAll(message: string): void {
    for (const { reject } of this.waiting.values()) reject(new Error(`the engine stopped: ${message}`))
    this.waiting.clear()
  }
}
