import { PassThrough } from 'node:stream'
import { afterEach, beforeEach, describe, expect, test, vi } from 'vitest'
import { durationText, startProgress } from '../../src/cli/progress.js'

beforeEach(() => void vi.useFakeTimers({ toFake: ['Date', 'setTimeout', 'clearTimeout'] }))
afterEach(() => void vi.useRealTimers())

function stream(isTTY: boolean) {
  const through = new PassThrough()
  const told: string[] = []
  through.on('data', (chunk) => told.push(String(chunk)))
  const likeStderr = Object.assign(through, { isTTY, columns: 100, cursorTo: () => true, clearLine: () => true })
  return { stderr: likeStderr as unknown as NodeJS.WriteStream, told }
}

describe('where nobody looks on', () => {
  test('a line now and then tells share, time left and best so far', () => {
    const { stderr, told } = stream(false)
    const progress = startProgress('optimize', stderr)
    progress.update(0.1, 'best 5')
    vi.advanceTimersByTime(2000)
    progress.update(0.25, 'best 4')
    progress.update(0.26, 'best 4')
    vi.advanceTimersByTime(5000)
    progress.update(0.5)
    progress.end()
    expect(told).toEqual(['optimize: 25 %, 6 s left, best 4\n', 'optimize: 50 %, 7 s left\n'])
  })

  test('what is done at once is not worth a line', () => {
    const { stderr, told } = stream(false)
    const progress = startProgress('sweep', stderr)
    for (let k = 0; k <= 100; k++) progress.update(k / 100)
    progress.end()
    expect(told).toEqual([])
  })
})

test('on a terminal there is a bar, and no exit handler is left behind', () => {
  const handlers = process.listenerCount('exit')
  const { stderr, told } = stream(true)
  const progress = startProgress('optimize', stderr)
  vi.advanceTimersByTime(2000)
  progress.update(0.5, 'best 4')
  progress.end()
  expect(told.join('')).toContain('50 %')
  expect(told.join('')).toContain('best 4')
  expect(process.listenerCount('exit')).toBe(handlers)
})

test('times are told as people tell them', () => {
  expect([0.2, 59.4, 200, 7500].map(durationText)).toEqual(['1 s', '59 s', '3 min 20 s', '2 h 5 min'])
})
