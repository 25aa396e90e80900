import type { IncomingMessage } from 'node:http'
import { Refusal } from './refusal.js'

const LARGEST_BYTES = 1024 * 1024

/**
 * The body as UTF-8 text.
 * @throws Refusal where it is larger than 1 MB or no UTF-8
 */
export async function readBody(request: IncomingMessage): Promise<string> {
  const tooLarge = new Refusal(413, 'a stack file of more than 1 MB is not saved; keep long spectra in CSV files')
  if (Number(request.headers['content-length'] ?? 0) > LARGEST_BYTES) throw tooLarge
  const chunks: Buffer[] = []
  let total = 0
  for await (const chunk of request as AsyncIterable<Buffer>) {
    total += chunk.length
    if (total > LARGEST_BYTES) throw tooLarge
    chunks.push(chunk)
  }
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(Buffer.concat(chunks, total))
  } catch {
    throw new Refusal(400, 'the body is not UTF-8 text')
  }
}
