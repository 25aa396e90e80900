import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { readStack } from '../../src/stack/readStack.js'
import { STARTER_FILE } from '../../src/stack/starterFile.js'
import { filesFrom } from './reading.js'

const WORDS = [
  'nz',
  'rth',
  '5 um',
  '-1',
  '1e400',
  '.nan',
  '~',
  '[',
  ']',
  '{',
  '}',
  '*a',
  '&a ',
  '!!js ',
  '? ',
  '|',
  '"',
  "'",
  '%',
  '\t',
  '\n',
  ': ',
  '- ',
  '__proto__',
  'constructor',
  'half',
  'panel',
  '{file: x.csv}',
  '<<',
  '#',
  '\u0000',
  '\ud800',
]

/** The starter file with pieces cut out, doubled and put in. */
const mutated = fc
  .array(
    fc.record({
      at: fc.nat(STARTER_FILE.length),
      cut: fc.nat(40),
      put: fc.oneof(fc.constantFrom(...WORDS), fc.string({ maxLength: 8 }), fc.constant(undefined)),
    }),
    { minLength: 1, maxLength: 4 },
  )
  .map((edits) =>
    edits.reduce((text, { at, cut, put }) => {
      const piece = text.slice(at, at + cut)
      return text.slice(0, at) + (put ?? piece + piece) + text.slice(put === undefined ? at + cut : at + (cut % 7))
    }, STARTER_FILE),
  )

describe('mutated stack files', () => {
  it('give a stack or problems that can be shown, never an exception', async () => {
    const files = filesFrom({ 'x.csv': '400,1\n700,2\n' })
    const set = fc.oneof(
      fc.constantFrom(
        'half.rth=3',
        'panel.index=[',
        'half.dispersion.re450=1',
        'conditions.directions.0.theta=4',
        'half={}',
      ),
      fc
        .tuple(fc.constantFrom('half.', 'panel.', 'layers.0.', ''), fc.string({ maxLength: 12 }))
        .map(([a, b]) => `${a}${b}=1`),
    )
    await fc.assert(
      fc.asyncProperty(mutated, fc.array(set, { maxLength: 2 }), async (text, sets) => {
        const reading = await readStack(text, { file: 'x.yaml', files, sets })
        if (reading.ok) return
        expect(reading.problems.length).toBeGreaterThan(0)
        for (const { message, range, file, allowed, next, received } of reading.problems) {
          expect(message).not.toMatch(/undefined|\[object|\bat .*\.ts/)
          expect([allowed, next, received].join()).not.toMatch(/\[object/)
          if (range !== undefined) {
            const lines = (reading.texts.get(file) ?? '').split('\n').length
            expect(range.line).toBeGreaterThanOrEqual(1)
            expect(range.endLine).toBeLessThanOrEqual(lines)
            expect(range.endLine * 1e4 + range.endColumn).toBeGreaterThanOrEqual(range.line * 1e4 + range.column)
          }
        }
      }),
      { seed: 7, numRuns: 250 },
    )
    expect(Object.keys(Object.prototype)).toEqual([])
  })
})
