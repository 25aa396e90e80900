import { useState } from 'preact/hooks'
import type { Design as FoundDesign, Optimum } from '../../studies/optimize.js'
import { fromPlain } from '../../units/quantity.js'
import type { Engine } from '../engine/engine.js'
import type { Values } from '../engine/messages.js'
import type { Design } from './useDesign.js'

export interface Search {
  readonly running?: { readonly done: number; readonly note: string }
  readonly optimum?: Optimum
  readonly fault?: string
  readonly start: () => Promise<void>
  readonly stop: () => void
  /** The parameters of a found design, in internal units. */
  readonly valuesOf: (found: FoundDesign) => Values
}

/** Finer than any film is cut, and given back exactly by the file they are saved to. */
const FILE_DIGITS = 10

/** The search of the file's `optimize` question; its best design is taken over as one step that can be undone. */
export function useSearch(engine: Engine, design: Design): Search {
  const [state, setState] = useState<Pick<Search, 'running' | 'optimum' | 'fault'>>({})
  const { open, history, set } = design
  const kinds = new Map(open?.parameters.map(({ path, kind }) => [path, kind]))
  const valuesOf = ({ parameters }: FoundDesign): Values =>
    Object.fromEntries(
      Object.entries(parameters).map(([path, plain]) => [
        path,
        fromPlain(Number(plain.toPrecision(FILE_DIGITS)), kinds.get(path) ?? 'number'),
      ]),
    )
  const start = async (): Promise<void> => {
    setState({ running: { done: 0, note: '' } })
    const progress = (done: number, note: string): void => setState({ running: { done, note } })
    try {
      const optimum = await engine.ask('optimize', { values: history.present }, progress)
      setState({ optimum })
      set(valuesOf(optimum.best))
    } catch (error) {
      setState({ fault: error instanceof Error ? error.message : String(error) })
    }
  }
  return { ...state, start, valuesOf, stop: () => void engine.ask('stop', null) }
}
