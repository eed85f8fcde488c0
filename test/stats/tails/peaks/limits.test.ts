import { describe, expect, test } from 'vitest';
import { nextStudentT } from '../../../../src/stats/random/studentDraw.ts';
import { lowerEndByRank } from '../../../../src/stats/tails/peaks/internal/lowerByRank.ts';
import { findPeaks, refuseLevelBelow } from '../../../../src/stats/tails/peaks/internal/peaks.ts';
import { peaksBeyond } from '../../../../src/stats/tails/peaks/peaksBeyond.ts';
import { fitGpd } from '../../../../src/stats/tails/peaks/peaksFit.ts';
import { peaksTail } from '../../../../src/stats/tails/peaks/peaksTail.ts';
import { accepted } from '../../../laws/outcomes.ts';
import { level, level95 } from '../../levels.ts';
import { testStreams } from '../../testStreams.ts';

const streams = testStreams(21);
const heavy = (count: number, nu: number, stream: number): Float64Array => {
  const random = streams.stream(stream);
  return Float64Array.from({ length: count }, () => 0.01 * nextStudentT(random, nu));
};
const tailOf = (returns: Float64Array, tailLevel = '0.99', confidence = level95) =>
  peaksTail({ returns, tailLevel: level(tailLevel), confidence, streams });
const messageOf = (outcome: ReturnType<typeof peaksTail> | ReturnType<typeof fitGpd>) =>
  outcome.ok ? 'not refused' : outcome.problem.message;
const note = (figure: string, code: string, text: string) => ({ figure, code, text, needs: null });

/** Excesses at the middles of 60 equal shares of the distribution 1 − (1 + xi·y)^(−1/xi). */
const paretoExcesses = (shape: number): Float64Array =>
  Float64Array.from({ length: 60 }, (_, index) => (((59.5 - index) / 60) ** -shape - 1) / shape);
/** 600 returns whose 60 largest losses lie those excesses beyond a loss of 1%. */
const withTail = (shape: number): Float64Array =>
  Float64Array.from([
    ...paretoExcesses(shape).map((excess) => -0.01 * (1 + excess)),
    ...Array.from({ length: 540 }, (_, index) => 0.01 - (0.02 * index) / 539),
  ]);

describe('figures of the largest losses', () => {
  test('say their model, their day and their methods, and nothing more where all is found', () => {
    expect(accepted(tailOf(heavy(2000, 4, 30)))).toMatchObject({
      model: 'peaks',
      target: 'unconditional',
      varIntervalMethod: 'profileLikelihood',
      varAttainedLevel: null,
      esIntervalMethod: 'profileLikelihood',
      parameters: { exceedances: 200 },
      notes: [],
    });
  });

  test('say that ES has no upper end', () => {
    const figures = accepted(tailOf(heavy(250, 1.5, 1)));
    expect(figures.esIntervalMethod).toBe('profileLikelihood');
    expect(figures.notes).toEqual([
      note(
        'esInterval',
        'upperEndUnbounded',
        'The interval of xi reaches 1, where ES does not exist: nothing bounds ES from above. Ask for a longer window.',
      ),
    ]);
  });

  test('say that ES does not exist', () => {
    const figures = accepted(tailOf(heavy(2000, 0.9, 2)));
    expect([figures.es, figures.esInterval, figures.esIntervalMethod]).toEqual([null, null, null]);
    expect(figures.notes).toEqual([
      note(
        'es',
        'meanNotFinite',
        'xi is at or above 1: the fitted tail is so heavy that the mean loss beyond VaR does not exist. Read VaR alone.',
      ),
    ]);
  });

  test('say which side of xi is open at an extreme confidence', () => {
    const short = accepted(tailOf(withTail(-0.3), '0.99', level('0.9999999999')));
    expect(short.parameters.shape).toBeLessThan(0);
    expect(short.parameters.shapeInterval.lower).toBeNull();
    expect(short.notes).toContainEqual(
      note('parameters', 'lowerEndUnbounded', 'No xi above −0.95 is unlikely enough to bound xi from below.'),
    );
    const long = accepted(tailOf(heavy(250, 1.2, 31), '0.99', level('0.9999999999')));
    expect(long.parameters.shapeInterval.upper).toBeNull();
    expect(long.notes).toContainEqual(
      note('parameters', 'upperEndUnbounded', 'No xi below 5 is unlikely enough to bound xi from above.'),
    );
  });
});

describe('ranks below the threshold, by hand', () => {
  test('go down to the smallest loss when nothing is unlikely enough, and no further', () => {
    expect(lowerEndByRank(Float64Array.of(1, 2, 3, 4), 1, 0.3, 100)).toBe(1);
  });

  test('take a loss whose ratio is exactly at the reach', () => {
    // One of two larger at a chance of a half is what is expected: no likelihood is lost, and 0 ≤ 0².
    expect(lowerEndByRank(Float64Array.of(1, 2), 0, 0.5, 0)).toBe(1);
  });
});

describe('the chance of a loss', () => {
  const returns = heavy(500, 4, 32);
  const { threshold } = accepted(tailOf(returns)).parameters;
  const chanceOf = (loss: number) =>
    accepted(peaksBeyond({ returns, threshold: loss, confidence: level95, streams }));

  test('at the threshold is the share of days, above it that of the fitted tail', () => {
    expect(chanceOf(threshold)).toMatchObject({
      model: 'peaks',
      // 50 losses lie beyond the threshold and one on it.
      probability: 51 / 500,
      intervalMethod: 'clopperPearson',
    });
    expect(chanceOf(threshold + 1e-4)).toMatchObject({
      model: 'peaks',
      intervalMethod: 'profileLikelihood',
      notes: [],
    });
  });

  test('is refused where the fit is', () => {
    const outcome = peaksBeyond({
      returns: Float64Array.from({ length: 300 }, (_, day) => 0.01 * Math.cos(day)),
      threshold: 0.0001,
      confidence: level95,
      streams,
    });
    expect(outcome.ok ? null : outcome.problem.code).toBe('shapeOutside');
  });
});

describe('refusals in full', () => {
  test('name the end to which xi ran', () => {
    const uniform = Float64Array.from({ length: 60 }, (_, index) => index + 1);
    expect(messageOf(fitGpd(uniform))).toBe(
      'The tail shape xi runs down to -0.5, the end of the range in which its estimator works. Ask for a longer window or for the historical model.',
    );
    expect(messageOf(fitGpd(paretoExcesses(2.5)))).toBe(
      'The tail shape xi runs up to 1.5, the end of the range in which its estimator works. Ask for a longer window or for the historical model.',
    );
  });

  test('name the losses beyond a threshold that occurs more than once', () => {
    // 25 of 250 lie beyond the 225th loss; with the 25th largest equal to it, 24 do.
    const losses = Float64Array.from({ length: 250 }, (_, index) => (index + 1) / 1000);
    losses[225] = losses[224] as number;
    const outcome = findPeaks(losses.map((loss) => -loss));
    expect(outcome).toMatchObject({ ok: false, problem: { code: 'notEnoughTail' } });
    expect(outcome.ok ? '' : outcome.problem.message).toBe(
      'A tail fitted to the largest losses needs 25 losses larger than its threshold, and 24 are larger than 0.225, which occurs more than once. Ask for a longer window or for the historical model.',
    );
  });

  test('name the level of the threshold', () => {
    const peaks = accepted(findPeaks(heavy(255, 4, 33)));
    // ⌊255/10⌋ = 25 of 255: 90.2%.
    const refusal = refuseLevelBelow(peaks, level('0.9'));
    expect(refusal?.problem.code).toBe('levelOutside');
    expect(refusal?.problem.message).toBe(
      'A tail fitted to the largest losses speaks of levels above 90.2%, where its threshold lies, and 90% was asked. Ask for a higher level or for the historical model.',
    );
    // 255·9.9% = 25.2 is as many as lie beyond it, 255·9.8% = 24.99 is not.
    expect(refuseLevelBelow(peaks, level('0.901'))).not.toBeNull();
    expect(refuseLevelBelow(peaks, level('0.902'))).toBeNull();
  });
});
