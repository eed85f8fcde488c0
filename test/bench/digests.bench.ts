/** What is due among 10,000 digests, and a thousand tickers worked out in two threads. */
import { afterAll, beforeAll, bench, describe } from 'vitest';
import { openSqlite } from '../../src/records/openSqlite.ts';
import type { Store } from '../../src/records/store.ts';
import { accepted } from '../laws/outcomes.ts';
import { newDigest } from '../records/madeSubscriptions.ts';

const count = 10_000;
let store: Store;

beforeAll(async () => {
  store = accepted(await openSqlite(null));
  for (let each = 0; each < count; each += 1)
    accepted(await store.subscriptions.add(newDigest({ nextDueMs: 1_000_000 + each })));
}, 120_000);
afterAll(() => store.close());

const often = { iterations: 50, time: 0, warmupIterations: 5, warmupTime: 0 };

// Goal: what is due among 10,000 digests is found in under 20 ms.
describe('10,000 digests', () => {
  bench(
    'nothing is due (goal 20 ms)',
    async () => {
      accepted(await store.subscriptions.dueBefore('T1', 999_999, 20_000));
    },
    often,
  );
  bench(
    '50 are due (goal 20 ms)',
    async () => {
      accepted(await store.subscriptions.dueBefore('T1', 1_000_049, 20_000));
    },
    often,
  );
  bench(
    'all of them are due',
    async () => {
      accepted(await store.subscriptions.dueBefore('T1', 2_000_000, 20_000));
    },
    { ...often, iterations: 5 },
  );
});
