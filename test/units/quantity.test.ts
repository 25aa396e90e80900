import fc from 'fast-check'
import { expect, test } from 'vitest'
import {
  displayUnit,
  formatQuantity,
  fromDisplay,
  fromPlain,
  isFault,
  parseQuantity,
  type QuantityKind,
  toDisplay,
  toPlain,
} from '../../src/units/quantity.js'

// SI prefixes and the degree: the International System of Units, 9th edition, tables 7 and 8. Exact equality is meant.
const READ: [unknown, QuantityKind, number][] = [
  [138, 'length', 138],
  ['138', 'length', 138],
  ['138 nm', 'length', 138],
  ['138nm', 'length', 138],
  ['25 um', 'length', 25_000],
  ['25 \u00b5m', 'length', 25_000],
  ['25 \u03bcm', 'length', 25_000],
  ['0.7 mm', 'length', 700_000],
  ['1.2e-3 mm', 'length', 1200],
  ['1.1 um', 'length', 1100],
  ['.5 um', 'length', 500],
  ['  -70  ', 'length', -70],
  ['+7. nm', 'length', 7],
  [30, 'angle', (30 * Math.PI) / 180],
  ['45 deg', 'angle', (45 * Math.PI) / 180],
  ['45deg', 'angle', Math.PI / 4],
  ['45°', 'angle', Math.PI / 4],
  ['0.5 rad', 'angle', 0.5],
  ['43.2 %', 'share', 0.432],
  ['43.2%', 'share', 0.432],
  ['99.98 %', 'share', 0.9998],
  ['7 %', 'share', 0.07],
  ['0.432', 'share', 0.432],
  [0.432, 'share', 0.432],
  [1e-7, 'number', 1e-7],
  ['1E3', 'number', 1000],
  ['10 klx', 'illuminance', 10_000],
  ['500 lx', 'illuminance', 500],
  ['600 cd/m2', 'luminance', 600],
  ['600 cd/m²', 'luminance', 600],
  ['5000 K', 'temperature', 5000],
]
test.each(READ)('%j as %s is %d', (raw, kind, value) => {
  expect(parseQuantity(raw, kind)).toBe(value)
})

const REFUSED: [unknown, QuantityKind, string | undefined][] = [
  ['12,5 nm', 'length', 'write the decimal point as a dot'],
  ['45 deg', 'length', '"deg" is a unit of angle'],
  ['138 nm', 'angle', '"nm" is a unit of length'],
  ['4 %', 'number', '"%" is a unit of share'],
  ['45 degrees', 'length', '"degrees" is a unit of angle'],
  ['45 degrees', 'angle', 'the unit "degrees" is written deg'],
  ['25 microns', 'length', 'the unit "microns" is written um'],
  ['138 NM', 'length', 'the unit "NM" is written nm'],
  ['600 nits', 'luminance', 'the unit "nits" is written cd/m2'],
  ['3 furlongs', 'length', '"furlongs" is not a unit known here'],
  ['1 000 nm', 'length', 'write the number without spaces'],
  ['\u221270 nm', 'length', 'write the minus sign as a plain hyphen'],
  ['nm', 'length', 'the number is missing'],
  ['', 'length', 'the value is empty'],
  [Number.NaN, 'length', 'the number is not finite'],
  [Infinity, 'share', 'the number is not finite'],
  ['1e400 nm', 'length', 'the number is not finite'],
  ['.nan', 'length', 'the number is not finite'],
  ['-Infinity', 'number', 'the number is not finite'],
  ['constructor', 'length', undefined],
  ['5 constructor', 'length', '"constructor" is not a unit known here'],
  ['thick', 'length', undefined],
  [true, 'angle', undefined],
  [null, 'angle', undefined],
  [[1], 'angle', undefined],
  [{ n: 1 }, 'angle', undefined],
]
test.each(REFUSED)('%j as %s is refused', (raw, kind, hint) => {
  const fault = parseQuantity(raw, kind)
  if (!isFault(fault)) throw new Error('it was read')
  expect(fault.hint).toBe(hint)
  expect(fault.allowed).toMatch(/^an? /)
  expect(fault.received).not.toBe('')
})

test('what is allowed names the units, and its examples can be read', () => {
  const kinds: QuantityKind[] = ['length', 'angle', 'share', 'illuminance', 'luminance', 'temperature']
  for (const kind of kinds) {
    const fault = parseQuantity(undefined, kind)
    if (!isFault(fault)) throw new Error('nothing was read')
    expect(fault.received).toBe('nothing')
    const examples = fault.allowed.match(/[\d.]+ [^\s,()]+/g) ?? []
    expect(examples.length).toBeGreaterThan(0)
    for (const example of examples) expect(isFault(parseQuantity(example.replace(/ or$/, ''), kind))).toBe(false)
  }
})

const WRITTEN: [number, QuantityKind, string][] = [
  [138, 'length', '138 nm'],
  [Math.PI / 4, 'angle', '45 deg'],
  [(29.7 * Math.PI) / 180, 'angle', '29.7 deg'],
  [0.432, 'share', '43.2 %'],
  [0.07, 'share', '7 %'],
  [1.55, 'number', '1.55'],
  [500, 'illuminance', '500 lx'],
  [600, 'luminance', '600 cd/m2'],
  [6504, 'temperature', '6504 K'],
]
test.each(WRITTEN)('%d of %s is written %s', (value, kind, text) => {
  expect(formatQuantity(value, kind)).toBe(text)
})

test('with a number of significant digits', () => {
  expect(formatQuantity(137.6789, 'length', 4)).toBe('137.7 nm')
  expect(formatQuantity(1.23456, 'angle', 3)).toBe('70.7 deg')
})

const ALL_KINDS: QuantityKind[] = ['length', 'angle', 'share', 'number', 'illuminance', 'luminance', 'temperature']

test('what is typed with up to nine digits is printed as it was typed', () => {
  const decimal = fc.tuple(fc.integer({ min: -999_999_999, max: 999_999_999 }), fc.integer({ min: 0, max: 8 }))
  fc.assert(
    fc.property(decimal, fc.constantFrom(...ALL_KINDS), ([digits, places], kind) => {
      const typed = Number(`${digits}e-${places}`)
      const unit = displayUnit(kind)
      const value = parseQuantity(`${typed} ${unit}`, kind)
      expect(value).toBe(fromDisplay(typed, kind))
      expect(formatQuantity(value as number, kind)).toBe(unit === '' ? `${typed}` : `${typed} ${unit}`)
    }),
    { seed: 8, numRuns: 1000 },
  )
})

test('shown and plain values lead back to the value', () => {
  fc.assert(
    fc.property(fc.double({ min: -1e4, max: 1e4, noNaN: true }), fc.constantFrom(...ALL_KINDS), (value, kind) => {
      const tolerance = 1e-13 * Math.abs(value)
      expect(Math.abs(fromDisplay(toDisplay(value, kind), kind) - value)).toBeLessThanOrEqual(tolerance)
      expect(Math.abs(fromPlain(toPlain(value, kind), kind) - value)).toBeLessThanOrEqual(tolerance)
    }),
    { seed: 9, numRuns: 500 },
  )
})

test('plain values are degrees, nm and fractions', () => {
  expect(toPlain(Math.PI / 6, 'angle')).toBe(30)
  expect(toPlain(0.432, 'share')).toBe(0.432)
  expect(toPlain(138, 'length')).toBe(138)
})
