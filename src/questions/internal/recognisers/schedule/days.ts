import type { ScheduleDays } from '../../../../terms/subscriptions.ts';
import { weekdayNumbers } from '../calendarWords.ts';
import { found, type Recogniser } from '../recogniser.ts';

/** Plain words: a session is a day on which the tickers trade, as the trade calls it. */
const oneWord: ReadonlyMap<string, ScheduleDays> = new Map([
  ['sessions', { kind: 'sessions' }],
  ['weekdays', { kind: 'weekdays' }],
  ['daily', { kind: 'daily' }],
]);

const afterMonth: ReadonlyMap<string, ScheduleDays> = new Map([
  ['start', { kind: 'monthStart' }],
  ['end', { kind: 'monthEnd' }],
]);

export const scheduleDayWords: readonly string[] = [...oneWord.keys(), 'month', ...afterMonth.keys()];

/** `mon,thu`, `monday and thursday`: the days of the week that stand one after the other. */
const daysOfWeek: Recogniser = ({ words }, at) => {
  const weekdays = new Set<number>();
  let end = at;
  for (let next = at; next < words.length; next += 1) {
    const word = words[next];
    const weekday = word?.quoted === false ? weekdayNumbers.get(word.lower) : undefined;
    const joins = next > at && (word?.lower === 'and' || word?.lower === '&');
    if (weekday !== undefined) {
      weekdays.add(weekday);
      end = next + 1;
    } else if (!joins) break;
  }
  if (weekdays.size === 0) return null;
  const days: ScheduleDays = { kind: 'on', weekdays: [...weekdays].sort((first, second) => first - second) };
  return found({ kind: 'scheduleDays', days }, end - at);
};

/** On which days something is posted. */
export const scheduleDays: Recogniser = (line, at) => {
  const [word, next] = [line.words[at], line.words[at + 1]];
  const single = oneWord.get(word?.lower ?? '');
  if (single !== undefined) return found({ kind: 'scheduleDays', days: single }, 1);
  const ofMonth = word?.lower === 'month' ? afterMonth.get(next?.lower ?? '') : undefined;
  return ofMonth === undefined ? daysOfWeek(line, at) : found({ kind: 'scheduleDays', days: ofMonth }, 2);
};
