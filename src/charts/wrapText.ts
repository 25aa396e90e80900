/** Breaks a text at its spaces into lines of at most `letters` (a longer word has a line of its own). */
export function wrapText(text: string, letters: number): string[] {
  const lines = ['']
  for (const word of text.split(' ')) {
    const last = lines[lines.length - 1]
    if (last !== '' && last.length + word.length + 1 > letters) lines.push(word)
    else lines[lines.length - 1] = last === '' ? word : `${last} ${word}`
  }
  return lines
}
