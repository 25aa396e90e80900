/** One hand of the engine's pool: rows of the cone, pieces of a search. */
import { serveJobs } from '../../pool/serveJobs.js'
import { TASKS } from '../../studies/tasks.js'

serveJobs(
  {
    post: (message) => self.postMessage(message),
    listen: (onMessage) => self.addEventListener('message', ({ data }) => onMessage(data)),
  },
  TASKS,
)
