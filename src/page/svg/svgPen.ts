/**
 * A 2-D drawing context that writes SVG: the part of it that Chart.js and the painters of `charts/` draw with, so that a
 * picture taken off the page is the chart itself in lines and letters. Transforms are rotations and shifts, as charts need.
 */
import { attributesText, fontSizePx, type Matrix, multiply, shortNumber, textShift, transformed } from './svgText.js'

interface Style {
  fillStyle: string
  strokeStyle: string
  lineWidth: number
  lineCap: string
  lineJoin: string
  globalAlpha: number
  font: string
  textAlign: string
  textBaseline: string
}

const FRESH: Style = {
  fillStyle: '#000000',
  strokeStyle: '#000000',
  lineWidth: 1,
  lineCap: 'butt',
  lineJoin: 'miter',
  globalAlpha: 1,
  font: '10px sans-serif',
  textAlign: 'start',
  textBaseline: 'alphabetic',
}
const IDENTITY: Matrix = [1, 0, 0, 1, 0, 0]
const ANCHORS: Readonly<Record<string, string>> = { right: 'end', end: 'end', center: 'middle' }

interface Saved {
  readonly style: Style
  readonly matrix: Matrix
  readonly dash: readonly number[]
  readonly clip: string
}

export class SvgPen {
  readonly canvas: object
  fillStyle = FRESH.fillStyle
  strokeStyle = FRESH.strokeStyle
  lineWidth = FRESH.lineWidth
  lineCap = FRESH.lineCap
  lineJoin = FRESH.lineJoin
  globalAlpha = FRESH.globalAlpha
  font = FRESH.font
  textAlign = FRESH.textAlign
  textBaseline = FRESH.textBaseline
  lineDashOffset = 0
  private matrix: Matrix = IDENTITY
  private dash: readonly number[] = []
  /** Id of the clip in force, empty for none. */
  private clipId = ''
  private clips = 0
  private path = ''
  private readonly saved: Saved[] = []
  private readonly marks: string[] = []

  /** `measure` is a pen of the browser, for the widths of texts. */
  constructor(
    private readonly width: number,
    private readonly height: number,
    private readonly measure: CanvasRenderingContext2D,
  ) {
    this.canvas = { width, height, style: {}, getContext: () => this, getAttribute: () => null, setAttribute() {} }
  }

  get text(): string {
    const size = `width="${this.width}" height="${this.height}" viewBox="0 0 ${this.width} ${this.height}"`
    return `<svg xmlns="http://www.w3.org/2000/svg" ${size}>\n${this.marks.join('\n')}\n</svg>\n`
  }

  save(): void {
    const { matrix, dash, clipId } = this
    this.saved.push({ style: this.style(), matrix, dash, clip: clipId })
  }

  restore(): void {
    const last = this.saved.pop()
    if (last === undefined) return
    Object.assign(this, last.style)
    this.matrix = last.matrix
    this.dash = last.dash
    this.clipId = last.clip
  }

  setTransform(...matrix: Matrix): void {
    this.matrix = matrix
  }

  resetTransform(): void {
    this.matrix = IDENTITY
  }

  translate(x: number, y: number): void {
    this.matrix = multiply(this.matrix, [1, 0, 0, 1, x, y])
  }

  rotate(angleRad: number): void {
    const [c, s] = [Math.cos(angleRad), Math.sin(angleRad)]
    this.matrix = multiply(this.matrix, [c, s, -s, c, 0, 0])
  }

  beginPath(): void {
    this.path = ''
  }

  moveTo(x: number, y: number): void {
    this.path += `M${this.at(x, y)}`
  }

  lineTo(x: number, y: number): void {
    this.path += `${this.path === '' ? 'M' : 'L'}${this.at(x, y)}`
  }

  bezierCurveTo(x1: number, y1: number, x2: number, y2: number, x: number, y: number): void {
    this.path += `C${this.at(x1, y1)} ${this.at(x2, y2)} ${this.at(x, y)}`
  }

  arc(x: number, y: number, radius: number, from: number, to: number, counterclockwise = false): void {
    const turn = Math.max(-2 * Math.PI, Math.min(2 * Math.PI, to - from))
    const sweep = counterclockwise && turn > 0 ? turn - 2 * Math.PI : turn
    const point = (angle: number): [number, number] => [x + radius * Math.cos(angle), y + radius * Math.sin(angle)]
    this.lineTo(...point(from))
    const flag = sweep > 0 ? 1 : 0
    // Half by half: a whole turn has no single arc.
    for (const share of [0.5, 1]) {
      this.path += `A${shortNumber(radius)} ${shortNumber(radius)} 0 0 ${flag} ${this.at(...point(from + share * sweep))}`
    }
  }

  rect(x: number, y: number, width: number, height: number): void {
    this.path += `M${this.at(x, y)}L${this.at(x + width, y)}L${this.at(x + width, y + height)}L${this.at(x, y + height)}Z`
  }

  closePath(): void {
    this.path += 'Z'
  }

  fill(rule: 'nonzero' | 'evenodd' = 'nonzero'): void {
    const fill = { fill: this.fillStyle, 'fill-rule': rule === 'evenodd' ? rule : undefined }
    this.mark('path', { d: this.path, ...fill })
  }

  stroke(): void {
    this.mark('path', { d: this.path, fill: 'none', ...this.strokeAttributes() })
  }

  clip(): void {
    const id = `clip${++this.clips}`
    const within = attributesText({ 'clip-path': this.clipReference() })
    this.marks.push(`<clipPath id="${id}"${within}><path d="${this.path}"/></clipPath>`)
    this.clipId = id
  }

  fillRect(x: number, y: number, width: number, height: number): void {
    this.separately(() => this.rect(x, y, width, height))
    this.mark('path', { d: this.separate, fill: this.fillStyle })
  }

  strokeRect(x: number, y: number, width: number, height: number): void {
    this.separately(() => this.rect(x, y, width, height))
    this.mark('path', { d: this.separate, fill: 'none', ...this.strokeAttributes() })
  }

  /** The sheet is blank to begin with. */
  clearRect(): void {}

  fillText(text: string, x: number, y: number): void {
    this.letters(text, x, y, { fill: this.fillStyle })
  }

  strokeText(text: string, x: number, y: number): void {
    this.letters(text, x, y, { fill: 'none', ...this.strokeAttributes() })
  }

  measureText(text: string): TextMetrics {
    this.measure.font = this.font
    return this.measure.measureText(text)
  }

  setLineDash(dash: readonly number[]): void {
    this.dash = dash
  }

  getLineDash(): readonly number[] {
    return this.dash
  }

  private separate = ''

  /** Makes a path without touching the current one. */
  private separately(draw: () => void): void {
    const kept = this.path
    this.path = ''
    draw()
    this.separate = this.path
    this.path = kept
  }

  private letters(
    text: string,
    x: number,
    y: number,
    paint: Readonly<Record<string, string | number | undefined>>,
  ): void {
    const shift = textShift(this.textBaseline) * fontSizePx(this.font)
    const attributes = { x: shortNumber(x), y: shortNumber(y + shift), style: `font:${this.font.replaceAll('"', "'")}` }
    const transform = `matrix(${this.matrix.map(shortNumber).join(' ')})`
    const escaped = text.replaceAll('&', '&amp;').replaceAll('<', '&lt;')
    this.mark('text', { ...attributes, transform, 'text-anchor': ANCHORS[this.textAlign], ...paint }, escaped)
  }

  private strokeAttributes() {
    return {
      stroke: this.strokeStyle,
      'stroke-width': this.lineWidth,
      'stroke-linecap': this.lineCap,
      'stroke-linejoin': this.lineJoin,
      'stroke-dasharray': this.dash.length > 0 ? this.dash.join(' ') : undefined,
    }
  }

  private mark(name: string, attributes: Readonly<Record<string, string | number | undefined>>, content = ''): void {
    const opacity = this.globalAlpha < 1 ? this.globalAlpha : undefined
    const all = attributesText({ ...attributes, opacity })
    const drawn = `<${name}${all}>${content}</${name}>`
    // The clip is not moved along with the text it clips.
    this.marks.push(this.clipId === '' ? drawn : `<g clip-path="${this.clipReference()}">${drawn}</g>`)
  }

  private clipReference(): string | undefined {
    return this.clipId === '' ? undefined : `url(#${this.clipId})`
  }

  private at(x: number, y: number): string {
    return transformed(this.matrix, x, y).map(shortNumber).join(' ')
  }

  private style(): Style {
    const { fillStyle, strokeStyle, lineWidth, lineCap, lineJoin, globalAlpha, font, textAlign, textBaseline } = this
    return { fillStyle, strokeStyle, lineWidth, lineCap, lineJoin, globalAlpha, font, textAlign, textBaseline }
  }
}
