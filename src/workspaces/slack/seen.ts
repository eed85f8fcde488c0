import type { SeenEvents } from './ports.ts';

/** The platform stops sending an event again after some minutes; this many keys reach far beyond that on a busy desk. */
const mostKeys = 20_000;

/** What was dealt with, remembered for as long as the process lives. */
export const seenInMemory = (): SeenEvents => {
  const keys = new Set<string>();
  return {
    firstSeen: (key) => {
      if (keys.has(key)) return Promise.resolve(false);
      keys.add(key);
      if (keys.size > mostKeys) {
        const [oldest] = keys;
        if (oldest !== undefined) keys.delete(oldest);
      }
      return Promise.resolve(true);
    },
  };
};
