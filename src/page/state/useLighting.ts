import { useLayoutEffect, useState } from 'preact/hooks'
import { type Lighting, lightRoom } from '../view/surround.js'

const KEY = 'offblack-lighting'

/** Light or dark: as chosen before, else as the system has it. */
export function useLighting(): readonly [Lighting, () => void] {
  const [lighting, set] = useState<Lighting>(first)
  useLayoutEffect(() => lightRoom(document.documentElement, lighting), [lighting])
  const toggle = (): void => {
    const next = lighting === 'light' ? 'dark' : 'light'
    localStorage.setItem(KEY, next)
    set(next)
  }
  return [lighting, toggle]
}

function first(): Lighting {
  const chosen = localStorage.getItem(KEY)
  if (chosen === 'light' || chosen === 'dark') return chosen
  return matchMedia('(prefers-color-scheme: dark)').matches ? 'dark' : 'light'
}
