import { answerQuestion } from '../../src/answers/answerQuestion.ts';
import { createMaking } from '../../src/digests/making.ts';
import type { Calendar, Deliver, PlaceVerdict, PostToSay, PricesNow } from '../../src/digests/ports.ts';
import { createRunner, type DigestRunner } from '../../src/digests/run/createRunner.ts';
import { createInTurn } from '../../src/digests/run/inTurn.ts';
import type { RunParts } from '../../src/digests/run/parts.ts';
import { canonicalText } from '../../src/questions/canonicalText.ts';
import type { StatisticalQuestion } from '../../src/questions/question.ts';
import { nonGreenChance } from '../../src/stats/backtests/nonGreenChance.ts';
import type { Day } from '../../src/terms/day.ts';
import type { PriceSeries } from '../../src/terms/prices.ts';
import { problem } from '../../src/terms/problem.ts';
import { type Result, refuse, succeed } from '../../src/terms/result.ts';
import type { Subscription } from '../../src/terms/subscriptions.ts';
import { localTimeAt } from '../../src/terms/zonedTime.ts';
import { returnsAfter } from '../../src/workspaces/subscriptions/asking.ts';
import { subscriptionsInMemory } from '../doubles/subscriptions.ts';
import { type ManualTime, manualTime } from '../doubles/time.ts';
import { accepted } from '../laws/outcomes.ts';
import { questionIn } from '../questions/asking.ts';
import { everyWeekday } from './days.ts';

const policy = { periodsPerYear: 252, smallestMeanThatMatters: 0.0005 };

const answered = (series: PriceSeries, question: StatisticalQuestion) => {
  const canonical = canonicalText(question);
  const position = { start: 0, end: canonical.length };
  return answerQuestion({
    read: { question, canonical, assumed: [], wishes: [], position },
    series: [series],
    policy,
  });
};

/** Prices that a test changes as it goes; those of a session should be in once its day is over in UTC. */
export const pricesOf = (
  all: readonly PriceSeries[],
  calendar: Calendar = everyWeekday,
  heldBack: Readonly<Record<string, string>> = {},
): PricesNow => {
  const series = (ticker: string) => all.find((each) => each.ticker === ticker) ?? null;
  return {
    fingerprint: all.map(({ ticker, closes }) => `${ticker}${closes.length}${closes.join()}`).join(),
    series,
    heldBack: (ticker) => heldBack[ticker] ?? null,
    returnsAfter: (ticker, after, returnType) => {
      const found = series(ticker);
      return found === null ? [] : returnsAfter(found, after, returnType);
    },
    expectedDay: (_, atMs) => {
      let day: Day = localTimeAt(atMs, 'UTC').day - 1;
      while (!calendar.isSession(day)) day -= 1;
      return day;
    },
    ask: async (question) => {
      const ticker = question.verb === 'compare' ? '' : question.ticker;
      const found = series(ticker);
      return found === null
        ? refuse(problem('unknownTicker', `${ticker} is not in the feed.`))
        : answered(found, question);
    },
  };
};

/** A ticker whose prices go on for ever and of which nothing is said: for what is about time alone. */
export const timeless: PricesNow = {
  fingerprint: 'timeless',
  series: () => null,
  heldBack: () => null,
  returnsAfter: () => [],
  expectedDay: () => 0,
  ask: async () => refuse(problem('tooFewReturns', 'KELP has too few returns.')),
};

export type Posted = PostToSay & { readonly atMs: number };

export type Stage = {
  readonly time: ManualTime & { readonly set: (nowMs: number) => void };
  readonly parts: RunParts;
  readonly runner: DigestRunner;
  readonly posted: readonly Posted[];
  readonly told: readonly string[];
  /** What the world looks like from now on. */
  readonly world: {
    prices: Result<PricesNow>;
    place: PlaceVerdict;
    calendar: Calendar;
    outcome: Awaited<ReturnType<Deliver>> | null;
  };
  /** Makes a digest or a watch as a person would, in channel C1. */
  readonly make: (words: string) => Promise<Subscription>;
  readonly find: (id: string) => Promise<Subscription>;
  /** Moves the clock to an instant and does what is due then. */
  readonly at: (instant: string) => Promise<void>;
  /** Another copy of the bot on the same store. */
  readonly copy: (holder: string) => DigestRunner;
};

const unheld = { confidence: { digits: 95, places: 2 }, estimationReturns: 250 };

/** Everything but the clock, the prices and the platform is real. */
export const stageAt = (instant: string, more: Partial<Stage['world']> = {}): Stage => {
  let shiftMs = 0;
  const manual = manualTime(Date.parse(instant));
  const time = {
    ...manual,
    nowMs: () => manual.nowMs() + shiftMs,
    set: (nowMs: number) => {
      shiftMs = nowMs - manual.nowMs();
    },
  };
  const world: Stage['world'] = {
    prices: succeed(timeless),
    place: { kind: 'fine' },
    calendar: everyWeekday,
    outcome: null,
    ...more,
  };
  const posted: Posted[] = [];
  const told: string[] = [];
  const said = new Set<string>();
  const deliver: Deliver = async (saying) => {
    if (world.outcome !== null) return world.outcome;
    if (!said.has(saying.key)) posted.push({ ...saying, atMs: time.nowMs() });
    said.add(saying.key);
    return { kind: 'said', ts: `ts of ${saying.key}` };
  };
  const calendars = {
    of: () => ({ isSession: (day: Day) => world.calendar.isSession(day), knows: world.calendar.knows }),
  };
  const parts: RunParts = {
    team: 'T1',
    holder: 'first',
    store: subscriptionsInMemory(),
    clock: time,
    prices: () => world.prices,
    calendars: () => calendars,
    deliver,
    placeState: async () => world.place,
    chanceOfNonGreen: nonGreenChance,
    mostLateMs: 3 * 3_600_000,
    waitForPricesMs: 30 * 60_000,
    inTurn: createInTurn(2),
    tell: (message) => told.push(message),
  };
  const making = createMaking({ ...parts, defaults: unheld });
  const maker = { team: 'T1', owner: 'U1', place: 'channel', channel: 'C1' } as const;
  const runner = createRunner(parts);
  const make = async (words: string): Promise<Subscription> => {
    const { question } = questionIn(words);
    if (question.verb === 'digest' && question.do === 'add')
      return accepted(await parts.store.add(making.newDigest(question, maker)));
    if (question.verb === 'watch' && question.do === 'add')
      return accepted(await parts.store.add(accepted(await making.newWatch(question, maker)).made));
    throw new Error(`${words} makes nothing`);
  };
  return {
    time,
    parts,
    runner,
    posted,
    told,
    world,
    make,
    find: async (id) => {
      const found = accepted(await parts.store.find('T1', id));
      if (found === null) throw new Error(`there is no ${id}`);
      return found;
    },
    at: async (next) => {
      time.set(Date.parse(next));
      await runner.tick();
      await runner.idle();
    },
    copy: (holder) => createRunner({ ...parts, holder }),
  };
};
