import { describe, expect, test } from 'vitest';
import { digestBody } from '../../../src/digests/body.ts';
import { type Making, makeDigest, varsOf } from '../../../src/digests/post/makeDigest.ts';
import { nonGreenChance } from '../../../src/stats/backtests/nonGreenChance.ts';
import type { PriceSeries } from '../../../src/terms/prices.ts';
import type { DigestFigures, DigestPost } from '../../../src/terms/scheduledPosts.ts';
import type { Subscription } from '../../../src/terms/subscriptions.ts';
import { seriesOf } from '../../answers/madeSeries.ts';
import { newDigest } from '../../records/madeSubscriptions.ts';
import { at, day, everyWeekday } from '../days.ts';
import { pricesOf } from '../stage.ts';

/** Closes from daily returns in percent. */
const closesOf = (returns: readonly number[]): readonly number[] => {
  const closes = [100];
  for (const each of returns) closes.push((closes.at(-1) ?? 0) * (1 + each / 100));
  return closes;
};

/** Half a percent up and down in turn, of slightly different sizes so that no two losses are equal. */
const calm = (count: number): readonly number[] =>
  Array.from({ length: count }, (_, each) => (each % 2 === 0 ? 0.5 : -0.5 - each / 10_000));

const series = (ticker: string, returns: readonly number[]): PriceSeries =>
  seriesOf(ticker, closesOf(returns), '2026-11-30');

const subscription: Subscription = { ...newDigest(), id: 'D-1', revision: 1 };

const body = (tickers: readonly string[]) =>
  digestBody({
    tickers,
    window: { kind: 'returns', count: 100 },
    tailLevel: { digits: 95, places: 2 },
    confidence: { digits: 95, places: 2 },
    model: 'historical',
    estimationReturns: 250,
  });

const made = (all: readonly PriceSeries[], tickers: readonly string[], more: Partial<Making> = {}) =>
  makeDigest(subscription, body(tickers), {
    prices: pricesOf(all),
    calendar: everyWeekday,
    chanceOfNonGreen: nonGreenChance,
    vars: {},
    skipped: null,
    dueMs: at('2026-12-01T08:30Z'),
    nowMs: at('2026-12-01T08:30Z'),
    ...more,
  });

const figuresIn = ({ lines }: DigestPost, ticker: string): DigestFigures => {
  const line = lines.find((each) => each.ticker === ticker);
  if (line?.ok !== true) throw new Error(`no figures of ${ticker}`);
  return line;
};

describe('the line of a ticker', () => {
  test('has the last return and whether it exceeded the figure made before it', async () => {
    const post = await made([series('KELP', [...calm(399), -2])], ['KELP']);
    const kelp = figuresIn(post, 'KELP');
    expect(kelp.lastReturn).toBeCloseTo(-0.02, 12);
    expect(kelp.exceeded).toBe(true);
    expect(kelp.asOf).toBe(day('2026-11-30'));
    expect(kelp.judged?.days).toBe(250);
    const quiet = await made([series('KELP', [...calm(398), -2, 0.1])], ['KELP']);
    expect(figuresIn(quiet, 'KELP').exceeded).toBe(false);
  });

  test('names the answers on record that it is made of', async () => {
    const kelp = figuresIn(await made([series('KELP', calm(400))], ['KELP']), 'KELP');
    expect(kelp.tailId).toMatch(/^R-/);
    expect(kelp.backtestId).toMatch(/^R-/);
    expect(kelp.tailId).not.toBe(kelp.backtestId);
  });

  test('is held against the digest before it, in half-widths of its interval', async () => {
    const now = await made([series('KELP', calm(400))], ['KELP']);
    const { var: value, varLower, varUpper } = figuresIn(now, 'KELP');
    const later = figuresIn(
      await made([series('KELP', calm(400))], ['KELP'], { vars: { KELP: value - 0.001 } }),
      'KELP',
    );
    expect(figuresIn(now, 'KELP')).toMatchObject({ change: null, changeOverHalfWidth: null });
    expect(later.change).toBeCloseTo(0.001, 12);
    expect(later.changeOverHalfWidth).toBeCloseTo(0.002 / ((varUpper ?? 0) - (varLower ?? 0)), 9);
  });

  test('of a short history says why its days were not judged', async () => {
    const kelp = figuresIn(await made([series('KELP', calm(120))], ['KELP']), 'KELP');
    expect(kelp).toMatchObject({ exceeded: null, judged: null, backtestId: null });
    expect(kelp.notJudged).toMatch(/250d/);
  });

  test('of a ticker without figures is a refusal with its reason', async () => {
    const { lines } = await made([], ['KELP']);
    expect(lines).toEqual([{ ok: false, ticker: 'KELP', message: 'KELP is not in the feed.' }]);
  });
});

describe('a digest', () => {
  const all = ['KELP', 'TARN', 'WREN'].map((ticker) => series(ticker, calm(400)));

  test('stands in the order of what changed most; what has no change after that, refusals last', async () => {
    const value = figuresIn(await made(all, ['KELP']), 'KELP').var;
    const post = await made(all, ['GONE', 'WREN', 'KELP', 'TARN'], {
      vars: { KELP: value - 0.0001, TARN: value + 0.002 },
    });
    expect(post.lines.map(({ ticker }) => ticker)).toEqual(['TARN', 'KELP', 'WREN', 'GONE']);
  });

  test('says what chance alone would bring among the tickers that can be told', async () => {
    const post = await made(
      [...all.slice(0, 2), series('WREN', calm(120))],
      ['KELP', 'TARN', 'WREN', 'GONE'],
    );
    expect(post.byChance.exceedances).toBeCloseTo(2 * 0.05, 12);
    expect(post.byChance.nonGreenZones).toBeCloseTo(
      2 * (nonGreenChance(250, { digits: 95, places: 2 }) ?? 0),
      12,
    );
  });

  test('says which prices are old, and what the feed flags', async () => {
    const flag = { code: 'jump', text: 'one close is far from its neighbours', day: null };
    const flagged: PriceSeries = { ...series('KELP', calm(400)), flags: [flag] };
    const old = seriesOf('TARN', closesOf(calm(400)), '2026-11-26');
    const post = await made([flagged, old], ['KELP', 'TARN']);
    expect(post.oldPrices).toEqual({
      lastDay: day('2026-11-26'),
      expectedDay: day('2026-11-30'),
      sessionsBehind: 2,
      tickers: ['TARN'],
    });
    expect(post.flags).toEqual(['KELP: one close is far from its neighbours']);
  });

  test('remembers VaR of each ticker for the next, and of one that is missing today the last there was', async () => {
    const post = await made(all, ['KELP', 'GONE']);
    expect(varsOf(post.lines, { GONE: 0.03, KELP: 0.5 })).toEqual({
      GONE: 0.03,
      KELP: figuresIn(post, 'KELP').var,
    });
  });
});
