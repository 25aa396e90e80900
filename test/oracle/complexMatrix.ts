import { abs, add, type Complex, conj, div, mul, ONE, sub, sum, ZERO } from './complex.js'

/** Rows of columns. */
export type Matrix = readonly (readonly Complex[])[]

export const identity = (size: number): Matrix =>
  Array.from({ length: size }, (_, i) => Array.from({ length: size }, (_, j) => (i === j ? ONE : ZERO)))

export const zeros = (rows: number, columns: number): Matrix =>
  Array.from({ length: rows }, () => Array.from({ length: columns }, () => ZERO))

export const transpose = (a: Matrix): Matrix => a[0].map((_, j) => a.map((row) => row[j]))

/** The conjugate transpose. */
export const adjoint = (a: Matrix): Matrix => transpose(a).map((row) => row.map(conj))

export const scaleMatrix = (factor: Complex, a: Matrix): Matrix => a.map((row) => row.map((v) => mul(factor, v)))

export const addMatrix = (a: Matrix, b: Matrix): Matrix => a.map((row, i) => row.map((v, j) => add(v, b[i][j])))

export const subMatrix = (a: Matrix, b: Matrix): Matrix => a.map((row, i) => row.map((v, j) => sub(v, b[i][j])))

export const trace = (a: Matrix): Complex => sum(a.map((row, i) => row[i]))

/** The product of any number of matrices. */
export const product = (...factors: readonly Matrix[]): Matrix =>
  factors.reduce((a, b) => a.map((row) => transpose(b).map((column) => sum(row.map((v, k) => mul(v, column[k]))))))

/** m ⊗ m*: what the map m of a field does to its coherency vector (ExEx*, ExEy*, EyEx*, EyEy*). */
export const kroneckerWithConjugate = (m: Matrix): Matrix =>
  m.flatMap((row) => m.map((other) => row.flatMap((v) => other.map((w) => mul(v, conj(w))))))

export const block = (a: Matrix, row: number, column: number, rows: number, columns: number): Matrix =>
  a.slice(row, row + rows).map((r) => r.slice(column, column + columns))

/** X of A X = B by Gaussian elimination with partial pivoting. Throws where A is singular. */
export function solveLinear(a: Matrix, b: Matrix): Matrix {
  const size = a.length
  const rows = a.map((row, i) => [...row, ...b[i]])
  for (let k = 0; k < size; k++) {
    const pivot = rowOfLargest(rows, k)
    const swapped = rows[pivot]
    rows[pivot] = rows[k]
    rows[k] = swapped
    if (abs(rows[k][k]) === 0) throw new Error('singular matrix')
    for (let i = k + 1; i < size; i++) subtractMultiple(rows[i], rows[k], k)
  }
  for (let k = size - 1; k >= 0; k--) {
    rows[k] = rows[k].map((v, j) => (j >= k ? div(v, rows[k][k]) : v))
    for (let i = 0; i < k; i++) subtractMultiple(rows[i], rows[k], k)
  }
  return rows.map((row) => row.slice(size))
}

function rowOfLargest(rows: readonly Complex[][], column: number): number {
  let best = column
  for (let i = column + 1; i < rows.length; i++) if (abs(rows[i][column]) > abs(rows[best][column])) best = i
  return best
}

/** Clears `target[column]` with a multiple of the pivot row. */
function subtractMultiple(target: Complex[], pivotRow: readonly Complex[], column: number): void {
  if (abs(target[column]) === 0) return
  const factor = div(target[column], pivotRow[column])
  for (let j = column; j < target.length; j++) target[j] = sub(target[j], mul(factor, pivotRow[j]))
}

export const inverse = (a: Matrix): Matrix => solveLinear(a, identity(a.length))
