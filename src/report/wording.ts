/** `1 error`, `3 errors`. */
export function plural(count: number, noun: string): string {
  return `${count} ${noun}${count === 1 ? '' : 's'}`
}

/** Text of foreign origin without what could move the cursor or color the screen: control characters become `·`. */
export function visible(text: string): string {
  return [...text].map((character) => (isControl(character) ? '·' : character)).join('')
}

function isControl(character: string): boolean {
  const code = character.codePointAt(0) ?? 0
  return (
    code < 32 || (code >= 127 && code < 160) || (code >= 0x202a && code <= 0x202e) || (code >= 0x2066 && code <= 0x2069)
  )
}
