/** Everything that Newton's method on a few parameters writes to; matrices by rows. */
export type Workspace = {
  readonly size: number;
  readonly point: Float64Array;
  readonly gradient: Float64Array;
  readonly hessian: Float64Array;
  readonly trial: Float64Array;
  readonly trialGradient: Float64Array;
  readonly trialHessian: Float64Array;
  readonly factor: Float64Array;
  readonly step: Float64Array;
  /** −1 held on the lower bound, 1 on the upper, 0 free. */
  readonly side: Int8Array;
  readonly errors: Float64Array;
};

export const createWorkspace = (start: Float64Array): Workspace => {
  const size = start.length;
  const vector = () => new Float64Array(size);
  const matrix = () => new Float64Array(size * size);
  return {
    size,
    point: start.slice(),
    gradient: vector(),
    hessian: matrix(),
    trial: vector(),
    trialGradient: vector(),
    trialHessian: matrix(),
    factor: matrix(),
    step: vector(),
    side: new Int8Array(size),
    errors: vector(),
  };
};

/**
 * Cholesky factor of −hessian + ridge·|diagonal| over the free parameters; a held one gets a unit row.
 * False where the matrix is not positive definite.
 */
export const factorise = (work: Workspace, ridge: number): boolean => {
  const { size, hessian, factor, side } = work;
  for (let row = 0; row < size; row += 1) {
    for (let column = 0; column <= row; column += 1) {
      const held = side[row] !== 0 || side[column] !== 0;
      const own = row === column;
      const entry = hessian[row * size + column] as number;
      let sum = held ? (own ? 1 : 0) : -entry + (own ? ridge * Math.max(Math.abs(entry), 1e-8) : 0);
      for (let k = 0; k < column; k += 1)
        sum -= (factor[row * size + k] as number) * (factor[column * size + k] as number);
      if (own) {
        if (!(sum > 0)) return false;
        factor[row * size + row] = Math.sqrt(sum);
      } else factor[row * size + column] = sum / (factor[column * size + column] as number);
    }
  }
  return true;
};

/** Solves factor·factorᵀ·result = right in place. */
export const substitute = (size: number, factor: Float64Array, right: Float64Array): void => {
  for (let row = 0; row < size; row += 1) {
    let sum = right[row] as number;
    for (let k = 0; k < row; k += 1) sum -= (factor[row * size + k] as number) * (right[k] as number);
    right[row] = sum / (factor[row * size + row] as number);
  }
  for (let row = size - 1; row >= 0; row -= 1) {
    let sum = right[row] as number;
    for (let k = row + 1; k < size; k += 1) sum -= (factor[k * size + row] as number) * (right[k] as number);
    right[row] = sum / (factor[row * size + row] as number);
  }
};

/** Standard errors of the free parameters from the factor made without a ridge. */
export const fillErrors = (work: Workspace): void => {
  const unit = new Float64Array(work.size);
  for (let i = 0; i < work.size; i += 1) {
    if (work.side[i] !== 0) {
      work.errors[i] = 0;
      continue;
    }
    unit.fill(0);
    unit[i] = 1;
    substitute(work.size, work.factor, unit);
    work.errors[i] = Math.sqrt(unit[i] as number);
  }
};
