import { describe, expect, test } from 'vitest';
import { answerQuestion } from '../../../src/answers/answerQuestion.ts';
import { reply } from '../../../src/present/reply.ts';
import { inWords } from '../../../src/present/words.ts';
import type { PriceSeries } from '../../../src/terms/prices.ts';
import { problem } from '../../../src/terms/problem.ts';
import { refuse, succeed } from '../../../src/terms/result.ts';
import { createConverse } from '../../../src/workspaces/converse.ts';
import type { Desk } from '../../../src/workspaces/desk.ts';
import type { DeskRecords } from '../../../src/workspaces/records/ports.ts';
import { seriesOf, wobbling } from '../../answers/madeSeries.ts';
import { brokenStore, recordsInMemory } from '../../doubles/records.ts';
import { deskOn, snapshotOf } from '../madeDesk.ts';

const closes = wobbling(300);
const kelp = seriesOf('KELP', closes);
const tarn = seriesOf('TARN', [...closes].reverse());

/** Asks on the given prices and says everything in words. */
const sayOn = (records: DeskRecords, all: readonly PriceSeries[], more: Partial<Desk> = {}) => {
  const converse = createConverse(deskOn(records, () => succeed(snapshotOf(all)), more));
  return async (text: string): Promise<string> => {
    const spoken = await converse.ask({ text, place: 'channel' });
    return spoken.map(({ reply }) => `${reply.kind}: ${inWords(reply)}`).join('\n\n');
  };
};

const idIn = (words: string): string => /R-\w{10,20}/.exec(words)?.[0] ?? 'no id';

describe('again with one id', () => {
  test.each([
    'interval KELP 60d robust',
    'interval vol KELP 3m',
    'claim KELP 20bp',
    'need KELP 5bp',
    'compare KELP TARN',
    'compare KELP before 2026-08-03',
    'shape KELP',
    'tail KELP by historical at 95%',
  ])('%s comes out the same to the last bit, and nothing has changed since', async (question) => {
    const records = await recordsInMemory();
    const say = sayOn(records, [kelp, tarn]);
    const given = await say(question);
    const id = idIn(given);
    const told = await say(`again ${id}`);
    expect(told).toMatch(new RegExp(`^record: ${id} comes out the same to the last bit`));
    expect(told).toContain('KELP: no close was changed and no day is new.');
    expect(told).not.toContain('On the same days');
    expect(told).toContain(`(${id})`);
  });

  test('a default window that was longer than the history comes out the same too', async () => {
    const records = await recordsInMemory();
    const say = sayOn(records, [seriesOf('KELP', wobbling(40))]);
    const id = idIn(await say('interval KELP'));
    expect(await say(`again ${id}`)).toContain('same to the last bit');
  });

  test('new days change what is said today, and nothing of what was kept', async () => {
    const records = await recordsInMemory();
    const id = idIn(await sayOn(records, [kelp])('interval KELP'));
    const later = seriesOf('KELP', [...closes, 150, 90, 140], '2026-12-02');
    const told = await sayOn(records, [later])(`again ${id}`);
    expect(told).toContain('same to the last bit');
    expect(told).toContain('KELP: 3 new days, to 2026-12-02.');
    expect(told).not.toContain('On the same days');
    const [then, today] = [...told.matchAll(/^KELP’s mean daily return .*$/gm)].map(([line]) => line);
    expect(today).toMatch(/\(R-\w{10}\)$/);
    expect(today?.startsWith(then ?? 'nothing')).toBe(false);
  });

  test('restated closes are counted, and their part in the change is shown by itself', async () => {
    const records = await recordsInMemory();
    const id = idIn(await sayOn(records, [kelp])('interval KELP'));
    const restated = closes.map((close, at) => (at >= 290 ? close * 1.5 : close));
    const later = seriesOf('KELP', [...restated, 200], '2026-11-30');
    const told = await sayOn(records, [later])(`again ${id}`);
    expect(told).toContain('same to the last bit');
    expect(told).toContain(
      'KELP: 10 of 300 closes restated, the first on 2026-11-16 and 1 new day, to 2026-11-30.',
    );
    const [alone] = (
      await sayOn(await recordsInMemory(), [seriesOf('KELP', restated)])('interval KELP')
    ).split('\n');
    expect(told).toContain(`On the same days, with the prices of today\n${alone?.replace('answer: ', '')}`);
    expect(new Set([...told.matchAll(/^KELP’s mean daily return .*$/gm)].map(([line]) => line)).size).toBe(3);
  });

  test('its own prices are worked out with the settings of then, the prices of today with those of now', async () => {
    const records = await recordsInMemory();
    const id = idIn(await sayOn(records, [kelp])('interval KELP'));
    const years: number[] = [];
    const compute: Desk['compute'] = async (job) => {
      years.push(job.policy.periodsPerYear);
      return answerQuestion(job);
    };
    const now = { compute, policy: { periodsPerYear: 260, smallestMeanThatMatters: 0.0005 } };
    expect(await sayOn(records, [kelp], now)(`again ${id}`)).toContain('same to the last bit');
    expect(years).toEqual([252, 260]);
  });

  test('a ticker that the feed has no more comes out from its own prices', async () => {
    const records = await recordsInMemory();
    const id = idIn(await sayOn(records, [kelp, tarn])('interval KELP'));
    const told = await sayOn(records, [tarn])(`again ${id}`);
    expect(told).toContain('same to the last bit');
    expect(told).toContain('KELP is not in the prices of today.');
  });

  test('works without any prices of today', async () => {
    const records = await recordsInMemory();
    const id = idIn(await sayOn(records, [kelp])('interval KELP'));
    const none = () => refuse(problem('feedMissing', 'No file.'));
    const converse = createConverse(deskOn(records, none));
    const [spoken] = await converse.ask({ text: `again ${id}`, place: 'channel' });
    expect(inWords(spoken?.reply ?? failing)).toMatch(/same to the last bit[\s\S]*No file\./);
  });

  test('figures that come out otherwise are named with all their digits, and a fault is called one', async () => {
    const records = await recordsInMemory();
    const id = idIn(await sayOn(records, [kelp])('interval KELP'));
    const compute: Desk['compute'] = async (job) => {
      const outcome = answerQuestion(job);
      if (!outcome.ok) return outcome;
      const [first] = outcome.value;
      return first.kind === 'interval mean'
        ? succeed([{ ...first, figures: { ...first.figures, upper: 0.0625 } }])
        : outcome;
    };
    const told = await sayOn(records, [kelp], { compute })(`again ${id}`);
    expect(told).toContain('comes out otherwise from the prices kept with it');
    expect(told).toMatch(/0\.upper: 0\.\d{12,} then, 0\.0625 now/);
    expect(told).toContain('Tell the operator');
  });

  test('words that are put otherwise since are told apart from figures', async () => {
    const records = await recordsInMemory();
    const id = idIn(await sayOn(records, [kelp])('interval KELP'));
    const compute: Desk['compute'] = async (job) => {
      const outcome = answerQuestion(job);
      return outcome.ok ? succeed([{ ...outcome.value[0], method: 'another name' }]) : outcome;
    };
    const told = await sayOn(records, [kelp], { compute })(`again ${id}`);
    expect(told).toMatch(/same to the last bit[\s\S]*Every figure is the same; cautions/);
  });

  test('another major version of Node is given as the reason', async () => {
    const records = await recordsInMemory();
    const id = idIn(await sayOn(records, [kelp])('interval KELP'));
    const compute: Desk['compute'] = async () => refuse(problem('tooFewReturns', 'Too few.'));
    const newer = { ...records, versions: { ...records.versions, node: '99.0.0' } };
    expect(await sayOn(newer, [kelp])(`again ${id}`)).toContain('(now 99.0.0)');
    expect(await sayOn(newer, [kelp], { compute })(`again ${id}`)).toMatch(
      /cannot be worked out again from the prices kept with it\.[\s\S]*Why\nToo few\./,
    );
  });
});

const failing = reply('refusal', 'nothing was said');

describe('again with two ids', () => {
  test('says in a line each what differs, then what both say', async () => {
    const records = await recordsInMemory();
    const say = sayOn(records, [kelp, tarn]);
    const first = idIn(await say('interval KELP 60d'));
    const second = idIn(await say('tail TARN 250d by historical log at 97.5%'));
    const told = await say(`again ${first} ${second}`);
    expect(told).toContain(
      `record: ${first} and ${second} differ in verb, ticker, window, level, return type, model and prices used.`,
    );
    expect(told).toContain('Window: 60d against 250d');
    expect(told).toContain('Level: 95% against 97.5%');
    expect(told).toContain('Model: none against historical');
    expect(told).toMatch(/KELP’s mean daily return/);
  });

  test('restated prices show although the days are the same', async () => {
    const records = await recordsInMemory();
    const first = idIn(await sayOn(records, [kelp])('interval KELP'));
    const restated = seriesOf(
      'KELP',
      closes.map((close, at) => (at === 299 ? close * 1.01 : close)),
    );
    const say = sayOn(records, [restated]);
    const second = idIn(await say('interval KELP'));
    expect(await say(`again ${first} ${second}`)).toContain('differ in prices used.');
  });
});

describe('what cannot be shown', () => {
  test('an id that was never given is refused, in either place', async () => {
    const records = await recordsInMemory();
    const say = sayOn(records, [kelp]);
    const id = idIn(await say('interval KELP'));
    for (const text of ['again R-0000000000', `again ${id} R-0000000000`, `again R-0000000000 ${id}`])
      expect(await say(text)).toMatch(/^refusal: There is no answer R-0000000000 on record/);
  });

  test('a store that fails is said, and other questions are answered', async () => {
    const records = await recordsInMemory({ store: brokenStore, tell: () => {} });
    const say = sayOn(records, [kelp]);
    for (const text of ['again R-0000000000', 'records', 'records verify'])
      expect(await say(text)).toMatch(/^refusal: The store of records cannot be used/);
    expect(await say('interval KELP')).toMatch(/^answer: /);
    expect(await say('help')).toMatch(/^help: /);
  });
});

describe('records', () => {
  test('lists what was asked, the newest first, by ticker and from a day on', async () => {
    const records = await recordsInMemory();
    const at = (iso: string) => ({ clock: { nowMs: () => Date.parse(iso) } });
    const first = idIn(await sayOn(records, [kelp, tarn], at('2026-11-27T08:00:00Z'))('interval KELP'));
    const second = idIn(await sayOn(records, [kelp, tarn], at('2026-11-28T09:30:00Z'))('shape TARN'));
    const say = sayOn(records, [kelp, tarn]);
    expect(await say('records')).toBe(
      [
        'record: 2 answers on record.',
        `2026-11-28 09:30 UTC  ${second}  shape TARN 500d confidence 95%`,
        `2026-11-27 08:00 UTC  ${first}  interval KELP 60d at 95%`,
      ].join('\n'),
    );
    expect(await say('records TARN')).toContain('1 answer on record about TARN.');
    expect(await say('records since 2026-11-27')).toContain('2 answers on record since 2026-11-27.');
    expect(await say('records KELP since 2026-11-26')).toContain(first);
    expect(await say('records TARN since 2026-11-27')).not.toContain(first);
  });

  test('says that there are none, and that they are whole', async () => {
    const say = sayOn(await recordsInMemory(), [kelp]);
    expect(await say('records KELP')).toBe('record: No answer is on record about KELP.');
    await say('interval KELP');
    expect(await say('records verify')).toMatch(
      /^record: The records are whole: 1 answer, asked 1 time, and the traces of 0 deletions\.\nThe chain ends in [0-9a-f]{16}\.$/,
    );
  });

  test('says what is wrong where they are not whole', async () => {
    const records = await recordsInMemory();
    const faults = Array.from({ length: 12 }, (_, index) => `Fault ${index}.`);
    const examined = { answers: 1, askings: 1, deletions: 0, head: 'ab'.repeat(32), faults };
    const store = { ...records.store, verify: async () => succeed(examined) };
    const told = await sayOn({ ...records, store }, [kelp])('records verify');
    expect(told).toMatch(/^record: The records are not whole: 12 faults in 1 answer/);
    expect(told).toContain('Fault 9.\nand 2 more');
  });
});
