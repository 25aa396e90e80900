import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { formulaAt, prepareFormula } from '../../src/materials/formula.js'
import { FORMULA_LIMITS } from '../../src/materials/formulaVocabulary.js'

describe('nothing but arithmetic gets through', () => {
  test.each([
    'constructor',
    '__proto__',
    'toString()',
    'wavelength_nm.constructor',
    'wavelength_nm["constructor"]',
    'sqrt.constructor("return 1")()',
    'cos.constructor("return process")().exit()',
    'import({a: 1})',
    'import("fs")',
    'createUnit("x")',
    'evaluate("1")',
    'parse("1")',
    'simplify("1")',
    'derivative("x", "x")',
    'config({})',
    'typed({})',
    'zeros(1e9)',
    'ones(1e5, 1e5)',
    'range(0, 1e9)',
    'factorial(1e7)',
    '170!',
    'a = 1',
    'wavelength_nm = 1',
    'sqrt = 1',
    'pi = 3',
    'f(x) = x^2',
    'f(x)=f(x); f(1)',
    '1; 2',
    '1\n2',
    '1 # note',
    '[1, 2]',
    '[1, 2][1]',
    '{a: 1}',
    '{a: 1}.a',
    '1:1e9',
    '"text"',
    "'text'",
    '`text`',
    '$' + '{1}',
    '5 nm',
    '5 nm to um',
    '2 in',
    'i',
    'true',
    'null',
    'undefined',
    'NaN',
    'Infinity',
    'end',
    'ans',
    '1 < 2',
    '1 == 1',
    '1 ? 2 : 3',
    'not 1',
    '1 and 1',
    '5 mod 2',
    '5 % 2',
    '50%',
    '5 & 3',
    '5 | 3',
    '~5',
    '1 << 30',
    "5'",
    '2 .* 3',
    '2 .^ 3',
    '0x10',
    '0b11',
    '1i',
    '1 /* note */',
    '\\u0061',
    'ｓｑｒｔ(2)',
    '１ + １',
    'wavelength_nm\u200b',
    'wavelength\u2024nm',
    '1\u00a0+ 1',
    '1\u0000',
    '\ud800',
    '💥',
    'λ',
    'ПИ',
    '\u202e1 + 2',
  ])('%j', async (text) => {
    const fault = await prepareFormula(text)
    expect(fault?.message).toBeTruthy()
    expect(fault?.column).toBeGreaterThanOrEqual(1)
    expect(fault?.column).toBeLessThanOrEqual(text.length + 1)
    expect(() => formulaAt(text, { wavelength_nm: 550, wavelength_um: 0.55 })).toThrow('not prepared')
  })
})

describe('size', () => {
  test.each([
    ['a megabyte of sums', `${'1+'.repeat(5e5)}1`],
    ['a megabyte of blanks', ' '.repeat(1e6)],
    ['a megabyte of one number', '9'.repeat(1e6)],
    ['a hundred thousand parentheses', `${'('.repeat(1e5)}1${')'.repeat(1e5)}`],
  ])('%s is refused at once', async (_, text) => {
    const start = performance.now()
    const fault = await prepareFormula(text)
    expect(performance.now() - start).toBeLessThan(100)
    expect(fault?.message).toBe(`the formula has ${text.length} characters; at most 500 are read`)
  })

  test('the bound on length is exact', async () => {
    const longest = `1${'+1'.repeat(249)} `
    expect(longest.length).toBe(FORMULA_LIMITS.length)
    expect(await prepareFormula(longest)).toBeUndefined()
    expect(formulaAt(longest, {})).toBe(250)
    expect((await prepareFormula(`${longest} `))?.column).toBe(501)
  })

  test('the bound on nesting is exact', async () => {
    const nested = (depth: number) => `${'('.repeat(depth)}1${')'.repeat(depth)}`
    expect(await prepareFormula(nested(FORMULA_LIMITS.depth))).toBeUndefined()
    expect(formulaAt(nested(FORMULA_LIMITS.depth), {})).toBe(1)
    expect(await prepareFormula(nested(FORMULA_LIMITS.depth + 1))).toMatchObject({
      message: 'parentheses are nested deeper than 40',
      column: 41,
    })
  })

  test('signs and powers as long as a formula may be neither hang nor overflow', async () => {
    const signs = `${'-'.repeat(499)}1`
    const powers = `1${'^1'.repeat(249)}`
    expect(await prepareFormula(signs)).toBeUndefined()
    expect(formulaAt(signs, {})).toBe(-1)
    expect(await prepareFormula(powers)).toBeUndefined()
    expect(formulaAt(powers, {})).toBe(1)
  })
})

describe('random texts', () => {
  const values = { wavelength_nm: 550, wavelength_um: 0.55 }

  async function isNumberOrFault(text: string): Promise<void> {
    const fault = await prepareFormula(text)
    if (fault === undefined) expect(typeof formulaAt(text, values)).toBe('number')
    else {
      expect(fault.message.length).toBeGreaterThan(5)
      expect(fault.column).toBeGreaterThanOrEqual(1)
      expect(fault.column).toBeLessThanOrEqual(text.length + 1)
    }
  }

  test('of any characters', async () => {
    await fc.assert(fc.asyncProperty(fc.string({ unit: 'binary', maxLength: 60 }), isNumberOrFault), {
      seed: 5,
      numRuns: 2000,
    })
  })

  test('of the words of the language', async () => {
    const words = fc.constantFrom(
      ...[
        '1',
        '2.5',
        '1e3',
        '.',
        'e',
        'pi',
        'wavelength_nm',
        'wavelength_um',
        'sqrt',
        'pow',
        'min',
        'constructor',
        'to',
        'mod',
      ],
      ...['+', '-', '*', '/', '^', '(', ')', ',', ' ', '=', '[', ']', '"', ';', ':', '!', "'", '%', 'v0'],
    )
    const texts = fc.array(words, { maxLength: 20 }).map((parts) => parts.join(''))
    await fc.assert(fc.asyncProperty(texts, isNumberOrFault), { seed: 6, numRuns: 3000 })
  })

  test('nothing is left behind on the language itself', async () => {
    const variables = ['__proto__']
    expect(await prepareFormula('__proto__ + 1', variables)).toBeUndefined()
    expect(formulaAt('__proto__ + 1', Object.fromEntries([['__proto__', 1]]), variables)).toBe(2)
    expect(Object.keys(Object.prototype)).toEqual([])
  })
})
