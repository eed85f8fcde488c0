import { describe, expect, test } from 'vitest';
import type { Connection } from '../../../src/records/connection.ts';
import { connectSqlite } from '../../../src/records/openSqlite.ts';
import { keepTidy } from '../../../src/start/records/records.ts';
import { reopening } from '../../../src/start/records/reopening.ts';
import { problem } from '../../../src/terms/problem.ts';
import { type Result, refuse } from '../../../src/terms/result.ts';
import { exampleSettings } from '../../e2e/demoDesk.ts';
import { accepted, refusalCode } from '../../laws/outcomes.ts';
import { answerOf, askingAt } from '../../records/madeRecords.ts';

const locked = refuse(problem('storeUnavailable', 'The file is locked.'));

/** Opens a store in memory after so many failures, and counts how often it was tried. */
const openingAfter = (failures: number) => {
  let tried = 0;
  const open = async (): Promise<Result<Connection>> => {
    tried += 1;
    return tried <= failures ? locked : connectSqlite(null);
  };
  return { open, tried: () => tried };
};

describe('a store that is opened when it is needed', () => {
  test('is not opened before, and once only', async () => {
    const { open, tried } = openingAfter(0);
    const store = reopening(open);
    expect([tried(), store.trouble()]).toEqual([0, null]);
    await Promise.all([store.find('R-A'), store.find('R-B'), store.verify()]);
    expect(tried()).toBe(1);
    await store.close();
  });

  test('is in trouble while it cannot be opened, and out of it once it can', async () => {
    const { open } = openingAfter(1);
    const store = reopening(open);
    expect(refusalCode(await store.keep(answerOf('R-A'), askingAt(1)))).toBe('storeUnavailable');
    expect(store.trouble()?.message).toBe('The file is locked.');
    accepted(await store.keep(answerOf('R-A'), askingAt(1)));
    expect(store.trouble()).toBe(null);
    await store.close();
  });

  test('is in trouble where it is open and fails', async () => {
    const store = reopening(openingAfter(0).open);
    accepted(await store.keep(answerOf('R-A'), askingAt(1)));
    accepted(await store.verify());
    const other = answerOf('R-A', { content: 'ff'.repeat(32) });
    expect(refusalCode(await store.keep(other, askingAt(2)))).toBe('storeUnavailable');
    expect(store.trouble()).not.toBe(null);
    await store.close();
  });
});

describe('the operator', () => {
  test('is told once when the store begins to fail, and once when it works again', async () => {
    const told: (string | null)[] = [];
    const store = reopening(openingAfter(2).open, (trouble) => void told.push(trouble?.message ?? null));
    await store.find('R-A');
    await store.keep(answerOf('R-A'), askingAt(1));
    expect(told).toEqual(['The file is locked.']);
    accepted(await store.keep(answerOf('R-A'), askingAt(1)));
    accepted(await store.verify());
    expect(told).toEqual(['The file is locked.', null]);
    await store.close();
  });

  test('is not told that it works where it can be read and not written', async () => {
    const told: (string | null)[] = [];
    const store = reopening(openingAfter(0).open, (trouble) => void told.push(trouble?.code ?? null));
    accepted(await store.keep(answerOf('R-A'), askingAt(1)));
    const other = answerOf('R-A', { content: 'ff'.repeat(32) });
    await store.keep(other, askingAt(2));
    accepted(await store.find('R-A'));
    expect(store.trouble()?.code).toBe('storeUnavailable');
    expect(told).toEqual(['storeUnavailable']);
    await store.close();
  });
});

describe('old records', () => {
  const dayMs = 86_400_000;
  const settings = (keepDays: number | null) => ({
    ...exampleSettings(),
    records: { ...exampleSettings().records, keepDays },
  });

  const askedAfterTidying = async (keepDays: number | null): Promise<readonly number[]> => {
    const store = reopening(openingAfter(0).open);
    for (const day of [1, 5, 9]) accepted(await store.keep(answerOf('R-A'), askingAt(day * dayMs)));
    const stop = keepTidy(store, settings(keepDays), { nowMs: () => 10 * dayMs }, (message) => {
      throw new Error(message);
    });
    stop();
    // what was begun is done once the store has answered what comes after it
    await store.verify();
    const lines = accepted(await store.list({ ticker: null, sinceMs: null }, 9));
    await store.close();
    return lines.map(({ askedAtMs }) => askedAtMs / dayMs);
  };

  test('are deleted after the days that the settings say', async () => {
    expect(await askedAfterTidying(5)).toEqual([9, 5]);
  });

  test('are kept for ever where the settings say no days', async () => {
    expect(await askedAfterTidying(null)).toEqual([9, 5, 1]);
  });

  test('that cannot be deleted are told to the operator', async () => {
    const told: string[] = [];
    await new Promise<void>((resolve) => {
      keepTidy(
        reopening(async () => locked),
        settings(5),
        { nowMs: () => 0 },
        (message) => {
          told.push(message);
          resolve();
        },
      )();
    });
    expect(told).toEqual(['Old records were not deleted: The file is locked.']);
  });
});
