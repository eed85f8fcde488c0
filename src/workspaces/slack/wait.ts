import type { Timers } from './ports.ts';

export const wait = (timers: Timers, delayMs: number): Promise<void> =>
  new Promise((resolve) => {
    timers.after(delayMs, resolve);
  });

/** Done when the work is, or when the time is up, whichever comes first. */
export const atMost = async (timers: Timers, limitMs: number, work: Promise<unknown>): Promise<void> => {
  let callOff = () => {};
  const timeUp = new Promise<void>((resolve) => {
    callOff = timers.after(limitMs, resolve);
  });
  await Promise.race([work, timeUp]);
  callOff();
};
