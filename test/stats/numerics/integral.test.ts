import { expect, it } from 'vitest';
import { integrate } from '../../../src/stats/numerics/integral.ts';

it('is exact on polynomials up to degree 22, so nodes and weights are right', () => {
  for (let degree = 0; degree <= 22; degree += 1) {
    // one panel only: a rule that needed halving would hide a wrong figure
    const integral = integrate((x) => x ** degree, 0, 1, { maxDepth: 0 });
    // ten units in the last place for a sum of fifteen terms
    expect(Math.abs(integral * (degree + 1) - 1), `degree ${degree}`).toBeLessThan(2e-15);
  }
  expect(Math.abs(integrate((x) => x ** 40, -1, 1, { maxDepth: 0 }) * 20.5 - 1)).toBeGreaterThan(1e-9);
});

it('halves its way down to a narrow hill', () => {
  // ∫ exp(−(x/w)²) dx = w·√π
  const width = 1e-3;
  const area = integrate((x) => Math.exp(-(((x - 0.4) / width) ** 2)), 0, 1);
  expect(Math.abs(area / (width * Math.sqrt(Math.PI)) - 1)).toBeLessThan(1e-13);
});

it('ends on a jump', () => {
  // accuracy is that of forty halvings' last panel times the jump, and of the allowance per panel
  expect(Math.abs(integrate((x) => (x < 1 / 3 ? 0 : 1), 0, 1) - 2 / 3)).toBeLessThan(1e-9);
});
