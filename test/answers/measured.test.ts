import { describe, expect, test } from 'vitest';
import { worseProcess } from '../../src/answers/measured.ts';
import { answerTo, drawn, seriesFrom } from './madeAnswers.ts';

/** Each return keeps half of the one before, or, where it clusters, each week is calm or wild. */
const following = (stream: number): readonly number[] => {
  const returns: number[] = [];
  for (const shock of drawn(250, 0.01, Number.POSITIVE_INFINITY, stream))
    returns.push(shock + 0.5 * (returns.at(-1) ?? 0));
  return returns;
};
const clustered = (stream: number): readonly number[] =>
  drawn(250, 0.01, Number.POSITIVE_INFINITY, stream).map((value, day) =>
    Math.floor(day / 25) % 2 === 0 ? value : 4 * value,
  );
const plain = (stream: number): readonly number[] => drawn(250, 0.01, Number.POSITIVE_INFINITY, stream);

const missesOf = (...asked: Parameters<typeof answerTo>): readonly string[] =>
  answerTo(...asked)
    .warnings.filter(({ code }) => code === 'coverageMisses')
    .map(({ text }) => text);

describe('an interval that missed its level in simulations says so', () => {
  test('the difference of two tickers whose returns follow each other', () => {
    const [text] = missesOf(
      'compare KELP TARN 250d',
      seriesFrom(following(1)),
      seriesFrom(following(2), [], 'TARN'),
    );
    expect(text).toMatch(
      /250 at a time, this interval of the difference at 95% held the truth 8\d% of the time/,
    );
  });

  test('the ratio of deviations where volatility clusters in either', () => {
    const [text] = missesOf(
      'compare KELP TARN 250d',
      seriesFrom(plain(1)),
      seriesFrom(clustered(2), [], 'TARN'),
    );
    expect(text).toMatch(/this interval of the ratio of standard deviations at 95% held the truth 5\d%/);
  });

  test('none where nothing misses', () => {
    expect(missesOf('claim KELP 5bp 250d', seriesFrom(plain(3)))).toEqual([]);
    expect(missesOf('interval ratio KELP 250d', seriesFrom(plain(3)))).toEqual([]);
  });

  test('the chance of a loss where volatility clusters, and each model’s share beside its figures', () => {
    const answer = answerTo('tail KELP beyond 4% 250d', seriesFrom(clustered(5)));
    expect(answer.warnings.map(({ code }) => code)).toContain('coverageMisses');
    if (answer.kind !== 'tail beyond') throw new Error(answer.kind);
    for (const model of answer.figures.models)
      if (model.ok) expect(model.measuredCoverage).toBeGreaterThan(0.1);
  });
});

test('of two processes the one is quoted under which intervals hold less often', () => {
  expect(worseProcess('normal', 'garchT')).toBe('garchT');
  expect(worseProcess('garchT', 'autoregressive')).toBe('garchT');
  expect(worseProcess('studentT4', 'normal')).toBe('studentT4');
  expect(worseProcess('normal', 'normal')).toBe('normal');
});
