import { setImmediate as turn } from 'node:timers/promises';
import { createTask, getTasks } from 'node-cron';
import { expect, test } from 'vitest';
import {
  clockTicks,
  keepRunning,
  quarterMinutes,
  type Ticks,
} from '../../../src/start/subscriptions/loop.ts';

/** Ticks when the test says so. */
const ticksByHand = () => {
  const calls = new Set<() => void>();
  const ticks: Ticks = (call) => {
    calls.add(call);
    return { end: () => calls.delete(call) };
  };
  return {
    ticks,
    tick: () => {
      for (const call of calls) call();
      return turn();
    },
    left: () => calls.size,
  };
};

const runnerOf = (tick: () => Promise<void>) => ({ tick, idle: async () => {} });

test('what falls due is looked for at once and at each tick, until it is stopped', async () => {
  const { ticks, tick, left } = ticksByHand();
  let looks = 0;
  const count = async () => {
    looks += 1;
  };
  const running = keepRunning(runnerOf(count), ticks, () => {});
  expect(looks).toBe(1);
  await turn();
  await tick();
  await tick();
  expect(looks).toBe(3);
  await running.stop();
  await tick();
  expect(looks).toBe(3);
  expect(left()).toBe(0);
});

test('a look that breaks is told, and the next is taken', async () => {
  const { ticks, tick } = ticksByHand();
  const told: string[] = [];
  let looks = 0;
  const breakOnce = async () => {
    looks += 1;
    if (looks === 1) throw new Error('no calendar');
  };
  const running = keepRunning(runnerOf(breakOnce), ticks, (message) => told.push(message));
  await turn();
  await tick();
  expect(looks).toBe(2);
  expect(told).toHaveLength(1);
  expect(told[0]).toContain('no calendar');
  await running.stop();
});

test('a tick during a look begins no second one, and stopping waits for the look', async () => {
  const { ticks, tick } = ticksByHand();
  let looks = 0;
  let finish = (): void => {};
  const untilFinished = () => {
    looks += 1;
    return new Promise<void>((resolve) => {
      finish = resolve;
    });
  };
  const running = keepRunning(runnerOf(untilFinished), ticks, () => {});
  await tick();
  expect(looks).toBe(1);
  let stopped = false;
  const stopping = running.stop().then(() => {
    stopped = true;
  });
  await turn();
  expect(stopped).toBe(false);
  finish();
  await stopping;
  expect(stopped).toBe(true);
});

test('the ticks stand on the quarters of the minute', async () => {
  const task = createTask(quarterMinutes, () => {}, { timezone: 'UTC' });
  await task.start();
  const next = task.getNextRuns(5).map((run) => run.getTime());
  await task.destroy();
  expect(next.map((ms) => ms % 15_000)).toEqual([0, 0, 0, 0, 0]);
  expect(next.slice(1).map((ms, index) => ms - (next[index] ?? 0))).toEqual([15_000, 15_000, 15_000, 15_000]);
  const ticking = clockTicks(() => {});
  expect(getTasks().size).toBe(1);
  ticking.end();
  expect(getTasks().size).toBe(0);
});
