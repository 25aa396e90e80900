export interface Column {
  readonly heading: string
  /** Numbers stand right, words left. */
  readonly align: 'left' | 'right'
}

/**
 * Columns two blanks apart, headings above; no lines. A row shorter than the columns ends early; blanks at line ends are cut.
 * @param cells rows of texts; a text may hold colors: `widthOf` counts what is seen
 */
export function textTable(columns: readonly Column[], cells: readonly (readonly string[])[]): string {
  const headings = columns.map(({ heading }) => heading)
  const rows = headings.every((heading) => heading === '') ? cells : [headings, ...cells]
  const widths = columns.map((_, k) => Math.max(...rows.map((row) => widthOf(row[k] ?? ''))))
  const lines = rows.map((row) =>
    row
      .map((cell, k) => {
        const gap = ' '.repeat(widths[k] - widthOf(cell))
        return columns[k].align === 'right' ? gap + cell : cell + gap
      })
      .join('  ')
      .trimEnd(),
  )
  return lines.join('\n')
}

const ESC = String.fromCharCode(27)
const COLOR = new RegExp(`${ESC}\\[[0-9;]*m`, 'g')

/** Characters as seen: colors have no width. */
function widthOf(text: string): number {
  return [...text.replace(COLOR, '')].length
}
