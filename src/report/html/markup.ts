import { visible } from '../wording.js'

/** Text that is HTML already. */
export class Markup {
  constructor(readonly text: string) {}
}

/** What may stand between the tags; whatever is not markup is escaped, `undefined` and `false` are nothing. */
export type Content = Markup | string | number | undefined | false | readonly Content[]

/** Template for HTML: html`<b>${title}</b>`. */
export function html(parts: TemplateStringsArray, ...contents: readonly Content[]): Markup {
  return new Markup(parts.map((part, k) => (k === 0 ? part : textOf(contents[k - 1]) + part)).join(''))
}

/** Text to stand in an element or a quoted attribute. */
export function escaped(text: string): string {
  return visible(text).replace(/[&<>"']/g, (character) => ENTITIES[character])
}

const ENTITIES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
}

function textOf(content: Content): string {
  if (content === undefined || content === false) return ''
  if (content instanceof Markup) return content.text
  if (typeof content === 'object') return content.map(textOf).join('')
  return escaped(String(content))
}
