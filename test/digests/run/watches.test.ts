import { describe, expect, test } from 'vitest';
import type { PriceSeries } from '../../../src/terms/prices.ts';
import { succeed } from '../../../src/terms/result.ts';
import { seriesOf } from '../../answers/madeSeries.ts';
import { day, shown } from '../days.ts';
import { pricesOf, type Stage, stageAt } from '../stage.ts';

/** Closes from daily returns in percent, after a calm past of half a percent up and down. */
const closesOf = (returns: readonly number[]): readonly number[] => {
  const closes = [100];
  for (const each of [...Array.from({ length: 40 }, (_, at) => (at % 2 === 0 ? 0.5 : -0.5)), ...returns])
    closes.push((closes.at(-1) ?? 0) * (1 + each / 100));
  return closes;
};

const kelp = (lastDay: string, returns: readonly number[]): PriceSeries =>
  seriesOf('KELP', closesOf(returns), lastDay);

const prices = (series: PriceSeries) => succeed(pricesOf([series]));

const heard = ({ posted }: Stage): readonly string[] =>
  posted.map(({ post, atMs }) =>
    post.kind === 'watch' ? `${post.event} ${shown(atMs)?.slice(0, 10)}` : post.kind,
  );

/** A new session each day at noon the day after: 2026-12-01 is a Tuesday. */
const sessions = [
  '2026-12-01',
  '2026-12-02',
  '2026-12-03',
  '2026-12-04',
  '2026-12-07',
  '2026-12-08',
  '2026-12-09',
];

const run = async (words: string, returns: readonly number[]): Promise<Stage> => {
  const stage = stageAt('2026-12-01T12:00Z', { prices: prices(kelp('2026-11-30', [])) });
  await stage.make(words);
  for (const [index] of returns.entries()) {
    const session = sessions[index] ?? '';
    stage.world.prices = prices(kelp(session, returns.slice(0, index + 1)));
    const noonAfter = new Date(Date.parse(`${session}T12:00Z`) + 86_400_000).toISOString();
    await stage.at(noonAfter);
    // the same prices looked at again say nothing more
    await stage.at(noonAfter);
  }
  return stage;
};

// historical VaR at 90% over the last 10 returns is the second largest loss of them (rank ceil(10 · 0.9) = 9 of 10)
const watchVar = 'watch KELP tail 90% 10d by historical above 2%';

describe('a watch of a figure', () => {
  test('fires when the line is crossed, once', async () => {
    const stage = await run(watchVar, [0, -3, -3, 0, 0]);
    expect(heard(stage)).toEqual(['fired 2026-12-04']);
    const post = stage.posted[0]?.post;
    if (post?.kind !== 'watch') throw new Error('no watch');
    expect(post.reading).toMatchObject({ of: 'var', line: 0.02, side: 'above', day: day('2026-12-03') });
    expect(post.reading?.value).toBeCloseTo(0.03, 10);
    expect(stage.posted[0]?.key).toBe(`watch:T1:W-1:${day('2026-12-03')}`);
  });

  test('clears after two sessions on the other side', async () => {
    const crossing = await run(
      'watch KELP tail 80% 5d by historical above 1%',
      [-3, -3, 0.1, -0.1, 0.1, -0.1, 0.1],
    );
    // with 5 returns the second largest loss is 3% from the second such day on, until one of the two has left the window
    expect(heard(crossing)).toEqual(['fired 2026-12-03', 'cleared 2026-12-10']);
  });

  test('that is beyond its line when it is made says nothing until it crosses again', async () => {
    const stage = await run('watch KELP tail 90% 10d by historical above 0.1%', [0, 0, 0]);
    expect(heard(stage)).toEqual([]);
  });

  test('is not set off by a past that was restated, and mentions it when it speaks', async () => {
    const stage = stageAt('2026-12-01T12:00Z', { prices: prices(kelp('2026-11-30', [])) });
    await stage.make(watchVar);
    const restated = kelp('2026-11-30', []);
    restated.closes.set([restated.closes[40] as number, (restated.closes[39] as number) * 1.1], 39);
    stage.world.prices = prices(restated);
    await stage.at('2026-12-01T13:00Z');
    expect(heard(stage)).toEqual([]);
    const worse = kelp('2026-12-02', [-3, -3]);
    stage.world.prices = prices(worse);
    await stage.at('2026-12-03T12:00Z');
    expect(heard(stage)).toEqual(['fired 2026-12-03']);
    expect(stage.posted[0]?.post).toMatchObject({ restated: true });
  });

  test('looks at a new day once, however many copies there are', async () => {
    const stage = stageAt('2026-12-01T12:00Z', { prices: prices(kelp('2026-11-30', [])) });
    await stage.make(watchVar);
    stage.world.prices = prices(kelp('2026-12-02', [-3, -3]));
    stage.time.set(Date.parse('2026-12-03T12:00Z'));
    const copies = [stage.copy('second'), stage.copy('third')];
    await Promise.all(copies.map((copy) => copy.tick()));
    await Promise.all(copies.map((copy) => copy.idle()));
    expect(heard(stage)).toHaveLength(1);
  });
});

const watchLoss = 'watch KELP loss beyond tail 90% 10d by historical';

describe('a watch of losses', () => {
  test('holds each against the figure of the session before, which never contains the day', async () => {
    // the figure before the first loss is half a percent; after it 3% is the largest and 0.5% still the second largest
    const stage = await run(watchLoss, [0, -3, 0, -0.4, -2.9]);
    expect(heard(stage)).toEqual(['fired 2026-12-03', 'fired 2026-12-08']);
    const post = stage.posted[0]?.post;
    if (post?.kind !== 'watch') throw new Error('no watch');
    expect(post.reading).toMatchObject({ of: 'loss', day: day('2026-12-02'), lineDay: day('2026-12-01') });
    expect(post.reading?.value).toBeCloseTo(0.03, 10);
    expect(post.reading?.line).toBeCloseTo(0.005, 10);
  });

  test('of several sessions that come at once tells the last that passed it', async () => {
    const stage = stageAt('2026-12-01T12:00Z', { prices: prices(kelp('2026-11-30', [])) });
    await stage.make(watchLoss);
    stage.world.prices = prices(kelp('2026-12-03', [-3, -2, 1]));
    await stage.at('2026-12-04T12:00Z');
    const post = stage.posted[0]?.post;
    expect(post).toMatchObject({ event: 'fired' });
    if (post?.kind === 'watch')
      expect(post.reading).toMatchObject({ day: day('2026-12-02'), lineDay: day('2026-11-30') });
  });
});

describe('a watch that cannot tell', () => {
  test('says so once when the prices are two sessions old, and speaks again when they come', async () => {
    const stage = stageAt('2026-12-01T12:00Z', { prices: prices(kelp('2026-11-30', [])) });
    await stage.make(watchVar);
    await stage.at('2026-12-02T12:00Z');
    expect(heard(stage)).toEqual([]);
    for (const hour of ['00', '02', '12', '20']) await stage.at(`2026-12-03T${hour}:30Z`);
    expect(heard(stage)).toEqual(['cannotTell 2026-12-03']);
    expect(stage.posted[0]?.post).toMatchObject({
      reason: 'The prices of KELP end 2026-11-30, 2 sessions old.',
    });
    stage.world.prices = prices(kelp('2026-12-02', [-3, -3]));
    await stage.at('2026-12-03T21:00Z');
    expect(heard(stage)).toEqual(['cannotTell 2026-12-03', 'fired 2026-12-03']);
  });

  test('says so once when its ticker is held back', async () => {
    const stage = stageAt('2026-12-01T12:00Z', { prices: prices(kelp('2026-11-30', [])) });
    await stage.make(watchVar);
    const heldBack = { KELP: 'KELP has two different closes on 2026-12-01.' };
    stage.world.prices = succeed(pricesOf([], undefined, heldBack));
    await stage.at('2026-12-01T13:00Z');
    await stage.at('2026-12-01T15:00Z');
    expect(heard(stage)).toEqual(['cannotTell 2026-12-01']);
    expect(stage.posted[0]?.post).toMatchObject({ reason: heldBack.KELP });
  });
});

describe('a watch whose place cannot be posted to', () => {
  test('keeps what it has to say until it can', async () => {
    const stage = stageAt('2026-12-01T12:00Z', { prices: prices(kelp('2026-11-30', [])) });
    await stage.make(watchVar);
    stage.world.place = { kind: 'paused', why: 'notMember' };
    stage.world.prices = prices(kelp('2026-12-02', [-3, -3]));
    await stage.at('2026-12-03T12:00Z');
    await stage.at('2026-12-03T14:00Z');
    expect(stage.posted.map(({ post }) => post.kind)).toEqual(['note']);
    expect(await stage.find('W-1')).toMatchObject({ state: 'paused', pausedWhy: 'place' });
    stage.world.place = { kind: 'fine' };
    await stage.at('2026-12-03T16:00Z');
    expect(heard(stage)).toEqual(['note', 'fired 2026-12-03']);
    expect(await stage.find('W-1')).toMatchObject({ state: 'active', pausedWhy: null });
  });
});
