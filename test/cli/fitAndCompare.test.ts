import { readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, test } from 'vitest'
import { namesIn, offblack, workFolder } from './offblack.js'

const STACK = 'stacks/dive-computer.stack.yaml'
const SAMPLE = 'stacks/measured/dive-computer-prototype-a.csv'
const READINGS = 'nm,8/0,45/90\n450,0.05,0.07\n550,0.04,0.06\n650,0.05,0.07\n'

describe('fit', () => {
  test('finds the planted faults of the demo sample and writes what it found', async () => {
    const folder = workFolder()
    const { code, stdout } = await offblack(['fit', STACK, '--measured', SAMPLE, '--json', '--out', 'out'], folder)
    expect(code).toBe(0)
    const { parameters, unresolved } = JSON.parse(stdout)
    // As planted: test/stacks/measuredSample.test.ts.
    const truth = {
      'half.retardance': 267,
      'quarter.slow_axis': 91.3,
      'half.slow_axis': 22.5,
      'quarter.retardance': 140,
    }
    for (const [path, value] of Object.entries(truth)) {
      expect(Math.abs(parameters[path].value - value), path).toBeLessThan(3 * parameters[path].std_error)
    }
    expect(unresolved).toEqual([])
    expect(namesIn(join(folder, 'out'))).toEqual([
      'dive-computer.fit.json',
      'dive-computer.residuals.csv',
      'dive-computer.residuals.png',
      'dive-computer.residuals.svg',
    ])
    const rows = readFileSync(join(folder, 'out', 'dive-computer.residuals.csv'), 'utf8')
      .trim()
      .split('\r\n')
    expect(rows).toHaveLength(1 + 6 * 31)
  })

  test.each<[string, readonly string[], Readonly<Record<string, string>>, RegExp]>([
    ['no --measured', [], {}, /required option '--measured <csv>'/],
    ['a missing sample', ['--measured', 'none.csv'], {}, /none\.csv {2}error: there is no such file/],
    ['a folder', ['--measured', 'stacks'], {}, /this is a folder/],
    [
      'theta beyond grazing',
      ['--measured', 's.csv'],
      { 's.csv': READINGS.replace('45/', '95/') },
      /s\.csv:1:1 .*theta is out/,
    ],
    [
      'micrometers',
      ['--measured', 's.csv'],
      { 's.csv': READINGS.replace('450,', '0.45,') },
      /s\.csv:2:1 .*wavelength is out/,
    ],
    ['percent', ['--measured', 's.csv'], { 's.csv': READINGS.replace('0.06', '6') }, /s\.csv:3:1 .*reflectance is out/],
    ['too little data', ['--measured', 's.csv'], { 's.csv': 'nm,8/0\n450,0.05\n' }, /too few readings for 4 free/],
  ])('%s: exit 2, told why, nothing written', async (_, options, files, message) => {
    const folder = workFolder(files)
    const { code, stdout, stderr } = await offblack(['fit', STACK, ...options, '--out', 'out'], folder)
    expect([code, stdout]).toEqual([2, ''])
    expect(stderr).toMatch(message)
    expect(namesIn(folder)).toEqual(Object.keys(files))
  })
})

/** Two films for one slot, angles as they are: quick, whatever is done with it. */
const FILMS = {
  'half-a.film.yaml':
    'format: 1\nname: A\nkind: retarder\nretardance: 262 nm\nthickness: 26 um\nindex: 1.53\nprice_per_m2: 12\n',
  'half-b.film.yaml':
    'format: 1\nname: B\nkind: retarder\nretardance: 280 nm\nthickness: 20 um\nindex: 1.53\nprice_per_m2: 9\n',
}

function compareFolder(): string {
  const folder = workFolder(FILMS)
  const text = readFileSync(join(folder, STACK), 'utf8')
    .replace('{file: spectra/oled-panel-reflectance.csv}', '45 %')
    .replace(/slots:\n( {4}.*\n)+ {2}optimize: true/, 'slots: {half: [half-*.film.yaml]}\n  optimize: true')
  writeFileSync(join(folder, 'my.stack.yaml'), text)
  return folder
}

describe('compare', () => {
  test('ranks the films, draws them, and takes up what is in hand', async () => {
    const folder = compareFolder()
    const first = await offblack(['compare', 'my.stack.yaml', '--json', '--out', 'out'], folder)
    expect([0, 3]).toContain(first.code)
    const { candidates, front_axes, front } = JSON.parse(first.stdout)
    expect(candidates.map(({ films }: { films: { half: string } }) => films.half).sort()).toEqual(['A', 'B'])
    expect(front_axes).toEqual(['objective', 'emission_transmittance@0,0', 'price_per_m2'])
    expect(front).toContain(0)
    expect(namesIn(join(folder, 'out'))).toEqual([
      'my.candidates-2.png',
      'my.candidates-2.svg',
      'my.candidates.png',
      'my.candidates.svg',
      'my.compare.csv',
      'my.compare.json',
      'my.compare.jsonl',
    ])
    // A run cut off while it wrote its last line.
    const store = join(folder, 'out', 'my.compare.jsonl')
    writeFileSync(store, readFileSync(store, 'utf8').slice(0, -20))
    const again = await offblack(['compare', 'my.stack.yaml', '--json', '--out', 'out'], folder)
    expect(again.stdout).toBe(first.stdout)
    expect(again.stderr).toContain('in hand from an earlier run: 1 result')
    const other = await offblack(['compare', 'my.stack.yaml', '--json', '--seed', '2', '--out', 'out'], folder)
    expect(other.stderr).not.toContain('in hand')
  })

  test.each([
    [['--front', 'darkness'], /--front darkness {2}error: there is no metric "darkness"/],
    [['--front', 'objektive'], /did you mean "?objective/i],
    [['--front', 'chroma@95,0'], /the eye stands in front of the screen/],
    [['--keep', '0'], /whole number from 1/],
    [['--front', 'price_per_m2', '--set', 'half.slow_axes=3'], /slow_axes/],
  ])('%j: exit 2, told why, nothing written', async (options, message) => {
    const folder = compareFolder()
    const { code, stdout, stderr } = await offblack(['compare', 'my.stack.yaml', ...options, '--out', 'out'], folder)
    expect([code, stdout]).toEqual([2, ''])
    expect(stderr).toMatch(message)
    expect(namesIn(folder)).not.toContain('out')
  })
})
