import type { Settings } from '../config/schema.ts';
import { freshnessOfFeed } from '../feed/freshness.ts';
import { filePorts } from '../feed/live/filePorts.ts';
import { type FeedEvent, type LiveFeed, startLiveFeed } from '../feed/live/liveFeed.ts';
import { type OpenSnapshot, openFeed } from '../feed/openFeed.ts';
import type { Clock } from '../terms/clock.ts';
import type { FeedStatus } from '../terms/feedReport.ts';
import type { Result } from '../terms/result.ts';

/** The prices as a conversation asks for them. */
export type FeedSource = {
  readonly snapshot: () => Result<OpenSnapshot>;
  readonly feedStatus: () => FeedStatus;
};

/** Reads the price files once: for a command that answers and ends. */
export const feedOnce = async (settings: Settings, clock: Clock): Promise<FeedSource> => {
  const opened = await openFeed(settings.feed, clock.nowMs());
  const status: FeedStatus = {
    report: opened.ok ? opened.value.report : null,
    freshness: opened.ok
      ? freshnessOfFeed(opened.value.report, opened.value.holidays, settings.deskTimeZone, clock.nowMs())
      : null,
    swappedAt: null,
    restatements: [],
    problem: opened.ok ? null : opened.problem,
    problemAt: null,
  };
  return { snapshot: () => opened, feedStatus: () => status };
};

/** Follows the price files for as long as the bot runs. */
export const feedLive = (
  settings: Settings,
  clock: Clock,
  tell: (event: FeedEvent) => void,
): Promise<LiveFeed> => {
  const { path, checkEverySeconds } = settings.feed;
  return startLiveFeed(
    { path, deskTimeZone: settings.deskTimeZone, checkEverySeconds },
    filePorts(settings.feed, clock, tell),
  );
};

/** What the operator reads of a feed event. */
export const eventInWords = (event: FeedEvent): string => {
  switch (event.kind) {
    case 'swapped': {
      const restated = event.restatements.length;
      const past = restated === 0 ? '' : `; the past of ${restated} tickers was changed`;
      return `new prices taken in, ${event.snapshot.fingerprint.slice(0, 12)}${past}`;
    }
    case 'refused':
      return `${event.problem.message}${event.hasPrices ? ' The last good prices go on being served.' : ''}`;
    case 'recovered':
      return 'the price file is whole again';
  }
};
