import type { Clock } from '../../src/terms/clock.ts';

type Timer = { readonly delayMs: number; readonly dueMs: number; readonly run: () => void };
type Watcher = { readonly holds: () => boolean; readonly resolve: () => void };

/** A clock that stands still until it is told to move, and the timers that hang on it. */
export type ManualTime = Clock & {
  /** Runs `run` once the clock has moved by `delayMs`; the result calls it off. */
  readonly after: (delayMs: number, run: () => void) => () => void;
  /** Moves the clock, running what falls due on the way in order of time. */
  readonly advance: (byMs: number) => void;
  /** Resolves once `count` timers of exactly this delay are waiting. */
  readonly timerSet: (delayMs: number, count?: number) => Promise<void>;
  /** Resolves once no timer of exactly this delay is waiting. */
  readonly timerGone: (delayMs: number) => Promise<void>;
  /** Delays of the timers that are waiting, in the order they were set. */
  readonly waiting: () => readonly number[];
};

/** 2026-11-27T15:00:00Z, a Friday, unless told otherwise. */
export const manualTime = (startMs = Date.UTC(2026, 10, 27, 15)): ManualTime => {
  let nowMs = startMs;
  const timers = new Set<Timer>();
  const watchers = new Set<Watcher>();
  const countOf = (delayMs: number) => [...timers].filter((timer) => timer.delayMs === delayMs).length;

  const tellWatchers = () => {
    for (const watcher of watchers) {
      if (!watcher.holds()) continue;
      watchers.delete(watcher);
      watcher.resolve();
    }
  };

  const once = (holds: () => boolean): Promise<void> =>
    new Promise((resolve) => {
      watchers.add({ holds, resolve });
      tellWatchers();
    });

  const firstDue = (untilMs: number) =>
    [...timers].filter((timer) => timer.dueMs <= untilMs).sort((a, b) => a.dueMs - b.dueMs)[0];

  return {
    nowMs: () => nowMs,
    after: (delayMs, run) => {
      const timer = { delayMs, dueMs: nowMs + delayMs, run };
      timers.add(timer);
      tellWatchers();
      return () => {
        timers.delete(timer);
        tellWatchers();
      };
    },
    advance: (byMs) => {
      const untilMs = nowMs + byMs;
      for (let timer = firstDue(untilMs); timer !== undefined; timer = firstDue(untilMs)) {
        timers.delete(timer);
        nowMs = timer.dueMs;
        timer.run();
        tellWatchers();
      }
      nowMs = untilMs;
    },
    timerSet: (delayMs, count = 1) => once(() => countOf(delayMs) >= count),
    timerGone: (delayMs) => once(() => countOf(delayMs) === 0),
    waiting: () => [...timers].map((timer) => timer.delayMs),
  };
};
