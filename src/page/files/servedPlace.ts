import type { OpenedFile, Place } from './place.js'

const TOKEN_KEY = 'offblack-token'

/** The folder that `offblack tune` serves; undefined where the page came from another server, or as plain files. */
export async function servedPlace(tokenOfLink: string | null): Promise<Place | undefined> {
  if (tokenOfLink !== null) localStorage.setItem(TOKEN_KEY, tokenOfLink)
  const token = localStorage.getItem(TOKEN_KEY)
  if (token === null) return undefined
  const ask = asker(token)
  const first = await ask<{ folder: string; files: string[] }>('GET', 'api/stacks').catch(() => undefined)
  if (first === undefined) return undefined
  const at = (file: string): string => `api/stack?file=${encodeURIComponent(file)}`
  return {
    kind: 'served',
    name: first.folder,
    list: async () => (await ask<{ files: string[] }>('GET', 'api/stacks')).files,
    open: (file) => ask<OpenedFile>('GET', at(file)),
    save: async (file, text, version) => (await ask<{ version: string }>('PUT', at(file), { text, version })).version,
  }
}

function asker(token: string) {
  return async <T>(method: string, address: string, saved?: { text: string; version?: string }): Promise<T> => {
    const headers = { 'x-offblack-token': token, ...(saved?.version !== undefined && { 'if-match': saved.version }) }
    const response = await fetch(address, { method, headers, body: saved?.text })
    const answer: unknown = await response.json()
    if (response.ok) return answer as T
    throw new Error((answer as { message: string }).message)
  }
}
