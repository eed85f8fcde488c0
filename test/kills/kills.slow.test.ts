import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { type PostgresServer, startPostgres, startWithinMs } from '../contracts/postgres.ts';
import { liveThrough, type MorningPlan, type Place } from './morning.ts';
import { postgresPlace, sqlitePlace } from './places.ts';

/** Twenty mornings of ten kills each are the two hundred moments; each morning begins on an empty store. */
const mornings = Array.from({ length: 20 }, (_, index) => 20_261_201 + index);
const kills = 10;
const finishWithinMs = 180_000;
const mostMs = 900_000;

const saysAllOnce = async (place: Place, plan: MorningPlan): Promise<void> => {
  const { complaints, ...outcome } = await liveThrough(place, plan, finishWithinMs);
  expect(outcome, complaints.join('')).toEqual({
    acknowledged: expect.any(Number),
    digestsNotOnce: [],
    answersNotOnce: [],
    placeholdersLeft: [],
  });
  expect(outcome.acknowledged).toBeGreaterThan(0);
};

describe('one bot on SQLite, killed ten times a morning', () => {
  test.each(mornings)(
    'says every digest and every answer once (seed %i)',
    async (seed) => {
      const plan = { seed, copies: 1, kills, questions: 30, faults: 12, locks: 2 };
      await saysAllOnce(await sqlitePlace(), plan);
    },
    mostMs,
  );
});

describe('three bots on one PostgreSQL database, killed ten times a morning', () => {
  let server: PostgresServer | null = null;
  beforeAll(async () => {
    server = await startPostgres();
  }, startWithinMs);
  afterAll(() => server?.stop());

  test.each(mornings)(
    'say every digest and every answer once (seed %i)',
    async (seed) => {
      if (server === null) throw new Error('the server was not started');
      const plan = { seed, copies: 3, kills, questions: 30, faults: 12, locks: 2 };
      await saysAllOnce(await postgresPlace(server), plan);
    },
    mostMs,
  );
});
