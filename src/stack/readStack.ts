/**
 * Text → checked stack, or every problem at once: first the YAML, then one schema, then the sense. Film cards are laid under
 * the layers that name them and options are set before the schema sees the data.
 */
import { readSlots } from './compareSlots.js'
import { type Draft, parseDraft } from './draft.js'
import { exclusiveFaults } from './exclusiveFields.js'
import { isMapping, type PlacedFault, valueAt } from './fault.js'
import { FilmCards, layOver } from './filmCards.js'
import { applyOverride, overrideProblem, readOverrides } from './overrides.js'
import { type FilmedLayer, type Origins, placeFault } from './placing.js'
import { treeFaults } from './plainTree.js'
import type { Problem } from './problem.js'
import type { RawCompare } from './schema/questions.js'
import { stackSchema } from './schema/stackSchema.js'
import { indexFaults } from './sense/indices.js'
import { duplicateIdFaults } from './sense/layerIds.js'
import { lightFaults } from './sense/lights.js'
import { metricFaults } from './sense/metrics.js'
import { pathFaults } from './sense/paths.js'
import { polarizerFaults } from './sense/polarizers.js'
import type { Sense } from './sense/sense.js'
import { slotSpreadFaults } from './sense/slotSpreads.js'
import { Source } from './source.js'
import type { CompareQuestion, Layer, Stack } from './stack.js'
import { besideFile, NO_FILES, type StackFiles } from './stackFiles.js'
import { missingFile, TableFiles } from './tableFiles.js'

export interface ReadOptions {
  /** Name of the stack file as the user gave it; stands in problems. */
  readonly file: string
  /** The files around it; none unless given. */
  readonly files?: StackFiles
  /** `path=value`, as behind `--set`. */
  readonly sets?: readonly string[]
}

export type Reading = {
  /** Texts of the files that problems and warnings point into, by the name shown. */
  readonly texts: ReadonlyMap<string, string>
} & (
  | { readonly ok: true; readonly stack: Stack; readonly warnings: readonly Problem[] }
  | { readonly ok: false; readonly problems: readonly Problem[] }
)

/** Reads a stack file; formulas in it are compiled for use in this thread. Throws only what `files` throws. */
export async function readStack(text: string, { file, files = NO_FILES, sets = [] }: ReadOptions): Promise<Reading> {
  const texts = new Map([[file, text]])
  const { source, problems } = Source.parse(file, text)
  const { raw, problems: plainProblems } = problems.length > 0 ? { raw: undefined, problems } : source.plain()
  if (plainProblems.length > 0) return { ok: false, problems: plainProblems, texts }
  const tree = treeFaults(raw)
  if (tree.length > 0)
    return { ok: false, problems: tree.map(({ at, key, ...f }) => source.problem(f, at, key)), texts }
  return new StackReader(source, texts, file, files).read(raw, sets)
}

class StackReader {
  private readonly tables: TableFiles
  private readonly cards: FilmCards
  private readonly schema: ReturnType<typeof stackSchema>
  private readonly problems: Problem[] = []
  private readonly faults: PlacedFault[] = []
  private readonly filmed = new Map<number, FilmedLayer>()

  constructor(
    private readonly source: Source,
    private readonly texts: Map<string, string>,
    file: string,
    private readonly files: StackFiles,
  ) {
    const shown = (path: string) => besideFile(file, path)
    this.tables = new TableFiles(files, shown)
    this.cards = new FilmCards(files, this.tables, shown)
    this.schema = stackSchema(this.tables)
  }

  async read(written: unknown, sets: readonly string[]): Promise<Reading> {
    const { overrides, problems } = readOverrides(sets, written)
    this.problems.push(...problems)
    const [films, others] = [overrides.filter(isFilm), overrides.filter((option) => !isFilm(option))]
    const raw = this.override(this.layFilms(this.override(written, films)), others)
    const { draft, faults } = parseDraft(this.schema, raw)
    this.faults.push(...faults, ...exclusiveIn(raw), ...(await senseFaults({ draft, raw })))
    const { compare: asked, ...sections } = draft
    const compare = asked && this.readCompare(asked, raw)
    if (compare !== undefined) {
      await this.checkCards(compare, draft)
      this.faults.push(...slotSpreadFaults(compare, { draft, raw }))
    }
    const whole = { ...sections, ...(compare && { compare }) }
    return this.conclude(whole, { source: this.source, overrides, filmed: this.filmed })
  }

  private override(raw: unknown, overrides: ReturnType<typeof readOverrides>['overrides']): unknown {
    let changed = raw
    for (const option of overrides) {
      const result = applyOverride(changed, option)
      if ('raw' in result) changed = result.raw
      else this.problems.push(overrideProblem(option.text, result.fault))
    }
    return changed
  }

  private layFilms(raw: unknown): unknown {
    if (!isMapping(raw) || !Array.isArray(raw.layers)) return raw
    return { ...raw, layers: raw.layers.map((layer, i) => this.layFilm(layer, i)) }
  }

  private layFilm(layer: unknown, i: number): unknown {
    if (!isMapping(layer) || typeof layer.film !== 'string') return layer
    const path = besideFile('', layer.film)
    const card = this.cards.card(path)
    if (card === undefined) {
      this.faults.push({ at: ['layers', i, 'film'], ...missingFile(path, this.files) })
      return layer
    }
    this.filmed.set(i, { layer, card })
    return layOver(card.fields, layer)
  }

  private readCompare(compare: RawCompare, raw: unknown): CompareQuestion {
    const { slots, faults, problems } = readSlots(compare, raw, {
      cards: this.cards,
      files: this.files,
      schema: this.schema,
    })
    this.faults.push(...faults)
    this.problems.push(...problems)
    return { ...compare, slots }
  }

  /** A film that fills a slot must be one that can be, as if it stood in the file. */
  private async checkCards({ slots }: CompareQuestion, { conditions }: Draft): Promise<void> {
    for (const { file, layer } of Object.values(slots).flat()) {
      const source = this.cards.card(file)?.source
      const faults = await filmFaults({ draft: { conditions, layers: [layer] }, raw: undefined })
      for (const { at, key, ...fault } of faults) {
        if (source !== undefined) this.problems.push(source.problem(fault, at.slice(2), key))
      }
    }
  }

  private conclude(draft: Omit<Draft, 'compare'> & { compare?: CompareQuestion }, origins: Origins): Reading {
    const placed = this.faults.filter(isNoSequel(this.faults)).flatMap((fault) => placeFault(fault, origins) ?? [])
    const used = [...this.cards.all()]
    const all = withoutRepeats([...this.problems, ...placed, ...used.flatMap(({ problems }) => problems)])
    for (const { source } of used) this.texts.set(source.file, source.text)
    for (const [name, text] of this.tables.texts) this.texts.set(name, text)
    const problems = all.filter(({ severity }) => severity === 'error')
    if (problems.length > 0) return { ok: false, problems: inOrder(problems, this.source.file), texts: this.texts }
    const stack = { ...draft, layers: draft.layers as readonly Layer[] } as Stack
    return { ok: true, stack, warnings: all, texts: this.texts }
  }
}

/** What a layer lacks because its film card cannot be read is not told besides. */
function isNoSequel(faults: readonly PlacedFault[]): (fault: PlacedFault) => boolean {
  const layers = new Set(faults.flatMap(({ at }) => (at[0] === 'layers' && at[2] === 'film' ? [at[1]] : [])))
  return ({ at, code }) => code !== 'missing_key' || at[0] !== 'layers' || !layers.has(at[1])
}

function isFilm({ at }: { readonly at: readonly unknown[] }): boolean {
  return at[0] === 'layers' && at.length === 3 && at[2] === 'film'
}

function exclusiveIn(raw: unknown): PlacedFault[] {
  const layers = valueAt(raw, ['layers'])
  return Array.isArray(layers) ? layers.flatMap((layer, i) => exclusiveFaults(layer, ['layers', i])) : []
}

async function senseFaults(sense: Sense): Promise<PlacedFault[]> {
  return [
    ...duplicateIdFaults(sense),
    ...(await filmFaults(sense)),
    ...lightFaults(sense),
    ...pathFaults(sense),
    ...metricFaults(sense),
  ]
}

/** Of the layers and the panel themselves. */
async function filmFaults(sense: Sense): Promise<PlacedFault[]> {
  const indices = await indexFaults(sense)
  const computable = indices.every(({ severity }) => severity === 'warning')
  return [...indices, ...(computable ? polarizerFaults(sense) : [])]
}

function withoutRepeats(problems: readonly Problem[]): Problem[] {
  const seen = new Set<string>()
  return problems.filter(({ file, path, code, message }) => {
    const key = JSON.stringify([file, path, code, message])
    return !seen.has(key) && seen.add(key)
  })
}

/** Options first, then the stack file from the top down, then other files. */
function inOrder(problems: readonly Problem[], file: string): Problem[] {
  const rank = (problem: Problem) => (problem.range === undefined ? 0 : problem.file === file ? 1 : 2)
  const place = ({ range }: Problem) => (range === undefined ? 0 : range.line * 1e5 + range.column)
  return [...problems].sort((a, b) => rank(a) - rank(b) || a.file.localeCompare(b.file) || place(a) - place(b))
}
