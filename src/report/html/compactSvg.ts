/**
 * An SVG picture in fewer bytes: coordinates to a hundredth of a pixel (a tenth in polylines, which hold no
 * letters), and paths in relative steps. A step is counted from
 * where the rounded path stands, so that roundings do not add up. Paths are those the canvas writes: M, L, Q, C and Z alone,
 * absolute.
 */
export function compactSvg(svg: string): string {
  return svg
    .replace(/<\?xml[^>]*\?>\s*/, '')
    .replace(/>\s+</g, '><')
    .replace(/<path[^>]* d=""\/>/g, '')
    .replace(/ d="([^"]*)"/g, (_, path: string) => ` d="${compactPath(path)}"`)
    .replace(/(-?\d+\.\d{3,})/g, (number) => shortNumber(Number(number)))
}

/** Steps to a pixel. */
const HUNDREDTHS = 100
const TENTHS = 10
const COMMAND = /([MLQCZ])([^MLQCZ]*)/g
const NUMBER = /-?\d*\.?\d+(?:e[+-]?\d+)?/g

function compactPath(path: string): string {
  let [x, y] = [0, 0]
  let [startX, startY] = [0, 0]
  let text = ''
  let before = ''
  const grid = /[QC]/.test(path) ? HUNDREDTHS : TENTHS
  const rounded = (value: number): number => Math.round(grid * value) / grid
  for (const [, command, tail] of path.matchAll(COMMAND)) {
    const absolute = (tail.match(NUMBER) ?? []).map((number) => rounded(Number(number)))
    const steps = absolute.map((value, k) => rounded(value - (k % 2 === 0 ? x : y)))
    const letter = command.toLowerCase()
    text += joined(letter === before ? '' : letter, steps)
    before = letter
    if (letter === 'z') [x, y] = [startX, startY]
    else [x, y] = absolute.slice(-2)
    if (letter === 'm') [startX, startY] = [x, y]
  }
  return text
}

/** A minus sign parts two numbers as well as a blank does. */
function joined(letter: string, numbers: readonly number[]): string {
  return numbers.reduce((text, number) => {
    const shown = shortNumber(number)
    const parted = text === letter && letter !== '' ? '' : ' '
    return text + (shown.startsWith('-') ? '' : parted) + shown
  }, letter)
}

/** Without the zero before the point. */
function shortNumber(value: number): string {
  return String(Math.round(HUNDREDTHS * value) / HUNDREDTHS).replace(/^(-?)0\./, '$1.')
}
