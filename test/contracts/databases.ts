import { afterAll, afterEach, beforeAll, describe } from 'vitest';
import { openPostgres } from '../../src/records/openPostgres.ts';
import { openSqlite } from '../../src/records/openSqlite.ts';
import type { Store } from '../../src/records/store.ts';
import { accepted } from '../laws/outcomes.ts';
import { type PostgresServer, startPostgres, startWithinMs } from './postgres.ts';

/** Runs one suite on every database that the records can be in. `open` gives an empty store, closed after the test. */
export const onEveryDatabase = (name: string, suite: (open: () => Promise<Store>) => void): void => {
  const opened: Store[] = [];
  const closeAll = async () => {
    for (const store of opened.splice(0)) await store.close();
  };
  const noted = (store: Store): Store => {
    opened.push(store);
    return store;
  };

  describe(`${name}, in memory`, () => {
    afterEach(closeAll);
    suite(async () => noted(accepted(await openSqlite(null))));
  });

  describe(`${name}, on PostgreSQL`, () => {
    let server: PostgresServer | null = null;
    beforeAll(async () => {
      server = await startPostgres();
    }, startWithinMs);
    afterEach(closeAll);
    afterAll(() => server?.stop());
    suite(async () => {
      if (server === null) throw new Error('the server was not started');
      return noted(accepted(await openPostgres(await server.emptyUrl())));
    });
  });
};
