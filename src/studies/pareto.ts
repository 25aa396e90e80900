/** Indices of the points that no other betters: none is at most as costly in every coordinate and less in one. */
export function nondominated(costs: readonly (readonly number[])[]): number[] {
  return costs.map((_, k) => k).filter((k) => !costs.some((other) => dominates(other, costs[k])))
}

function dominates(a: readonly number[], b: readonly number[]): boolean {
  return a.every((cost, k) => cost <= b[k]) && a.some((cost, k) => cost < b[k])
}
