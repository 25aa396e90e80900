import { createHash, timingSafeEqual } from 'node:crypto'
import type { IncomingMessage } from 'node:http'
import { Refusal } from './refusal.js'

/**
 * Refuses what does not come from the page itself: another Host is a name that was made to point here, another Origin a page
 * from elsewhere in the same browser.
 * @throws Refusal
 */
export function checkSender({ headers }: IncomingMessage, port: number): void {
  const hosts = [`127.0.0.1:${port}`, `localhost:${port}`]
  if (headers.host === undefined || !hosts.includes(headers.host))
    throw new Refusal(421, 'this server has another name')
  const { origin } = headers
  if (origin !== undefined && origin !== `http://${headers.host}`) throw new Refusal(403, 'another origin')
  const site = headers['sec-fetch-site']
  if (site !== undefined && site !== 'same-origin' && site !== 'none') throw new Refusal(403, 'another site')
}

/**
 * The token was printed with the address: other users of the machine, who can reach the port too, do not have it.
 * @throws Refusal
 */
export function checkToken({ headers }: IncomingMessage, token: string): void {
  const given = headers['x-offblack-token']
  const digest = (text: string): Buffer => createHash('sha256').update(text).digest()
  if (typeof given !== 'string' || !timingSafeEqual(digest(given), digest(token))) {
    throw new Refusal(
      401,
      'the page does not have the token of this server: open the address that offblack tune printed',
    )
  }
}
