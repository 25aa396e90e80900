import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import type { FilmCard } from '../../src/stack/stack.js'
import { evaluate } from '../../src/studies/evaluate.js'
import { DEMO_STACKS, demoStack, demoText, readDemo, STACKS_FOLDER } from './demoStacks.js'

const INVENTED = '# Invented demo data, no real product.'

it('shows at least eight stacks', () => expect(DEMO_STACKS.length).toBeGreaterThanOrEqual(8))

describe.each(DEMO_STACKS)('%s', (name) => {
  it('says first that it is invented', () => expect(demoText(name).split('\n')[0]).toBe(INVENTED))

  it('is read without a problem or a warning', async () => {
    expect(await readDemo(name)).toMatchObject({ ok: true, warnings: [] })
  })

  it('sends back no more than it gets, and at least what its front faces do', async () => {
    const { directions } = evaluate(await demoStack(name))
    for (const { spectrum } of directions) {
      const { reflectance, front_reflectance, emission_transmittance = [0] } = spectrum
      expect(Math.max(...reflectance, ...emission_transmittance)).toBeLessThan(1)
      expect(Math.min(...reflectance.map((r, i) => r - front_reflectance[i]))).toBeGreaterThan(-1e-12)
      expect(Math.min(...front_reflectance, ...emission_transmittance)).toBeGreaterThanOrEqual(0)
    }
  })
})

/** A search over a stack that meets all its limits already would show nothing. */
it.each([
  'bridge-repeater',
  'chart-display',
  'deck-panel',
  'dive-computer',
  'folding-logbook',
  'map-reader',
  'regatta-watch',
  'survey-watch',
])('%s misses a limit as it stands', async (name) => {
  const { limits } = evaluate(await demoStack(`${name}.stack.yaml`))
  expect(limits.filter(({ met }) => !met)).not.toEqual([])
})

describe('the files beside the stacks', () => {
  const filesIn = (folder: string): string[] =>
    readdirSync(join(STACKS_FOLDER, folder), { recursive: true, withFileTypes: true })
      .filter((entry) => entry.isFile())
      .map((entry) => join(entry.parentPath, entry.name).slice(STACKS_FOLDER.length + 1))

  it('are each used by a stack', async () => {
    const touched = new Set<string>()
    for (const name of DEMO_STACKS) await readDemo(name, [], touched)
    const unused = [...filesIn('films'), ...filesIn('spectra')].filter((file) => !touched.has(file))
    expect(unused).toEqual([])
  })

  it('say that they are invented', () => {
    const files = ['films', 'spectra', 'measured'].flatMap(filesIn)
    const firstLine = (file: string) => readFileSync(join(STACKS_FOLDER, file), 'utf8').split('\n')[0]
    expect(files.filter((file) => !firstLine(file).startsWith('# Invented'))).toEqual([])
  })
})

describe('the film cards', () => {
  const cardsOf = async (name: string): Promise<Readonly<Record<string, readonly FilmCard[]>>> =>
    (await demoStack(name)).compare?.slots ?? {}

  it('offer four polarizers, ten half-wave and ten quarter-wave films', async () => {
    const [watch, reader] = [await cardsOf('dive-computer.stack.yaml'), await cardsOf('map-reader.stack.yaml')]
    expect([reader.polarizer.length, watch.half.length, watch.quarter.length]).toEqual([4, 10, 10])
  })

  it('have a price, a name of their own, and the retardance that the name tells', async () => {
    const { half, quarter } = await cardsOf('dive-computer.stack.yaml')
    const { polarizer } = await cardsOf('map-reader.stack.yaml')
    const cards = [...half, ...quarter, ...polarizer]
    expect(new Set(cards.map((card) => card.name)).size).toBe(cards.length)
    expect(cards.filter(({ price_per_m2 = 0 }) => price_per_m2 <= 0)).toEqual([])
    for (const { name, layer } of [...half, ...quarter]) {
      expect(layer).toMatchObject({ kind: 'retarder', retardance: Number(/(\d+) nm$/.exec(name)?.[1]) })
    }
  })
})
