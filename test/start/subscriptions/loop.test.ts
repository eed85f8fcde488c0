import { expect, test } from 'vitest';
import { keepRunning, lookEveryMs } from '../../../src/start/subscriptions/loop.ts';
import { manualTime } from '../../doubles/time.ts';

test('what falls due is looked for at once and every 15 seconds, until it is stopped', async () => {
  const time = manualTime();
  let ticks = 0;
  const runner = {
    tick: async () => {
      ticks += 1;
    },
    idle: async () => {},
  };
  const running = keepRunning(runner, time, () => {});
  for (let look = 1; look <= 3; look += 1) {
    await time.timerSet(lookEveryMs);
    expect(ticks).toBe(look);
    time.advance(lookEveryMs);
  }
  await time.timerSet(lookEveryMs);
  await running.stop();
  expect(time.waiting()).toEqual([]);
  expect(ticks).toBe(4);
  expect(lookEveryMs).toBe(15_000);
});

test('a look that breaks is told, and the next is taken', async () => {
  const time = manualTime();
  const told: string[] = [];
  let ticks = 0;
  const runner = {
    tick: async () => {
      ticks += 1;
      if (ticks === 1) throw new Error('no calendar');
    },
    idle: async () => {},
  };
  const running = keepRunning(runner, time, (message) => told.push(message));
  await time.timerSet(lookEveryMs);
  time.advance(lookEveryMs);
  await time.timerSet(lookEveryMs);
  expect(ticks).toBe(2);
  expect(told).toHaveLength(1);
  expect(told[0]).toContain('no calendar');
  await running.stop();
});

test('stopped while it looks, it ends with that look', async () => {
  const time = manualTime();
  let finish = (): void => {};
  const runner = {
    tick: () =>
      new Promise<void>((resolve) => {
        finish = resolve;
      }),
    idle: async () => {},
  };
  const running = keepRunning(runner, time, () => {});
  const stopped = running.stop();
  finish();
  await stopped;
  expect(time.waiting()).toEqual([]);
});
