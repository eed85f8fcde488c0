import { describe, expect, test } from 'vitest';
import { nextOpenDouble } from '../../../../src/stats/random/draws.ts';
import { nextStudentT } from '../../../../src/stats/random/studentDraw.ts';
import { lowerEndByRank } from '../../../../src/stats/tails/peaks/internal/lowerByRank.ts';
import { peaksBeyond } from '../../../../src/stats/tails/peaks/peaksBeyond.ts';
import { peaksTail } from '../../../../src/stats/tails/peaks/peaksTail.ts';
import { accepted, refusalCode } from '../../../laws/outcomes.ts';
import { level, level95 } from '../../levels.ts';
import { testStreams } from '../../testStreams.ts';

const streams = testStreams(21);
const heavy = (count: number, nu: number, stream: number): Float64Array => {
  const random = streams.stream(stream);
  return Float64Array.from({ length: count }, () => 0.01 * nextStudentT(random, nu));
};
const question = (returns: Float64Array, tailLevel = '0.99') => ({
  returns,
  tailLevel: level(tailLevel),
  confidence: level95,
  streams,
});

describe('figures of the largest losses', () => {
  test('ES has no upper end where the interval of xi reaches 1', () => {
    const figures = accepted(peaksTail(question(heavy(250, 1.5, 1))));
    expect(figures.parameters.shape).toBeLessThan(1);
    expect(figures.parameters.shapeInterval.upper).toBeGreaterThan(1);
    expect(figures.esInterval?.upper).toBeNull();
    expect(figures.esInterval?.lower).toBeLessThan(figures.es ?? 0);
    expect(figures.notes.map(({ figure, code }) => [figure, code])).toContainEqual([
      'esInterval',
      'upperEndUnbounded',
    ]);
  });

  test('ES does not exist where xi is 1 or more, and VaR does', () => {
    const figures = accepted(peaksTail(question(heavy(2000, 0.9, 2))));
    expect(figures.parameters.shape).toBeGreaterThan(1);
    expect(figures.es).toBeNull();
    expect(figures.esInterval).toBeNull();
    expect(figures.notes.map(({ code }) => code)).toContain('meanNotFinite');
    expect(figures.varInterval?.upper).toBeGreaterThan(figures.var);
  });

  test('a lower end of VaR below the threshold is a loss that was seen', () => {
    const returns = heavy(500, 4, 3);
    const figures = accepted(peaksTail(question(returns, '0.905')));
    const { lower } = figures.varInterval ?? { lower: null };
    expect(lower).toBeLessThan(figures.parameters.threshold);
    expect(Array.from(returns, (value) => -value)).toContain(lower);
  });

  test('ranks stop where twice the loss of likelihood passes the square of the reach', () => {
    // Losses 1 to 100 at 90%: with 16 larger than the loss at rank 84, 2·[16·ln(16/10) + 84·ln(84/90)] = 3.45;
    // with 17 larger than the one at rank 83, 2·[17·ln(17/10) + 83·ln(83/90)] = 4.60, beyond 1.96² = 3.84.
    const losses = Float64Array.from({ length: 100 }, (_, index) => index + 1);
    expect(lowerEndByRank(losses, 10, 0.1, 1.96)).toBe(84);
  });

  test('the chance of a loss below the threshold is the share of days', () => {
    const returns = heavy(400, 4, 4);
    const chance = accepted(peaksBeyond({ returns, threshold: 0.005, confidence: level95, streams }));
    const hits = returns.filter((value) => -value >= 0.005).length;
    expect(chance.probability).toBe(hits / 400);
    expect(chance.model).toBe('peaks');
    expect(chance.intervalMethod).toBe('clopperPearson');
  });

  test('a loss beyond the end of a short tail has chance 0, with an upper end above it', () => {
    const random = streams.stream(5);
    // P(loss > 0.01·(1 − e)) = e⁴, so xi is −1/4.
    const returns = Float64Array.from({ length: 2000 }, () => 0.01 * (nextOpenDouble(random) ** 0.25 - 1));
    const figures = accepted(peaksTail(question(returns)));
    expect(figures.parameters.shape).toBeLessThan(0);
    const beyondEnd = figures.parameters.threshold - figures.parameters.scale / figures.parameters.shape;
    const chanceOf = (threshold: number) =>
      accepted(peaksBeyond({ returns, threshold, confidence: level95, streams }));
    const chance = chanceOf(1.02 * beyondEnd);
    expect(chance.probability).toBe(0);
    expect(chance.meanReturnSessions).toBeNull();
    expect(chance.interval?.lower).toBe(0);
    expect(chance.interval?.upper).toBeGreaterThan(0);
    expect(chance.interval?.upper).toBeLessThan(0.01);
    // Ten times as far no chance that counts can be squared with the losses: the smallest that does is the end.
    const never = chanceOf(10 * beyondEnd);
    expect([never.interval?.lower, never.interval?.upper]).toEqual(
      [0, 1e-12].map((end) => expect.closeTo(end, 20)),
    );
  });
});

describe('figures of the largest losses are refused', () => {
  test('below 250 returns, naming 250', () => {
    const outcome = peaksTail(question(heavy(249, 4, 6)));
    expect(outcome.ok ? null : [outcome.problem.code, outcome.problem.needs]).toEqual(['tooFewReturns', 250]);
  });

  test('where ties at the threshold leave fewer than 25 losses beyond it', () => {
    const returns = heavy(250, 4, 7).sort();
    returns.fill(returns[24] as number, 20, 30);
    expect(refusalCode(peaksTail(question(returns)))).toBe('notEnoughTail');
  });

  test('at a level at or below the threshold', () => {
    expect(refusalCode(peaksTail(question(heavy(250, 4, 8), '0.9')))).toBe('levelOutside');
    expect(refusalCode(peaksTail(question(heavy(250, 4, 8), '0.901')))).toBe('not refused');
  });

  test('where xi runs to either end of its range', () => {
    const uniform = Float64Array.from({ length: 300 }, (_, day) => 0.01 * Math.cos(day));
    expect(refusalCode(peaksTail(question(uniform)))).toBe('shapeOutside');
    expect(refusalCode(peaksTail(question(heavy(2000, 0.5, 9))))).toBe('shapeOutside');
  });

  test('for a price that stands still', () => {
    expect(refusalCode(peaksTail(question(new Float64Array(300))))).toBe('priceDoesNotMove');
  });
});
