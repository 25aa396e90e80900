import { describe, expect, test } from 'vitest'
import { nodeWorkers } from '../../src/cli/nodeWorkers.js'
import type { Task } from '../../src/studies/parallel.js'

const anyTask: Task<object, number, number> = { name: 'anyTask', prepare: async () => (job) => job }

describe('a thread of Node that dies', () => {
  test('by leaving is reported with its exit code and the job', async () => {
    const pool = nodeWorkers(2, new URL('exitingWorker.js', import.meta.url))
    await expect(pool.map(anyTask, {}, [1, 2, 3])).rejects.toThrow(/^job \d of anyTask: the worker ended: exit code 7$/)
  })

  test('by a fault is reported with its message', async () => {
    const pool = nodeWorkers(1, new URL('throwingWorker.js', import.meta.url))
    await expect(pool.map(anyTask, {}, [1])).rejects.toThrow('job 0 of anyTask: the worker ended: fault in the thread')
  })

  test('for want of its script is reported', async () => {
    const pool = nodeWorkers(1, new URL('noSuchWorker.js', import.meta.url))
    await expect(pool.map(anyTask, {}, [1])).rejects.toThrow(/noSuchWorker\.js/)
  })
})
