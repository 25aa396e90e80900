import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, test } from 'vitest'
import { VERBS } from '../../src/cli/verbs.js'
import { ROOT } from '../sourceFiles.js'
import { offblack, outcomeOf, startOffblack, workFolder } from './offblack.js'

describe('usage', () => {
  test('an unknown verb or option is answered with the nearest', async () => {
    const folder = workFolder()
    const verb = await offblack(['evalute', 'x'], folder)
    expect([verb.code, verb.stdout]).toEqual([2, ''])
    expect(verb.stderr).toContain('Did you mean evaluate?')
    const option = await offblack(['evaluate', 'x', '--jsn'], folder)
    expect(option.code).toBe(2)
    expect(option.stderr).toContain('Did you mean --json?')
  })

  test.each([
    [['evaluate']],
    [['evaluate', 'a', 'b']],
    [['evaluate', 'a', '--workers', '0']],
    [['evaluate', 'a', '--workers', '2.5']],
    [['optimize', 'a', '--seed', 'x']],
    [[]],
  ])('%j is not how to use it: exit 2, no stack trace', async (args) => {
    const { code, stdout, stderr } = await offblack(args, workFolder())
    expect([code, stdout]).toEqual([2, ''])
    expect(stderr).not.toMatch(/^ +at .*[:(]/m)
  })

  test('--version is that of the package', async () => {
    const { version } = JSON.parse(readFileSync(join(ROOT, 'package.json'), 'utf8'))
    expect(await offblack(['--version'], workFolder())).toEqual({ code: 0, stdout: `${version}\n`, stderr: '' })
  })

  test('--help is quick', async () => {
    const folder = workFolder()
    const times: number[] = []
    for (let run = 0; run < 5; run++) {
      const begun = performance.now()
      expect((await offblack(['--help'], folder)).code).toBe(0)
      times.push(performance.now() - begun)
    }
    // Printed for the reader: a busy machine must not fail the tests.
    console.log(`--help: ${Math.min(...times).toFixed(0)} ms at best of 5, the whole process`)
  })
})

/** Verbs that answer until they are stopped; they print their address. */
const SERVING = ['tune']

describe('every verb', () => {
  test.each(VERBS.map(({ name }) => name))(
    '%s --help ends with an example that runs',
    { timeout: 180_000 },
    async (name) => {
      const folder = workFolder()
      const help = await offblack([name, '--help'], folder)
      expect(help.code).toBe(0)
      const example = help.stdout.trimEnd().split('\n').at(-1) ?? ''
      expect(example).toMatch(new RegExp(`^ {2}offblack ${name}\\b`))
      const [command] = example.trim().split(' > ')
      const child = startOffblack(command.split(' ').slice(1), folder)
      if (SERVING.includes(name)) child.stdout?.once('data', () => child.kill('SIGINT'))
      const { code, stdout, stderr } = await outcomeOf(child)
      expect(stderr).not.toContain('error')
      if (SERVING.includes(name)) expect(stdout).toContain('http://127.0.0.1')
      else expect([0, 3]).toContain(code)
    },
  )
})
