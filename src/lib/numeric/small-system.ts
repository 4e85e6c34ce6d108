/**
 * Solves a small dense system in place by Gaussian elimination with partial pivoting: `matrix` (n by n, row after row) is used up, and
 * each of the right-hand sides that follow each other in `sides` becomes its solution. False where the matrix is singular. For the inner loop of a
 * solver only, where making matrices would take longer than solving them.
 */
export function solveInPlace(matrix: Float64Array, n: number, sides: Float64Array, count: number): boolean {
  for (let k = 0; k < n; k += 1) {
    let pivot = k;
    for (let i = k + 1; i < n; i += 1) if (Math.abs(matrix[i * n + k]!) > Math.abs(matrix[pivot * n + k]!)) pivot = i;
    const head = matrix[pivot * n + k]!;
    if (!(Math.abs(head) > 0)) return false;
    if (pivot !== k) swapRows(matrix, sides, n, count, pivot, k);
    for (let i = k + 1; i < n; i += 1) {
      const factor = matrix[i * n + k]! / head;
      if (factor === 0) continue;
      for (let j = k + 1; j < n; j += 1) matrix[i * n + j]! -= factor * matrix[k * n + j]!;
      for (let s = 0; s < count; s += 1) sides[s * n + i]! -= factor * sides[s * n + k]!;
    }
  }
  for (let s = 0; s < count; s += 1) substituteBack(matrix, sides, n, s * n);
  return true;
}

function substituteBack(matrix: Float64Array, sides: Float64Array, n: number, from: number): void {
  for (let i = n - 1; i >= 0; i -= 1) {
    let rest = sides[from + i]!;
    for (let j = i + 1; j < n; j += 1) rest -= matrix[i * n + j]! * sides[from + j]!;
    sides[from + i] = rest / matrix[i * n + i]!;
  }
}

function swapRows(matrix: Float64Array, sides: Float64Array, n: number, count: number, a: number, b: number): void {
  for (let j = 0; j < n; j += 1) {
    const held = matrix[a * n + j]!;
    matrix[a * n + j] = matrix[b * n + j]!;
    matrix[b * n + j] = held;
  }
  for (let s = 0; s < count; s += 1) {
    const held = sides[s * n + a]!;
    sides[s * n + a] = sides[s * n + b]!;
    sides[s * n + b] = held;
  }
}
