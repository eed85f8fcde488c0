import { describe, expect, test } from 'vitest';
import type { StatisticalQuestion } from '../../src/questions/question.ts';
import { readMessage } from '../../src/questions/readMessage.ts';
import { isStatistical } from '../../src/workspaces/questionKinds.ts';
import { context, questionIn } from './asking.ts';

const statistical = (text: string): StatisticalQuestion => {
  const { question } = questionIn(text);
  if (!isStatistical(question)) throw new Error(`${text} asks for no figure`);
  return question;
};

const askedAfter = (before: string, text: string) =>
  readMessage(text, context, statistical(before)).questions;

const onlyAfter = (before: string, text: string) => {
  const [outcome, another] = askedAfter(before, text);
  expect(another).toBe(undefined);
  if (outcome?.ok !== true) throw new Error(outcome?.problem.message ?? `${text}: nothing was asked`);
  return outcome.value;
};

describe('words without a verb replace their like in the question before, and the rest of it is carried over', () => {
  test.each([
    ['interval KELP 60d', 'same at 99%', 'interval KELP 60d at 99%', 'interval KELP 60d'],
    ['interval KELP 60d', 'at 99%', 'interval KELP 60d at 99%', 'interval KELP 60d'],
    ['interval KELP 60d', '99%', 'interval KELP 60d at 99%', 'interval KELP 60d'],
    ['interval KELP 90d at 90%', 'TARN', 'interval TARN 90d at 90%', 'interval 90d at 90%'],
    ['interval KELP', 'and for TARN?', 'interval TARN 60d at 95%', 'interval 60d at 95%'],
    ['interval KELP', '3m', 'interval KELP 3m at 95%', 'interval KELP at 95%'],
    ['interval KELP', 'vol', 'interval vol KELP 60d at 95%', 'interval KELP 60d at 95%'],
    ['interval vol KELP', 'mean', 'interval KELP 60d at 95%', 'interval KELP 60d at 95%'],
    [
      'interval KELP',
      'since 2026-05-04 log',
      'interval KELP since 2026-05-04 at 95% log',
      'interval KELP at 95%',
    ],
    ['interval KELP', 'a year', 'interval KELP 60d at 95% a year', 'interval KELP 60d at 95%'],
    [
      'tail KELP 1y',
      'on 2m USD',
      'tail KELP 1y at 99% confidence 95% over 1d on 2m USD',
      'tail KELP 1y at 99% confidence 95% over 1d',
    ],
    [
      'tail KELP',
      'over 10d at 97.5%',
      'tail KELP 500d at 97.5% confidence 95% over 10d',
      'tail KELP 500d confidence 95%',
    ],
    ['tail KELP', 'beyond 4%', 'tail KELP beyond 4% 500d confidence 95%', 'tail KELP 500d confidence 95%'],
    [
      'tail KELP beyond 4%',
      'beyond 5%',
      'tail KELP beyond 5% 500d confidence 95%',
      'tail KELP 500d confidence 95%',
    ],
    [
      'tail KELP',
      'by student',
      'tail KELP 500d at 99% confidence 95% over 1d by student',
      'tail KELP 500d at 99% confidence 95% over 1d',
    ],
    ['claim KELP 20bp', '30bp', 'claim KELP 30bp 60d at 95%', 'claim KELP 60d at 95%'],
    ['claim KELP 15% a year', '20bp', 'claim KELP 20bp 60d at 95%', 'claim KELP 60d at 95%'],
    ['claim KELP 20bp', 'at 99%', 'claim KELP 20bp 60d at 99%', 'claim KELP 20bp 60d'],
    ['claim ratio KELP 0.1', '0.2', 'claim ratio KELP 0.2 60d at 95%', 'claim ratio KELP 60d at 95%'],
    ['need KELP 5bp', 'power 90%', 'need KELP 5bp 60d at 95% power 90%', 'need KELP 5bp 60d at 95%'],
    ['compare KELP TARN', 'KELP WREN', 'compare KELP WREN 60d at 95%', 'compare 60d at 95%'],
    [
      'compare KELP before 2026-05-04',
      'before 2026-06-01',
      'compare KELP before 2026-06-01 all at 95%',
      'compare KELP all at 95%',
    ],
    ['shape KELP', '`ALL`', 'shape `ALL` 500d confidence 95%', 'shape 500d confidence 95%'],
    [
      'backtest KELP',
      'on window 125d',
      'backtest KELP 500d at 99% on window 125d',
      'backtest KELP 500d at 99%',
    ],
  ])('after %s: %s', (before, text, canonical, carried) => {
    const read = onlyAfter(before, text);
    expect(read.canonical).toBe(canonical);
    expect(read.assumed).toEqual([`${carried} (carried over)`]);
  });

  test('for each ticker that is named', () => {
    const outcomes = askedAfter('interval KELP 60d', 'TARN WREN').map((each) =>
      each.ok ? each.value.canonical : null,
    );
    expect(outcomes).toEqual(['interval TARN 60d at 95%', 'interval WREN 60d at 95%']);
  });

  test('with the wish to see or have it otherwise', () => {
    expect(onlyAfter('tail KELP', 'as picture')).toMatchObject({
      canonical: 'tail KELP 500d at 99% confidence 95% over 1d',
      wishes: ['picture'],
    });
  });
});

describe('a verb of its own carries over nothing but the ticker', () => {
  test.each([
    [
      'interval KELP 90d at 99%',
      'tail',
      'tail KELP 500d at 99% confidence 95% over 1d',
      [
        'KELP (carried over)',
        '500d (default)',
        '99% (default)',
        'over 1d (default)',
        'confidence 95% (default)',
      ],
    ],
    [
      'tail KELP',
      'vol 3m',
      'interval vol KELP 3m at 95%',
      ['vol read as interval vol', 'KELP (carried over)', '95% (default)'],
    ],
    [
      'tail KELP',
      'VaR at 97.5% 1y',
      'tail KELP 1y at 97.5% confidence 95% over 1d',
      ['VaR read as tail', 'KELP (carried over)', 'over 1d (default)', 'confidence 95% (default)'],
    ],
    [
      'interval KELP',
      'compare TARN 60d',
      'compare KELP TARN 60d at 95%',
      ['KELP (carried over)', '95% (default)'],
    ],
  ])('after %s: %s', (before, text, canonical, assumed) => {
    const read = onlyAfter(before, text);
    expect(read.canonical).toBe(canonical);
    expect([...read.assumed].sort()).toEqual([...assumed].sort());
  });
});

describe('a whole question is not touched by the one before', () => {
  test.each(['interval TARN', 'feed', 'help', 'records', 'tail TARN at 95%'])('%s', (text) => {
    expect(askedAfter('tail KELP 1y', text)).toEqual(readMessage(text, context).questions);
  });
});

describe('a default window that is carried over stays one that nobody asked for', () => {
  test('so it can be cut to a shorter history', () => {
    expect(onlyAfter('interval KELP', 'TARN').question).toMatchObject({ windowAsked: false });
    expect(onlyAfter('interval KELP 60d', 'TARN').question).toMatchObject({ windowAsked: true });
    expect(onlyAfter('interval KELP', '90d').question).toMatchObject({ windowAsked: true });
  });
});

describe('what cannot be carried on is refused', () => {
  test.each([
    ['interval KELP', 'why is that', 'noVerb', null],
    ['interval KELP', 'at 99% somehow', 'unreadableWords', 'interval KELP 60d at 99%'],
    ['interval KELP 90d', 'TARM', 'unknownTicker', 'interval TARN 90d at 95%'],
    ['interval KELP', '99', 'ambiguous', 'interval KELP 60d at 99%'],
    ['interval KELP', 'on 2m USD at 99%', 'notForVerb', 'interval KELP 60d at 99%'],
    ['claim KELP 20bp', '99%', 'ambiguous', 'claim KELP 20bp 60d at 99%'],
    ['claim KELP 20bp', '0.3%', 'ambiguous', 'claim KELP 20bp 60d at 0.3%'],
    ['compare KELP TARN', 'before 2026-05-04', 'notForVerb', null],
    ['compare KELP TARN', 'WREN', 'missingPart', null],
    ['tail KELP', 'at 20%', 'levelOutside', 'tail KELP 500d at 80% confidence 95% over 1d'],
  ])('after %s: %s', (before, text, code, suggestion) => {
    const [outcome] = askedAfter(before, text);
    if (outcome?.ok !== false) throw new Error('was not refused');
    expect(outcome.problem.code).toBe(code);
    if (suggestion !== null) expect(outcome.problem.suggestions).toContain(suggestion);
  });

  test('where it stood in what was said', () => {
    const [outcome] = askedAfter('interval KELP', 'at 99% somehow');
    expect(outcome).toMatchObject({ ok: false, problem: { position: { start: 7, end: 14 } } });
  });

  test('thanks are no question', () => {
    expect(askedAfter('interval KELP', 'thanks')).toEqual([]);
  });

  test('a ticker that the feed has no more does not stand in the way of another', () => {
    const gone = { ...statistical('interval KELP 90d'), ticker: 'GONE' } as StatisticalQuestion;
    const [other, same] = [readMessage('TARN', context, gone), readMessage('at 99%', context, gone)];
    expect(other.questions[0]).toMatchObject({ ok: true, value: { canonical: 'interval TARN 90d at 95%' } });
    expect(same.questions[0]?.ok).toBe(false);
  });
});
