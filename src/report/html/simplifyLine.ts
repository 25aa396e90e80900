/** A point in pixels. */
export type Point = readonly [x: number, y: number]

/**
 * The fewest of a line's own points, its ends among them, that stay within `tolerance` of it (Douglas and Peucker, The
 * Canadian Cartographer 10, 1973, from memory).
 */
export function simplifyLine(points: readonly Point[], tolerance: number): Point[] {
  const kept = new Uint8Array(points.length).fill(0)
  kept[0] = 1
  kept[points.length - 1] = 1
  const spans: [number, number][] = [[0, points.length - 1]]
  for (let span = spans.pop(); span !== undefined; span = spans.pop()) {
    const [from, to] = span
    const [index, distance] = farthest(points, from, to)
    if (distance <= tolerance) continue
    kept[index] = 1
    spans.push([from, index], [index, to])
  }
  return points.filter((_, k) => kept[k] === 1)
}

/** The point between two others that lies farthest from the straight line (or, where they meet, from the point) they span. */
function farthest(points: readonly Point[], from: number, to: number): [index: number, distance: number] {
  const [[ax, ay], [bx, by]] = [points[from], points[to]]
  const length = Math.hypot(bx - ax, by - ay)
  let [index, largest] = [from, 0]
  for (let k = from + 1; k < to; k++) {
    const [x, y] = [points[k][0] - ax, points[k][1] - ay]
    const distance = length > 0 ? Math.abs(x * (by - ay) - y * (bx - ax)) / length : Math.hypot(x, y)
    if (distance > largest) [index, largest] = [k, distance]
  }
  return [index, largest]
}
