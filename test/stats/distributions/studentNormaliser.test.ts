import { expect, test } from 'vitest';
import { fillStudentNormaliser } from '../../../src/stats/distributions/studentNormaliser.ts';
import { studentTDensity } from '../../../src/stats/distributions/studentT.ts';

const at = (inverseNu: number) => {
  const into = { value: Number.NaN, slope: Number.NaN, curvature: Number.NaN };
  fillStudentNormaliser(inverseNu, into);
  return into;
};

const places = [0.003, 0.02, 0.033, 0.034, 0.1, 0.4, 1.5];

test.each(places)('at 1/nu = %d it is the logarithm of the density at 0', (inverseNu) => {
  // The density is good to 1e-13 relative, so its logarithm to 1e-13.
  expect(Math.abs(at(inverseNu).value - Math.log(studentTDensity(0, 1 / inverseNu)))).toBeLessThan(1e-12);
});

test('in the normal limit it is that of the bell curve, and falls by a quarter of 1/nu', () => {
  // ln Γ((nu + 1)/2) − ln Γ(nu/2) − ½ ln(nu·π) = −½ ln 2π − 1/(4 nu) + … (Stirling's series).
  expect(at(0).value).toBeCloseTo(-0.5 * Math.log(2 * Math.PI), 15);
  expect(at(0).slope).toBeCloseTo(-0.25, 15);
  expect(Math.abs(at(0).curvature)).toBeLessThan(1e-15);
});

test.each(places)('at 1/nu = %d its derivatives are those of its value', (inverseNu) => {
  const { slope, curvature } = at(inverseNu);
  const step = 1e-3 * inverseNu;
  const difference = (of: 'value' | 'slope', width: number) =>
    (at(inverseNu + width)[of] - at(inverseNu - width)[of]) / (2 * width);
  const slopeOf = (of: 'value' | 'slope') => (4 * difference(of, step / 2) - difference(of, step)) / 3;
  // Fourth order in a step of a thousandth: 1e-11 at most; rounding of 1e-15 over the step, 1e-9 at the smallest.
  expect(Math.abs(slopeOf('value') - slope)).toBeLessThan(1e-8);
  expect(Math.abs(slopeOf('slope') - curvature)).toBeLessThan(1e-7);
});
