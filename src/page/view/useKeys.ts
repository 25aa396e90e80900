import { useEffect } from 'preact/hooks'
import type { Design } from '../state/useDesign.js'

/** Ctrl-Z and Ctrl-Shift-Z (or Ctrl-Y) for the whole page; a field being typed in keeps its own. */
export function useKeys({ undo, redo }: Design): void {
  useEffect(() => {
    const press = (event: KeyboardEvent): void => {
      if (!(event.ctrlKey || event.metaKey) || event.target instanceof HTMLInputElement) return
      const key = event.key.toLowerCase()
      if (key !== 'z' && key !== 'y') return
      event.preventDefault()
      if (key === 'y' || event.shiftKey) redo()
      else undo()
    }
    addEventListener('keydown', press)
    return () => removeEventListener('keydown', press)
  }, [undo, redo])
}
