/** The known name nearest to a mistyped one, or undefined where none is near enough to be meant. */
export function nearestName(name: string, known: Iterable<string>): string | undefined {
  const wanted = name.slice(0, LONGEST_COMPARED).toLowerCase()
  let best: string | undefined
  let bestDistance = mostEdits(wanted.length) + 1
  for (const candidate of known) {
    const distance = editDistance(wanted, candidate.slice(0, LONGEST_COMPARED).toLowerCase())
    if (distance < bestDistance) {
      bestDistance = distance
      best = candidate
    }
  }
  return best
}

const LONGEST_COMPARED = 80

/** One slip in a short name, more in a long one; a single letter stands for nothing. */
function mostEdits(length: number): number {
  return length < 2 ? 0 : Math.max(1, Math.floor(length / 3))
}

/** Levenshtein's distance where two neighbors exchanged count once (optimal string alignment). */
function editDistance(a: string, b: string): number {
  let beforeLast: number[] = []
  let last = Array.from({ length: b.length + 1 }, (_, j) => j)
  for (let i = 1; i <= a.length; i++) {
    const row = [i]
    for (let j = 1; j <= b.length; j++) {
      const replaced = last[j - 1] + (a[i - 1] === b[j - 1] ? 0 : 1)
      row[j] = Math.min(last[j] + 1, row[j - 1] + 1, replaced)
      const exchanged = i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1]
      if (exchanged) row[j] = Math.min(row[j], beforeLast[j - 2] + 1)
    }
    beforeLast = last
    last = row
  }
  return last[b.length]
}
