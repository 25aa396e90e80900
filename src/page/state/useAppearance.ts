/** What the engine says of the values at hand: figures and spectra at once, cone and budget as soon as they can follow. */
import { useEffect, useMemo, useState } from 'preact/hooks'
import type { Direction } from '../../stack/stack.js'
import type { Budget } from '../../studies/budget.js'
import type { Engine } from '../engine/engine.js'
import type { TimedCone, Values, View } from '../engine/messages.js'
import { LatestOnly } from './latestOnly.js'
import type { OpenDesign } from './useDesign.js'

export interface Appearance {
  readonly view?: View
  readonly cone?: TimedCone
  readonly budget?: Budget
  /** Why there is none. */
  readonly fault?: string
}

interface Ask {
  readonly values: Values
  readonly direction: Direction
}

/** The budget takes a while and is read after the hand has come to rest. */
const REST_MS = 200

export function useAppearance(
  engine: Engine,
  open: OpenDesign | undefined,
  values: Values,
  direction: Direction,
): Appearance {
  const [appearance, setAppearance] = useState<Appearance>({})
  const asks = useMemo(() => {
    const add = (part: Appearance): void => setAppearance((before) => ({ ...before, ...part }))
    const fail = (error: Error): void => add({ fault: error.message })
    return {
      view: new LatestOnly((ask: Ask) => engine.ask('view', ask).then((view) => add({ view, fault: undefined }), fail)),
      cone: new LatestOnly((ask: Ask) => engine.ask('cone', ask).then((cone) => add({ cone }), fail)),
      budget: new LatestOnly((ask: Ask) => engine.ask('budget', ask).then((budget) => add({ budget }), fail)),
    }
  }, [engine])
  useEffect(() => {
    setAppearance({})
  }, [open?.stack])
  useEffect(() => {
    if (open === undefined) return
    asks.view.request({ values, direction })
  }, [asks, open?.stack, values, direction])
  useEffect(() => {
    if (open === undefined) return
    asks.cone.request({ values, direction })
  }, [asks, open?.stack, values])
  useEffect(() => {
    if (open === undefined) return
    const timer = setTimeout(() => asks.budget.request({ values, direction }), REST_MS)
    return () => clearTimeout(timer)
  }, [asks, open?.stack, values, direction])
  return appearance
}
