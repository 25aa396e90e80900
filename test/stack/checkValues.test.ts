import { readdirSync, readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { readStack } from '../../src/stack/readStack.js'

const folder = new URL('../check-values/', import.meta.url)

describe('the check stacks', () => {
  const names = readdirSync(folder).filter((name) => name.endsWith('.stack.yaml'))
  it('are there', () => expect(names.length).toBeGreaterThanOrEqual(10))
  it.each(names)('%s reads without a problem', async (name) => {
    const reading = await readStack(readFileSync(new URL(name, folder), 'utf8'), { file: name })
    expect(reading).toMatchObject({ ok: true, warnings: [] })
  })
})
