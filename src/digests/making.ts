import { canonicalText } from '../questions/canonicalText.ts';
import type { DigestChange, DigestQuestion, WatchQuestion } from '../questions/question.ts';
import type { InstantMs } from '../terms/clock.ts';
import { type Level, levelFraction } from '../terms/level.ts';
import { type Result, succeed } from '../terms/result.ts';
import type { DigestPost, WatchReading } from '../terms/scheduledPosts.ts';
import type { NewSubscription, Subscription } from '../terms/subscriptions.ts';
import { type DigestBody, digestBody, questionsOf, readDigestBody, watchBody } from './body.ts';
import { freshDigestMemory, readDigestMemory } from './memory.ts';
import type { Calendar, PricesNow } from './ports.ts';
import { makeDigest } from './post/makeDigest.ts';
import { planned } from './run/changing.ts';
import type { RunParts } from './run/parts.ts';
import { beginWatch } from './watch/beginWatch.ts';

/** Who makes something, and where it will speak. */
export type Maker = Pick<Subscription, 'team' | 'owner' | 'place' | 'channel'>;

export type MakingParts = Pick<RunParts, 'clock' | 'calendars' | 'prices' | 'chanceOfNonGreen' | 'inTurn'> & {
  /** What a digest takes that its question does not say. */
  readonly defaults: { readonly confidence: Level; readonly estimationReturns: number };
};

/** What a watch is called in its replies, and what it sees at once. */
export type WatchMade = {
  readonly made: NewSubscription;
  readonly watching: {
    readonly ticker: string;
    readonly tailLevel: number;
    readonly confidenceLevel: number;
    readonly model: string;
  };
  readonly reading: WatchReading;
};

/** Makes digests and watches of questions, and changes them. Nothing is kept here. */
export type Making = {
  readonly newDigest: (question: DigestQuestion & { readonly do: 'add' }, by: Maker) => NewSubscription;
  readonly newWatch: (
    question: WatchQuestion & { readonly do: 'add' },
    by: Maker,
  ) => Promise<Result<WatchMade>>;
  readonly changed: (subscription: Subscription, change: DigestChange) => Result<Subscription>;
  readonly paused: (subscription: Subscription) => Subscription;
  /** From now on: what was due in between is not made up for. */
  readonly resumed: (subscription: Subscription) => Result<Subscription>;
  readonly stopped: (subscription: Subscription) => Subscription;
  /** What it would post now. It is no post, and the next one is not held against it. */
  readonly digestNow: (subscription: Subscription) => Promise<Result<DigestPost>>;
  /** Whether some year of its sessions is in no list of holidays. */
  readonly weekdaysAssumed: (subscription: Pick<Subscription, 'id' | 'body' | 'schedule'>) => boolean;
};

const blank = (by: Maker, nowMs: InstantMs) => ({
  ...by,
  state: 'active' as const,
  pausedWhy: null,
  createdAtMs: nowMs,
  settledUpToMs: nowMs,
  awaitingUntilMs: null,
});

/** An id that no store gives, for what is not kept yet. */
const unkept = (made: NewSubscription): Subscription => ({ ...made, id: '', revision: 0 });

const withoutId = ({ id: _, revision: __, ...made }: Subscription): NewSubscription => made;

const changedBody = (body: DigestBody, change: DigestChange): DigestBody => ({
  ...body,
  tickers: change.tickers.length === 0 ? body.tickers : change.tickers,
  window: change.window ?? body.window,
  tailLevel: change.tailLevel ?? body.tailLevel,
  model: change.model ?? body.model,
});

/** Figures of another model, level or window are not held against those before. */
const sameFigures = (change: DigestChange): boolean =>
  change.window === null && change.tailLevel === null && change.model === null;

export const createMaking = (parts: MakingParts): Making => {
  const { clock, calendars, defaults } = parts;
  const calendarOf = (tickers: readonly string[]): Calendar => calendars().of(tickers);

  const makeWatch = async (
    prices: PricesNow,
    question: WatchQuestion & { readonly do: 'add' },
    by: Maker,
  ): Promise<Result<WatchMade>> => {
    const { watched, crossing, tail } = question;
    const body = watchBody({ watched, crossing, tail });
    const made: NewSubscription = {
      ...blank(by, clock.nowMs()),
      kind: 'watch',
      questions: [canonicalText(question)],
      body: JSON.stringify(body),
      schedule: null,
      nextDueMs: null,
      memory: '{}',
    };
    const begun = await beginWatch(prices, body, unkept(made));
    if (!begun.ok) return begun;
    const { memory, reading } = begun.value;
    return succeed({
      made: { ...made, memory: JSON.stringify(memory) },
      reading,
      watching: {
        ticker: tail.ticker,
        tailLevel: levelFraction(tail.tailLevel),
        confidenceLevel: levelFraction(tail.confidence),
        model: tail.model ?? 'all models',
      },
    });
  };

  const replanned = (subscription: Subscription): Result<Subscription> => {
    const now = { ...subscription, settledUpToMs: clock.nowMs() };
    if (subscription.kind === 'watch') return succeed(now);
    const body = readDigestBody(subscription);
    return body.ok ? succeed(planned(now, calendarOf(body.value.tickers))) : body;
  };

  return {
    newDigest: ({ tickers, schedule, window, tailLevel, model }, by) => {
      const body = digestBody({ tickers, window, tailLevel, model, ...defaults });
      const made: NewSubscription = {
        ...blank(by, clock.nowMs()),
        kind: 'digest',
        questions: questionsOf(body),
        body: JSON.stringify(body),
        schedule,
        nextDueMs: null,
        memory: JSON.stringify(freshDigestMemory),
      };
      return withoutId(planned(unkept(made), calendarOf(tickers)));
    },
    newWatch: async (question, by) => {
      const prices = parts.prices();
      return prices.ok ? makeWatch(prices.value, question, by) : prices;
    },
    changed: (subscription, change) => {
      const before = readDigestBody(subscription);
      if (!before.ok) return before;
      const body = changedBody(before.value, change);
      const { schedule } = subscription;
      const memory = readDigestMemory(subscription.memory);
      return replanned({
        ...subscription,
        questions: questionsOf(body),
        body: JSON.stringify(body),
        schedule:
          schedule === null
            ? null
            : {
                days: change.days ?? schedule.days,
                minutes: change.minutes ?? schedule.minutes,
                timeZone: change.timeZone ?? schedule.timeZone,
              },
        memory: JSON.stringify(sameFigures(change) ? memory : { ...memory, vars: {} }),
      });
    },
    paused: (subscription) => ({
      ...subscription,
      state: 'paused',
      pausedWhy: 'person',
      nextDueMs: null,
      awaitingUntilMs: null,
    }),
    resumed: (subscription) => replanned({ ...subscription, state: 'active', pausedWhy: null }),
    stopped: (subscription) => ({
      ...subscription,
      state: 'stopped',
      pausedWhy: null,
      nextDueMs: null,
      awaitingUntilMs: null,
    }),
    digestNow: async (subscription) => {
      const prices = parts.prices();
      const body = readDigestBody(subscription);
      if (!prices.ok) return prices;
      if (!body.ok) return body;
      const { vars } = readDigestMemory(subscription.memory);
      const post = await parts.inTurn(() =>
        makeDigest(subscription, body.value, {
          prices: prices.value,
          calendar: calendarOf(body.value.tickers),
          chanceOfNonGreen: parts.chanceOfNonGreen,
          vars,
          skipped: null,
          dueMs: null,
          nowMs: clock.nowMs(),
        }),
      );
      return succeed(post);
    },
    weekdaysAssumed: (subscription) => {
      const { schedule } = subscription;
      if (schedule === null || !['sessions', 'monthStart', 'monthEnd'].includes(schedule.days.kind))
        return false;
      const body = readDigestBody(subscription);
      const year = new Date(clock.nowMs()).getUTCFullYear();
      return body.ok && !calendarOf(body.value.tickers).knows(year);
    },
  };
};
