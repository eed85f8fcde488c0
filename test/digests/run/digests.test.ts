import { describe, expect, test } from 'vitest';
import { problem } from '../../../src/terms/problem.ts';
import { refuse, succeed } from '../../../src/terms/result.ts';
import { seriesOf, wobbling } from '../../answers/madeSeries.ts';
import { accepted } from '../../laws/outcomes.ts';
import { day, shown } from '../days.ts';
import { type Posted, pricesOf, type Stage, stageAt } from '../stage.ts';

/** What was posted: its kind and instant. */
const heard = ({ posted }: Stage): readonly string[] =>
  posted.map(({ post, atMs }) => `${post.kind} ${shown(atMs)}`);

const digestsOf = ({ posted }: Stage): readonly Posted[] =>
  posted.filter(({ post }) => post.kind === 'digest');

const lastDigest = (stage: Stage) => {
  const post = digestsOf(stage).at(-1)?.post;
  if (post?.kind !== 'digest') throw new Error('no digest was posted');
  return post;
};

const kelpTo = (lastDay: string, count = 60) => seriesOf('KELP', wobbling(count), lastDay);
const pricesTo = (lastDay: string) => succeed(pricesOf([kelpTo(lastDay)]));

// 2026-12-01 is a Tuesday; London is on UTC.
describe('a digest', () => {
  test('is posted when it is due, once, with its details in its thread', async () => {
    const stage = stageAt('2026-12-01T08:00Z');
    const { id, nextDueMs } = await stage.make('digest KELP 08:30');
    expect([id, shown(nextDueMs)]).toEqual(['D-1', '2026-12-01T08:30Z']);
    await stage.at('2026-12-01T08:29Z');
    expect(heard(stage)).toEqual([]);
    for (const minute of ['30', '30', '31', '59']) await stage.at(`2026-12-01T08:${minute}Z`);
    expect(heard(stage)).toEqual(['digest 2026-12-01T08:30Z', 'detail 2026-12-01T08:30Z']);
    const dueMs = Date.parse('2026-12-01T08:30Z');
    const key = `digest:T1:D-1:${dueMs}`;
    const [post, detail] = stage.posted;
    expect(post).toMatchObject({ key, channel: 'C1', threadTs: null, urgent: false });
    expect(post?.expiresAtMs).toBe(Date.parse('2026-12-01T11:30Z'));
    expect(detail).toMatchObject({ key: `${key}:detail`, threadTs: `ts of ${key}` });
    expect(shown((await stage.find('D-1')).nextDueMs)).toBe('2026-12-02T08:30Z');
    expect(stage.told).toEqual([]);
  });

  test('is posted once by several copies of the bot', async () => {
    const stage = stageAt('2026-12-01T08:30Z');
    await stage.make('digest KELP 09:00');
    stage.time.set(Date.parse('2026-12-01T09:00Z'));
    const copies = [stage.runner, stage.copy('second'), stage.copy('third')];
    await Promise.all(copies.map((copy) => copy.tick()));
    await Promise.all(copies.map((copy) => copy.idle()));
    expect(heard(stage)).toHaveLength(2);
  });

  test('of a copy that died with it is taken over once its lease is over', async () => {
    const stage = stageAt('2026-12-01T08:30Z');
    await stage.make('digest KELP 09:00');
    const nowMs = Date.parse('2026-12-01T09:00Z');
    const key = `digest:T1:D-1:${nowMs}`;
    accepted(await stage.parts.store.claim({ key, holder: 'dead', nowMs, leaseMs: 300_000 }));
    await stage.at('2026-12-01T09:05Z');
    expect(heard(stage)).toEqual([]);
    await stage.at('2026-12-01T09:06Z');
    expect(heard(stage)).toHaveLength(2);
  });

  test('that could not be noted is not posted again', async () => {
    const stage = stageAt('2026-12-01T08:30Z');
    const made = await stage.make('digest KELP 09:00');
    await stage.at('2026-12-01T09:00Z');
    // as if the process had ended before it noted what it had posted
    const after = await stage.find('D-1');
    accepted(await stage.parts.store.save({ ...made, revision: after.revision }));
    await stage.at('2026-12-01T09:10Z');
    expect(heard(stage)).toHaveLength(2);
  });

  test('in a host that slept from Friday to Monday says what was left out', async () => {
    const stage = stageAt('2026-12-03T12:00Z');
    await stage.make('digest daily KELP 08:30');
    await stage.at('2026-12-07T09:10Z');
    expect(heard(stage)).toEqual(['digest 2026-12-07T09:10Z', 'detail 2026-12-07T09:10Z']);
    const { skipped } = lastDigest(stage);
    expect([skipped?.count, shown(skipped?.firstMs ?? null), shown(skipped?.lastMs ?? null)]).toEqual([
      3,
      '2026-12-04T08:30Z',
      '2026-12-06T08:30Z',
    ]);
    await stage.at('2026-12-08T08:30Z');
    expect(lastDigest(stage).skipped).toBe(null);
  });

  test('too late is left out and said in the next, with all before it', async () => {
    const stage = stageAt('2026-12-03T12:00Z');
    await stage.make('digest KELP 08:30');
    await stage.at('2026-12-04T12:00Z');
    await stage.at('2026-12-07T12:00Z');
    expect(heard(stage)).toEqual([]);
    await stage.at('2026-12-08T08:30Z');
    expect(lastDigest(stage).skipped).toEqual({
      count: 2,
      firstMs: Date.parse('2026-12-04T08:30Z'),
      lastMs: Date.parse('2026-12-07T08:30Z'),
    });
  });

  test('is not posted again when the clock is set back by an hour', async () => {
    const stage = stageAt('2026-12-01T08:00Z');
    await stage.make('digest KELP 08:30');
    for (const minute of ['08:30', '08:40', '07:45', '08:29', '08:30', '08:31', '09:30'])
      await stage.at(`2026-12-01T${minute}Z`);
    expect(heard(stage)).toHaveLength(2);
    await stage.at('2026-12-02T08:30Z');
    expect(heard(stage)).toHaveLength(4);
  });

  test('that its owner paused is not posted, and nothing is made up for when it goes on', async () => {
    const stage = stageAt('2026-12-01T08:00Z');
    const made = await stage.make('digest KELP 08:30');
    accepted(
      await stage.parts.store.save({ ...made, state: 'paused', pausedWhy: 'person', nextDueMs: null }),
    );
    await stage.at('2026-12-01T08:30Z');
    expect(heard(stage)).toEqual([]);
  });

  test('moves with a holiday that is named later', async () => {
    const stage = stageAt('2026-12-01T08:00Z');
    await stage.make('digest KELP 08:30');
    const wasSession = stage.world.calendar;
    stage.world.calendar = {
      ...wasSession,
      isSession: (on) => on !== day('2026-12-01') && wasSession.isSession(on),
    };
    await stage.at('2026-12-01T08:30Z');
    expect(heard(stage)).toEqual([]);
    expect(shown((await stage.find('D-1')).nextDueMs)).toBe('2026-12-02T08:30Z');
    await stage.at('2026-12-02T08:30Z');
    expect(lastDigest(stage).skipped).toBe(null);
  });
});

describe('a digest whose prices are missing', () => {
  const waiting = async () => {
    const stage = stageAt('2026-12-01T08:00Z', { prices: pricesTo('2026-11-27') });
    await stage.make('digest KELP 08:30 by historical 20d');
    await stage.at('2026-12-01T08:30Z');
    await stage.at('2026-12-01T08:59Z');
    return stage;
  };

  test('waits, and is posted as soon as they are in', async () => {
    const stage = await waiting();
    expect(heard(stage)).toEqual([]);
    stage.world.prices = pricesTo('2026-11-30');
    await stage.at('2026-12-01T08:59Z');
    expect(lastDigest(stage).oldPrices).toBe(null);
    expect((await stage.find('D-1')).awaitingUntilMs).toBe(null);
  });

  test('is posted on old ones after half an hour, and says so', async () => {
    const stage = await waiting();
    await stage.at('2026-12-01T09:00Z');
    expect(lastDigest(stage).oldPrices).toEqual({
      lastDay: day('2026-11-27'),
      expectedDay: day('2026-11-30'),
      sessionsBehind: 1,
      tickers: ['KELP'],
    });
  });

  test('gets one fresh line in its thread when they come before noon', async () => {
    const stage = await waiting();
    await stage.at('2026-12-01T09:00Z');
    await stage.at('2026-12-01T10:00Z');
    expect(heard(stage)).toHaveLength(2);
    stage.world.prices = pricesTo('2026-11-30');
    await stage.at('2026-12-01T12:00Z');
    await stage.at('2026-12-01T12:01Z');
    expect(heard(stage).slice(2)).toEqual(['fresh 2026-12-01T12:00Z']);
    expect(stage.posted.at(-1)?.threadTs).toBe(stage.posted[1]?.threadTs);
  });

  test('gets none when they come in the afternoon', async () => {
    const stage = await waiting();
    await stage.at('2026-12-01T09:00Z');
    stage.world.prices = pricesTo('2026-11-30');
    await stage.at('2026-12-01T12:01Z');
    expect(heard(stage)).toHaveLength(2);
  });

  test('without any price file is left out in the end, and said', async () => {
    const stage = stageAt('2026-12-01T08:00Z', { prices: refuse(problem('feedMissing', 'There is none.')) });
    await stage.make('digest KELP 08:30');
    for (const hour of ['09', '10', '11', '12']) await stage.at(`2026-12-01T${hour}:00Z`);
    expect(heard(stage)).toEqual([]);
    stage.world.prices = pricesTo('2026-12-01');
    await stage.at('2026-12-02T08:30Z');
    expect(lastDigest(stage).skipped?.count).toBe(1);
  });
});

describe('a digest whose place cannot be posted to', () => {
  const archived = async () => {
    const stage = stageAt('2026-12-01T08:00Z', { place: { kind: 'paused', why: 'archived' } });
    await stage.make('digest KELP 08:30');
    await stage.at('2026-12-01T08:30Z');
    await stage.at('2026-12-02T08:30Z');
    return stage;
  };

  test('is paused, and its owner is told once', async () => {
    const stage = await archived();
    expect(stage.posted.map(({ channel, post }) => [channel, post.kind])).toEqual([['U1', 'note']]);
    expect(stage.posted[0]?.post).toMatchObject({
      what: 'paused',
      why: 'archived',
      id: 'D-1',
      channel: 'C1',
    });
    expect(await stage.find('D-1')).toMatchObject({ state: 'paused', pausedWhy: 'place' });
  });

  test('goes on by itself when it can be posted again, and says what was left out', async () => {
    const stage = await archived();
    stage.world.place = { kind: 'fine' };
    await stage.at('2026-12-03T08:30Z');
    expect(lastDigest(stage).skipped?.count).toBe(2);
    expect(await stage.find('D-1')).toMatchObject({ state: 'active', pausedWhy: null });
  });

  test('that has become open to others is stopped for good', async () => {
    const stage = stageAt('2026-12-01T08:00Z', { place: { kind: 'stopped', why: 'shared' } });
    await stage.make('digest KELP 08:30');
    await stage.at('2026-12-01T08:30Z');
    stage.world.place = { kind: 'fine' };
    await stage.at('2026-12-02T08:30Z');
    expect(stage.posted.map(({ post }) => post.kind)).toEqual(['note']);
    expect(await stage.find('D-1')).toMatchObject({ state: 'stopped', nextDueMs: null });
  });

  test('as the platform says at the post is paused too', async () => {
    const stage = stageAt('2026-12-01T08:00Z', { outcome: { kind: 'refused', code: 'is_archived' } });
    await stage.make('digest KELP 08:30');
    await stage.at('2026-12-01T08:30Z');
    expect(await stage.find('D-1')).toMatchObject({ state: 'paused', pausedWhy: 'place' });
    expect(stage.told).toEqual(['D-1 was paused (archived), and its owner could not be told.']);
    stage.world.outcome = null;
    await stage.at('2026-12-02T08:30Z');
    expect(lastDigest(stage).skipped?.count).toBe(1);
  });

  test('a post that came too late is left out', async () => {
    const stage = stageAt('2026-12-01T08:00Z', { outcome: { kind: 'expired' } });
    await stage.make('digest KELP 08:30');
    await stage.at('2026-12-01T08:30Z');
    expect(await stage.find('D-1')).toMatchObject({ state: 'active' });
    stage.world.outcome = null;
    await stage.at('2026-12-02T08:30Z');
    expect(lastDigest(stage).skipped?.count).toBe(1);
  });
});

test('a store in trouble is told of, and what is due is posted when it works again', async () => {
  const stage = stageAt('2026-12-01T08:00Z');
  await stage.make('digest KELP 08:30');
  stage.time.set(Date.parse('2026-12-01T08:30Z'));
  const broken = refuse(problem('storeUnavailable', 'disk is full'));
  const runner = stage.copy('first');
  const { store } = stage.parts;
  const works = store.dueBefore;
  Object.assign(store, { dueBefore: async () => broken });
  await runner.tick();
  expect(stage.told).toEqual(['What is due cannot be read: disk is full']);
  Object.assign(store, { dueBefore: works });
  await runner.tick();
  await runner.idle();
  expect(heard(stage)).toHaveLength(2);
});

test('what was posted but could not be noted is noted later, and not posted again', async () => {
  const stage = stageAt('2026-12-01T08:00Z');
  await stage.make('digest KELP 08:30');
  const { store } = stage.parts;
  const works = store.save;
  Object.assign(store, { save: async () => refuse(problem('storeUnavailable', 'disk is full')) });
  await stage.at('2026-12-01T08:30Z');
  expect(stage.told).toEqual(['D-1 could not be noted: disk is full']);
  Object.assign(store, { save: works });
  await stage.at('2026-12-01T08:31Z');
  expect(heard(stage)).toHaveLength(2);
  expect(shown((await stage.find('D-1')).nextDueMs)).toBe('2026-12-02T08:30Z');
});
