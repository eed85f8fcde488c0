import { expect, test } from 'vitest';
import { liveThrough } from './morning.ts';
import { sqlitePlace } from './places.ts';

/** The short form of kills.slow.test.ts. */
test('a morning with two kills and a few faults says every digest and every answer once', async () => {
  const plan = { seed: 20_261_201, copies: 1, kills: 2, questions: 10, faults: 4, locks: 0 };
  const { complaints, ...outcome } = await liveThrough(await sqlitePlace(), plan, 25_000);
  expect(outcome, complaints.join('')).toEqual({
    acknowledged: expect.any(Number),
    digestsNotOnce: [],
    answersNotOnce: [],
    placeholdersLeft: [],
  });
  expect(outcome.acknowledged).toBeGreaterThan(0);
}, 40_000);
