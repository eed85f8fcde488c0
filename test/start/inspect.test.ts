import { expect, test } from 'vitest';
import { readArguments } from '../../src/start/arguments.ts';
import { inspect } from '../../src/start/inspection.ts';
import { head, temporaryFolder } from '../feed/settingsForTests.ts';

const folder = temporaryFolder();
const config = new URL('../../config/example-settings.yaml', import.meta.url).pathname;
const clock = { nowMs: () => Date.UTC(2026, 10, 28, 12) };

const run = (...words: string[]) => {
  const asked = readArguments(['--config', config, ...words]);
  if ('wrong' in asked) throw new Error(asked.wrong);
  return inspect(asked, clock, 100);
};

test('the files of the settings are inspected where none is named', async () => {
  const { code, out, err } = await run();
  expect([code, err]).toEqual([0, '']);
  expect(out).toContain('2023-11-27 to 2026-11-27: up to date');
  expect(out).toContain('GANNET.B');
});

test('a named file is inspected, and what the checks find is said', async () => {
  const path = folder.write(
    'prices.csv',
    `${head}2026-11-26,KELP,1\n2026-11-27,KELP,1.1\n2026-11-27,TARN,0\n`,
  );
  const { code, out } = await run(path);
  expect(code).toBe(0);
  expect(out).toContain('TARN is held back');
});

test('the report is given as data with dates in ISO 8601', async () => {
  const path = folder.write('prices.csv', `${head}2026-11-26,KELP,1\n2026-11-27,KELP,2\n`);
  const { code, out } = await run('--json', path);
  expect(code).toBe(0);
  expect(JSON.parse(out)).toMatchObject({
    ok: true,
    report: {
      files: [{ path, kind: 'csv', rowCount: 2 }],
      firstDay: '2026-11-26',
      lastDay: '2026-11-27',
      findings: [
        { code: 'splitLike', weight: 'warned', count: 1, examples: [{ ticker: 'KELP', day: '2026-11-27' }] },
      ],
      tickers: [
        {
          ticker: 'KELP',
          state: 'suspicious',
          priceCount: 2,
          flags: [{ code: 'splitLike', day: '2026-11-27' }],
        },
      ],
    },
    freshness: { lastDay: '2026-11-27', expectedDay: '2026-11-27', sessionsBehind: 0 },
  });
});

test.each([
  [['absent.csv'], 'fileUnreadable', 'There is no price file'],
  [['one.csv', 'two.csv'], 'unreadableWords', 'Only one path'],
  [['--config', '/nowhere.yaml'], 'fileUnreadable', '/nowhere.yaml'],
])('%j would be refused, and is, with exit code 2', async (words, code, part) => {
  const inWords = await run(...words);
  expect([inWords.code, inWords.out]).toEqual([2, '']);
  expect(inWords.err).toContain(part);
  const asJson = await run('--json', ...words);
  expect(asJson.code).toBe(2);
  expect(JSON.parse(asJson.err)).toMatchObject({ ok: false, problem: { code } });
});
