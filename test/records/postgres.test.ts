import { afterAll, beforeAll } from 'vitest';
import { openPostgres } from '../../src/records/openPostgres.ts';
import { type PostgresServer, startPostgres, startWithinMs } from '../contracts/postgres.ts';
import { storeContract } from '../contracts/store.contract.ts';
import { accepted } from '../laws/outcomes.ts';

let server: PostgresServer | null = null;
beforeAll(async () => {
  server = await startPostgres();
}, startWithinMs);
afterAll(() => server?.stop());

storeContract('in PostgreSQL', async () => {
  if (server === null) throw new Error('the server was not started');
  return accepted(await openPostgres(await server.emptyUrl()));
});
