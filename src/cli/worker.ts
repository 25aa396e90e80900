/** What a worker thread runs. */
import { parentPort } from 'node:worker_threads'
import { serveJobs } from '../pool/serveJobs.js'
import { TASKS } from '../studies/tasks.js'

if (parentPort === null) throw new Error('worker.js is started by offblack itself')
const port = parentPort
serveJobs({ post: (message) => port.postMessage(message), listen: (onMessage) => port.on('message', onMessage) }, TASKS)
