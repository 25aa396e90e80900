import { useMemo } from 'preact/hooks'
import type { Theme } from '../../charts/theme.js'
import type { Budget } from '../../studies/budget.js'
import type { Shown } from '../state/shown.js'
import type { Design, OpenDesign } from '../state/useDesign.js'
import type { Search } from '../state/useSearch.js'
import { BudgetBars } from './BudgetBars.js'
import { Families } from './Families.js'
import { Figures } from './Figures.js'
import { Laminate } from './Laminate.js'
import { Limits } from './Limits.js'
import { Look } from './Look.js'
import { chartTheme } from './surround.js'

interface BenchProps {
  readonly open: OpenDesign
  readonly design: Design
  readonly shown: readonly Shown[]
  readonly budget: Budget | undefined
  readonly search: Search
  readonly place: number
  readonly onPlace: (place: number) => void
  readonly theme: Theme
}

/** The laminate, what it looks like, how it is judged. */
export function Bench({ open, design, shown, budget, search, place, onPlace, theme }: BenchProps) {
  const { view } = shown[shown.length - 1]
  // The slab is dark in either room.
  const slabTheme = useMemo(() => ({ ...chartTheme('dark'), lineWidth: 1.5 }), [])
  return (
    <div class="bench">
      <Laminate
        open={open}
        values={design.history.present}
        itinerary={view.itinerary}
        theme={slabTheme}
        roomTheme={theme}
        onSet={design.set}
      />
      <Look stack={open.stack} shown={shown} place={place} onPlace={onPlace} theme={theme} />
      <section class="judgment" aria-labelledby="judgment-title">
        <h2 id="judgment-title">Against the limits</h2>
        <Limits limits={view.evaluation.limits} />
        <Families stack={open.stack} search={search} onSet={design.set} />
        <Figures shown={shown} place={place} />
        {budget !== undefined && <BudgetBars budget={budget} />}
      </section>
    </div>
  )
}
