import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { formulaAt, prepareFormula } from '../../src/materials/formula.js'

async function evaluate(text: string, values: Readonly<Record<string, number>> = {}): Promise<number> {
  const variables = Object.keys(values)
  const fault = await prepareFormula(text, variables)
  if (fault !== undefined) throw new Error(`${text}: ${fault.message}`)
  return formulaAt(text, values, variables)
}

describe('values', () => {
  test.each([
    // The usual precedence of mathematical notation; powers bind to the right and before a sign.
    ['1 + 2 * 3', 7],
    ['(1 + 2) * 3', 9],
    ['10 - 4 - 3', 3],
    ['16 / 4 / 2', 2],
    ['2^3^2', 512],
    ['-2^2', -4],
    ['2 * -3', -6],
    ['2^-1', 0.5],
    ['2 - -3', 5],
    ['+5', 5],
    ['.5 + 5. + 1.5e1 + 2E-1', 20.7],
    ['pow(2, 10) - min(3, 1, 2) + max(4, 9)', 1032],
    ['sqrt(16) + abs(-3) + log10(1000)', 10],
    ['log(e^2)', 2],
    ['exp(log(7))', 7],
    ['sin(pi / 2) + cos(pi)', 0],
    ['4 * atan(1) - pi', 0],
    ['tan(pi / 4)', 1],
    // A folded text of YAML ends in a line break.
    ['1 +\r\n\t2\n', 3],
  ])('%s = %d', async (text, value) => {
    expect(await evaluate(text)).toBeCloseTo(value, 12)
  })

  test('a parameter path is a variable', async () => {
    expect(await evaluate('half.slow_axis*2+45', { 'half.slow_axis': 15 })).toBe(75)
    expect(await evaluate('layers.2.thickness/2', { 'layers.2.thickness': 9 })).toBe(4.5)
  })

  test('the longest name is meant, and a path is no product of its parts', async () => {
    const values = { film: 1, 'film.nz': 10, 'film.nz_b': 100, 'film-2.nz': 1000 }
    expect(await evaluate('film + film.nz + film.nz_b + film-2.nz', values)).toBe(1111)
    expect(await evaluate('film-2', values)).toBe(-1)
  })

  test('a name like those used inside is refused, a variable of that name is itself', async () => {
    expect((await prepareFormula('a.b + v0', ['a.b']))?.message).toBe('"v0" is not a known name')
    expect(await evaluate('v1 - v0', { v0: 5, v1: 7 })).toBe(2)
    expect(await evaluate('v0', { v1: 5, v0: 7 })).toBe(7)
  })

  test('a variable may hide a constant or a function', async () => {
    expect(await evaluate('e * 2', { e: 10 })).toBe(20)
    expect(await evaluate('min / 2', { min: 10 })).toBe(5)
  })

  test('the same text with other variables is another formula', async () => {
    expect(await evaluate('a + 1', { a: 1 })).toBe(2)
    expect((await prepareFormula('a + 1', ['b']))?.column).toBe(1)
    expect(() => formulaAt('a + 1', { b: 1 }, ['b'])).toThrow('not prepared')
  })

  test('any tree of the operators comes back as it was computed', async () => {
    interface Tree {
      text: string
      value: number
    }
    const { tree } = fc.letrec<{ tree: Tree; leaf: Tree; pair: Tree }>((tie) => ({
      tree: fc.oneof({ maxDepth: 4, withCrossShrink: true }, tie('leaf'), tie('pair')),
      leaf: fc.oneof(
        fc.integer({ min: 0, max: 99 }).map((value) => ({ text: `${value}`, value })),
        fc.double({ min: 1e-3, max: 1e3, noNaN: true }).map((value) => ({ text: `${value}`, value })),
        fc.constant({ text: 'quarter.slow_axis', value: 12.5 }),
      ),
      pair: fc.tuple(fc.constantFrom('+', '-', '*', '/'), tie('tree'), tie('tree')).map(([sign, a, b]) => ({
        text: `(${a.text} ${sign} ${b.text})`,
        value: { '+': a.value + b.value, '-': a.value - b.value, '*': a.value * b.value, '/': a.value / b.value }[
          sign
        ] as number,
      })),
    }))
    await fc.assert(
      fc.asyncProperty(
        tree.filter(({ text }) => text.length <= 500),
        async ({ text, value }) => {
          expect(await evaluate(text, { 'quarter.slow_axis': 12.5 })).toBe(value)
        },
      ),
      { seed: 3, numRuns: 300 },
    )
  })
})

describe('faults tell what was found and where', () => {
  test.each([
    ['', 1, 'the formula is empty'],
    [' \t', 1, 'the formula is empty'],
    ['1 + wavelength', 5, '"wavelength" is not a known name'],
    ['wavelength_nm.x', 1, '"wavelength_nm.x" is not a known name'],
    ['1.5 × 2', 5, '"×" cannot stand in a formula; write *'],
    ['wavelength_nm²', 14, '"²" cannot stand in a formula; write ^2'],
    ['1 − 2', 3, '"−" cannot stand in a formula; write -'],
    ['2 pi', 3, 'an operator is missing between "2" and "pi"'],
    ['2(3)', 2, 'an operator is missing between "2" and "("'],
    ['pi(2)', 3, 'an operator is missing between "pi" and "("'],
    ['1e', 2, 'an operator is missing between "1" and "e"'],
    ['sqrt 2', 1, 'the function sqrt needs (…) behind it'],
    ['1 + sqrt', 5, 'the function sqrt needs (…) behind it'],
    ['1e999', 1, 'the number 1e999 is too large'],
    ['(1 + 2', 1, '"(" is not closed'],
    ['wavelength_nm + 1)', 18, '")" closes nothing'],
    ['wavelength_nm *', 16, 'cannot be read as a formula: unexpected end of expression'],
    ['wavelength_nm *  / 2', 18, 'cannot be read as a formula: value expected'],
    ['1,5', 2, 'a comma stands only between the arguments of a function; decimals are written 1.5'],
    ['max((1, 2))', 7, 'a comma stands only between the arguments of a function; decimals are written 1.5'],
    ['2 * ()', 6, 'cannot be read as a formula: value expected'],
    ['max(1,)', 7, 'cannot be read as a formula: value expected'],
    ['1 + sin(1, 2)', 5, 'the function sin takes 1 argument, not 2'],
    ['sqrt()', 1, 'the function sqrt takes 1 argument, not 0'],
    ['pow(2)', 1, 'the function pow takes 2 arguments, not 1'],
  ])('%s', async (text, column, message) => {
    const fault = await prepareFormula(text)
    expect(fault).toMatchObject({ column, message })
    expect(fault?.allowed).toContain('wavelength_nm, wavelength_um, pi, e, + - * / ^')
  })
})
