/** A year of digests against a table that was written by hand. */
import { readFileSync } from 'node:fs';
import { beforeAll, expect, test } from 'vitest';
import { calendarOf } from '../../src/digests/calendar.ts';
import { at, day } from './days.ts';
import { type Stage, stageAt } from './stage.ts';

const written = readFileSync(new URL('../fixtures/digest-year/posts.txt', import.meta.url), 'utf8')
  .split('\n')
  .filter((line) => line !== '' && !line.startsWith('#'));

const daysIn = (ranges: readonly string[]): readonly number[] =>
  ranges.flatMap((range) => {
    const [first = 0, last = first] = range.split('-').map(Number);
    return Array.from({ length: last - first + 1 }, (_, each) => first + each);
  });

const twoDigits = (value: number): string => String(value).padStart(2, '0');

/** The instants of each digest as they are written, in order. */
const expected = new Map<string, string[]>();
let holidays: readonly string[] = [];
let digest = '';
for (const line of written) {
  const [head = '', clock = '', ...ranges] = line.split(' ');
  if (head === 'holidays') holidays = [clock, ...ranges];
  else if (head === 'digest') {
    digest = line;
    expected.set(line, []);
  } else expected.get(digest)?.push(...daysIn(ranges).map((each) => `${head}-${twoDigits(each)}T${clock}Z`));
}

const quarterMs = 15 * 60_000;

let stage: Stage;
const ids = new Map<string, string>();
beforeAll(async () => {
  stage = stageAt('2028-01-01T00:00Z', { calendar: calendarOf(new Set(holidays.map(day))) });
  for (const words of expected.keys()) ids.set(words, (await stage.make(`${words} KELP`)).id);
  for (let nowMs = at('2028-01-01T00:00Z'); nowMs < at('2029-01-01T00:00Z'); nowMs += quarterMs) {
    stage.time.set(nowMs);
    await stage.runner.tick();
    await stage.runner.idle();
  }
}, 60_000);

test('the table is whole: 252 sessions, 366 days, 105 mornings of weekends, 12 starts and 12 ends of months', () => {
  // 260 weekdays of 2028 less 8 holidays; 53 Saturdays and 53 Sundays in Sydney, the first of them in 2027 in UTC
  expect([...expected.values()].map((posts) => posts.length)).toEqual([252, 366, 105, 12, 12]);
});

test.each([...expected])('%s', (words, posts) => {
  const found = stage.posted.filter(({ post }) => post.kind === 'digest' && post.id === ids.get(words));
  expect(found.map(({ atMs }) => new Date(atMs).toISOString().replace(':00.000Z', 'Z'))).toEqual(posts);
  expect(found.filter(({ post }) => post.kind === 'digest' && post.skipped !== null)).toEqual([]);
});

test('nothing else was said', () => {
  const digests = [...expected.values()].reduce((sum, posts) => sum + posts.length, 0);
  expect(stage.posted).toHaveLength(2 * digests);
  expect(stage.told).toEqual([]);
});
