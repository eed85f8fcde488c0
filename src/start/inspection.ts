import { feedReply } from '../present/compose/feed.ts';
import { problemToJson } from '../present/json.ts';
import { toText } from '../present/text.ts';
import type { Clock } from '../terms/clock.ts';
import { isoFromDay } from '../terms/day.ts';
import type { FeedStatus } from '../terms/feedReport.ts';
import type { Problem } from '../terms/problem.ts';
import type { Arguments } from './arguments.ts';
import { exitCodes } from './exit.ts';
import { feedOnce } from './feed.ts';
import { settingsFor } from './settings.ts';

/** What a command came to: what to say, where, and how to end. */
export type Inspection = { readonly code: number; readonly out: string; readonly err: string };

const spaces = 2;
const dayKeys = ['day', 'firstDay', 'lastDay', 'expectedDay', 'from'];

/** The report as data, with days written as ISO 8601 dates. */
const reportToJson = ({ report, freshness }: FeedStatus): string =>
  JSON.stringify(
    { ok: true, report, freshness },
    (key, value: unknown) => (dayKeys.includes(key) && typeof value === 'number' ? isoFromDay(value) : value),
    spaces,
  );

const refused = (problems: readonly Problem[], json: boolean): Inspection => ({
  code: exitCodes.refused,
  out: '',
  err: problems.map((found) => `${json ? problemToJson(found) : found.message}\n`).join(''),
});

/** Reads price files as the bot would and says what it finds: `FILE` or the files of the settings. */
export const inspect = async (asked: Arguments, clock: Clock, width: number): Promise<Inspection> => {
  const [file, ...others] = asked.words;
  if (others.length > 0) {
    const message = `Only one path can be inspected at a time, and ${asked.words.length} were given. Name one file, folder or pattern.`;
    return refused(
      [{ code: 'unreadableWords', message, position: null, suggestion: null, needs: null }],
      asked.json,
    );
  }
  const reading = settingsFor(file === undefined ? asked : { ...asked, feed: file });
  if (!reading.ok) return refused(reading.problems, asked.json);
  const { feedStatus } = await feedOnce(reading.settings, clock);
  const status = feedStatus();
  if (status.problem !== null) return refused([status.problem], asked.json);
  const out = asked.json
    ? reportToJson(status)
    : toText({ ...feedReply(status, reading.settings.deskTimeZone), buttons: [] }, { width });
  return { code: exitCodes.answered, out: `${out}\n`, err: '' };
};
