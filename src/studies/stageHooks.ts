import type { Hooks } from './hooks.js'

/** Hooks for one stage of a study: its whole progress is the part from `from` to `to` of the study's. */
export function stageHooks({ progress, stopped }: Hooks, from: number, to: number, note?: string): Hooks {
  return {
    ...(stopped && { stopped }),
    ...(progress && { progress: (done, own) => progress(from + (to - from) * done, note ?? own) }),
  }
}
