import fc from 'fast-check';
import { afterAll, expect, test } from 'vitest';
import { openDatabase } from '../../src/feed/internal/read/database.ts';
import { openFiles } from '../../src/feed/openFeed.ts';
import { listPriceFiles } from '../../src/feed/priceFiles.ts';
import { isoFromDay } from '../../src/terms/day.ts';
import { accepted, head, longCsv, temporaryFolder } from './settingsForTests.ts';

const folder = temporaryFolder();
const { database, close } = await openDatabase();
afterAll(close);

const name = fc.constantFrom('KELP', 'TARN', 'A', 'kelp', 'GANNET.B', 'ÆGIR', 'Z/1', 'WITH SPACE', 'O“Q”');
const row = fc.tuple(name, fc.integer({ min: 20_000, max: 20_020 }), fc.integer({ min: 1, max: 99_999 }));

test('every row of a file in any order is served under its ticker and day, and nothing else is', async () => {
  const rows = fc.uniqueArray(row, {
    minLength: 1,
    maxLength: 60,
    selector: ([ticker, day]) => `${ticker}|${day}`,
  });
  await fc.assert(
    fc.asyncProperty(rows, async (written) => {
      const lines = written.map(([ticker, day, cents]) => `${isoFromDay(day)},"${ticker}",${cents / 100}\n`);
      const path = folder.write('prices.csv', head + lines.join(''));
      const snapshot = accepted(await openFiles(await listPriceFiles(path), longCsv(path), null, database));
      const names = [...new Set(written.map(([ticker]) => ticker))].sort((a, b) => (a < b ? -1 : 1));
      expect(snapshot.tickers).toEqual(names);
      for (const ticker of names) {
        const own = written.filter(([one]) => one === ticker).sort(([, a], [, b]) => a - b);
        const series = snapshot.series(ticker);
        expect([...(series?.days ?? [])]).toEqual(own.map(([, day]) => day));
        expect([...(series?.closes ?? [])]).toEqual(own.map(([, , cents]) => cents / 100));
        expect(series?.closes.buffer).toBe(snapshot.columns.closes.buffer);
      }
      expect(snapshot.report.priceCount).toBe(written.length);
    }),
    { seed: 3, numRuns: 60 },
  );
});
