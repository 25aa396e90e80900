import type { WorkerLike } from '../../pool/messages.js'
import { createWorkerPool, type WorkerPool } from '../../pool/workerPool.js'

const MOST_WORKERS = 8

/** A pool of workers of the browser, one for each core. */
export function browserWorkers(): WorkerPool {
  return createWorkerPool(Math.min(MOST_WORKERS, Math.max(1, navigator.hardwareConcurrency)), startWorker)
}

function startWorker(): WorkerLike {
  const worker = new Worker(new URL('./taskWorker.ts', import.meta.url), { type: 'module' })
  return {
    post: (message) => worker.postMessage(message),
    listen: (onMessage, onDeath) => {
      worker.addEventListener('message', ({ data }) => onMessage(data))
      worker.addEventListener('messageerror', () => onDeath('an answer could not be read'))
      worker.addEventListener('error', ({ message }) => onDeath(message))
    },
    end: () => worker.terminate(),
  }
}
