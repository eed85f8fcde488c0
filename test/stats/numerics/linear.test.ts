import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { invertPositiveDefinite, solvePositiveDefinite } from '../../../src/stats/numerics/linear.ts';

describe('solvePositiveDefinite', () => {
  it('solves by hand-checked figures', () => {
    // 4·1.25 + 2·1.5 = 8, 2·1.25 + 3·1.5 = 7
    const solution =
      solvePositiveDefinite(
        [
          [4, 2],
          [2, 3],
        ],
        [8, 7],
      ) ?? [];
    expect(solution[0]).toBeCloseTo(1.25, 14);
    expect(solution[1]).toBeCloseTo(1.5, 14);
  });

  it('is null where the matrix is not positive definite', () => {
    expect(
      solvePositiveDefinite(
        [
          [1, 2],
          [2, 1],
        ],
        [1, 1],
      ),
      'indefinite',
    ).toBeNull();
    expect(
      solvePositiveDefinite(
        [
          [1, 1],
          [1, 1],
        ],
        [1, 1],
      ),
      'singular',
    ).toBeNull();
    expect(solvePositiveDefinite([[-1]], [1]), 'negative').toBeNull();
    expect(solvePositiveDefinite([[Number.NaN]], [1]), 'not a number').toBeNull();
    expect(
      invertPositiveDefinite([
        [1, 2],
        [2, 1],
      ]),
    ).toBeNull();
  });

  it('does not mind scales that differ by many powers of ten', () => {
    const inverse =
      invertPositiveDefinite([
        [1e-12, 0],
        [0, 1e12],
      ]) ?? [];
    expect((inverse[0]?.[0] ?? 0) / 1e12).toBeCloseTo(1, 14);
    expect((inverse[1]?.[1] ?? 0) * 1e12).toBeCloseTo(1, 14);
  });

  it('throws where matrix and vector do not fit', () => {
    expect(() => solvePositiveDefinite([[1]], [1, 2])).toThrow(/^solvePositiveDefinite/);
  });
});

describe('invertPositiveDefinite', () => {
  const entry = fc.double({ min: -2, max: 2, noNaN: true });

  it('undoes A·Aᵀ + I of any A, and is symmetric to the last bit', () => {
    fc.assert(
      fc.property(fc.array(fc.tuple(entry, entry, entry, entry), { minLength: 4, maxLength: 4 }), (rows) => {
        const matrix = rows.map((row, i) =>
          rows.map((other, j) =>
            row.reduce((sum, value, k) => sum + value * (other[k] ?? 0), i === j ? 1 : 0),
          ),
        );
        const inverse = invertPositiveDefinite(matrix) ?? [];
        for (let i = 0; i < 4; i += 1) {
          for (let j = 0; j < 4; j += 1) {
            const product = matrix.reduce(
              (sum, _, k) => sum + (matrix[i]?.[k] ?? 0) * (inverse[k]?.[j] ?? 0),
              0,
            );
            // the condition number is at most 65; 1e-12 is a hundred times what rounding can do
            expect(Math.abs(product - (i === j ? 1 : 0))).toBeLessThan(1e-12);
            expect(inverse[i]?.[j]).toBe(inverse[j]?.[i]);
          }
        }
      }),
      { seed: 2013 },
    );
  });
});
