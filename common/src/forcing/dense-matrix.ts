/** Square matrices of order n, row after row in one array; blocks of columns may be wider than n. */

/** out = a · b, with b and out `columns` wide. */
export function multiplyInto(
  out: Float64Array,
  a: Float64Array,
  b: Float64Array,
  n: number,
  columns: number,
): Float64Array {
  out.fill(0);
  for (let i = 0; i < n; i += 1) {
    const to = i * columns;
    for (let k = 0; k < n; k += 1) {
      const factor = a[i * n + k]!;
      const from = k * columns;
      for (let j = 0; j < columns; j += 1) out[to + j]! += factor * b[from + j]!;
    }
  }
  return out;
}

/**
 * Solves a · x = b for all columns of b in place, by elimination with row exchange. `a` is spoilt.
 *
 * The matrices met here (unity minus a reflection twice over, unity plus a small step) have no pivot near zero.
 */
export function solveInPlace(a: Float64Array, b: Float64Array, n: number, columns: number): void {
  for (let pivot = 0; pivot < n; pivot += 1) {
    bringUpPivot(a, b, n, columns, pivot);
    const inverse = 1 / a[pivot * n + pivot]!;
    for (let i = pivot + 1; i < n; i += 1) {
      const factor = a[i * n + pivot]! * inverse;
      if (factor === 0) continue;
      for (let j = pivot + 1; j < n; j += 1) a[i * n + j]! -= factor * a[pivot * n + j]!;
      for (let j = 0; j < columns; j += 1) b[i * columns + j]! -= factor * b[pivot * columns + j]!;
    }
  }
  for (let i = n - 1; i >= 0; i -= 1) {
    for (let k = i + 1; k < n; k += 1) {
      const factor = a[i * n + k]!;
      for (let j = 0; j < columns; j += 1) b[i * columns + j]! -= factor * b[k * columns + j]!;
    }
    const inverse = 1 / a[i * n + i]!;
    for (let j = 0; j < columns; j += 1) b[i * columns + j]! *= inverse;
  }
}

function bringUpPivot(a: Float64Array, b: Float64Array, n: number, columns: number, pivot: number): void {
  let largest = pivot;
  for (let i = pivot + 1; i < n; i += 1) {
    if (Math.abs(a[i * n + pivot]!) > Math.abs(a[largest * n + pivot]!)) largest = i;
  }
  if (largest === pivot) return;
  swapRows(a, n, pivot, largest);
  swapRows(b, columns, pivot, largest);
}

function swapRows(matrix: Float64Array, width: number, first: number, second: number): void {
  for (let j = 0; j < width; j += 1) {
    const kept = matrix[first * width + j]!;
    matrix[first * width + j] = matrix[second * width + j]!;
    matrix[second * width + j] = kept;
  }
}
