import { describe, expect, test } from 'vitest';
import { startFiltered } from '../../../../src/stats/backtests/rolling/filtered.ts';
import { startHistorical } from '../../../../src/stats/backtests/rolling/historical.ts';
import { startNormal } from '../../../../src/stats/backtests/rolling/normal.ts';
import { startPeaks } from '../../../../src/stats/backtests/rolling/peaks.ts';
import type {
  DayForecast,
  RollingSpan,
  StartForecaster,
} from '../../../../src/stats/backtests/rolling/rollingForecaster.ts';
import { startStudent } from '../../../../src/stats/backtests/rolling/student.ts';
import { lossesAscending, meanBeyond } from '../../../../src/stats/losses/losses.ts';
import { quantileMultiplier, shortfallMultiplier } from '../../../../src/stats/losses/studentMultiplier.ts';
import { fitStudent } from '../../../../src/stats/tails/studentFit.ts';
import { filterByEwma } from '../../../../src/stats/volatility/ewma.ts';
import { fitGarch, processOf } from '../../../../src/stats/volatility/garch.ts';
import { filterByGarch } from '../../../../src/stats/volatility/garchPath.ts';
import { ceilingOfCount, expectedBeyond, tailFraction } from '../../../../src/terms/level.ts';
import { accepted, refusalCode, refusalMessage } from '../../../laws/outcomes.ts';
import { relativeError } from '../../../laws/relativeError.ts';
import { indexReturns } from '../../indexWindows.ts';
import { level } from '../../levels.ts';
import { testStreams } from '../../testStreams.ts';

const dax = indexReturns('DAX', 'all');
const tailLevel = level('0.975');

const spanOf = (more: Partial<RollingSpan> = {}): RollingSpan => ({
  returns: dax,
  firstDay: 700,
  dayCount: 60,
  estimationReturns: 250,
  tailLevel,
  ...more,
});

const walkThrough = (start: StartForecaster, span: RollingSpan) => {
  const forecaster = accepted(start(span));
  const forecasts = Array.from({ length: span.dayCount }, (_, place) => {
    const into: DayForecast = { valueAtRisk: Number.NaN, expectedShortfall: Number.NaN };
    const problem = forecaster.forecast(span.firstDay + place, into);
    return { ...into, refused: problem?.code ?? null };
  });
  return { forecaster, forecasts };
};

const empirical = (values: Float64Array) => {
  const losses = lossesAscending(values);
  const rank = ceilingOfCount(values.length, tailLevel);
  return {
    var: losses[rank - 1] ?? 0,
    es: meanBeyond(losses, rank, expectedBeyond(values.length, tailLevel)),
  };
};

const windowBefore = ({ returns, firstDay, estimationReturns }: RollingSpan, place: number) =>
  returns.slice(firstDay + place - estimationReturns, firstDay + place);

const starters = {
  historical: startHistorical,
  normal: startNormal,
  student: startStudent,
  filtered: startFiltered,
  peaks: startPeaks,
};

describe('each day’s figure is that of the window before it', () => {
  test('historical: the sorted window after 60 moves is a fresh sort, bit for bit', () => {
    const span = spanOf();
    walkThrough(startHistorical, span).forecasts.forEach(({ valueAtRisk, expectedShortfall }, place) => {
      const { var: expected, es } = empirical(windowBefore(span, place));
      expect([valueAtRisk, expectedShortfall]).toEqual([expected, es]);
    });
  });

  test('filtered by EWMA, bit for bit', () => {
    const span = spanOf();
    walkThrough(startFiltered, span).forecasts.forEach(({ valueAtRisk, expectedShortfall }, place) => {
      const { residuals, nextVariance } = filterByEwma(windowBefore(span, place));
      const { var: quantile, es } = empirical(residuals);
      const deviation = Math.sqrt(nextVariance);
      expect([valueAtRisk, expectedShortfall]).toEqual([deviation * quantile, deviation * es]);
    });
  });

  test('student: yesterday’s fit leads to the same maximum as a search from nothing', () => {
    const span = spanOf();
    const tail = tailFraction(tailLevel);
    walkThrough(startStudent, span).forecasts.forEach(({ valueAtRisk, expectedShortfall }, place) => {
      const { location, scale, nu } = accepted(fitStudent(windowBefore(span, place)));
      // Both climbs stop at |gradient|·se ≤ 1e-8, so parameters agree to about 1e-8 of their errors.
      expect(relativeError(valueAtRisk, scale * quantileMultiplier(tail, nu) - location)).toBeLessThan(1e-7);
      expect(
        relativeError(expectedShortfall ?? 0, scale * shortfallMultiplier(tail, nu) - location),
      ).toBeLessThan(1e-7);
    });
  });

  test('filtered by GARCH: parameters of the last refit, variance of yesterday', () => {
    const span = spanOf({ firstDay: 1300, dayCount: 45, estimationReturns: 500 });
    const { forecasts } = walkThrough(startFiltered, span);
    for (const [fittedOn, places] of [
      [0, [0, 7, 19]],
      [20, [20, 39]],
      [40, [40, 44]],
    ] as const) {
      const process = processOf(accepted(fitGarch(windowBefore(span, fittedOn))));
      for (const place of places) {
        const { mu, residuals, nextVariance } = filterByGarch(windowBefore(span, place), process);
        const figure = Math.sqrt(nextVariance) * empirical(residuals).var - mu;
        expect(forecasts[place]?.valueAtRisk).toBe(figure);
      }
    }
  });
});

describe.each(Object.entries(starters))('%s', (_, start) => {
  const span = spanOf({ firstDay: 1300, dayCount: 30, estimationReturns: 500 });

  test('no forecast knows its own day or a later one', () => {
    const before = walkThrough(start, span).forecasts;
    for (const day of [1300, 1312, 1329]) {
      const changed = dax.slice();
      changed.fill(-0.5, day);
      const after = walkThrough(start, { ...span, returns: changed }).forecasts;
      expect(after.slice(0, day - 1299)).toEqual(before.slice(0, day - 1299));
      if (day < 1329) expect(after[day - 1299]).not.toEqual(before[day - 1299]);
    }
  });

  test('a day’s figures do not depend on where the walk began', () => {
    // Twenty days earlier keeps the schedule of the GARCH refits. Climbs to a Student fit stop within 1e-8 errors of it.
    const late = walkThrough(start, span).forecasts;
    const early = walkThrough(start, { ...span, firstDay: 1280, dayCount: 50 }).forecasts.slice(20);
    late.forEach(({ valueAtRisk }, place) => {
      expect(relativeError(early[place]?.valueAtRisk ?? 0, valueAtRisk)).toBeLessThan(1e-6);
    });
  });

  test('draws lie beyond VaR and average ES', () => {
    const { forecaster, forecasts } = walkThrough(start, span);
    const { valueAtRisk, expectedShortfall } = forecasts[3] ?? forecasts[0] ?? { valueAtRisk: Number.NaN };
    const random = testStreams(7).stream(3);
    const draws = Float64Array.from({ length: 40_000 }, () => forecaster.drawBeyond(1303, random));
    const mean = draws.reduce((sum, value) => sum + value, 0) / draws.length;
    const variance = draws.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (draws.length - 1);
    // Four standard errors of the mean; a draw may equal VaR up to rounding.
    expect(Math.abs(mean - (expectedShortfall ?? 0))).toBeLessThan(4 * Math.sqrt(variance / draws.length));
    expect(draws.every((loss) => loss >= valueAtRisk * (1 - 1e-12))).toBe(true);
  });

  test('a price that stands still has no figure', () => {
    const still = dax.slice();
    still.fill(0, 1300 - 500, 1310);
    const { forecasts } = walkThrough(start, { ...span, returns: still });
    expect(forecasts[0]?.refused).toBe('priceDoesNotMove');
    expect(forecasts[10]?.refused).toBe('priceDoesNotMove');
  });
});

test.each(['historical', 'normal', 'student', 'filtered', 'peaks'] as const)(
  'the forecaster of %s says so',
  (model) => {
    expect(accepted(starters[model](spanOf())).model).toBe(model);
  },
);

test.each([
  ['normal', 19, 'A normal tail figure needs at least 20 returns'],
  ['student', 19, 'A Student fit needs at least 20 returns'],
  ['peaks', 249, 'A tail fitted to the largest losses needs at least 250 returns'],
] as const)('the refusal of %s names the figure', (model, estimationReturns, words) => {
  expect(refusalMessage(starters[model](spanOf({ estimationReturns })))).toContain(words);
});

describe('windows too short for the model', () => {
  test.each([
    ['historical', 39, 'notEnoughTail'],
    ['normal', 19, 'tooFewReturns'],
    ['student', 19, 'tooFewReturns'],
    ['filtered', 39, 'notEnoughTail'],
    ['peaks', 249, 'tooFewReturns'],
  ] as const)('%s with %i returns: %s', (model, estimationReturns, code) => {
    expect(refusalCode(starters[model](spanOf({ estimationReturns })))).toBe(code);
    expect(refusalCode(starters[model](spanOf({ estimationReturns: estimationReturns + 1 })))).toBe(
      'not refused',
    );
  });
});
