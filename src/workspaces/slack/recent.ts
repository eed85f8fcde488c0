import type { Clock } from '../../terms/clock.ts';

/** Within so long a button that was pressed is not answered again, whoever presses it. */
const shortTimeMs = 60_000;

/** Presses that were just answered, or are about to be. */
export type RecentPresses = {
  /** Whether this is the first press of a button in a short time. */
  readonly isFirst: (key: string) => boolean;
  /** Nothing came of it that others could see: the next press counts anew. */
  readonly forget: (key: string) => void;
};

export const recentPresses = (clock: Clock): RecentPresses => {
  const pressedAtMs = new Map<string, number>();
  return {
    isFirst: (key) => {
      const nowMs = clock.nowMs();
      for (const [known, atMs] of pressedAtMs)
        if (nowMs - atMs >= shortTimeMs) pressedAtMs.delete(known);
        else break;
      if (pressedAtMs.has(key)) return false;
      pressedAtMs.set(key, nowMs);
      return true;
    },
    forget: (key) => void pressedAtMs.delete(key),
  };
};
