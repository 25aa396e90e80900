/** Text to letters that an address can carry, and back. */
export async function packText(text: string): Promise<string> {
  const bytes = await through(new Blob([text]), new CompressionStream('deflate-raw'))
  let binary = ''
  for (const byte of bytes) binary += String.fromCharCode(byte)
  return btoa(binary).replaceAll('+', '-').replaceAll('/', '_').replaceAll('=', '')
}

export async function unpackText(packed: string): Promise<string> {
  const binary = atob(packed.replaceAll('-', '+').replaceAll('_', '/'))
  const bytes = Uint8Array.from(binary, (character) => character.charCodeAt(0))
  return new TextDecoder().decode(await through(new Blob([bytes]), new DecompressionStream('deflate-raw')))
}

async function through(blob: Blob, stream: CompressionStream | DecompressionStream): Promise<Uint8Array> {
  return new Uint8Array(await new Response(blob.stream().pipeThrough(stream)).arrayBuffer())
}
