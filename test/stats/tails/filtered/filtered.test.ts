import { describe, expect, test } from 'vitest';
import { filteredBeyond } from '../../../../src/stats/tails/filtered/filteredBeyond.ts';
import { filteredKinds } from '../../../../src/stats/tails/filtered/filteredKinds.ts';
import { filteredTail } from '../../../../src/stats/tails/filtered/filteredTail.ts';
import { filterSource } from '../../../../src/stats/tails/filtered/internal/filterSource.ts';
import { visitResampledStates } from '../../../../src/stats/tails/filtered/internal/resampledStates.ts';
import { historicalTail } from '../../../../src/stats/tails/historicalTail.ts';
import { fitGarch, processOf } from '../../../../src/stats/volatility/garch.ts';
import { filterByGarch, rebuildReturns } from '../../../../src/stats/volatility/garchPath.ts';
import { accepted, refusalCode } from '../../../laws/outcomes.ts';
import { relativeError } from '../../../laws/relativeError.ts';
import { indexReturns } from '../../indexWindows.ts';
import { level, level95 } from '../../levels.ts';
import { testStreams } from '../../testStreams.ts';
import { simulateGarchReturns } from '../../volatility/simulateReturns.ts';

const streams = testStreams(31);
const question = (returns: Float64Array, tailLevel = '0.95') => ({
  returns,
  tailLevel: level(tailLevel),
  confidence: level95,
  streams,
});
const clustered = { mu: 0.0005, omega: 2e-6, alpha: 0.08, beta: 0.9 } as const;

describe('which filter speaks', () => {
  test.each([
    [60, ['ewma']],
    [489, ['ewma']],
    [490, ['ewma', 'garch']],
    [499, ['ewma', 'garch']],
    [500, ['garch', 'ewma']],
    [510, ['garch', 'ewma']],
    [511, ['garch']],
  ] as const)('at %s returns', (count, kinds) => {
    expect(filteredKinds(count)).toEqual(kinds);
  });
});

describe('filtered figures by the exponentially weighted mean', () => {
  test('by hand, without its interval', () => {
    // Twenty returns ±1%: σ² stays 1e-4, residuals are ±1. With one more return of −3% σ² becomes
    // 0.94·σ² + 0.06·9e-4, σ²_1 = (20·1e-4 + 9e-4)/21; the largest residual is 0.03 over the deviation of its day.
    const returns = Float64Array.from({ length: 21 }, (_, day) =>
      day === 20 ? -0.03 : day % 2 === 0 ? 0.01 : -0.01,
    );
    const figures = accepted(filteredTail(question(returns)));
    const meanSquare = (20e-4 + 9e-4) / 21;
    const onLastDay = 1e-4 + (meanSquare - 1e-4) * 0.94 ** 20;
    const next = 0.94 * onLastDay + 0.06 * 9e-4;
    // k = ⌈21·0.95⌉ = 20: VaR is the second largest residual loss, 0.01 over the deviation of day 20 (the 19th update).
    const second = 0.01 / Math.sqrt(1e-4 + (meanSquare - 1e-4) * 0.94 ** 19);
    const largest = 0.03 / Math.sqrt(onLastDay);
    expect(relativeError(figures.var, Math.sqrt(next) * second)).toBeLessThan(1e-13);
    // n(1 − a) = 1.05 residuals: the largest and 0.05 of the second.
    expect(relativeError(figures.es ?? 0, (Math.sqrt(next) * (largest + 0.05 * second)) / 1.05)).toBeLessThan(
      1e-13,
    );
    expect(figures.parameters.kind).toBe('ewma');
    expect(relativeError(figures.parameters.nextDayDeviation, Math.sqrt(next))).toBeLessThan(1e-13);
    expect(figures.target).toBe('nextDay');
  });

  test('has no upper end where so many residuals cannot bound VaR, and no interval of ES below ten beyond', () => {
    const figures = accepted(filteredTail(question(indexReturns('DAX', '250'), '0.99')));
    expect(figures.varInterval?.upper).toBeNull();
    expect(figures.varInterval?.lower).toBeLessThan(figures.var);
    expect(figures.esInterval).toBeNull();
    expect(figures.notes.map(({ figure, code, needs }) => [figure, code, needs])).toEqual([
      ['varInterval', 'upperEndUnbounded', 368],
      ['esInterval', 'tooFewBeyond', 1000],
    ]);
  });

  test('a confidence that the resamples cannot reach leaves the figures and says why', () => {
    const figures = accepted(
      filteredTail({ ...question(indexReturns('DAX', '250')), confidence: level('0.9999') }),
    );
    expect(figures.varInterval).toBeNull();
    expect(figures.varIntervalMethod).toBeNull();
    expect(figures.notes.map(({ code }) => code)).toEqual(['levelBeyondResamples']);
  });
});

describe('filtered figures by GARCH', () => {
  const returns = simulateGarchReturns(800, clustered, 5, 41);
  const asked = { ...question(returns), replicates: 79 };
  const figures = accepted(filteredTail(asked));

  test('are the historical figures of the residuals on the next day’s deviation, less mu', () => {
    const process = processOf(accepted(fitGarch(returns)));
    const { residuals, nextVariance } = filterByGarch(returns, process);
    const plain = accepted(historicalTail(question(residuals)));
    const deviation = Math.sqrt(nextVariance);
    expect(relativeError(figures.var, deviation * plain.var - process.mu)).toBeLessThan(1e-12);
    expect(relativeError(figures.es ?? 0, deviation * (plain.es ?? 0) - process.mu)).toBeLessThan(1e-12);
  });

  test('carry the parameters of the fit and both intervals', () => {
    expect(figures.parameters).toMatchObject({ kind: 'garch' });
    expect(figures.varInterval?.lower).toBeLessThan(figures.var);
    expect(figures.varInterval?.upper).toBeGreaterThan(figures.var);
    expect(figures.esInterval?.lower).toBeLessThan(figures.es ?? 0);
    expect(figures.esInterval?.upper).toBeGreaterThan(figures.es ?? 0);
    expect(figures.varIntervalMethod).toBe('residualBootstrap');
  });

  test('the same question has the same answer, bit by bit', () => {
    expect(accepted(filteredTail(asked))).toEqual(figures);
  });

  test('from a fit nearby are nearly the same', () => {
    const near = accepted(fitGarch(returns.slice(0, -5)));
    const warm = accepted(filteredTail({ ...asked, replicates: 39 }, { near }));
    expect(relativeError(warm.var, figures.var)).toBeLessThan(1e-7);
  });

  test('by the exponentially weighted mean, when asked for, beside it', () => {
    const other = accepted(filteredTail(asked, { kind: 'ewma' }));
    expect(other.parameters.kind).toBe('ewma');
    expect(relativeError(other.var, figures.var)).toBeLessThan(0.5);
  });

  test('without clustering say so', () => {
    const plain = Array.from({ length: 8 }, (_, replicate) =>
      simulateGarchReturns(500, { mu: 0, omega: 1e-4, alpha: 0, beta: 0 }, 6, 300 + replicate),
    ).flatMap((sample) => {
      // Nineteen resamples cannot reach 95%, so none is made: the interval is not the matter here.
      const outcome = filteredTail({ ...question(sample), replicates: 19 });
      return outcome.ok && outcome.value.notes.some(({ code }) => code === 'noClustering')
        ? [outcome.value]
        : [];
    });
    expect(plain.length).toBeGreaterThan(1);
    for (const { parameters } of plain) expect(parameters).toMatchObject({ alpha: 0, beta: null });
  });
});

describe('the rebuilt path', () => {
  const returns = simulateGarchReturns(600, clustered, 5, 42);
  const source = accepted(filterSource(returns, 'garch'));

  test('of the residuals in their own order is the path', () => {
    const { process, residuals } = source.state;
    const order = Uint32Array.from(residuals, (_, day) => day);
    const rebuilt = rebuildReturns(returns, process, residuals, order);
    // 600 steps of a recursion that forgets: errors do not pile up.
    rebuilt.forEach((value, day) => {
      expect(Math.abs(value - (returns[day] as number))).toBeLessThan(1e-14);
    });
  });

  test('gives refits that scatter around the fit', () => {
    const betas: number[] = [];
    const resampled = visitResampledStates(source, streams, 60, (state) => betas.push(state.process.beta));
    expect(resampled.complete).toBe(true);
    const middle = betas.sort((first, second) => first - second)[30] as number;
    expect(Math.abs(middle - source.state.process.beta)).toBeLessThan(0.1);
    expect(new Set(betas).size).toBe(60);
  });

  test('leaves the past as it was: the next variance is that of the true returns under the refitted parameters', () => {
    visitResampledStates(source, streams, 5, ({ process, nextVariance }) => {
      expect(nextVariance).toBe(filterByGarch(returns, process).nextVariance);
    });
    const ewma = accepted(filterSource(returns, 'ewma'));
    visitResampledStates(ewma, streams, 5, ({ residuals, nextVariance }) => {
      expect(nextVariance).toBe(ewma.state.nextVariance);
      expect(residuals).not.toEqual(ewma.state.residuals);
    });
  });

  test('resamples that fail are replaced, and too many failures leave none', () => {
    const failing = (share: number) => {
      let tries = 0;
      return {
        ...source,
        resample: () => {
          tries += 1;
          return tries % share === 0 ? null : source.state;
        },
      };
    };
    const seen = { some: 0 };
    const few = visitResampledStates(failing(4), streams, 30, () => {
      seen.some += 1;
    });
    expect([few.complete, few.leftOut, seen.some]).toEqual([true, 9, 30]);
    expect(visitResampledStates(failing(1), streams, 30, () => undefined)).toEqual({
      complete: false,
      leftOut: 60,
    });
  });
});

describe('the chance of a loss tomorrow', () => {
  const returns = simulateGarchReturns(1000, clustered, 5, 43);
  const chanceOf = (threshold: number) =>
    accepted(filteredBeyond({ returns, threshold, confidence: level95, streams }));

  test('of the size of VaR is the tail probability', () => {
    const { var: valueAtRisk } = accepted(filteredTail({ ...question(returns), replicates: 39 }));
    // VaR is the 950th of 1,000 ascending losses, so 51 are at least as large.
    expect(chanceOf(valueAtRisk - 1e-12).probability).toBe(0.051);
  });

  test('that no residual reaches is 0, with the upper end of the exact binomial interval', () => {
    const chance = chanceOf(1);
    expect(chance.probability).toBe(0);
    expect(chance.interval?.lower).toBe(0);
    // 1 − 0.025^(1/1000), the Clopper-Pearson end for no hit (by hand).
    expect(relativeError(chance.interval?.upper ?? 0, 1 - 0.025 ** (1 / 1000))).toBeLessThan(1e-9);
    expect(chance.meanReturnSessions).toBeNull();
    expect(chance.target).toBe('nextDay');
  });

  test('has a lower end at or below the exact one and an upper end at or above it', () => {
    const chance = chanceOf(0.01);
    expect(chance.interval?.lower).toBeLessThan(chance.probability);
    expect(chance.interval?.upper).toBeGreaterThan(chance.probability);
  });
});

describe('filtered figures are refused', () => {
  test('with too few returns for the level, naming how many it needs', () => {
    const outcome = filteredTail(question(indexReturns('DAX', '60'), '0.99'));
    expect(outcome.ok ? null : [outcome.problem.code, outcome.problem.needs]).toEqual(['notEnoughTail', 100]);
  });

  test('for a price that stands still', () => {
    expect(refusalCode(filteredTail(question(new Float64Array(300))))).toBe('priceDoesNotMove');
    expect(
      refusalCode(
        filteredBeyond({ returns: new Float64Array(300), threshold: 0.01, confidence: level95, streams }),
      ),
    ).toBe('priceDoesNotMove');
  });

  test('where the GARCH fit is', () => {
    const growing = simulateGarchReturns(600, { mu: 0, omega: 1e-4, alpha: 0, beta: 0 }, 8, 7).map(
      (value, day) => value * Math.exp(day / 100),
    );
    expect(refusalCode(filteredTail(question(growing)))).toBe('varianceNotStationary');
  });
});
