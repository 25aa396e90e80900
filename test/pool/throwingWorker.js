// A worker thread with a fault outside any job.
import { parentPort } from 'node:worker_threads'

parentPort.on('message', ({ kind }) => {
  if (kind === 'run') throw new Error('fault in the thread')
})
