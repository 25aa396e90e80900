import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { JobError } from '../../src/pool/jobError.js'
import { createWorkerPool } from '../../src/pool/workerPool.js'
import { mapInline, type Task } from '../../src/studies/parallel.js'
import { type LocalWorker, startLocalWorker } from './localWorkers.js'

const power: Task<{ readonly exponent: number }, number, number> = {
  name: 'power',
  prepare: async ({ exponent }) => {
    if (exponent < 0) throw new Error('exponent below 0')
    return (base) => {
      if (base === 13) throw new RangeError('13 is not to be raised')
      return base ** exponent
    }
  },
}
const TASKS = [power as Task<never, never, unknown>]

/** A pool whose workers can be looked at. */
function watchedPool(count: number, delay?: () => number) {
  const workers: LocalWorker[] = []
  const pool = createWorkerPool(count, () => {
    const worker = startLocalWorker(TASKS, delay)
    workers.push(worker)
    return worker
  })
  return { pool, workers }
}

const range = (count: number): number[] => Array.from({ length: count }, (_, k) => k)
const sentKinds = (worker: LocalWorker, kind: string): number => worker.sent.filter((m) => m.kind === kind).length

describe('results', () => {
  test('are those of the inline map, in the order of the jobs, however many workers and whatever their pace', async () => {
    const jobs = fc.array(fc.integer({ min: 14, max: 1000 }), { maxLength: 40 })
    const paces = fc.array(fc.integer({ min: 0, max: 4 }), { minLength: 1, maxLength: 20 })
    await fc.assert(
      fc.asyncProperty(jobs, fc.integer({ min: 1, max: 5 }), paces, async (bases, count, pace) => {
        let turn = 0
        const { pool } = watchedPool(count, () => pace[turn++ % pace.length])
        const shared = { exponent: 2 }
        expect(await pool.map(power, shared, bases)).toEqual(await mapInline(power, shared, bases))
      }),
      { seed: 1, numRuns: 60 },
    )
  })

  test('of maps that run side by side do not mix', async () => {
    const { pool } = watchedPool(2)
    const [squares, cubes] = await Promise.all([
      pool.map(power, { exponent: 2 }, range(9)),
      pool.map(power, { exponent: 3 }, range(9)),
    ])
    expect(squares).toEqual(range(9).map((k) => k * k))
    expect(cubes).toEqual(range(9).map((k) => k * k * k))
  })
})

describe('what is sent', () => {
  test('shared data goes to a worker once, also for later maps over the same', async () => {
    const { pool, workers } = watchedPool(2)
    const shared = { exponent: 2 }
    for (let round = 0; round < 5; round++) await pool.map(power, shared, range(6))
    expect(workers.map((worker) => sentKinds(worker, 'prepare'))).toEqual([1, 1])
  })

  test('shared data of long ago is given up, and sent again when asked for again', async () => {
    const { pool, workers } = watchedPool(1)
    const all = range(7).map((exponent) => ({ exponent }))
    for (const shared of all) await pool.map(power, shared, [2])
    expect(sentKinds(workers[0], 'forget')).toBe(3)
    expect(await pool.map(power, all[0], [2])).toEqual([1])
    expect(sentKinds(workers[0], 'prepare')).toBe(8)
  })

  test('few jobs are spread over the workers', async () => {
    const { pool, workers } = watchedPool(3)
    await pool.map(power, { exponent: 2 }, range(3))
    expect(workers.map((worker) => sentKinds(worker, 'run'))).toEqual([1, 1, 1])
  })
})

describe('progress and stop', () => {
  test('progress counts jobs up to 1', async () => {
    const { pool } = watchedPool(2)
    const seen: number[] = []
    await pool.map(power, { exponent: 1 }, range(4), { progress: (done) => seen.push(done) })
    expect(seen).toEqual([0.25, 0.5, 0.75, 1])
  })

  test('after a stop no job is begun; those begun are finished and kept', async () => {
    const { pool, workers } = watchedPool(1)
    let done = 0
    const results = await pool.map(power, { exponent: 1 }, range(20), {
      progress: () => {
        done++
      },
      stopped: () => done >= 3,
    })
    expect(sentKinds(workers[0], 'run')).toBe(4)
    expect(results.slice(0, 4)).toEqual([0, 1, 2, 3])
    expect(results.slice(4).every((result) => result === undefined)).toBe(true)
    expect(results).toHaveLength(20)
  })
})

describe('failures', () => {
  test('a job that fails is named; the pool goes on', async () => {
    const { pool } = watchedPool(2)
    const failing = pool.map(power, { exponent: 2 }, [1, 2, 13, 4])
    await expect(failing).rejects.toThrow('job 2 of power: 13 is not to be raised')
    await expect(failing).rejects.toBeInstanceOf(JobError)
    expect(await pool.map(power, { exponent: 2 }, [5])).toEqual([25])
  })

  test('the stack trace is that of the worker', async () => {
    const { pool } = watchedPool(1)
    const error = await pool.map(power, { exponent: 2 }, [13]).catch((fault: unknown) => fault)
    expect((error as Error).stack).toContain('RangeError: 13 is not to be raised')
  })

  test('a task that cannot be prepared fails its jobs', async () => {
    const { pool } = watchedPool(2)
    await expect(pool.map(power, { exponent: -1 }, [1])).rejects.toThrow('job 0 of power: exponent below 0')
  })

  test('a task the worker does not know is named with those it knows', async () => {
    const { pool } = watchedPool(1)
    const stray: typeof power = { ...power, name: 'root' }
    await expect(pool.map(stray, { exponent: 1 }, [1])).rejects.toThrow('knows no task "root"; it knows power')
  })

  test('a worker that dies ends the pool, with the job it died at', async () => {
    const { pool, workers } = watchedPool(2)
    const dying = pool.map(power, { exponent: 1 }, range(9))
    workers[1].die('out of memory')
    await expect(dying).rejects.toThrow('job 1 of power: the worker ended: out of memory')
    await expect(pool.map(power, { exponent: 1 }, [1])).rejects.toThrow('out of memory')
  })

  test('a closed pool rejects what is under way', async () => {
    const { pool } = watchedPool(2)
    const running = pool.map(power, { exponent: 1 }, range(9))
    pool.close()
    await expect(running).rejects.toThrow('the workers were ended')
  })
})
