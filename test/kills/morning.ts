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
/** Within this much of the machine’s time what belongs to one kill happens. */
const spanMs = 1_200;

/** Where the bots keep their records, and how to see that nothing is left to be done there. */
export type Place = {
  readonly path: string | null;
  readonly url: string | null;
  readonly unsettled: () => Promise<number>;
  /** Locks the store against everybody until the returned function is called. */
  readonly lock: () => Promise<() => Promise<void>>;
  /** Lets go of it, once nobody uses it any more. */
  readonly leave: () => Promise<void>;
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

type Digest = { readonly key: string; readonly channel: string };

/** A bot in a process of its own, started anew each time it is killed, that is told of every digest that is due. */
const keepCopy = (plan: object, due: readonly Digest[]) => {
  let child: ChildProcess | null = null;
  let ended = false;
  let isUp = false;
  const waiting: (() => void)[] = [];
  let gone: Promise<void> = Promise.resolve();
  const complaints: string[] = [];
  const start = (): void => {
    const running = spawn(process.execPath, [childPath], {
      env: { ...process.env, LEADSMAN_KILL_PLAN: JSON.stringify(plan) },
      stdio: ['ignore', 'ignore', 'pipe', 'ipc'],
    });
    running.stderr?.on('data', (data: Buffer) => complaints.push(data.toString()));
    running.on('exit', (code) => {
      if (code !== null && code !== 0) complaints.push(`ended with ${code}`);
      if (!ended) start();
    });
    gone = new Promise((resolve) => running.once('exit', () => resolve()));
    running.once('message', () => {
      running.send(due, () => {});
      isUp = true;
      for (const goOn of waiting.splice(0)) goOn();
    });
    child = running;
  };
  start();
  return {
    /** Resolves once it runs, however often it is started until then. */
    ready: (): Promise<void> => (isUp ? Promise.resolve() : new Promise((resolve) => waiting.push(resolve))),
    tell: (digests: readonly Digest[]): void => {
      if (child?.connected === true) child.send(digests, () => {});
    },
    kill: (): void => {
      isUp = false;
      child?.kill('SIGKILL');
    },
    end: (): void => {
      ended = true;
      child?.kill('SIGKILL');
    },
    gone: () => gone,
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

/** A question in some channel; every third takes long enough for a placeholder. */
const ask = (platform: Platform, random: () => number, number: number): Said => {
  const takesMs = number % 3 === 0 ? 1_600 + Math.floor(random() * 10_000) : 0;
  const channel = channelOf(Math.floor(random() * channelCount));
  return platform.mention({ channel, text: `question ${number} takes ${takesMs}` });
};

type Copy = ReturnType<typeof keepCopy>;

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

/** The share of a whole that falls into one of so many parts. */
const partOf = <T>(all: readonly T[], part: number, parts: number): readonly T[] =>
  all.slice(Math.floor((part * all.length) / parts), Math.floor(((part + 1) * all.length) / parts));

/** Between two kills some digests fall due and some questions are asked, all at random moments. */
const strike = async (copies: readonly Copy[], random: () => number, happenings: readonly (() => void)[]) => {
  const victim = copies[Math.floor(random() * copies.length)];
  const killAtMs = random() * spanMs;
  const moments = happenings.map((happen) => ({ happen, atMs: random() * spanMs }));
  const all = [...moments, { happen: () => victim?.kill(), atMs: killAtMs }].sort((a, b) => a.atMs - b.atMs);
  await Promise.all(copies.map((copy) => copy.ready()));
  let nowMs = 0;
  for (const { happen, atMs } of all) {
    await pause(atMs - nowMs);
    nowMs = atMs;
    happen();
  }
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
  const latency = () => pause(random() * 60);
  const platform = await startPlatform({ time: timeFrom(epochMs), latency });
  for (let index = 0; index < channelCount; index += 1)
    platform.workspace.addChannel({ id: channelOf(index) });
  platform.faults.next('chat.postMessage', ...faultsOf(random, plan.faults));
  const digests = Array.from(
    { length: digestCount },
    (_, index): Digest => ({
      key: `digest:T0DESK:D-${index}:${epochMs}`,
      channel: channelOf(index),
    }),
  );
  const due: Digest[] = [];
  const asked: Said[] = [];
  const { path, url } = place;
  const { apiUrl, botToken, appToken } = platform;
  const told = { epochMs, speed, path, url, apiUrl, botToken, appToken };
  const copies = Array.from({ length: plan.copies }, () => keepCopy(told, due));
  const fallsDue = (digest: Digest) => (): void => {
    due.push(digest);
    for (const copy of copies) copy.tell([digest]);
  };
  try {
    const numbers = Array.from({ length: plan.questions }, (_, number) => number);
    for (let part = 0; part < plan.kills; part += 1) {
      const locked = part < plan.locks ? lockFor(place, random) : Promise.resolve();
      await strike(copies, random, [
        ...partOf(digests, part, plan.kills).map(fallsDue),
        ...partOf(numbers, part, plan.kills).map((number) => () => {
          asked.push(ask(platform, random, number));
        }),
      ]);
      await locked;
    }
    const acknowledged = acknowledgedOf(asked);
    const untilMs = Date.now() + withinMs;
    const isPosted = (id: string) =>
      platform.posts.all.some(({ metadata }) => metadata?.event_payload['id'] === id);
    // a digest that the copies were just told of is not in the store yet
    const isDone = async () =>
      digests.every(({ key }) => isPosted(deliveryIdOf(key))) && (await place.unsettled()) === 0;
    while (!(await isDone()) && Date.now() < untilMs) await pause(200);
    const keys = digests.map(({ key }) => key);
    const answered = asked.filter(({ ts }) => acknowledged.has(ts));
    return { ...judge(platform, keys, answered), complaints: copies.flatMap((copy) => copy.complaints) };
  } finally {
    for (const copy of copies) copy.end();
    await Promise.all(copies.map((copy) => copy.gone()));
    await platform.stop();
    await place.leave();
  }
};

/** The store is locked for ten seconds of the morning’s clock, from some moment on. */
const lockFor = async ({ lock }: Place, random: () => number): Promise<void> => {
  await pause(random() * spanMs);
  const unlock = await lock();
  await pause(10_000 / speed);
  await unlock();
};
