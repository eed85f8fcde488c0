import { describe, expect, test } from 'vitest';
import { dieboldMariano } from '../../../src/stats/backtests/dieboldMariano.ts';
import { standings } from '../../../src/stats/backtests/league.ts';
import { nextNormal } from '../../../src/stats/random/draws.ts';
import { relativeError } from '../../laws/relativeError.ts';
import { level } from '../levels.ts';
import { testStreams } from '../testStreams.ts';

describe('Diebold & Mariano', () => {
  test('differences 1, 2, 3: t = 2/(1/√3), two degrees of freedom', () => {
    const test3 = dieboldMariano(Float64Array.of(2, 4, 6), Float64Array.of(1, 2, 3));
    expect(test3?.statistic).toBeCloseTo(2 * Math.sqrt(3), 14);
    // Two-sided t with 2 degrees of freedom in closed form: 1 − t/√(2 + t²).
    expect(relativeError(test3?.p ?? 0, 1 - Math.sqrt(12 / 14))).toBeLessThan(1e-13);
    expect(test3?.variance).toBe('plain');
  });

  test('swapping the models turns the sign', () => {
    const first = Float64Array.of(2, 4, 6, 5);
    const second = Float64Array.of(1, 2, 3, 7);
    const forward = dieboldMariano(first, second);
    const backward = dieboldMariano(second, first);
    expect(backward?.statistic).toBe(-(forward?.statistic ?? 0));
    expect(backward?.p).toBe(forward?.p);
  });

  test('autocorrelated differences are judged by Newey-West', () => {
    const runs = Float64Array.from({ length: 200 }, (_, day) => (day % 20 < 10 ? 1.1 : -0.9));
    const judged = dieboldMariano(runs, new Float64Array(200));
    expect(judged?.variance).toBe('neweyWest');
    // Plain: 0.1/(1/√200) = 1.41; runs of ten make the standard error larger.
    expect(judged?.statistic).toBeLessThan(1);
  });

  test('nothing to test', () => {
    expect(dieboldMariano(Float64Array.of(1, 2, 3), Float64Array.of(1, 2, 3))).toBeNull();
    expect(dieboldMariano(Float64Array.of(1, 2, 3), Float64Array.of(0, 1, 2))).toBeNull();
    expect(dieboldMariano(Float64Array.of(1), Float64Array.of(2))).toBeNull();
    expect(() => dieboldMariano(Float64Array.of(1), Float64Array.of(2, 3))).toThrow(
      'dieboldMariano: 1 and 2 losses are not of the same days',
    );
  });
});

describe('standings', () => {
  const random = testStreams(9).stream(0);
  const losses = Float64Array.from({ length: 1000 }, () => nextNormal(random));
  const model = (valueAtRisk: number, expectedShortfall: number, days = losses) => ({
    losses: days,
    valuesAtRisk: new Float64Array(days.length).fill(valueAtRisk),
    expectedShortfalls: new Float64Array(days.length).fill(expectedShortfall),
  });
  // Normal at 97.5%: VaR 1.96, ES 2.338 (coverage.json).
  const right = model(1.96, 2.338);

  test('the right model loses least, and one far off is told from it', () => {
    const [good, low, high] = standings([right, model(0.5, 0.8), model(4, 5)], level('0.975'));
    expect(good?.dieboldMarianoP).toBeNull();
    for (const other of [low, high]) {
      expect(other?.meanJointLoss ?? 0).toBeGreaterThan(good?.meanJointLoss ?? 9);
      expect(other?.meanQuantileLoss ?? 0).toBeGreaterThan(good?.meanQuantileLoss ?? 9);
    }
    expect(low?.dieboldMarianoP).toBeLessThan(0.01);
  });

  test('Holm: the smaller of two p-values is doubled', () => {
    const alone = standings([right, model(1.2, 1.6)], level('0.975'))[1]?.dieboldMarianoP ?? 0;
    const both = standings([right, model(1.2, 1.6), model(2.7, 3.1)], level('0.975'));
    expect(both[1]?.dieboldMarianoP).toBeCloseTo(2 * alone, 12);
  });

  test('a model without a joint loss is not the best of models whose joint losses are above zero', () => {
    // Losses in hundredths are a hundred times as large, and the logarithm of ES above zero.
    const large = losses.map((loss) => 100 * loss);
    const none = model(-1, 0, large);
    const [, good, low] = standings([none, model(196, 233.8, large), model(50, 80, large)], level('0.975'));
    expect(good?.meanJointLoss).toBeGreaterThan(0);
    expect(good?.dieboldMarianoP).toBeNull();
    expect(low?.dieboldMarianoP).toBeLessThan(0.01);
  });

  test('no model has no place', () => {
    expect(standings([], level('0.975'))).toEqual([]);
  });

  test('identical losses are not tested', () => {
    const [first, second] = standings([right, model(1.96, 2.338)], level('0.975'));
    expect([first?.dieboldMarianoP, second?.dieboldMarianoP]).toEqual([null, null]);
    expect(first?.meanJointLoss).toBe(second?.meanJointLoss);
  });

  test('below 10 expected exceedances there is no p', () => {
    const pOf = (count: number) =>
      standings(
        [model(1.96, 2.338, losses.slice(0, count)), model(0.5, 0.8, losses.slice(0, count))],
        level('0.975'),
      )
        .map(({ dieboldMarianoP }) => dieboldMarianoP)
        .filter((p) => p !== null).length;
    expect(pOf(399)).toBe(0);
    expect(pOf(400)).toBe(1);
  });

  test('a model without a positive, finite ES has no joint loss and is not the best', () => {
    const [none, infinite, good] = standings([model(-1, 0), model(1, Infinity), right], level('0.975'));
    expect([none?.meanJointLoss, infinite?.meanJointLoss]).toEqual([null, null]);
    expect(good?.meanJointLoss).not.toBeNull();
    expect(none?.dieboldMarianoP).toBeNull();
  });
});
