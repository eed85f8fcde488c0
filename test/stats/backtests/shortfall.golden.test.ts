import { describe, expect, test } from 'vitest';
import { drawStudentBeyond } from '../../../src/stats/backtests/rolling/studentTail.ts';
import { shortfallZ2, simulatedShortfallP } from '../../../src/stats/backtests/shortfall.ts';
import { level } from '../levels.ts';
import { fixtureJson } from '../readFixture.ts';
import { testStreams } from '../testStreams.ts';

type Simulated = {
  readonly distribution: string;
  readonly var: number;
  readonly es: number;
  readonly quantiles: readonly { readonly probability: number; readonly critical_value: number }[];
};
type Fixture = {
  readonly cases: readonly {
    readonly name: string;
    readonly simulation?: { readonly results: readonly Simulated[] };
  }[];
};

const simulated =
  fixtureJson<Fixture>('coverage.json').cases.find(({ name }) => name === 'expected_shortfall_z2')?.simulation
    ?.results ?? [];

const nuOf = ({ distribution }: Simulated): number =>
  Number(/nu=(\d+)/.exec(distribution)?.[1] ?? Number.POSITIVE_INFINITY);

const days = 250;
const replicates = 9999;

// Critical values from 4,000,000 replications with numpy 1.24.2 (command in the fixture); the normal and nu = 10 and more
// give the published −0.70 at 5% and −1.8 at 0.01% (Acerbi & Szekely 2014, from memory).
describe.each(simulated)('Z2 over 250 days at 97.5%, $distribution', (row) => {
  const shortfalls = new Float64Array(days).fill(row.es);
  const nu = nuOf(row);

  test.each(row.quantiles)('$critical_value is undercut with chance $probability', (quantile) => {
    const p = simulatedShortfallP(
      quantile.critical_value,
      shortfalls,
      level('0.975'),
      (_, random) => drawStudentBeyond(row.var, nu, random),
      testStreams(14),
      replicates,
    );
    // Four binomial standard errors of the count, one for the + 1 of p, and 1% for the fixture's own interval.
    const error = Math.sqrt((quantile.probability * (1 - quantile.probability)) / replicates);
    expect(Math.abs(p - quantile.probability)).toBeLessThan(
      4 * error + 1 / replicates + 0.01 * quantile.probability,
    );
  });
});

describe('Z2', () => {
  const judged = (losses: number[], valueAtRisk: number, expectedShortfall: number) => ({
    losses: Float64Array.from(losses),
    valuesAtRisk: new Float64Array(losses.length).fill(valueAtRisk),
    expectedShortfalls: new Float64Array(losses.length).fill(expectedShortfall),
  });
  const quiet = (count: number) => new Array<number>(count).fill(0);

  test('by hand: one loss of 0.05 in 100 days at 99% with ES 0.04 is 1 − 0.05/0.04', () => {
    expect(shortfallZ2(judged([...quiet(99), 0.05], 0.03, 0.04), level('0.99'))).toBeCloseTo(-0.25, 15);
  });

  test('without an exceedance 1; a loss equal to VaR is none', () => {
    expect(shortfallZ2(judged([...quiet(99), 0.03], 0.03, 0.04), level('0.99'))).toBe(1);
  });

  test('exceedances as expected and losses as large as ES: 0', () => {
    expect(shortfallZ2(judged([...quiet(98), 0.04, 0.04], 0.03, 0.04), level('0.98'))).toBe(0);
  });

  test.each([0, -0.01, Number.POSITIVE_INFINITY])('ES of %d cannot be judged', (expectedShortfall) => {
    expect(shortfallZ2(judged([0.1, 0.2], -0.03, expectedShortfall), level('0.99'))).toBeNull();
  });
});

test('the same streams give the same p', () => {
  const p = () =>
    simulatedShortfallP(
      -0.5,
      new Float64Array(250).fill(1),
      level('0.99'),
      (_, random) => drawStudentBeyond(2.3, 4, random),
      testStreams(3),
      500,
    );
  expect(p()).toBe(p());
});
