/** Whatever is asked, of whatever prices, the message keeps the platform's limits and says in its text what matters. */
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { escapeFallback, toBlocks } from '../../src/present/blocks.ts';
import { limitFaults } from '../../src/present/limits/limitFaults.ts';
import { succeed } from '../../src/terms/result.ts';
import { createConverse } from '../../src/workspaces/converse.ts';
import { seriesOf } from '../answers/madeSeries.ts';
import { recordsInMemory } from '../doubles/records.ts';
import { deskOn, snapshotOf } from '../workspaces/madeDesk.ts';

const tickers = ['KELP', 'TARN', `${'LONG'.repeat(20)}1`, 'A.B'];

/** Prices of some length and size of move, at any scale; some days they do not move at all. */
const anyCloses = fc
  .record({
    start: fc.constantFrom(0.0001, 1, 100, 1e9),
    moves: fc.array(
      fc.oneof({ weight: 9, arbitrary: fc.double({ min: -0.2, max: 0.2, noNaN: true }) }, fc.constant(0)),
      {
        minLength: 2,
        maxLength: 320,
      },
    ),
  })
  .map(({ start, moves }) => {
    const closes: number[] = [start];
    for (const move of moves) closes.push((closes.at(-1) ?? start) * (1 + move));
    return closes;
  });

const verbs = fc.constantFrom(
  'interval',
  'interval vol',
  'interval ratio',
  'claim 20bp',
  'claim 15% a year',
  'need 5bp',
  'compare KELP TARN',
  'compare KELP TARN A.B',
  'compare KELP before 2026-05-04',
  'tail by historical',
  'tail by normal on 2m',
  'tail beyond 4% by normal',
  'backtest by normal 60d on window 40d',
  'feed',
  'records',
  'help',
  'help tail',
);
const parts = fc.subarray(
  ['60d', 'at 99%', 'log', 'robust', 'above', 'a year', 'as json', 'thanks', 'over 10d'],
  { maxLength: 3 },
);
const anyQuestion = fc
  .record({ verb: verbs, ticker: fc.constantFrom(...tickers), parts })
  .map(({ verb, ticker, parts: more }) =>
    [verb, /compare|records|help/.test(verb) ? '' : `\`${ticker}\``, ...more].join(' '),
  );

/** Buttons whose answers follow from the answer alone. */
const pressed: readonly string[] = ['working', 'more', 'level'];

describe('a message, and what each of its buttons brings up,', () => {
  test('keeps the limits and tells a notification the verdict, the data date and the id', async () => {
    await fc.assert(
      fc.asyncProperty(
        anyQuestion,
        fc.tuple(anyCloses, anyCloses, anyCloses, anyCloses),
        async (text, closes) => {
          const series = tickers.map((ticker, index) => seriesOf(ticker, closes[index] ?? []));
          const desk = deskOn(await recordsInMemory(), () => succeed(snapshotOf(series)));
          const converse = createConverse(desk);
          for (const { reply, outcome } of await converse.ask({ text, place: 'channel' })) {
            const message = toBlocks(reply);
            expect(limitFaults(message)).toEqual([]);
            for (const button of reply.buttons) {
              if (!pressed.includes(button.action)) continue;
              for (const shown of await converse.press({ ...button, place: 'channel' }))
                expect(limitFaults(toBlocks(shown.reply))).toEqual([]);
            }
            if (outcome?.ok !== true) continue;
            const [{ id, asOf }] = outcome.value;
            expect(message.text).toContain(id);
            expect(message.text).toContain(`Data to ${asOf}`);
            for (const warning of reply.warnings.slice(0, 2))
              expect(message.text).toContain(escapeFallback(`Caution: ${warning}`));
          }
        },
      ),
      { seed: 21, numRuns: 80 },
    );
  });
});
