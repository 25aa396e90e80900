import { Worker } from 'node:worker_threads'
import type { WorkerLike } from '../pool/messages.js'
import { createWorkerPool, type WorkerPool } from '../pool/workerPool.js'

/** The build puts every script of the program into one folder. */
const WORKER_FILE = new URL('./worker.js', import.meta.url)

/** A pool of `count` threads of Node, each running `file`: a script that serves jobs (see `worker.ts`). */
export function nodeWorkers(count: number, file: URL = WORKER_FILE): WorkerPool {
  return createWorkerPool(count, () => startThread(file))
}

function startThread(file: URL): WorkerLike {
  const thread = new Worker(file)
  return {
    post: (message) => thread.postMessage(message),
    listen: (onMessage, onDeath) => {
      thread.on('message', onMessage)
      thread.on('messageerror', (error) => onDeath(error.message))
      thread.on('error', (error) => onDeath(error.message))
      thread.on('exit', (code) => onDeath(`exit code ${code}`))
    },
    end: () => void thread.terminate(),
  }
}
