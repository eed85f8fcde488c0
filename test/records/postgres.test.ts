import { afterAll, afterEach, beforeAll, describe, expect, test } from 'vitest';
import { withRecordsUrl } from '../../src/config/recordsUrl.ts';
import { openPostgres } from '../../src/records/openPostgres.ts';
import type { Store } from '../../src/records/store.ts';
import { recordsToKeep, recordsToRead } from '../../src/start/records/records.ts';
import { deliveriesContract } from '../contracts/deliveries.contract.ts';
import { inboxContract } from '../contracts/inbox.contract.ts';
import { type PostgresServer, startPostgres, startWithinMs } from '../contracts/postgres.ts';
import { storeContract } from '../contracts/store.contract.ts';
import { exampleSettings } from '../e2e/demoDesk.ts';
import { accepted, refusalCode } from '../laws/outcomes.ts';
import { answerOf, askingAt } from './madeRecords.ts';

let server: PostgresServer | null = null;
beforeAll(async () => {
  server = await startPostgres();
}, startWithinMs);
afterAll(() => server?.stop());

const opened: Store[] = [];
afterEach(async () => {
  for (const store of opened.splice(0)) await store.close();
});

const addressed = (): Promise<string> => {
  if (server === null) throw new Error('the server was not started');
  return server.emptyUrl();
};

const open = async (): Promise<Store> => {
  const store = accepted(await openPostgres(await addressed()));
  opened.push(store);
  return store;
};

storeContract('in PostgreSQL', async () => accepted(await openPostgres(await addressed())));
inboxContract('in PostgreSQL', open);
deliveriesContract('in PostgreSQL', open);

describe('records in PostgreSQL', () => {
  test('are made once where several copies start at the same time', async () => {
    const url = await addressed();
    const copy = async () => accepted(await openPostgres(url));
    const [first, second, third] = await Promise.all([copy(), copy(), copy()]);
    opened.push(first, second, third);
    accepted(await first.keep(answerOf('R-A'), askingAt(1)));
    expect(accepted(await second.find('R-A'))?.askings).toHaveLength(1);
  });

  test('kept by several copies at once stand in one chain', async () => {
    const url = await addressed();
    const first = accepted(await openPostgres(url));
    const second = accepted(await openPostgres(url));
    opened.push(first, second);
    await Promise.all(
      [first, second].flatMap((store, copy) =>
        [1, 2, 3, 4].map(async (each) =>
          accepted(await store.keep(answerOf(`R-${copy}${each}`), askingAt(each))),
        ),
      ),
    );
    expect(accepted(await first.verify())).toMatchObject({ answers: 8, askings: 8, faults: [] });
  });

  test('are kept and read where the environment names the database', async () => {
    const settings = accepted(withRecordsUrl(exampleSettings(), { LEADSMAN_RECORDS_URL: await addressed() }));
    const keeping = recordsToKeep(settings);
    accepted(await keeping.keep(answerOf('R-A'), askingAt(1)));
    const reading = recordsToRead(settings);
    expect(accepted(await reading.find('R-A'))?.askings).toHaveLength(1);
    expect(keeping.trouble()).toBe(null);
    await keeping.close();
    await reading.close();
  });

  test('whose making was interrupted are made to the end by the next start', async () => {
    const url = await addressed();
    const schema = /search_path%3D(\w+)/.exec(url)?.[1] ?? '';
    await server?.query(`create table ${schema}.deliveries (key text)`);
    expect(refusalCode(await openPostgres(url))).toBe('storeUnavailable');
    const made = await server?.query(`select max(version) as version from ${schema}.schema_versions`);
    expect(made).toEqual([{ version: 1 }]);
    await server?.query(`drop table ${schema}.deliveries`);
    const store = accepted(await openPostgres(url));
    opened.push(store);
    accepted(await store.inbox.release('ann'));
  });

  test('cannot be copied to a file, which is said', async () => {
    const refused = await (await open()).backUp('copy.db');
    expect(refused.ok ? '' : refused.problem.message).toContain('pg_dump');
  });

  test.each([
    ['the password is another', (url: string) => url.replace('only-for-this-test', 'se%40same')],
    ['nobody listens', (url: string) => url.replace(/:\d+\//, ':1/')],
    ['the address is none', () => 'postgresql://ann:se%40same@:port/x'],
  ])('are refused where %s, and no password is shown', async (_, wrong) => {
    const refused = await openPostgres(wrong(await addressed()));
    expect(refusalCode(refused)).toBe('storeUnavailable');
    expect(JSON.stringify(refused)).not.toMatch(/se@same|se%40same|only-for-this-test/);
  });

  test('go on where the server has broken the connections', async () => {
    const store = await open();
    accepted(await store.keep(answerOf('R-A'), askingAt(1)));
    const others = 'pid <> pg_backend_pid() and datname is not null';
    await server?.query(`select pg_terminate_backend(pid) from pg_stat_activity where ${others}`);
    // each use that meets a broken connection fails and gives it up
    let found = await store.find('R-A');
    for (let tried = 0; tried < 8 && !found.ok; tried += 1) found = await store.find('R-A');
    expect(accepted(found)?.askings).toHaveLength(1);
  });
});
