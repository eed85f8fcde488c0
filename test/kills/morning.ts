import { type ChildProcess, spawn } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { deliveryIdOf } from '../../src/workspaces/slack/durable/outbox.ts';
import type { Fault } from '../doubles/platform/faults.ts';
import type { Said } from '../doubles/platform/people.ts';
import { type Platform, startPlatform } from '../doubles/platform/start.ts';
import { bot } from '../doubles/platform/workspace.ts';
import type { ManualTime } from '../doubles/time.ts';
import limits from '../fixtures/platform/limits.json' with { type: 'json' };
import { fastTime } from './fastTime.mjs';

/** How many times as fast as the machine’s the clock of a morning runs, for the bots and the platform alike. */
const speed = 10;
const digestCount = 50;
const channelCount = 20;

/** Where the bots keep their records, and how to see that nothing is left to be done there. */
export type Place = {
  readonly path: string | null;
  readonly url: string | null;
  readonly unsettled: () => Promise<number>;
  /** Locks the store against everybody until the returned function is called. */
  readonly lock: () => Promise<() => Promise<void>>;
};

export type MorningPlan = {
  readonly seed: number;
  readonly copies: number;
  readonly kills: number;
  readonly questions: number;
  /** How many posts meet a fault of the platform. */
  readonly faults: number;
  readonly locks: number;
};

/** What a morning came to; each list is empty where everything was said once. */
export type MorningOutcome = {
  readonly acknowledged: number;
  readonly digestsNotOnce: readonly string[];
  readonly answersNotOnce: readonly string[];
  readonly placeholdersLeft: readonly string[];
};

/** A small generator with a seed (mulberry32): which moments are struck is the same in every run. */
const seeded = (seed: number) => {
  let state = seed >>> 0;
  return (): number => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4_294_967_296;
  };
};

const pause = (realMs: number): Promise<void> =>
  new Promise((resolve) => {
    setTimeout(resolve, realMs);
  });

const notManual = (): never => {
  throw new Error('this clock moves by itself');
};

/** The bots acknowledge no faster because the clock is faster: how long they may take is counted on the machine’s. */
const timeFrom = (epochMs: number): ManualTime => ({
  ...fastTime(epochMs, speed),
  after: (delayMs, run) => {
    const delay = delayMs === limits.events.acknowledgeWithinMs ? delayMs : delayMs / speed;
    const timer = setTimeout(run, delay);
    return () => clearTimeout(timer);
  },
  advance: notManual,
  timerSet: notManual,
  timerGone: notManual,
  waiting: notManual,
});

const childPath = fileURLToPath(new URL('bot.mjs', import.meta.url));

/** A bot in a process of its own, started anew each time it is killed. */
const keepCopy = (plan: object) => {
  let child: ChildProcess | null = null;
  let ended = false;
  const complaints: string[] = [];
  const start = (): void => {
    const running = spawn(process.execPath, [childPath], {
      env: { ...process.env, LEADSMAN_KILL_PLAN: JSON.stringify(plan) },
      stdio: ['ignore', 'ignore', 'pipe'],
    });
    running.stderr.on('data', (data: Buffer) => complaints.push(data.toString()));
    running.on('exit', (code) => {
      if (code !== null && code !== 0) complaints.push(`ended with ${code}`);
      if (!ended) start();
    });
    child = running;
  };
  start();
  return {
    kill: () => child?.kill('SIGKILL'),
    end: () => {
      ended = true;
      child?.kill('SIGKILL');
    },
    complaints,
  };
};

const channelOf = (index: number): string => `C0SEA${String(index % channelCount).padStart(2, '0')}`;

const faultsOf = (random: () => number, count: number): readonly Fault[] =>
  Array.from({ length: count }, (): Fault => {
    const accepted = random() < 0.5;
    const kind = random();
    if (kind < 0.3) return { kind: 'dropped', accepted };
    if (kind < 0.6) return { kind: 'status', status: 500, accepted };
    if (kind < 0.95) return { kind: 'limited', retryAfterSeconds: 1 + Math.floor(random() * 5) };
    return { kind: 'silent', accepted };
  });

/** Asks questions in the channels at random moments of the time in which digests fall due. */
const ask = async (
  platform: Platform,
  random: () => number,
  count: number,
  lastsMs: number,
): Promise<readonly Said[]> => {
  const asked: Said[] = [];
  for (let number = 0; number < count; number += 1) {
    await pause((lastsMs / count) * (0.5 + random()));
    // every third answer takes long enough for a placeholder
    const takesMs = number % 3 === 0 ? 1_600 + Math.floor(random() * 10_000) : 0;
    const channel = channelOf(Math.floor(random() * channelCount));
    asked.push(platform.mention({ channel, text: `question ${number} takes ${takesMs}` }));
  }
  return asked;
};

const notOnceOf = (names: readonly string[], countOf: (name: string) => number): readonly string[] =>
  names.flatMap((name) => (countOf(name) === 1 ? [] : [`${name}: ${countOf(name)} times`]));

/** What stands in the workspace in the end, and what was posted on the way there. */
const judge = (platform: Platform, digests: readonly string[], asked: readonly Said[]): MorningOutcome => {
  const standing = [...platform.workspace.channels.values()]
    .flatMap(({ messages }) => messages)
    .filter(({ botId }) => botId === bot.botId);
  const postedWith = (id: string) =>
    platform.posts.all.filter(({ metadata }) => metadata?.event_payload['id'] === id).length;
  const placeholders = standing.filter(({ text }) => text.startsWith('Working on it.'));
  const threads = new Map(asked.map(({ ts }) => [ts, 0]));
  for (const { threadTs, text } of standing)
    if (threadTs !== null && !text.startsWith('Working on it.'))
      threads.set(threadTs, (threads.get(threadTs) ?? 0) + 1);
  return {
    acknowledged: asked.length,
    digestsNotOnce: notOnceOf(digests, (key) => postedWith(deliveryIdOf(key))),
    answersNotOnce: notOnceOf([...threads.keys()], (ts) => threads.get(ts) ?? 0),
    placeholdersLeft: placeholders.map(({ channel, ts }) => `${channel} ${ts}`),
  };
};

const acknowledgedOf = (asked: readonly Said[]) => {
  const acknowledged = new Set<string>();
  for (const { ts, sent } of asked)
    for (const { acknowledged: told } of sent) void told.then(() => acknowledged.add(ts));
  return acknowledged;
};

/**
 * A morning on which digests fall due and people ask, the bots are killed at random moments and started anew, the platform
 * loses answers and the store is locked. Ends once there is nothing left to be done, or fails to after `withinMs`.
 */
export const liveThrough = async (
  place: Place,
  plan: MorningPlan,
  withinMs: number,
): Promise<MorningOutcome & { readonly complaints: readonly string[] }> => {
  const random = seeded(plan.seed);
  const epochMs = Date.now();
  const time = timeFrom(epochMs);
  const latency = () => pause(random() * 60);
  const platform = await startPlatform({ time, latency });
  for (let index = 0; index < channelCount; index += 1)
    platform.workspace.addChannel({ id: channelOf(index) });
  platform.faults.next('chat.postMessage', ...faultsOf(random, plan.faults));
  // nothing falls due while the first copies are still starting
  const lastsMs = Math.max(2_000, plan.kills * 1_200);
  const digests = Array.from({ length: digestCount }, (_, index) => ({
    key: `digest:T0DESK:D-${index}:${epochMs}`,
    channel: channelOf(index),
    dueMs: epochMs + Math.floor(random() * lastsMs * speed),
  }));
  const { path, url } = place;
  const { apiUrl, botToken, appToken } = platform;
  const told = { epochMs, speed, digests, path, url, apiUrl, botToken, appToken };
  const copies = Array.from({ length: plan.copies }, () => keepCopy(told));
  try {
    await platform.sockets.connected(2 * plan.copies);
    const asking = ask(platform, random, plan.questions, lastsMs);
    const locking = lockAtTimes(place, random, plan.locks, lastsMs);
    for (let killed = 0; killed < plan.kills; killed += 1) {
      await pause((lastsMs / plan.kills) * (0.5 + random()));
      copies[Math.floor(random() * copies.length)]?.kill();
    }
    const asked = await asking;
    await locking;
    const acknowledged = acknowledgedOf(asked);
    const untilMs = Date.now() + withinMs;
    const isDone = async () => (await place.unsettled()) === 0 && platform.posts.all.length >= digestCount;
    while (!(await isDone()) && Date.now() < untilMs) await pause(200);
    const keys = digests.map(({ key }) => key);
    const answered = asked.filter(({ ts }) => acknowledged.has(ts));
    return { ...judge(platform, keys, answered), complaints: copies.flatMap((copy) => copy.complaints) };
  } finally {
    for (const copy of copies) copy.end();
    await platform.stop();
  }
};

/** The store is locked for ten seconds of the morning’s clock, so many times. */
const lockAtTimes = async (
  { lock }: Place,
  random: () => number,
  count: number,
  lastsMs: number,
): Promise<void> => {
  for (let number = 0; number < count; number += 1) {
    await pause((lastsMs / count) * random());
    const unlock = await lock();
    await pause(10_000 / speed);
    await unlock();
  }
};
