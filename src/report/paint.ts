/** How a text may be set off; the terminal puts its colors in, a file or a pipe nothing. */
export interface Paint {
  readonly strong: (text: string) => string
  readonly faint: (text: string) => string
  readonly good: (text: string) => string
  readonly bad: (text: string) => string
  readonly caution: (text: string) => string
}

const same = (text: string): string => text

export const PLAIN: Paint = { strong: same, faint: same, good: same, bad: same, caution: same }
