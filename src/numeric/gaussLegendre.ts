/**
 * Nodes and weights of Gauss–Legendre quadrature on [0, 1]: exact for polynomials up to degree 2 count - 1. Newton's method
 * on the Legendre polynomial from Tricomi's starting values (e.g. Press et al., Numerical Recipes, §4.6).
 */
export function gaussLegendre(count: number): { nodes: Float64Array; weights: Float64Array } {
  const nodes = new Float64Array(count)
  const weights = new Float64Array(count)
  for (let k = 0; k < count; k++) {
    let x = Math.cos((Math.PI * (k + 0.75)) / (count + 0.5))
    let slope = 1
    for (let step = 0; step < 100; step++) {
      const { value, derivative } = legendre(count, x)
      slope = derivative
      const change = value / derivative
      x -= change
      if (Math.abs(change) < 1e-15) break
    }
    nodes[count - 1 - k] = (1 + x) / 2
    weights[count - 1 - k] = 1 / ((1 - x * x) * slope * slope)
  }
  return { nodes, weights }
}

function legendre(degree: number, x: number): { value: number; derivative: number } {
  let before = 1
  let value = x
  for (let k = 2; k <= degree; k++) {
    const next = ((2 * k - 1) * x * value - (k - 1) * before) / k
    before = value
    value = next
  }
  return { value, derivative: (degree * (x * value - before)) / (x * x - 1) }
}
