// A worker thread that ends itself at the first job.
import { parentPort } from 'node:worker_threads'

parentPort.on('message', ({ kind }) => {
  if (kind === 'run') process.exit(7)
})
