import { expect, test } from 'vitest';
import { reply } from '../../src/present/reply.ts';
import { problem } from '../../src/terms/problem.ts';
import { refuse, succeed } from '../../src/terms/result.ts';
import { createConverse } from '../../src/workspaces/converse.ts';
import { pictured } from '../../src/workspaces/pictured.ts';
import { seriesOf, wobbling } from '../answers/madeSeries.ts';
import { emptyPng } from '../doubles/drawing.ts';
import { recordsInMemory } from '../doubles/records.ts';
import { deskOn, snapshotOf } from './madeDesk.ts';

const button = {
  action: 'picture',
  label: 'Picture',
  answerId: 'R-0000000000',
  question: 'interval KELP',
} as const;
const spoken = { reply: reply('answer', 'So.', { buttons: [button] }), outcome: null };
const drawn = { png: emptyPng, altText: 'Bars.', title: 'KELP', fileName: 'kelp.png' };
const bars = [{ head: 'Closes', lines: ['▁▂▃'] }];

test('a reply with its picture has no button for it', () => {
  const { reply: said, pictures } = pictured(spoken, succeed(drawn), bars);
  expect(said.buttons).toEqual([]);
  expect(pictures).toEqual([{ ...drawn, inText: bars }]);
});

test('a picture that could not be drawn is missed in words, beside what stands for it', () => {
  const found = pictured(spoken, refuse(problem('tooFewReturns', 'too few returns.')), bars);
  expect(found.reply.passages).toEqual([
    ...bars,
    { head: null, lines: ['There is no picture: too few returns.'] },
  ]);
  expect(found.reply.buttons).toEqual([button]);
  expect(found.pictures).toBeUndefined();
});

const live = succeed(snapshotOf([seriesOf('KELP', wobbling(80))]));

test('a question asked as picture is answered with one, and the button draws the same', async () => {
  const converse = createConverse(deskOn(await recordsInMemory(), () => live));
  const [asked] = await converse.ask({ text: 'interval KELP 60d as picture', place: 'channel' });
  expect(asked?.pictures?.map(({ altText }) => altText)).toEqual([
    expect.stringMatching(/^Interval ladder\./),
  ]);
  const [plain] = await converse.ask({ text: 'interval KELP 60d', place: 'channel' });
  expect(plain?.pictures).toBeUndefined();
  const shown = plain?.reply.buttons.find(({ action }) => action === 'picture');
  if (shown === undefined) throw new Error('no button');
  const [pressed] = await converse.press({ ...shown, place: 'channel' });
  expect(pressed?.reply.sentence).toMatch(/^The picture of R-/);
  expect(pressed?.pictures).toEqual(asked?.pictures);
});

test('the button of an answer that nobody kept draws nothing', async () => {
  const converse = createConverse(deskOn(await recordsInMemory(), () => live));
  const [refused] = await converse.press({ ...button, place: 'channel' });
  expect(refused?.outcome).toMatchObject({ ok: false, problem: { code: 'unknownRecord' } });
  expect(refused?.pictures).toBeUndefined();
});

test('the feed and a ticker have pictures; the ticker’s bars stand for it in text', async () => {
  const converse = createConverse(deskOn(await recordsInMemory(), () => live));
  const [unread] = await converse.ask({ text: 'feed as picture', place: 'channel' });
  expect(unread?.pictures).toBeUndefined();
});
