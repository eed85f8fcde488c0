import { schedule } from 'node-cron';
import type { DigestRunner } from '../../digests/run/createRunner.ts';

/** Four times a minute on the clock, so that what is due at 08:30 is looked for at 08:30:00. */
export const quarterMinutes = '*/15 * * * * *';

/** Calls back again and again; the result ends it. */
export type Ticks = (call: () => void) => { readonly end: () => void };

export const clockTicks: Ticks = (call) => {
  const task = schedule(quarterMinutes, call, { timezone: 'UTC' });
  return { end: () => void task.destroy() };
};

const inWords = (error: unknown): string =>
  error instanceof Error ? (error.stack ?? error.message) : String(error);

/**
 * Looks for what falls due, at once and at each tick, until it is stopped; never twice at a time. What breaks one look is
 * told, and the next is taken all the same.
 */
export const keepRunning = (
  runner: DigestRunner,
  ticks: Ticks,
  tell: (message: string) => void,
): { readonly stop: () => Promise<void> } => {
  let underWay: Promise<void> | null = null;
  const look = (): void => {
    underWay ??= runner
      .tick()
      .catch((error: unknown) => tell(`Looking for what is due failed: ${inWords(error)}`))
      .finally(() => {
        underWay = null;
      });
  };
  look();
  const ticking = ticks(look);
  return {
    stop: async () => {
      ticking.end();
      await underWay;
    },
  };
};
