import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { problemText } from '../../src/report/problemText.js'
import type { Problem } from '../../src/stack/problem.js'

const FILE = ['format: 1', 'layers:', '  - id: half', '    kind: retarder', '    anlge: 22 deg', 'panel: {}'].join('\n')
const texts = new Map([['a.stack.yaml', FILE]])

const misspelt: Problem = {
  severity: 'error',
  code: 'unknown_key',
  path: 'layers.0.anlge',
  file: 'a.stack.yaml',
  range: { line: 5, column: 5, endLine: 5, endColumn: 10 },
  message: 'a retarder has no such field',
  received: 'anlge',
  allowed: 'slow_axis, retardance',
  suggestion: 'angle',
  next: 'correct the name',
}

test('a problem is told with its place, lines of the file and a mark, what came, what is allowed and what to do', () => {
  expect(problemText([misspelt], texts)).toBe(
    [
      'a.stack.yaml:5:5 (layers.0.anlge)  error: a retarder has no such field',
      '  3 |   - id: half',
      '  4 |     kind: retarder',
      '> 5 |     anlge: 22 deg',
      '    |     ^^^^^',
      '  6 | panel: {}',
      '  received  anlge',
      '  allowed   slow_axis, retardance',
      '  nearest   did you mean "angle"?',
      '  next      correct the name',
      '',
      '1 error',
      '',
    ].join('\n'),
  )
})

test('all are told at once and counted', () => {
  const warning: Problem = { ...misspelt, severity: 'warning' }
  const text = problemText([misspelt, warning, misspelt], texts)
  expect(text.match(/a\.stack\.yaml:5:5/g)).toHaveLength(3)
  expect(text).toMatch(/\n2 errors, 1 warning\n$/)
})

test('an option has no place in a file', () => {
  const text = problemText([
    { severity: 'error', code: 'x', path: 'half.x', file: '--set half.x=1', message: 'no such path' },
  ])
  expect(text).toBe('--set half.x=1 (half.x)  error: no such path\n\n1 error\n')
})

test('thousands of problems do not bury the first', () => {
  const text = problemText(new Array<Problem>(3000).fill(misspelt), texts)
  expect(text.split('\n').length).toBeLessThan(600)
  expect(text).toContain('and 2950 more problems')
  expect(text).toContain('3000 errors')
})

describe('a hostile file', () => {
  const wide = `${'x'.repeat(5000)}HERE${'y'.repeat(5000)}`
  const range = { line: 1, column: 5001, endLine: 1, endColumn: 5005 }

  test('with a very long line is cut about the place', () => {
    const lines = problemText([{ ...misspelt, range }], new Map([['a.stack.yaml', wide]])).split('\n')
    const shown = lines.find((line) => line.includes('HERE')) ?? ''
    const marks = lines.find((line) => line.includes('^')) ?? ''
    expect(shown.length).toBeLessThan(120)
    expect(marks.indexOf('^^^^')).toBe(shown.indexOf('HERE'))
  })

  test('moves no cursor and colors no screen', () => {
    const text = fc.string({ unit: fc.constantFrom('\u001b', '\u009b', '\r', '\u0007', '\u202e', 'a', '[', '2', 'J') })
    fc.assert(
      fc.property(text, text, (line, received) => {
        const out = problemText(
          [{ ...misspelt, received, message: received, range: { line: 1, column: 1, endLine: 1, endColumn: 2 } }],
          new Map([['a.stack.yaml', line]]),
        )
        const controls = [...out].filter(
          (c) => c !== '\n' && (c < ' ' || (c >= '\u007f' && c < '\u00a0') || c === '\u202e'),
        )
        expect(controls).toEqual([])
      }),
      { seed: 1, numRuns: 200 },
    )
  })
})
