import type { Clock } from '../../../terms/clock.ts';

/** How long a fact is taken as it is, and how long it serves where it cannot be looked up anew. */
export type Ages = { readonly freshMs: number; readonly usableMs: number };

/** After a look-up that failed the next one waits this long: nobody waits twice for what does not come. */
const afterFailureMs = 10_000;

type Entry<T> = { readonly value: T; readonly sinceMs: number };

/** Facts by key, looked up when they are needed and known no more when they are old. */
export const remembered = <T>(clock: Clock, { freshMs, usableMs }: Ages) => {
  const entries = new Map<string, Entry<T>>();
  const failures = new Map<string, number>();
  const underWay = new Map<string, Promise<void>>();

  const ageMs = (entry: Entry<T>): number => clock.nowMs() - entry.sinceMs;

  const get = (key: string): T | null => {
    const entry = entries.get(key);
    return entry === undefined || ageMs(entry) > usableMs ? null : entry.value;
  };

  const set = (key: string, value: T): void => {
    entries.set(key, { value, sinceMs: clock.nowMs() });
    failures.delete(key);
  };

  const find = async (key: string, look: () => Promise<T | null>): Promise<void> => {
    const value = await look();
    if (value === null) failures.set(key, clock.nowMs());
    else set(key, value);
  };

  return {
    get,
    set,
    /** Looks it up, where it is not fresh and did not just fail; those who ask meanwhile wait for the same look-up. */
    learn: (key: string, look: () => Promise<T | null>): Promise<void> => {
      const entry = entries.get(key);
      if (entry !== undefined && ageMs(entry) <= freshMs) return Promise.resolve();
      const failedMs = failures.get(key);
      if (failedMs !== undefined && clock.nowMs() - failedMs < afterFailureMs) return Promise.resolve();
      const running = underWay.get(key) ?? find(key, look).finally(() => underWay.delete(key));
      underWay.set(key, running);
      return running;
    },
    /** What is known serves no more: it has changed. */
    forget: (key: string): void => {
      entries.delete(key);
      failures.delete(key);
    },
  };
};
