import { describe, expect, test } from 'vitest';
import { succeed } from '../../../src/terms/result.ts';
import { createConverse } from '../../../src/workspaces/converse.ts';
import type { Desk } from '../../../src/workspaces/desk.ts';
import type { DeskRecords } from '../../../src/workspaces/records/ports.ts';
import { seriesOf, wobbling } from '../../answers/madeSeries.ts';
import { brokenStore, recordsInMemory, testVersions } from '../../doubles/records.ts';
import { accepted } from '../../laws/outcomes.ts';
import { deskOn, morningMs, snapshotOf } from '../madeDesk.ts';

const series = [seriesOf('KELP', wobbling(300)), seriesOf('TARN', [...wobbling(300)].reverse())];
const live = succeed(
  snapshotOf([
    ...series,
    seriesOf(
      'WREN',
      wobbling(280)
        .slice(1)
        .map((close, at) => close * (1 + (at % 7) / 500)),
    ),
  ]),
);

const from = { team: 'T1', channel: 'C1', person: 'U1', message: '17.1', thread: null };

const askOn = (records: DeskRecords, more: Partial<Desk> = {}) => {
  const converse = createConverse(deskOn(records, () => live, more));
  return (text: string) => converse.ask({ text, place: 'channel', from });
};

const idOf = (quietLine: string | null | undefined): string => /R-\w+/.exec(quietLine ?? '')?.[0] ?? 'no id';

describe('an answer that was given', () => {
  test('is on record with its prices, and with who asked, where, when and in which words', async () => {
    const records = await recordsInMemory();
    const [spoken] = await askOn(records)('interval  kelp');
    const id = idOf(spoken?.reply.quietLine);
    const found = accepted(await records.store.find(id));
    expect(found?.answer).toMatchObject({
      ids: [id],
      question: 'interval KELP 60d at 95%',
      asOf: '2026-11-27',
    });
    expect(found?.answer.series).toEqual([series[0]]);
    expect(found?.askings).toEqual([
      {
        askedAtMs: morningMs,
        place: 'channel',
        from,
        words: 'interval  kelp',
        replyText: expect.stringContaining(`${spoken?.reply.sentence}`),
        versions: testVersions,
      },
    ]);
    expect(found?.askings[0]?.replyText).toContain(id);
  });

  test('is one record however it is typed, and each asking is kept', async () => {
    const records = await recordsInMemory();
    const ask = askOn(records);
    const [first] = await ask('interval KELP');
    const [second] = await ask('KELP interval at 95% 60d');
    const id = idOf(first?.reply.quietLine);
    expect(idOf(second?.reply.quietLine)).toBe(id);
    expect(accepted(await records.store.find(id))?.askings.map(({ words }) => words)).toEqual([
      'interval KELP',
      'KELP interval at 95% 60d',
    ]);
    expect(accepted(await records.store.verify())).toMatchObject({ answers: 1, askings: 2, faults: [] });
  });

  test('has a longer id where other content has the usual one', async () => {
    const records = await recordsInMemory();
    const [first] = await askOn(records)('interval KELP');
    // another year changes the annual figures and nothing that the usual id is made from
    const policy = { periodsPerYear: 260, smallestMeanThatMatters: 0.0005 };
    const ask = askOn(records, { policy });
    const [second] = await ask('interval KELP');
    const [third] = await ask('interval KELP');
    const [usual, longer] = [first, second].map((spoken) => idOf(spoken?.reply.quietLine));
    expect(usual).toHaveLength(12);
    expect(longer).toHaveLength(14);
    expect(idOf(third?.reply.quietLine)).toBe(longer);
    const outcome = second?.outcome?.ok === true ? second.outcome.value[0].id : 'none';
    expect(outcome).toBe(longer);
    expect(new Set(second?.reply.buttons.map(({ answerId }) => answerId))).toEqual(new Set([longer]));
    expect(accepted(await records.store.verify())).toMatchObject({ answers: 2, askings: 3, faults: [] });
  });

  test('with several pairs is found by the id of each', async () => {
    const records = await recordsInMemory();
    const [spoken] = await askOn(records)('compare KELP TARN WREN');
    const answers = spoken?.outcome?.ok === true ? spoken.outcome.value : [];
    expect(answers).toHaveLength(3);
    for (const { id } of answers)
      expect(accepted(await records.store.find(id))?.answer.ids).toEqual(answers.map((answer) => answer.id));
  });
});

describe('what is not kept', () => {
  test('refusals, help and questions about the records', async () => {
    const records = await recordsInMemory();
    const ask = askOn(records);
    for (const text of ['interval NOPE', 'interval KELP 9000d', 'help', 'feed', 'records', 'records verify'])
      await ask(text);
    expect(accepted(await records.store.verify())).toMatchObject({ answers: 0, askings: 0 });
  });

  test('the press of a button', async () => {
    const records = await recordsInMemory();
    const converse = createConverse(deskOn(records, () => live));
    await converse.press({
      action: 'working',
      answerId: 'R-0000000000',
      question: 'interval KELP 60d at 95%',
      place: 'channel',
    });
    expect(accepted(await records.store.verify())).toMatchObject({ answers: 0, askings: 0 });
  });

  test('anything, where records are only read', async () => {
    const records = await recordsInMemory({ keeps: false });
    const [spoken] = await askOn(records)('interval KELP');
    expect(spoken?.reply.quietLine).not.toContain('Not kept');
    expect(accepted(await records.store.verify())).toMatchObject({ answers: 0 });
  });
});

test('a store that fails takes no answer from anybody: it is said in the quiet line and to the operator', async () => {
  const told: string[] = [];
  const records = await recordsInMemory({ store: brokenStore, tell: (message) => told.push(message) });
  const [spoken] = await askOn(records)('interval KELP');
  expect(spoken?.reply.kind).toBe('answer');
  expect(spoken?.reply.quietLine).toMatch(
    /R-\w{10}.*\. Not kept on record: the store cannot be written now$/,
  );
  expect(told).toHaveLength(1);
  expect(told[0]).toMatch(/^The answer R-\w{10} was given but not kept: The store of records cannot be used/);
});
