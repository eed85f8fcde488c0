/**
 * A clock that starts at an instant and runs so many times as fast as the machine’s, the same in every process that is
 * told the same, with timers that keep to it.
 */
export const fastTime = (epochMs, speed) => ({
  nowMs: () => epochMs + Math.floor((Date.now() - epochMs) * speed),
  after: (delayMs, run) => {
    const timer = setTimeout(run, delayMs / speed);
    return () => clearTimeout(timer);
  },
});
