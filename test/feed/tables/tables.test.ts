import { expect, test } from 'vitest';
import { openFeed } from '../../../src/feed/openFeed.ts';
import { readHolidays } from '../../../src/feed/tables/holidays.ts';
import { readPositions } from '../../../src/feed/tables/positions.ts';
import { dayFromIso } from '../../../src/terms/day.ts';
import { accepted, head, longCsv, problemOf, temporaryFolder } from '../settingsForTests.ts';

const folder = temporaryFolder();
const { format } = longCsv('');
const columns = { ticker: 'ticker', quantity: 'quantity' };

const positions = (text: string, name = 'positions.csv') =>
  readPositions({ path: folder.write(name, text), columns, format });

test('positions are read in the order of the file, short ones below zero, blank rows left out', async () => {
  const read = await positions('ticker,quantity,note\nTARN,-200,short\nKELP,500.5,\n,,\n');
  expect(accepted(read)).toEqual([
    { ticker: 'TARN', quantity: -200 },
    { ticker: 'KELP', quantity: 500.5 },
  ]);
  expect(accepted(await positions('ticker,quantity\n'))).toEqual([]);
});

test.each([
  ['ticker,shares\nKELP,1\n', 'columnMissing', 'no column “quantity”'],
  ['', 'fileEmpty', 'it is empty'],
  [
    'ticker,quantity\nKELP,many\n',
    'valueUnreadable',
    'column “quantity”, row 2: “many” is not a number of shares',
  ],
  ['ticker,quantity\nKELP,1\nTARN,\n', 'valueUnreadable', 'column “quantity”, row 3: “”'],
  ['ticker,quantity\n,7\n', 'valueUnreadable', 'column “ticker”, row 2: “” is not the name of a ticker'],
  ['ticker,quantity\nKELP,inf\n', 'valueUnreadable', 'row 2: “inf”'],
  ['ticker,quantity\nKELP,1\nKELP,2\n', 'valueUnreadable', 'has KELP twice'],
  ['ticker,quantity\nKELP,1,2\n', 'fileUnreadable', 'Row 2 has 3 cells'],
])('positions %j are refused by name', async (text, code, words) => {
  const problem = problemOf(await positions(text));
  expect(problem.code).toBe(code);
  expect(problem.message).toContain(words);
  expect(problem.message).toContain(folder.path('positions.csv'));
});

test('a positions file that is not there, or whose name says nothing, is refused', async () => {
  const absent = await readPositions({ path: folder.path('absent.csv'), columns, format });
  expect(problemOf(absent).message).toContain('cannot be opened');
  expect(problemOf(await positions('ticker,quantity\n', 'positions.txt')).message).toContain('end in .csv');
});

const holidaySettings = (text: string, calendar: string | null) => ({
  format,
  holidays: { path: folder.write('holidays.csv', text), columns: { date: 'date', calendar } },
});

test('holidays are read by calendar, without a calendar column for the tickers without one', async () => {
  const text = 'date,calendar\n2026-12-25,coast\n2026-12-26,coast\n2026-07-04,hills\n';
  const byCalendar = accepted(await readHolidays(holidaySettings(text, 'calendar')));
  expect([...byCalendar.keys()]).toEqual(['coast', 'hills']);
  expect(byCalendar.get('coast')).toEqual(new Set([dayFromIso('2026-12-25'), dayFromIso('2026-12-26')]));
  const all = accepted(await readHolidays(holidaySettings(text, null)));
  expect([...all.keys()]).toEqual([null]);
  expect(all.get(null)?.size).toBe(3);
  expect(accepted(await readHolidays(longCsv(''))).size).toBe(0);
});

test('a wrong holiday file refuses the feed by name', async () => {
  const path = folder.write('prices.csv', `${head}2026-01-05,KELP,1\n`);
  const more = holidaySettings('date\n25/12/2026\n', null);
  const problem = problemOf(await openFeed(longCsv(path, more)));
  expect(problem.code).toBe('valueUnreadable');
  expect(problem.message).toContain(`${folder.path('holidays.csv')}, column “date”, row 2: “25/12/2026”`);
});

test('a weekday that the whole feed misses is a gap unless it is a holiday', async () => {
  // 2026-01-07 is a Wednesday on which no ticker has a price
  const days = ['2026-01-05', '2026-01-06', '2026-01-08'];
  const rows = days
    .flatMap((day) => [`${day},KELP,1.0${day.at(-1)}\n`, `${day},TARN,5.0${day.at(-1)}\n`])
    .join('');
  const path = folder.write('prices.csv', head + rows);
  const gapsWith = async (holidays: string) => {
    const snapshot = accepted(await openFeed(longCsv(path, holidaySettings(`date\n${holidays}\n`, null))));
    return snapshot.report.tickers.map(({ missingSessions }) => missingSessions);
  };
  expect(accepted(await openFeed(longCsv(path))).report.tickers[0]?.missingSessions).toBe(0);
  expect(await gapsWith('2026-12-25')).toEqual([1, 1]);
  expect(await gapsWith('2026-01-07')).toEqual([0, 0]);
  // a list that speaks of another year alone says nothing of this one
  expect(await gapsWith('2025-12-25')).toEqual([0, 0]);
});
