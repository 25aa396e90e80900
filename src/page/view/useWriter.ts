import { createContext } from 'preact'
import { useContext } from 'preact/hooks'
import type { Engine } from '../engine/engine.js'
import type { Values } from '../engine/messages.js'

export const EngineContext = createContext<Engine | undefined>(undefined)

/** The open file's text with the values in it. */
export function useWriter(): (values: Values) => Promise<string> {
  const engine = useContext(EngineContext)
  return async (values) => {
    if (engine === undefined) throw new Error('the engine is not running')
    return engine.ask('write', { values })
  }
}
