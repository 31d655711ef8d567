/**
 * Small symmetric positive definite systems, in place, row-major: `a[i * p + j]`.
 * Kept apart from a general matrix package because the board solves hundreds of
 * thousands of systems of 2 to 12 unknowns, where making matrix objects costs
 * more than the arithmetic.
 */

/**
 * Replaces the lower triangle of `a` by its Cholesky factor L (a = L Lᵀ).
 *
 * @returns log determinant of `a`, or null when it is not positive definite (a column repeats others)
 */
export function factorise(a: Float64Array, p: number): number | null {
  let logDeterminant = 0;
  for (let j = 0; j < p; j++) {
    let pivot = a[j * p + j]!;
    const was = pivot;
    for (let k = 0; k < j; k++) pivot -= a[j * p + k]! * a[j * p + k]!;
    // 1e-11 of the diagonal: what is left then is rounding, not information.
    if (!(pivot > was * 1e-11)) return null;
    const root = Math.sqrt(pivot);
    a[j * p + j] = root;
    logDeterminant += 2 * Math.log(root);
    for (let i = j + 1; i < p; i++) {
      let value = a[i * p + j]!;
      for (let k = 0; k < j; k++) value -= a[i * p + k]! * a[j * p + k]!;
      a[i * p + j] = value / root;
    }
  }
  return logDeterminant;
}

/** Solves L z = b in place. */
export function solveLower(factor: Float64Array, p: number, b: Float64Array): void {
  for (let i = 0; i < p; i++) {
    let value = b[i]!;
    for (let k = 0; k < i; k++) value -= factor[i * p + k]! * b[k]!;
    b[i] = value / factor[i * p + i]!;
  }
}

/** Solves (L Lᵀ) x = b in place. */
export function solveWith(factor: Float64Array, p: number, b: Float64Array): void {
  solveLower(factor, p, b);
  for (let i = p - 1; i >= 0; i--) {
    let value = b[i]!;
    for (let k = i + 1; k < p; k++) value -= factor[k * p + i]! * b[k]!;
    b[i] = value / factor[i * p + i]!;
  }
}

/** Diagonal element `j` of the inverse of L Lᵀ. */
export function inverseDiagonal(factor: Float64Array, p: number, j: number): number {
  const unit = new Float64Array(p);
  unit[j] = 1;
  solveLower(factor, p, unit);
  let sum = 0;
  for (let i = j; i < p; i++) sum += unit[i]! * unit[i]!;
  return sum;
}
