/** A table for spreadsheets: RFC 4180, a heading line, numbers with all their digits and a point. */
export function csvText(headings: readonly string[], rows: Iterable<readonly (string | number | undefined)[]>): string {
  const lines = [headings, ...rows].map((row) => row.map(cellText).join(','))
  return `${lines.join('\r\n')}\r\n`
}

function cellText(cell: string | number | undefined): string {
  if (cell === undefined || Number.isNaN(cell)) return ''
  if (typeof cell === 'number') return String(cell)
  // A text a spreadsheet would take for a formula is kept a text.
  const text = /^[=+\-@\t\r]/.test(cell) ? `'${cell}` : cell
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text
}
