import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, test } from 'vitest'
import { namesIn, offblack, outcomeOf, startOffblack, workFolder } from './offblack.js'
import { SMALL_STACK } from './smallStack.js'

const FILE = 'small.stack.yaml'
const TOLERANCE = `tolerance:
  samples: 600
  vary:
    quarter.slow_axis: {normal: 1 deg}
    quarter.retardance: {normal: 3 nm, limit: 8 nm}
`
const BETTER = ['--set', 'quarter.slow_axis=45deg', '--set', 'quarter.retardance=138nm']
const folderWithStack = (): string => workFolder({ [FILE]: SMALL_STACK + TOLERANCE })

describe('tolerance', () => {
  test('gives the same digits for any number of threads', async () => {
    const folder = folderWithStack()
    const [one, three] = await Promise.all(
      ['1', '3'].map((workers) => offblack(['tolerance', FILE, ...BETTER, '--json', '--workers', workers], folder)),
    )
    expect(three.stdout).toBe(one.stdout)
    expect(JSON.parse(one.stdout)).toMatchObject({ draws: 600, interrupted: false, design_meets_limits: true })
  })

  test('the exit code tells whether the wanted yield is reached', async () => {
    const folder = folderWithStack()
    const codeOf = async (...args: string[]) =>
      (await offblack(['tolerance', FILE, '--draws-only', ...args], folder)).code
    expect(await codeOf(...BETTER)).toBe(0)
    expect(await codeOf()).toBe(3)
    expect(await codeOf('--wanted-yield', '1%')).toBe(3)
    expect(await codeOf('--wanted-yield', '101 %')).toBe(2)
  })

  test('--out writes every draw beside the rest', async () => {
    const folder = folderWithStack()
    const { code } = await offblack(
      ['tolerance', FILE, ...BETTER, '--draws-only', '--samples', '300', '--out', 'out'],
      folder,
    )
    expect(code).toBe(0)
    expect(namesIn(join(folder, 'out'))).toEqual(
      expect.arrayContaining(['small.draws.csv', 'small.tolerance.csv', 'small.tolerance.json']),
    )
    const [headings, ...rows] = readFileSync(join(folder, 'out/small.draws.csv'), 'utf8').trimEnd().split('\r\n')
    expect(headings).toBe('quarter.slow_axis,quarter.retardance,color_weighted_reflectance,luminous_reflectance,chroma')
    expect(rows).toHaveLength(300)
    const { metrics } = JSON.parse(readFileSync(join(folder, 'out/small.tolerance.json'), 'utf8'))
    const mean = rows.reduce((sum, row) => sum + Number(row.split(',')[3]), 0) / rows.length
    expect(mean).toBeCloseTo(metrics.luminous_reflectance.mean, 12)
  })

  test('Ctrl-C keeps the draws made so far, and exits with 130', async () => {
    const folder = folderWithStack()
    const child = startOffblack(['tolerance', FILE, '--samples', '50000000', '--out', 'out', '--json'], folder)
    const ended = outcomeOf(child)
    child.stderr?.once('data', () => child.kill('SIGINT'))
    const { code, stdout } = await ended
    expect(code).toBe(130)
    const { draws, interrupted } = JSON.parse(stdout)
    expect(interrupted).toBe(true)
    expect(draws).toBeGreaterThan(0)
    const rows = readFileSync(join(folder, 'out/small.draws.csv'), 'utf8').trimEnd().split('\r\n')
    expect(rows).toHaveLength(draws + 1)
    expect(namesIn(join(folder, 'out')).filter((name) => name.includes('partial'))).toEqual([])
  })
})
