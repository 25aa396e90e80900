import { mkdirSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { expect, test } from 'vitest'
import { stackFilesOnDisk } from '../../src/cli/stackFilesOnDisk.js'
import { InputError } from '../../src/stack/problem.js'
import { workFolder } from './offblack.js'

function filesBesideStack() {
  const folder = workFolder()
  mkdirSync(join(folder, 'films'))
  for (const name of ['half-b.yaml', 'half-a.yaml', 'quarter.yaml', '.half-hidden.yaml', 'half-a.yaml.bak']) {
    writeFileSync(join(folder, 'films', name), name)
  }
  return { folder, files: stackFilesOnDisk(join(folder, 'x.stack.yaml')) }
}

test('patterns list the files beside the stack file in order, hidden ones only when asked for', () => {
  const { folder, files } = filesBesideStack()
  expect(files.list('films/half-*.yaml')).toEqual(['films/half-a.yaml', 'films/half-b.yaml'])
  expect(files.list('f*/*a*.yaml')).toEqual(['films/half-a.yaml', 'films/half-b.yaml', 'films/quarter.yaml'])
  expect(files.list('films/.h*')).toEqual(['films/.half-hidden.yaml'])
  expect(files.list('films/quarter.yaml')).toEqual(['films/quarter.yaml'])
  expect(files.list(`${folder}/films/q*`)).toEqual([`${folder}/films/quarter.yaml`])
  expect(files.list('films/half-a.yaml*half-a.yaml')).toEqual([])
  expect(files.list('none/*.yaml')).toEqual([])
})

test('a pattern of many stars takes no longer for it', () => {
  const { folder, files } = filesBesideStack()
  writeFileSync(join(folder, 'a'.repeat(200)), '')
  const begun = performance.now()
  expect(files.list(`${'*a'.repeat(60)}*b`)).toEqual([])
  expect(performance.now() - begun).toBeLessThan(1000)
})

test('files are read without byte order mark; those that are not there are undefined', () => {
  const { folder, files } = filesBesideStack()
  writeFileSync(join(folder, 'bom.csv'), '\ufeff380,1')
  expect(files.read('bom.csv')).toBe('380,1')
  expect(files.read('films/../films/quarter.yaml')).toBe('quarter.yaml')
  expect(files.read('nowhere.csv')).toBeUndefined()
  expect(files.read('films/quarter.yaml/deeper')).toBeUndefined()
})

test('a file beyond the bound is refused with the bound', () => {
  const { folder, files } = filesBesideStack()
  writeFileSync(join(folder, 'large.csv'), Buffer.alloc(40 * 1024 * 1024, '1'))
  expect(() => files.read('large.csv')).toThrow(InputError)
  try {
    files.read('large.csv')
  } catch (error) {
    expect((error as InputError).problems[0]).toMatchObject({ received: '40 MB', allowed: 'at most 32 MB' })
  }
})
