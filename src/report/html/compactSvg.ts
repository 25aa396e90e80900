import { type Point, simplifyLine } from './simplifyLine.js'

/**
 * An SVG picture in fewer bytes: coordinates to a hundredth of a pixel (a tenth in polylines, which hold no
 * letters and are freed of the points nobody would miss), and paths in relative steps. A step is counted from
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
/** A line may be moved so far: a fiftieth of a millimeter on paper. */
const UNSEEN_PX = 0.12
const COMMAND = /([MLQCZ])([^MLQCZ]*)/g
const NUMBER = /-?\d*\.?\d+(?:e[+-]?\d+)?/g

interface Command {
  readonly letter: string
  /** Absolute coordinates, x and y in turn. */
  readonly numbers: readonly number[]
}

function compactPath(path: string): string {
  const commands = [...path.matchAll(COMMAND)].map(([, letter, tail]): Command => {
    return { letter, numbers: (tail.match(NUMBER) ?? []).map(Number) }
  })
  const curved = commands.some(({ letter }) => letter === 'Q' || letter === 'C')
  return curved ? inSteps(commands, HUNDREDTHS) : inSteps(straightened(commands), TENTHS)
}

/** The path without the points of its lines that the eye would not miss. */
function straightened(commands: readonly Command[]): Command[] {
  const found: Command[] = []
  let line: Point[] = []
  const flush = () => {
    const points = line.length > 2 ? simplifyLine(line, UNSEEN_PX) : line
    found.push(...points.map((point, k) => ({ letter: k === 0 ? 'M' : 'L', numbers: point })))
    line = []
  }
  for (const command of commands) {
    if (command.letter !== 'L') flush()
    if (command.letter === 'Z') found.push(command)
    else line.push([command.numbers[0], command.numbers[1]])
  }
  flush()
  return found
}

/** The path in relative steps, on a grid of so many steps to a pixel. */
function inSteps(commands: readonly Command[], grid: number): string {
  const rounded = (value: number): number => Math.round(grid * value) / grid
  let [x, y] = [0, 0]
  let [startX, startY] = [0, 0]
  let text = ''
  let before = ''
  for (const { letter, numbers } of commands) {
    const absolute = numbers.map(rounded)
    const steps = absolute.map((value, k) => rounded(value - (k % 2 === 0 ? x : y)))
    const relative = letter.toLowerCase()
    text += joined(relative === before ? '' : relative, steps)
    before = relative
    if (letter === 'Z') [x, y] = [startX, startY]
    else [x, y] = absolute.slice(-2)
    if (letter === 'M') [startX, startY] = [x, y]
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
