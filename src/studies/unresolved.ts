import type { Certainty } from '../search/certainty.js'
import type { Direction } from '../stack/stack.js'

/** Parameters the measurement cannot tell apart, in words a person at the bench can act on. */
export interface Unresolved {
  readonly parameters: readonly string[]
  /** Standard deviation along the combination, as a share of the range searched. */
  readonly deviation: number
  readonly sentence: string
}

/** A combination known no better than to this share of its range is called unresolved. */
const UNRESOLVED_DEVIATION = 0.15
/** Two parameters this strongly correlated move together even where both are fairly known. */
const STRONG_CORRELATION = 0.98
/** Part of a combination's direction below which a parameter is not named. */
const NAMED_SHARE = 0.25

export function unresolvedCombinations(
  paths: readonly string[],
  certainty: Certainty,
  directions: readonly Direction[],
): Unresolved[] {
  const advice = adviceFor(directions)
  const combinations = certainty.combinations
    .filter(({ deviation }) => !(deviation < UNRESOLVED_DEVIATION))
    .map(({ direction, deviation }) => {
      const named = certainty.free.filter((_, k) => Math.abs(direction[k]) >= NAMED_SHARE).map((i) => paths[i])
      return { parameters: named, deviation, sentence: `${sentence(named)}: ${advice}` }
    })
  return [...combinations, ...correlatedPairs(paths, certainty, combinations, advice)]
}

function correlatedPairs(
  paths: readonly string[],
  { free, correlation, combinations }: Certainty,
  told: readonly Unresolved[],
  advice: string,
): Unresolved[] {
  const p = free.length
  const pairs: Unresolved[] = []
  for (let a = 0; a < p; a++) {
    for (let b = a + 1; b < p; b++) {
      if (Math.abs(correlation[a * p + b]) < STRONG_CORRELATION) continue
      const parameters = [paths[free[a]], paths[free[b]]]
      if (told.some((other) => parameters.every((path) => other.parameters.includes(path)))) continue
      pairs.push({ parameters, deviation: combinations[0].deviation, sentence: `${sentence(parameters)}: ${advice}` })
    }
  }
  return pairs
}

function sentence(parameters: readonly string[]): string {
  if (parameters.length === 1) return `${parameters[0]} hardly changes what was measured`
  const last = parameters[parameters.length - 1]
  return `${parameters.slice(0, -1).join(', ')} and ${last} move together`
}

/** What would tell them apart: the direction not yet measured from. */
function adviceFor(directions: readonly Direction[]): string {
  const oblique = directions.filter(({ theta }) => theta > 0.17)
  if (oblique.length === 0) return 'measure at 45 deg or more as well'
  const azimuths = new Set(oblique.map(({ phi }) => Math.round(((phi % Math.PI) + Math.PI) * 1e3) % 3142))
  if (azimuths.size === 1) return 'measure at a second azimuth'
  return 'measure one of them by itself, or keep it at its nominal value'
}
