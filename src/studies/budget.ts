/**
 * Where the remaining reflection comes from. With R(S) the luminous reflectance of the stack with the imperfections S
 * only, D the imperfections that come with the direction (`oblique`), and `all` what the file has:
 *
 *   ideal = R(∅),  alone(f) = R(D ∪ {f}) - R(D),  alone(oblique) = R(D) - R(∅),  if_removed(f) = R(all) - R(all ∖ {f}),
 *   rest = R(all) - R(∅) - Σ alone,
 *
 * each R from the same engine as every other number of the program.
 */
import { Scene } from '../appearance/scene.js'
import type { Direction, Stack } from '../stack/stack.js'
import { degrees } from './evaluate.js'
import { createIdealizer, type Idealizer, IMPERFECTIONS, type Imperfection } from './idealized.js'

/** Luminous reflectances, fractions. */
export interface Budget {
  readonly title: string
  readonly theta_deg: number
  readonly phi_deg: number
  /** Of the whole stack: ideal + the sum of `alone` + rest. */
  readonly total: number
  /** What would be left without any of the terms. */
  readonly ideal: number
  readonly terms: readonly BudgetTerm[]
  /** What arises only where several act together; negative where they make up for one another. */
  readonly rest: number
  /** What the terms mean, for whoever reads the figures. */
  readonly meaning: string
  /** Terms that do not apply to this stack, and why. */
  readonly notes: readonly string[]
}

interface BudgetTerm {
  readonly name: Imperfection
  /** Added to the ideal stack, which has none of the others. */
  readonly alone: number
  /** Gain: how much darker the stack would be without it, all others staying; negative where it makes up for another. */
  readonly if_removed: number
}

export const BUDGET_MEANING =
  '"alone" is what a single imperfection adds to an otherwise ideal stack seen from the same direction; "gained if removed" ' +
  '(if_removed) is how much darker the whole stack would be without it. Negative: it makes up for another. The parts alone, ' +
  'the ideal stack and the rest add up to the total; the rest arises where several act together. Ideal means: a front that ' +
  'reflects nothing; every layer behind the front of one index; a polarizer that passes nothing along its absorption axis; ' +
  'films of the retardances (retardance_550) and axes (axis_error) of the nearest design that makes circular light at 550 nm ' +
  'head-on; Re proportional to the wavelength (dispersion: a film of constant Re counts as an imperfection too); no ' +
  'depolarized share; head-on instead of oblique.'

export function budget(stack: Stack, direction: Direction): Budget {
  const { missing, reflectance } = createReflectance(stack, direction)
  const oblique = direction.theta > 0
  const names = IMPERFECTIONS.filter((name) => !missing.has(name) && (oblique || name !== 'oblique'))
  const view: Imperfection[] = oblique ? ['oblique'] : []
  const total = reflectance(IMPERFECTIONS)
  const ideal = reflectance([])
  const seen = reflectance(view)
  const terms = names.map((name) => ({
    name,
    alone: name === 'oblique' ? seen - ideal : reflectance([...view, name]) - seen,
    if_removed: total - reflectance(IMPERFECTIONS.filter((other) => other !== name)),
  }))
  return {
    title: stack.title,
    theta_deg: degrees(direction.theta),
    phi_deg: degrees(direction.phi),
    total,
    ideal,
    terms,
    rest: total - ideal - terms.reduce((sum, { alone }) => sum + alone, 0),
    meaning: BUDGET_MEANING,
    notes: notesOf(missing),
  }
}

/** R(S) of the header. */
function createReflectance(stack: Stack, { theta, phi }: Direction) {
  const real = new Scene(stack)
  const dark = new Scene(stack, real.wavelengthsNm, 'perfect')
  const { missing, stackWith } = createIdealizer(stack, real.wavelengthsNm)
  // What cannot be taken away is always there.
  const reflectance = (names: readonly Imperfection[]): number => {
    const present = new Set([...names, ...missing.keys()])
    const scene = present.has('front_face') ? real : dark
    return scene.lookOnce(stackWith(present), present.has('oblique') ? theta : 0, phi).luminousReflectance
  }
  return { missing, reflectance }
}

/** One line a reason. */
function notesOf(missing: Idealizer['missing']): string[] {
  const reasons = [...new Set(missing.values())]
  return reasons.map((reason) => {
    const names = [...missing].filter(([, why]) => why === reason).map(([name]) => name)
    return `${names.join(', ')} left out: ${reason}`
  })
}
