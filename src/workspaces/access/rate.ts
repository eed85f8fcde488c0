import type { Clock } from '../../terms/clock.ts';

const minuteMs = 60_000;

/** Counts by the minute, so many for each person; 0 where one is let in, else in how many seconds the next one is. */
export const personalRate = (clock: Clock, perMinute: number | null) => {
  const recent = new Map<string, readonly number[]>();

  /** Those that have been quiet for a minute stand first: each count puts its person last. */
  const forgetQuiet = (sinceMs: number): void => {
    for (const [person, instants] of recent) {
      if ((instants.at(-1) ?? 0) > sinceMs) return;
      recent.delete(person);
    }
  };

  return (person: string): number => {
    if (perMinute === null) return 0;
    const nowMs = clock.nowMs();
    forgetQuiet(nowMs - minuteMs);
    const within = (recent.get(person) ?? []).filter((instant) => instant > nowMs - minuteMs);
    const [oldest] = within;
    if (within.length >= perMinute && oldest !== undefined)
      return Math.max(1, Math.ceil((oldest + minuteMs - nowMs) / 1_000));
    recent.delete(person);
    recent.set(person, [...within, nowMs]);
    return 0;
  };
};
