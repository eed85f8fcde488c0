import { describe, expect, test } from 'vitest';
import type { PriceFlag, PriceSeries } from '../../../src/terms/prices.ts';
import { answerTo, drawn, seriesFrom } from '../madeAnswers.ts';

const warningsOf = (text: string, series: PriceSeries) => answerTo(text, series).warnings;

const codesOf = (text: string, series: PriceSeries): readonly string[] =>
  warningsOf(text, series).map(({ code }) => code);

const calm = drawn(240, 0.01, Number.POSITIVE_INFINITY);

describe('a tail answer warns', () => {
  test('of nothing where 240 days follow the bell curve', () => {
    expect(codesOf('tail KELP 240d at 95%', seriesFrom(calm))).toEqual([]);
  });

  test('that volatility clusters where the last weeks are four times as wild, and where they are calm after a storm', () => {
    const wild = drawn(30, 0.04, Number.POSITIVE_INFINITY, 1);
    const stormy = warningsOf('tail KELP 240d at 95%', seriesFrom([...calm.slice(30), ...wild]));
    expect(stormy.find(({ code }) => code === 'volatilityClusters')?.text).toContain('stormier');
    const after = warningsOf('tail KELP 240d at 95%', seriesFrom([...wild, ...wild, ...calm.slice(60)]));
    expect(after.find(({ code }) => code === 'volatilityClusters')?.text).toContain('calmer');
  });

  test('that one day carries the result, with the figure without it', () => {
    const crash = calm.map((value, day) => (day === 100 ? -0.25 : value));
    const found = warningsOf('tail KELP 240d at 95%', seriesFrom(crash)).find(
      ({ code }) => code === 'outlierCarries',
    );
    // The ES of the bell curve at 95% is 2.06 deviations, here 1%, and 239 days tell it to a tenth or so.
    expect(found?.text).toMatch(
      /\(−25\.0%\), carries the result: without it the historical ES is (1\.9|2\.[012])\d%/,
    );
    const largest = calm.map((value, day) => (day === 100 ? -0.04 : value));
    expect(codesOf('tail KELP 240d at 95%', seriesFrom(largest))).not.toContain('outlierCarries');
  });

  test('that no variance may exist where degrees of freedom of 2 are not ruled out', () => {
    expect(codesOf('tail KELP 120d at 95%', seriesFrom(drawn(120, 0.005, 1.6)))).toContain(
      'varianceMayNotBeFinite',
    );
    expect(codesOf('tail KELP 240d at 95%', seriesFrom(calm))).not.toContain('varianceMayNotBeFinite');
  });

  test('that the interval is wider than the figure itself', () => {
    expect(codesOf('tail KELP 25d at 99.5% by student', seriesFrom(drawn(25, 0.01, 2.5, 3)))).toContain(
      'widerThanFigure',
    );
  });
});

describe('what the feed found in the prices', () => {
  const flagOf = (place: number): PriceFlag => ({
    code: 'splitLike',
    text: 'KELP went from 100 to 50, which looks like a 2:1 split',
    day: seriesFrom(calm).days[place] ?? null,
  });
  const warned = (place: number) => codesOf('tail KELP 100d at 95%', seriesFrom(calm, [flagOf(place)]));

  // 241 closes; the last hundred returns begin at the close in place 140.
  test.each([141, 200, 240])('warns where its day lies in the window: place %i', (place) => {
    expect(warned(place)).toContain('splitLike');
  });

  test.each([1, 139, 140])('is left out where it moved no return of the window: place %i', (place) => {
    expect(warned(place)).not.toContain('splitLike');
  });

  test('always warns where it has no day', () => {
    const flags = [{ code: 'mixed', text: 'of no day', day: null }];
    expect(codesOf('interval KELP 60d', seriesFrom(calm, flags))).toContain('mixed');
  });
});
