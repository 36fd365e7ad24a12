/** Square matrices of three to five rows, stored row after row. */

/** One step of iterative refinement: s += B⁻¹ (b − B s). */
export function refine(
  matrix: Float64Array,
  right: Float64Array,
  inverse: Float64Array,
  s: Float64Array,
  d: number,
): void {
  const residual = new Float64Array(d);
  for (let i = 0; i < d; i++) {
    let value = right[i] as number;
    for (let k = 0; k < d; k++) value -= (matrix[i * d + k] as number) * (s[k] as number);
    residual[i] = value;
  }
  for (let i = 0; i < d; i++) {
    let step = 0;
    for (let k = 0; k < d; k++) step += (inverse[i * d + k] as number) * (residual[k] as number);
    s[i] = (s[i] as number) + step;
  }
}

/** Gauss–Jordan with partial pivoting, for matrices of three to five rows; false when the rows depend on each other. */
export function invert(matrix: Float64Array, inverse: Float64Array, d: number): boolean {
  const work = SCRATCH;
  for (let i = 0; i < d * d; i++) work[i] = matrix[i] as number;
  inverse.fill(0);
  for (let i = 0; i < d; i++) inverse[i * d + i] = 1;
  for (let column = 0; column < d; column++) {
    let pivotRow = column;
    for (let r = column + 1; r < d; r++) {
      if (Math.abs(work[r * d + column] as number) > Math.abs(work[pivotRow * d + column] as number)) pivotRow = r;
    }
    const pivot = work[pivotRow * d + column] as number;
    if (pivot === 0) return false;
    if (pivotRow !== column) {
      swapRows(work, column, pivotRow, d);
      swapRows(inverse, column, pivotRow, d);
    }
    for (let k = 0; k < d; k++) {
      work[column * d + k] = (work[column * d + k] as number) / pivot;
      inverse[column * d + k] = (inverse[column * d + k] as number) / pivot;
    }
    for (let r = 0; r < d; r++) {
      const factor = work[r * d + column] as number;
      if (r === column || factor === 0) continue;
      for (let k = 0; k < d; k++) {
        work[r * d + k] = (work[r * d + k] as number) - factor * (work[column * d + k] as number);
        inverse[r * d + k] = (inverse[r * d + k] as number) - factor * (inverse[column * d + k] as number);
      }
    }
  }
  return true;
}

const SCRATCH = new Float64Array(25);

function swapRows(matrix: Float64Array, i: number, j: number, d: number): void {
  for (let k = 0; k < d; k++) {
    const held = matrix[i * d + k] as number;
    matrix[i * d + k] = matrix[j * d + k] as number;
    matrix[j * d + k] = held;
  }
}
