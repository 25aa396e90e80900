import { expect, test } from 'vitest'
import { namesIn, offblack, workFolder } from './offblack.js'
import { firstChangedLine, SMALL_STACK } from './smallStack.js'

/** Ways to be wrong: what stands in the file, what is put in its place, and a word the message must hold. */
const SPOILED: readonly (readonly [name: string, from: string, to: string, word: RegExp])[] = [
  ['a misspelt field', 'slow_axis: 30 deg', 'slow_axs: 30 deg', /did you mean "slow_axis"/],
  ['an unknown layer kind', 'kind: retarder', 'kind: retardr', /did you mean "retarder"/],
  ['an unknown unit', 'retardance: 120 nm', 'retardance: 120 parsec', /parsec/],
  ['an angle for a length', 'thickness: 25 um', 'thickness: 25 deg', /deg/],
  ['a negative thickness', 'thickness: 25 um', 'thickness: -25 um', /-25 um/],
  ['a share above one', 'reflectance: 45 %', 'reflectance: 145 %', /145 %/],
  ['a word for a number', 'index: 1.55', 'index: high', /high/],
  ['an unknown material', 'index: 1.55', 'index: {material: unobtanium}', /unobtanium/],
  ['a missing spectrum', 'index: 1.55', 'index: {file: nowhere.csv}', /nowhere\.csv/],
  ['a formula that reaches out', 'index: 1.55', "index: {formula: 'import(1)'}", /import/],
  ['a broken bracket', 'ambient: [500]', 'ambient: [500}', /flow|\]/],
  ['a tab for indentation', '  observer: 2 deg', '\tobserver: 2 deg', /tab/i],
  ['the same key twice', 'ambient: [500]', 'format: 1', /twice/],
  ['the same id twice', 'id: quarter', 'id: polarizer', /polarizer/],
  ['an unknown illuminant', 'illuminant: D65', 'illuminant: D66', /D66/],
  ['no direction', 'directions: [{theta: 0 deg, phi: 0 deg}]', 'directions: []', /direction/],
  ['a direction along the surface', 'directions: [{theta: 0 deg', 'directions: [{theta: 90 deg', /theta|90/],
  [
    'an unknown metric',
    'metric: luminous_reflectance, theta',
    'metric: luminous_reflectence, theta',
    /did you mean "luminous_reflectance"/,
  ],
  ['a path that leads nowhere', 'quarter.slow_axis: {from', 'quartr.slow_axis: {from', /quarter/],
  ['bounds upside down', '{from: 90 nm, to: 190 nm}', '{from: 190 nm, to: 90 nm}', /190|from|below/],
  ['a transmittance the faces forbid', 'single_transmittance: 43 %', 'single_transmittance: 60 %', /transmittance/],
  ['a missing version', 'format: 1', 'format: 7', /7/],
]

test.each(SPOILED)('%s: exit 2, the line named, nothing written', async (_, from, to, word) => {
  const text = SMALL_STACK.replace(from, to)
  expect(text).not.toBe(SMALL_STACK)
  const folder = workFolder({ 'wrong.stack.yaml': text })
  const { code, stdout, stderr } = await offblack(['evaluate', 'wrong.stack.yaml', '--out', 'out'], folder)
  expect(stderr).toMatch(new RegExp(`^wrong\\.stack\\.yaml:${firstChangedLine(text)}:\\d+`, 'm'))
  expect(stderr).toMatch(word)
  expect(stderr).not.toMatch(/^ +at .*[:(]/m)
  expect(stdout).toBe('')
  expect(code).toBe(2)
  expect(namesIn(folder)).toEqual(['wrong.stack.yaml'])
})

test('several at once are all told, with their number', async () => {
  const text = SMALL_STACK.replace('slow_axis: 30 deg', 'slow_axs: 30 deg').replace('45 %', '145 %')
  const { code, stderr } = await offblack(['check', 'wrong.stack.yaml'], workFolder({ 'wrong.stack.yaml': text }))
  expect(code).toBe(2)
  expect(stderr).toContain('slow_axs')
  expect(stderr).toContain('145 %')
  expect(stderr).toMatch(/\n[2-9] errors\n$/)
})

test('check --json tells the same as data, on stdout', async () => {
  const text = SMALL_STACK.replace('slow_axis: 30 deg', 'slow_axs: 30 deg')
  const { code, stdout } = await offblack(['check', 'w.yaml', '--json'], workFolder({ 'w.yaml': text }))
  const { ok, problems } = JSON.parse(stdout)
  expect([code, ok]).toEqual([2, false])
  expect(problems[0]).toMatchObject({ file: 'w.yaml', range: { line: firstChangedLine(text) } })
})

test('a wrong --set is named as such', async () => {
  const folder = workFolder({ 'a.stack.yaml': SMALL_STACK })
  const { code, stderr } = await offblack(['evaluate', 'a.stack.yaml', '--set', 'quartr.slow_axis=3deg'], folder)
  expect(code).toBe(2)
  expect(stderr).toContain('--set quartr.slow_axis=3deg')
  expect(stderr).toContain('did you mean "quarter')
})

test('a file that is not there is told with its neighbor', async () => {
  const folder = workFolder({ 'watch.stack.yaml': SMALL_STACK })
  const { code, stderr } = await offblack(['evaluate', 'wach.stack.yaml'], folder)
  expect(code).toBe(2)
  expect(stderr).toContain('there is no such file')
  expect(stderr).toContain('did you mean "watch.stack.yaml"?')
})

test('a folder, and bytes that are no text, are told as such', async () => {
  const folder = workFolder({ 'bytes.yaml': 'a\u0000b' })
  expect((await offblack(['evaluate', '.'], folder)).stderr).toContain('this is a folder')
  expect((await offblack(['evaluate', 'bytes.yaml'], folder)).stderr).toContain('not UTF-8 text')
})

test('a verb whose question the file does not ask says what is missing', async () => {
  const text = SMALL_STACK.slice(0, SMALL_STACK.indexOf('optimize:'))
  const { code, stderr } = await offblack(['optimize', 'a.stack.yaml'], workFolder({ 'a.stack.yaml': text }))
  expect(code).toBe(2)
  expect(stderr).toContain('no section "optimize"')
})
