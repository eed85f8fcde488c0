import type { Time } from '../workspaces/slack/ports.ts';

/** The clock and the timers of this machine. */
export const machineTime: Time = {
  nowMs: Date.now,
  after: (delayMs, run) => {
    const timer = setTimeout(run, delayMs);
    return () => clearTimeout(timer);
  },
};
