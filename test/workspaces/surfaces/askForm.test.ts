import { describe, expect, test } from 'vitest';
import { viewFaults } from '../../../src/present/limits/viewFaults.ts';
import { problem } from '../../../src/terms/problem.ts';
import { refuse, succeed } from '../../../src/terms/result.ts';
import { everythingAllowed } from '../../../src/workspaces/permissions.ts';
import { type AskValues, createAskForm, emptyForm } from '../../../src/workspaces/surfaces/askForm.ts';
import { tickersLike } from '../../../src/workspaces/surfaces/tickersLike.ts';
import { seriesOf, wobbling } from '../../answers/madeSeries.ts';
import { recordsInMemory } from '../../doubles/records.ts';
import { deskOn, snapshotOf } from '../madeDesk.ts';

const live = succeed(
  snapshotOf(['KELP', 'KELP.ONE', 'TARN', 'ALL'].map((ticker) => seriesOf(ticker, wobbling(300)))),
);
const records = await recordsInMemory();
const form = createAskForm(deskOn(records, () => live));
const asker = { place: 'channel' as const };
const values = (more: Partial<AskValues>): AskValues => ({
  ...emptyForm,
  ticker: 'KELP',
  place: 'C1',
  ...more,
});

describe('the fields of the form', () => {
  test.each([
    [{}, 'interval KELP 60d at 95%'],
    [{ verb: 'interval vol', window: ' 3m ' }, 'interval vol KELP 3m at 95%'],
    [{ verb: 'shape', level: '99%' }, 'shape KELP 500d confidence 99%'],
    [
      { verb: 'tail', level: '97.5%', window: 'since 2026-05-04' },
      'tail KELP since 2026-05-04 at 97.5% confidence 95% over 1d',
    ],
    [{ verb: 'backtest', ticker: 'ALL' }, 'backtest `ALL` 500d at 99% on window 250d'],
    [{ ticker: 'KELP.ONE' }, 'interval KELP.ONE 60d at 95%'],
  ])('%j ask %s', (more, question) => {
    expect(form.read(asker, values(more))).toEqual({ ok: true, question });
  });

  test.each([
    [{ ticker: null }, 'ticker'],
    [{ ticker: 'GONE' }, 'ticker'],
    [{ window: 'sixty' }, 'window'],
    [{ window: '95' }, 'window'],
    [{ window: '60d at 99%', level: '95%' }, 'level'],
    [{ window: 'and tail TARN' }, 'window'],
    [{ verb: 'tail', level: '20%' }, 'level'],
  ])('%j are wrong at %s', (more, field) => {
    const read = form.read(asker, values(more));
    expect(read.ok ? [] : Object.keys(read.faults)).toEqual([field]);
  });

  test('are refused at the place where the verb may not be asked, also where nothing may be said of why', () => {
    const barred = (silent: boolean) =>
      createAskForm(
        deskOn(records, () => live, {
          permissions: {
            ...everythingAllowed,
            mayAsk: (_, verb) =>
              verb === 'tail' ? { ok: false, silent, message: 'Not here.' } : { ok: true },
          },
        }),
      );
    expect(barred(false).read(asker, values({ verb: 'tail' }))).toEqual({
      ok: false,
      faults: { place: 'Not here.' },
    });
    expect(barred(true).read(asker, values({ verb: 'tail' }))).toMatchObject({
      ok: false,
      faults: { place: /./ },
    });
    expect(barred(true).read(asker, values({ verb: 'shape' })).ok).toBe(true);
  });

  test('cannot be read while there are no prices', () => {
    const none = createAskForm(deskOn(records, () => refuse(problem('feedMissing', 'No file.'))));
    expect(none.read(asker, values({}))).toEqual({ ok: false, faults: { ticker: 'No file.' } });
    expect(none.tickers([asker], 'k')).toEqual([]);
    expect(viewFaults(none.view(emptyForm))).toEqual([]);
  });
});

test('tickers are offered to who may ask in one of the places, and to nobody else', () => {
  const mayAsk = (asked: { readonly place: string }) =>
    asked.place === 'direct' ? ({ ok: true } as const) : ({ ok: false, silent: true, message: '' } as const);
  const barred = createAskForm(
    deskOn(records, () => live, { permissions: { ...everythingAllowed, mayAsk } }),
  );
  expect(barred.tickers([asker], 'k')).toEqual([]);
  expect(barred.tickers([asker, { place: 'direct' }], 'k').map(({ value }) => value)).toEqual([
    'KELP',
    'KELP.ONE',
  ]);
});

test('the form keeps the limits, whatever stands in it', () => {
  for (const window of [null, 'x'.repeat(3000), '60d'])
    expect(viewFaults(form.view(values({ window })))).toEqual([]);
});

describe('tickers that are being typed', () => {
  const all = ['AKELP', 'KELP', 'TARN', 'KELP.ONE'];
  test.each([
    ['k', ['KELP', 'KELP.ONE', 'AKELP']],
    ['kelp.', ['KELP.ONE']],
    ['', all],
    ['zz', []],
  ])('"%s" offers %j', (typed, offered) => {
    expect(tickersLike(typed, all, 100)).toEqual(offered);
  });

  test('no more than so many, those that begin so first', () => {
    expect(tickersLike('k', all, 2)).toEqual(['KELP', 'KELP.ONE']);
    const feed = Array.from({ length: 20_000 }, (_, at) => `T${at}`);
    expect(tickersLike('t', feed, 100)).toHaveLength(100);
  });
});
