/** The light of the room and of the screen must be seen: without luminous power over the wavelengths nothing has a color. */
import { type Illuminant, illuminantAt } from '../../color/illuminant.js'
import { observerAt } from '../../color/observer.js'
import type { PathKey, PlacedFault } from '../fault.js'
import { wavelengthsOf } from '../wavelengths.js'
import type { Sense } from './sense.js'

export function lightFaults({ draft: { conditions, emission } }: Sense): PlacedFault[] {
  if (conditions === undefined) return []
  const wavelengths = wavelengthsOf(conditions)
  const { y } = observerAt(conditions.observer, wavelengths)
  const isSeen = (light: Illuminant) => illuminantAt(light, wavelengths).some((power, i) => power * y[i] > 0)
  if (!isSeen('E')) return [unseen(['conditions', 'wavelengths'], 'no light of these wavelengths is visible')]
  const faults: PlacedFault[] = []
  const message = 'the light has no visible power at the wavelengths of the file'
  if (!isSeen(conditions.illuminant)) faults.push(unseen(['conditions', 'illuminant'], message))
  if (emission !== undefined && !isSeen(emission.spectrum)) faults.push(unseen(['emission', 'spectrum'], message))
  return faults
}

function unseen(at: readonly PathKey[], message: string): PlacedFault {
  const allowed = 'some power where the eye sees, 360 to 830 nm'
  return { at, code: 'out_of_range', message, allowed, next: 'check the wavelengths and the table of the light' }
}
