/** A JSON document to be read by programs and, at need, by people: objects indented, lists of plain values on one line. */
export function jsonText(value: unknown): string {
  return `${format(value, '')}\n`
}

const INDENT = '  '

function format(value: unknown, margin: string): string {
  if (typeof value !== 'object' || value === null) return JSON.stringify(value) ?? 'null'
  if (Array.isArray(value) && value.every(isPlain)) return JSON.stringify(value)
  const inner = margin + INDENT
  const [open, close] = Array.isArray(value) ? '[]' : '{}'
  const parts = Array.isArray(value)
    ? value.map((item) => format(item, inner))
    : Object.entries(value)
        .filter(([, item]) => item !== undefined)
        .map(([key, item]) => `${JSON.stringify(key)}: ${format(item, inner)}`)
  if (parts.length === 0) return open + close
  return `${open}\n${parts.map((part) => inner + part).join(',\n')}\n${margin}${close}`
}

function isPlain(value: unknown): boolean {
  return typeof value !== 'object' || value === null
}
