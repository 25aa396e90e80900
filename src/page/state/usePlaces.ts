/** Where files are opened from, and what the address asks to open. */
import { useEffect, useState } from 'preact/hooks'
import { demoPlace } from '../files/demoPlace.js'
import { pickedPlace } from '../files/pickedPlace.js'
import type { Place } from '../files/place.js'
import { servedPlace } from '../files/servedPlace.js'
import { readLink, valuesOfLink } from './link.js'
import type { Design } from './useDesign.js'

export interface Places {
  /** With the files each has; the served folder first. */
  readonly listed: readonly { readonly place: Place; readonly files: readonly string[] }[]
  readonly asking: boolean
  readonly fault: string
  readonly ask: () => void
  readonly cancel: () => void
  readonly open: (place: Place, file: string) => Promise<void>
  readonly pick: (files: readonly File[]) => Promise<void>
}

export function usePlaces(design: Design): Places {
  const [places, setPlaces] = useState<readonly Place[]>([demoPlace])
  const [listed, setListed] = useState<Places['listed']>([])
  const [asking, setAsking] = useState(false)
  const [fault, setFault] = useState('')

  const told = async (work: () => Promise<void>): Promise<void> => {
    try {
      setFault('')
      await work()
    } catch (error) {
      setFault(error instanceof Error ? error.message : String(error))
    }
  }
  const list = (of: readonly Place[]): Promise<void> =>
    told(async () => {
      setListed(await Promise.all(of.map(async (place) => ({ place, files: await place.list() }))))
      setAsking(true)
    })
  const open = (place: Place, file: string): Promise<void> =>
    told(async () => {
      setAsking(false)
      await design.load(place, await place.open(file))
    })
  const pick = (files: readonly File[]): Promise<void> =>
    told(async () => {
      const place = await pickedPlace(files)
      const found = await place.list()
      const others = places.filter(({ kind }) => kind !== 'picked')
      setPlaces([place, ...others])
      if (found.length === 1) await open(place, found[0])
      else await list([place, ...others])
    })
  const begin = (): Promise<void> =>
    told(async () => {
      const link = await readLink(location.hash)
      const served = await servedPlace(link.token)
      const known = served === undefined ? [demoPlace] : [served, demoPlace]
      setPlaces(known)
      const start = (parameters: Parameters<typeof valuesOfLink>[1]) => valuesOfLink(link, parameters)
      if (link.token !== null) withoutToken()
      if (link.served !== null && served !== undefined) await design.load(served, await served.open(link.served), start)
      else if (link.demo !== null) await design.load(demoPlace, await demoPlace.open(link.demo), start)
      else if (link.carried !== undefined) await design.load(await pickedPlace([]), link.carried, start)
      else await list(known)
    })
  useEffect(() => {
    void begin()
    const follow = (): void => void begin()
    addEventListener('hashchange', follow)
    return () => removeEventListener('hashchange', follow)
  }, [])
  return { listed, asking, fault, ask: () => void list(places), cancel: () => setAsking(false), open, pick }
}

/** The token does not stay in the address, where it would be copied along. */
function withoutToken(): void {
  const link = new URLSearchParams(location.hash.slice(1))
  link.delete('token')
  history.replaceState(null, '', `#${link}`)
}
