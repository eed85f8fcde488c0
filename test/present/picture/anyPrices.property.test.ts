/** Whatever the prices are, a picture shows numbers that are numbers, and fits its sheet. */
import fc from 'fast-check';
import { expect, test } from 'vitest';
import { answerQuestion } from '../../../src/answers/answerQuestion.ts';
import { feedPicture, tickerPicture } from '../../../src/answers/pictures/feedPictures.ts';
import { pictureOf } from '../../../src/answers/pictures/pictureOf.ts';
import { sheetOf } from '../../../src/present/picture/sheetOf.ts';
import { toSvg } from '../../../src/present/picture/toSvg.ts';
import { readMessage } from '../../../src/questions/readMessage.ts';
import type { PriceSeries } from '../../../src/terms/prices.ts';
import { seriesOf } from '../../answers/madeSeries.ts';
import { accepted } from '../../laws/outcomes.ts';
import { context } from '../../questions/asking.ts';

const policy = { periodsPerYear: 252, smallestMeanThatMatters: 0.0005 };

/** From quiet to wild, now and then only rising, which leaves no loss to show. */
const returns = fc
  .record({
    scale: fc.constantFrom(1e-6, 0.001, 0.02, 0.3),
    onlyRises: fc.boolean(),
    steps: fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: 25, maxLength: 90 }),
  })
  .map(({ scale, onlyRises, steps }) =>
    steps.map((step, place) => scale * ((onlyRises ? Math.abs(step) : step) + ((place % 7) - 3) / 50)),
  );

const closesFrom = (steps: readonly number[]): readonly number[] => {
  const closes = [100];
  for (const step of steps) closes.push((closes.at(-1) ?? 0) * (1 + step));
  return closes;
};

const questions = [
  'interval KELP all',
  'interval KELP below all',
  'interval vol KELP all',
  'claim KELP 20bp all',
  'need KELP 5bp all',
  'tail KELP at 90% all by historical',
  'tail KELP at 90% all by student',
  'tail KELP beyond 2% all by normal',
  'backtest KELP at 90% by normal on window 20d 4d',
] as const;

const answered = (text: string, series: PriceSeries) => {
  const [read] = readMessage(text, context).questions;
  if (read === undefined) throw new Error(`nothing was read in ${text}`);
  const job = { read: accepted(read), series: [series], policy };
  const answers = answerQuestion(job);
  return answers.ok ? { job, answers: answers.value } : null;
};

const sound = async (data: Parameters<typeof sheetOf>[0]): Promise<void> => {
  const sheet = sheetOf(data);
  const svg = await toSvg(sheet);
  expect(`${JSON.stringify(sheet)}${svg}`).not.toMatch(/NaN|undefined|Infinity/);
  expect(svg).toMatch(/^<svg[^>]* width="480"/);
};

test('answers on any prices that are not refused', async () => {
  let drawn = 0;
  await fc.assert(
    fc.asyncProperty(returns, fc.constantFrom(...questions), async (steps, question) => {
      const found = answered(question, seriesOf('KELP', closesFrom(steps)));
      if (found === null) return;
      drawn += 1;
      await sound(accepted(pictureOf(found.job, found.answers)));
    }),
    { seed: 20261201, numRuns: 45 },
  );
  expect(drawn).toBeGreaterThan(20);
});

test('a ticker of any length, down to one price', async () => {
  for (const closes of [
    [5],
    [5, 5],
    [5, 6, 7, 8],
    closesFrom(Array.from({ length: 900 }, (_, day) => (day % 3) / 100)),
  ]) {
    const data = tickerPicture(seriesOf('KELP', closes));
    if (data === null) throw new Error('no picture');
    await sound(data);
  }
  expect(tickerPicture(seriesOf('KELP', []))).toBeNull();
});

test('a feed whose only ticker has no price that can be read', async () => {
  const { meaning } = seriesOf('KELP', [1]);
  const report = {
    files: [],
    fingerprint: 'ab'.repeat(32),
    priceCount: 1,
    firstDay: 20000,
    lastDay: 20001,
    findings: [],
    tickers: [
      {
        ticker: 'KELP',
        state: 'quarantined' as const,
        quarantine: 'KELP contradicts itself.',
        priceCount: 0,
        firstDay: null,
        lastDay: null,
        missingSessions: 0,
        longestGapDays: 0,
        flags: [],
        meaning,
      },
    ],
  };
  await sound(feedPicture(report, () => null));
});
