/** The open stack file, and the values of its parameters with their history. */
import { useCallback, useReducer, useState } from 'preact/hooks'
import type { ParameterInfo } from '../../stack/parameters.js'
import type { Stack } from '../../stack/stack.js'
import type { Engine } from '../engine/engine.js'
import type { Values } from '../engine/messages.js'
import type { OpenedFile, Place } from '../files/place.js'
import { type History, stepHistory, UNTOUCHED } from './history.js'

export interface OpenDesign {
  readonly place: Place
  readonly opened: OpenedFile
  /** As the file has it. */
  readonly stack: Stack
  readonly parameters: readonly ParameterInfo[]
  readonly warnings: string
}

export interface Design {
  readonly open: OpenDesign | undefined
  /** Of a file that could not be read, as the command line tells them. */
  readonly problems: string
  readonly history: History
  readonly saved: Values
  readonly load: (
    place: Place,
    opened: OpenedFile,
    start?: (parameters: readonly ParameterInfo[]) => Values,
  ) => Promise<void>
  /** `gesture` names a drag, whose steps are undone as one. */
  readonly set: (changes: Values, gesture?: string) => void
  readonly undo: () => void
  readonly redo: () => void
  readonly markSaved: (version: string | undefined) => void
}

export function useDesign(engine: Engine): Design {
  const [open, setOpen] = useState<OpenDesign>()
  const [problems, setProblems] = useState('')
  const [saved, setSaved] = useState<Values>({})
  const [history, step] = useReducer(stepHistory, UNTOUCHED)

  const load = useCallback<Design['load']>(
    async (place, opened, start = () => ({})) => {
      const opening = await engine.ask('open', opened)
      if (!opening.ok) {
        setOpen(undefined)
        setProblems(opening.problems)
        return
      }
      setProblems('')
      setSaved({})
      step({ kind: 'restart', values: start(opening.parameters) })
      setOpen({ place, opened, ...opening })
    },
    [engine],
  )
  const set = (changes: Values, gesture?: string): void => {
    step({ kind: 'set', values: withoutRepeats({ ...history.present, ...changes }, open), gesture })
  }
  const markSaved = (version: string | undefined): void => {
    setSaved(history.present)
    if (open !== undefined) setOpen({ ...open, opened: { ...open.opened, version } })
  }
  return {
    open,
    problems,
    history,
    saved,
    load,
    set,
    markSaved,
    undo: () => step({ kind: 'undo' }),
    redo: () => step({ kind: 'redo' }),
  }
}

/** What is as in the file is not kept. */
function withoutRepeats(values: Values, open: OpenDesign | undefined): Values {
  const own = new Map(open?.parameters.map(({ path, value }) => [path, value]))
  return Object.fromEntries(Object.entries(values).filter(([path, value]) => own.get(path) !== value))
}
