/** A small square matrix by rows. */
export type Matrix = readonly (readonly number[])[];

/**
 * The lower triangle L with L·Lᵀ equal to a symmetric matrix; null when the matrix is not positive definite.
 *
 * Convention: only the lower triangle of the input is read. A pivot that is not larger than 1e-14 of its own diagonal
 * entry has lost every digit and counts as zero.
 * Source: Golub & Van Loan 2013, Matrix Computations, 4th edition, section 4.2.
 */
export const choleskyFactor = (matrix: Matrix): Matrix | null => {
  const factor: number[][] = [];
  for (const [row, entries] of matrix.entries()) {
    const built: number[] = [];
    for (let column = 0; column < row; column += 1) {
      const other = factor[column] as number[];
      const rest = (entries[column] as number) - dot(built, other, column);
      built.push(rest / (other[column] as number));
    }
    const diagonal = entries[row] as number;
    const pivot = diagonal - dot(built, built, row);
    if (!(pivot > 1e-14 * Math.abs(diagonal)) || !Number.isFinite(pivot)) return null;
    built.push(Math.sqrt(pivot));
    factor.push(built);
  }
  return factor;
};

const dot = (first: readonly number[], second: readonly number[], count: number): number => {
  let sum = 0;
  for (let index = 0; index < count; index += 1) {
    sum += (first[index] as number) * (second[index] as number);
  }
  return sum;
};

/**
 * Solves matrix·x = vector for a symmetric positive definite matrix; null when it is not positive definite.
 *
 * Domain: a few rows (the fits of the core have two to five), matrix and vector of the same length.
 * Source: as {@link choleskyFactor}.
 * Example: `solvePositiveDefinite([[4, 2], [2, 3]], [8, 7])` is [1.25, 1.5].
 */
export const solvePositiveDefinite = (matrix: Matrix, vector: readonly number[]): number[] | null => {
  if (vector.length !== matrix.length) {
    throw new RangeError(
      `solvePositiveDefinite: ${matrix.length} rows but ${vector.length} right-hand sides`,
    );
  }
  const factor = choleskyFactor(matrix);
  return factor === null ? null : solveFactored(factor, vector);
};

const solveFactored = (factor: Matrix, vector: readonly number[]): number[] => {
  const forward: number[] = [];
  for (const [row, entries] of factor.entries()) {
    forward.push(((vector[row] as number) - dot(entries, forward, row)) / (entries[row] as number));
  }
  const solution = [...forward];
  for (let row = factor.length - 1; row >= 0; row -= 1) {
    let rest = forward[row] as number;
    for (let below = row + 1; below < factor.length; below += 1) {
      rest -= (factor[below]?.[row] as number) * (solution[below] as number);
    }
    solution[row] = rest / (factor[row]?.[row] as number);
  }
  return solution;
};

/**
 * The inverse of a symmetric positive definite matrix, symmetric to the last bit; null when it is not positive definite.
 *
 * Example: `invertPositiveDefinite([[2, 0], [0, 4]])` is [[0.5, 0], [0, 0.25]].
 */
export const invertPositiveDefinite = (matrix: Matrix): number[][] | null => {
  const factor = choleskyFactor(matrix);
  if (factor === null) return null;
  const columns = matrix.map((_, unit) =>
    solveFactored(
      factor,
      matrix.map((_row, row) => (row === unit ? 1 : 0)),
    ),
  );
  return columns.map((column, row) =>
    column.map((value, other) => (other <= row ? value : (columns[other]?.[row] as number))),
  );
};
