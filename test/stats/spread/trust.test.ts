import { describe, expect, test } from 'vitest';
import { nextIndex, nextNormal } from '../../../src/stats/random/draws.ts';
import { deviationTrust } from '../../../src/stats/spread/trust.ts';
import { accepted, refusalCode } from '../../laws/outcomes.ts';
import { level, level95 } from '../levels.ts';
import { testStreams } from '../testStreams.ts';

const streams = testStreams(51);

const normals = (count: number): Float64Array => {
  const random = testStreams(52).stream(0);
  return Float64Array.from({ length: count }, () => 0.01 * nextNormal(random));
};

/** Scattered large values on both sides: fat tails without clusters. */
const fat = (count: number): Float64Array =>
  normals(count).map((value, index) => (index % 23 === 7 ? (index % 2 === 0 ? 0.07 : -0.07) : value));

const clustered = (count: number): Float64Array =>
  normals(count).map((value, index) => (Math.floor(index / 20) % 2 === 0 ? 0.5 : 2) * value);

/** The same values in an order without clusters. */
const shuffled = (values: readonly number[]): number[] => {
  const random = testStreams(53).stream(0);
  const left = [...values];
  return values.map(() => left.splice(nextIndex(random, left.length), 1)[0] ?? Number.NaN);
};

const trusted = (returns: ArrayLike<number>, more: object = {}) =>
  accepted(deviationTrust({ returns, level: level95, streams, replicates: 999, ...more }));

describe('which interval of the standard deviation to believe', () => {
  test('a bell curve: chi-square', () => {
    const found = trusted(normals(120));
    expect(found).toMatchObject({ trust: 'chiSquare', reason: 'bellShaped', block: null });
    expect(found.bonett).not.toBeNull();
  });

  test('fat tails: Bonett', () => {
    const found = trusted(fat(120));
    expect(found).toMatchObject({ trust: 'bonett', reason: 'fatTailed' });
    expect(found.jarqueBera?.p).toBeLessThan(0.05);
  });

  test('kurtosis alone is enough', () => {
    // Even steps and one large value on each side: g2 = 1.46 lies between 2·√(24/60) = 1.26 and what Jarque-Bera needs.
    const steps = Array.from({ length: 29 }, (_, index) => (index + 1) / 100);
    const found = trusted(shuffled([...steps, ...steps.map((step) => -step), 0.68, -0.68]));
    expect(found.clustering.p).toBeGreaterThan(0.05);
    expect(found.jarqueBera?.p).toBeGreaterThan(0.05);
    expect(found).toMatchObject({ trust: 'bonett', reason: 'fatTailed' });
  });

  test('Jarque-Bera alone is enough', () => {
    // Lopsided and with less kurtosis than the bell curve.
    const found = trusted(shuffled(Array.from({ length: 60 }, (_, index) => ((index + 0.5) / 60) ** 2.2)));
    expect(found.clustering.p).toBeGreaterThan(0.05);
    expect(found.excessKurtosis).toBeLessThan(0);
    expect(found).toMatchObject({ trust: 'bonett', reason: 'fatTailed' });
  });

  test('clusters: blocks', () => {
    const found = trusted(clustered(400));
    expect(found).toMatchObject({ trust: 'block', reason: 'clustered' });
    expect(found.clustering.p).toBeLessThan(0.05);
  });

  test('blocks can be asked for without changing what is trusted', () => {
    const found = trusted(normals(120), { blockAsked: true });
    expect(found.trust).toBe('chiSquare');
    expect(found.block).not.toBeNull();
  });

  test('doubt is said where nothing better can be had', () => {
    const nine = [0.01, -0.01, 0.012, 0.009, -0.011, 0.2, 0.01, -0.012, 0.01];
    expect(trusted(nine)).toMatchObject({ trust: 'chiSquare', reason: 'outOfReach', bonett: null });
    // Clustered, and the level is beyond the resamples: Bonett is the better of what is left.
    expect(trusted(clustered(400), { level: level('0.99999') })).toMatchObject({
      trust: 'bonett',
      reason: 'outOfReach',
      block: null,
    });
    expect(trusted([0, 0.01])).toMatchObject({
      reason: 'bellShaped',
      excessKurtosis: null,
      jarqueBera: null,
    });
  });

  test('four returns have a kurtosis', () => {
    // By hand: of 0, 0, 0, 1 the fourth central moment is 21/256 and the second 3/16, so m4/m2² − 3 = −2/3.
    const found = trusted([0, 0, 0, 1]);
    expect(found.excessKurtosis).toBeCloseTo(-2 / 3, 14);
    expect(found.jarqueBera).not.toBeNull();
  });

  test('is refused like the chi-square interval', () => {
    expect(refusalCode(deviationTrust({ returns: [0.1], level: level95, streams }))).toBe('tooFewReturns');
  });
});
