import { describe, expect, test } from 'vitest';
import { filteredBeyond } from '../../../../src/stats/tails/filtered/filteredBeyond.ts';
import { filteredTail } from '../../../../src/stats/tails/filtered/filteredTail.ts';
import { filterNotes } from '../../../../src/stats/tails/filtered/internal/filterDescription.ts';
import { filterSource } from '../../../../src/stats/tails/filtered/internal/filterSource.ts';
import {
  leftOutNotes,
  visitResampledStates,
} from '../../../../src/stats/tails/filtered/internal/resampledStates.ts';
import { countAtLeast } from '../../../../src/stats/tails/filtered/internal/stateFigures.ts';
import { historicalBeyond } from '../../../../src/stats/tails/historicalBeyond.ts';
import { fitGarch, type GarchFit } from '../../../../src/stats/volatility/garch.ts';
import { accepted, refusalCode } from '../../../laws/outcomes.ts';
import { indexReturns } from '../../indexWindows.ts';
import { level, level95 } from '../../levels.ts';
import { testStreams } from '../../testStreams.ts';
import { simulateGarchReturns } from '../../volatility/simulateReturns.ts';

const streams = testStreams(32);
const dax60 = indexReturns('DAX', '60');
const clustered = simulateGarchReturns(600, { mu: 0.0005, omega: 2e-6, alpha: 0.08, beta: 0.9 }, 5, 44);

describe('the count behind a chance, by hand', () => {
  const process = { mu: 1, omega: 1, alpha: 0, beta: 0 };

  test('takes residuals whose loss on the next day, less mu, is at least the threshold', () => {
    // Deviation 2: the residuals −1, −2, −3, 3 lose 2 − 1, 4 − 1, 6 − 1 and −6 − 1.
    const state = { process, mu: 1, residuals: Float64Array.of(-1, -2, -3, 3), nextVariance: 4 };
    expect([1, 3, 3.01, 5, 5.01, -7].map((threshold) => countAtLeast(state, threshold))).toEqual([
      3, 2, 1, 1, 0, 4,
    ]);
  });
});

describe('a filtered chance', () => {
  const asked = { returns: dax60, threshold: 0.02, confidence: level95, streams };

  test('says its model, its day and its method, and needs no fit below 500 returns', () => {
    expect(accepted(filteredBeyond(asked))).toMatchObject({
      model: 'filtered',
      target: 'nextDay',
      intervalMethod: 'residualBootstrap',
      notes: [],
    });
    expect(refusalCode(filteredBeyond(asked, { kind: 'garch' }))).toBe('tooFewReturns');
  });

  test('is refused for one return, naming two', () => {
    expect(filteredBeyond({ ...asked, returns: Float64Array.of(0.01) })).toEqual({
      ok: false,
      problem: expect.objectContaining({
        code: 'tooFewReturns',
        needs: 2,
        message:
          'A filtered chance needs at least 2 returns, and there is 1. Ask for a window of 2 days or more.',
      }),
    });
    expect(refusalCode(filteredBeyond({ ...asked, returns: Float64Array.of(0.01, -0.02) }))).toBe(
      'not refused',
    );
  });

  test('has no interval at a confidence that 999 resamples cannot reach', () => {
    // (999 + 1)·0.05% is half a resample; at 99.8% it is one.
    const chance = accepted(filteredBeyond({ ...asked, confidence: level('0.999') }));
    expect([chance.interval, chance.intervalMethod]).toEqual([null, null]);
    expect(chance.notes).toEqual([
      {
        figure: 'interval',
        code: 'levelBeyondResamples',
        text: 'A bootstrap of 999 resamples cannot reach 99.9%: fewer than one of them would lie beyond an end. Ask for a lower level.',
        needs: null,
      },
    ]);
    expect(accepted(filteredBeyond({ ...asked, confidence: level('0.998') })).interval).not.toBeNull();
  });

  test('has the wider of the resampled and the exact end on each side', () => {
    const threshold = 0.012;
    const source = accepted(filterSource(clustered, 'garch'));
    const shares: number[] = [];
    visitResampledStates(source, streams, 199, ({ mu, residuals, nextVariance }) => {
      // The same inequality solved for the loss; no residual lies within rounding of it.
      shares.push(residuals.filter((z) => -z * Math.sqrt(nextVariance) - mu >= threshold).length / 600);
    });
    shares.sort((first, second) => first - second);
    const { mu, residuals, nextVariance } = source.state;
    const exact = accepted(
      historicalBeyond({
        returns: residuals,
        threshold: (threshold + mu) / Math.sqrt(nextVariance),
        confidence: level95,
        streams,
      }),
    );
    // (199 + 1)·2.5% = 5: the 5th share from below and from above.
    const [lower = Number.NaN, upper = Number.NaN] = [shares[4], shares[194]];
    const chance = accepted(filteredBeyond({ returns: clustered, threshold, confidence: level95, streams }));
    expect(chance.probability).toBe(exact.probability);
    expect(chance.interval).toEqual({
      lower: Math.min(lower, exact.interval?.lower ?? Number.NaN),
      upper: Math.max(upper, exact.interval?.upper ?? Number.NaN),
    });
    // The parameters are unsure enough for the resamples to decide both ends here.
    expect([chance.interval?.lower, chance.interval?.upper]).toEqual([lower, upper]);
  });
});

describe('what is said of a fit', () => {
  const source = accepted(filterSource(dax60, 'ewma'));
  const fit: GarchFit = {
    innovations: 'student',
    mu: 0,
    omega: 1e-6,
    alpha: 0.1,
    beta: 0.8,
    nu: 5,
    clustering: true,
    normalLimit: false,
    logLikelihood: 0,
    standardErrors: { mu: 1, omega: 1, alpha: 1, beta: 1, inverseNu: 1 },
  };
  const said = (part: Partial<GarchFit>) => filterNotes({ ...source, fit: { ...fit, ...part } });
  const note = (code: string, text: string) => ({ figure: 'parameters', code, text, needs: null });

  test('nothing, where it is ordinary or was not made', () => {
    expect([said({}), filterNotes(source)]).toEqual([[], []]);
  });

  test('each limit by its own sentence', () => {
    expect(said({ clustering: false, alpha: 0, beta: null })).toEqual([
      note(
        'noClustering',
        'No volatility clustering was found: alpha is 0, and every day has the same variance.',
      ),
    ]);
    expect(said({ beta: 0 })).toEqual([
      note(
        'parameterOnBound',
        'beta ended on 0 and was held there: volatility remembers the last day alone.',
      ),
    ]);
    expect(said({ nu: Number.POSITIVE_INFINITY, normalLimit: true })).toEqual([
      note(
        'normalLimit',
        'The residuals are no fatter than the bell curve: nu is infinite, the normal limit.',
      ),
    ]);
  });

  test('resamples that were left out, replaced or not', () => {
    expect(leftOutNotes('interval', { complete: true, leftOut: 0 }, 30)).toEqual([]);
    expect(leftOutNotes('interval', { complete: true, leftOut: 9 }, 30)).toEqual([
      {
        figure: 'interval',
        code: 'resamplesLeftOut',
        text: '9 of 39 resamples could not be refitted and were replaced by further ones.',
        needs: null,
      },
    ]);
    expect(leftOutNotes('varInterval', { complete: false, leftOut: 55 }, 30)).toEqual([
      {
        figure: 'varInterval',
        code: 'resamplesLeftOut',
        text: '55 of 60 resamples could not be refitted, too many for an interval. Ask for a longer window.',
        needs: null,
      },
    ]);
  });

  test('a fit nearby is where the search starts', () => {
    const near = accepted(fitGarch(clustered.slice(0, -5)));
    const warm = accepted(fitGarch(clustered, { near }));
    expect(accepted(filterSource(clustered, 'garch', near)).fit).toEqual(warm);
    expect(accepted(filterSource(clustered, 'garch')).fit).not.toEqual(warm);
  });
});

describe('filtered figures say what is missing', () => {
  const question = (returns: Float64Array, tailLevel: string, confidence = level95) => ({
    returns,
    tailLevel: level(tailLevel),
    confidence,
    streams,
  });

  test('in figures of the count and the level', () => {
    const { notes } = accepted(filteredTail(question(indexReturns('DAX', '250'), '0.99')));
    // 0.99^367 is above 2.5% and 0.99^368 below (by hand); 250·1% = 2.5 and 1,000·1% = 10.
    expect(notes.map(({ text }) => text)).toEqual([
      '250 residuals cannot bound a 99% figure from above; 368 would.',
      '250 residuals leave 2.5 beyond 99% on average, too few for an interval of the mean beyond it; 1000 returns would be enough.',
    ]);
  });

  test('ten expected beyond the level are enough for an interval of ES, and one less is not', () => {
    const returns = indexReturns('DAX', '250');
    // 200·5% = 10 and 199·5% = 9.95.
    const enough = accepted(filteredTail(question(returns.slice(0, 200), '0.95')));
    expect(enough.esInterval).not.toBeNull();
    expect(enough.esIntervalMethod).toBe('residualBootstrap');
    const few = accepted(filteredTail(question(returns.slice(0, 199), '0.95')));
    expect([few.esInterval, few.esIntervalMethod]).toEqual([null, null]);
    expect(few.notes).toMatchObject([{ figure: 'esInterval', code: 'tooFewBeyond', needs: 200 }]);
  });

  test('an unreachable confidence is said of VaR, and a refusal names the figure', () => {
    const { notes } = accepted(filteredTail(question(dax60, '0.95', level('0.999'))));
    expect(notes.map(({ figure, code }) => [figure, code])).toEqual([
      ['varInterval', 'levelBeyondResamples'],
    ]);
    const refused = filteredTail(question(dax60, '0.99'));
    expect(refused.ok ? '' : refused.problem.message).toMatch(/^A filtered tail figure/);
  });
});
