import { execFile } from 'node:child_process'
import { readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { promisify } from 'node:util'
import { describe, expect, test } from 'vitest'
import { ROOT } from '../sourceFiles.js'
import { namesIn, offblack, outcomeOf, startOffblack, workFolder } from './offblack.js'
import { SMALL_STACK } from './smallStack.js'

const FILE = 'small.stack.yaml'
const folderWithStack = (text = SMALL_STACK): string => workFolder({ [FILE]: text })

describe('evaluate', () => {
  test('with --json prints one document and nothing else', async () => {
    const { stdout, stderr } = await offblack(['evaluate', FILE, '--json'], folderWithStack())
    const { directions, limits } = JSON.parse(stdout)
    expect(directions[0]).toMatchObject({ theta_deg: 0, phi_deg: 0, ambient_contrast: [{ illuminance_lx: 500 }] })
    expect(directions[0].spectrum.wavelength_nm).toHaveLength(16)
    expect(limits).toHaveLength(1)
    expect(stderr).toBe('')
  })

  test('tells by its exit code whether the limits are met', async () => {
    const folder = folderWithStack()
    expect((await offblack(['evaluate', FILE], folder)).code).toBe(3)
    const better = ['--set', 'quarter.slow_axis=45deg', '--set', 'quarter.retardance=138nm']
    expect((await offblack(['evaluate', FILE, ...better], folder)).code).toBe(0)
  })

  test('has no colors in a pipe unless they are forced', async () => {
    const folder = folderWithStack()
    expect((await offblack(['evaluate', FILE], folder)).stdout).not.toContain('\u001b')
    expect((await offblack(['evaluate', FILE], folder, { FORCE_COLOR: '1' })).stdout).toContain('\u001b[31m')
    const both = { FORCE_COLOR: '1', NO_COLOR: '1' }
    expect((await offblack(['evaluate', FILE], folder, both)).stdout).not.toContain('\u001b')
  })

  test('leaves in silence when nobody reads on', async () => {
    const command = `"${process.execPath}" "${join(ROOT, 'bin/offblack.js')}" evaluate ${FILE} --json | head -c 1`
    const { stdout, stderr } = await promisify(execFile)('sh', ['-c', command], { cwd: folderWithStack() })
    expect([stdout, stderr]).toEqual(['{', ''])
  })
})

describe('optimize', () => {
  test('gives the same digits for any number of threads, and meets the limit', async () => {
    const folder = folderWithStack()
    const [one, three] = await Promise.all(
      ['1', '3'].map((workers) => offblack(['optimize', FILE, '--json', '--workers', workers], folder)),
    )
    expect(three.stdout).toBe(one.stdout)
    const { start, best, limits, interrupted } = JSON.parse(one.stdout)
    expect(best.objective).toBeLessThan(start.objective / 2)
    expect(limits[0].met).toBe(true)
    expect(interrupted).toBe(false)
    expect(one.code).toBe(0)
  })

  test('--out writes the improved stack file: comments kept, files still found, the digits those of the search', async () => {
    const spectrum = 'wavelength_nm,reflectance\n400,0.40\n700,0.48\n'
    const text = SMALL_STACK.replace('reflectance: 45 %', 'reflectance: {file: panel.csv}')
    const folder = workFolder({ [FILE]: `# mine\n${text}`, 'panel.csv': spectrum })
    const { stdout } = await offblack(['optimize', FILE, '--json', '--out', 'deep/out'], folder)
    const improved = readFileSync(join(folder, 'deep/out/small.optimized.stack.yaml'), 'utf8')
    expect(improved).toContain('# mine\n')
    expect(improved).toContain('{file: ../../panel.csv}')
    const again = await offblack(['evaluate', 'deep/out/small.optimized.stack.yaml', '--json'], folder)
    const [{ luminous_reflectance }] = JSON.parse(again.stdout).directions
    expect(luminous_reflectance).toBeCloseTo(JSON.parse(stdout).best.objective, 13)
  })

  test('Ctrl-C keeps the best so far, writes it, and exits with 130', async () => {
    const more = ['polarizer.absorption_axis: {from: 0 deg, to: 180 deg}', 'quarter.nz: {from: -2, to: 3}']
    const ratios = ['re450', 're650'].map((ratio) => `quarter.dispersion.${ratio}: {from: 0.6, to: 1.4}`)
    const slow = SMALL_STACK.replace('step: 20 nm', 'step: 0.5 nm')
      .replace('  minimize:', `${[...more, ...ratios].map((line) => `    ${line}\n`).join('')}  minimize:`)
      .replace(
        'views: [{theta: 0 deg, phi: 0 deg, weight: 1}]',
        `views: [${[0, 20, 40, 60].map((t) => `{theta: ${t} deg, phi: 20 deg, weight: 1}`).join(', ')}]`,
      )
    const folder = folderWithStack(slow)
    const child = startOffblack(['optimize', FILE, '--out', 'out', '--json', '--workers', '2'], folder)
    const ended = outcomeOf(child)
    child.stderr?.once('data', () => child.kill('SIGINT'))
    const { code, stdout, stderr } = await ended
    expect(stderr).toContain('the best so far is kept')
    const { interrupted, best, start } = JSON.parse(stdout)
    expect(interrupted).toBe(true)
    expect(best.objective).toBeLessThanOrEqual(start.objective)
    expect(namesIn(join(folder, 'out'))).toContain('small.optimize.json')
    expect(code).toBe(130)
  })
})

describe('files', () => {
  test('--out makes the folder and leaves nothing but whole files', async () => {
    const folder = folderWithStack()
    const { stderr } = await offblack(['evaluate', FILE, '--out', 'a/b'], folder)
    const names = namesIn(join(folder, 'a', 'b'))
    expect(names.map((name) => name.replace('small.', ''))).toEqual([
      'evaluate.json',
      'off-state-color.png',
      'off-state-color.svg',
      'reflectance-0-0.png',
      'reflectance-0-0.svg',
      'spectra.csv',
    ])
    for (const name of names) expect(stderr).toContain(name)
    expect(JSON.parse(readFileSync(join(folder, 'a/b/small.evaluate.json'), 'utf8')).directions).toHaveLength(1)
  })

  test('a file in the way of the folder is told before the search begins', async () => {
    const folder = folderWithStack()
    writeFileSync(join(folder, 'out'), 'mine')
    const { code, stderr, stdout } = await offblack(['optimize', FILE, '--out', 'out/deeper'], folder)
    expect([code, stdout]).toEqual([2, ''])
    expect(stderr).toContain('is a file, not a folder')
    expect(readFileSync(join(folder, 'out'), 'utf8')).toBe('mine')
  })

  test('where a file cannot be written in full, the old one stays and the result is still printed', async () => {
    const folder = folderWithStack()
    await offblack(['evaluate', FILE, '--out', '.'], folder)
    const before = readFileSync(join(folder, 'small.evaluate.json'), 'utf8')
    const names = namesIn(folder)
    // The shell bounds the size of a file (blocks of 512 bytes), in place of a full disk.
    const command = `ulimit -f 1; exec "${process.execPath}" "${join(ROOT, 'bin/offblack.js')}" evaluate ${FILE} --set quarter.nz=2 --out .`
    const failed = await promisify(execFile)('sh', ['-c', command], { cwd: folder }).catch((error) => error)
    expect(failed.code).toBe(2)
    expect(failed.stderr).toContain('cannot write')
    expect(failed.stdout).toContain('luminous reflectance')
    expect(readFileSync(join(folder, 'small.evaluate.json'), 'utf8')).toBe(before)
    expect(namesIn(folder)).toEqual(names)
  })

  test('new writes a stack file that is right, and overwrites nothing', async () => {
    const folder = workFolder()
    expect((await offblack(['new', 'my.stack.yaml'], folder)).code).toBe(0)
    const text = readFileSync(join(folder, 'my.stack.yaml'), 'utf8')
    expect((await offblack(['check', 'my.stack.yaml'], folder)).stderr).toBe('')
    writeFileSync(join(folder, 'my.stack.yaml'), `${text}# mine\n`)
    const again = await offblack(['new', 'my.stack.yaml'], folder)
    expect(again.code).toBe(2)
    expect(again.stderr).toContain('exists already')
    expect(readFileSync(join(folder, 'my.stack.yaml'), 'utf8')).toBe(`${text}# mine\n`)
  })
})

describe('a fault of the program', () => {
  const sabotage = {
    NODE_OPTIONS: '--import=data:text/javascript,Math.cbrt=Math.hypot=()=>{throw(new(Error)("sabotage"))}',
  }

  test('is told as such, asks to be reported, and exits with 1', async () => {
    const { code, stdout, stderr } = await offblack(['evaluate', FILE], folderWithStack(), sabotage)
    expect([code, stdout]).toEqual([1, ''])
    expect(stderr).toContain('a fault of the program, not of your input: sabotage')
    expect(stderr).toContain('report it')
    expect(stderr).not.toMatch(/^ +at /m)
  })

  test('shows where it happened when asked', async () => {
    const { stderr } = await offblack(['evaluate', FILE], folderWithStack(), { ...sabotage, OFFBLACK_DEBUG: '1' })
    expect(stderr).toMatch(/^ +at /m)
  })
})
