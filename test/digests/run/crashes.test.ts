/** A copy of the bot that dies at any of its steps, and another that goes on: everything is posted once. */
import { expect, test } from 'vitest';
import { createRunner } from '../../../src/digests/run/createRunner.ts';
import type { RunParts } from '../../../src/digests/run/parts.ts';
import { succeed } from '../../../src/terms/result.ts';
import { seriesOf, wobbling } from '../../answers/madeSeries.ts';
import { shown } from '../days.ts';
import { pricesOf, type Stage, stageAt } from '../stage.ts';

const forEver = new Promise<never>(() => {});

/** The same parts for a process that ends at its n-th step outside itself, before or after the step is done. */
const dyingAt = (
  parts: RunParts,
  last: number,
  afterIt: boolean,
): { parts: RunParts; steps: () => number } => {
  let steps = 0;
  const step =
    <Args extends readonly unknown[], T>(run: (...args: Args) => Promise<T>) =>
    async (...args: Args): Promise<T> => {
      steps += 1;
      if (steps > last || (steps === last && !afterIt)) return forEver;
      const done = await run(...args);
      return steps === last && afterIt ? forEver : done;
    };
  const { store } = parts;
  return {
    steps: () => steps,
    parts: {
      ...parts,
      holder: 'dying',
      deliver: step(parts.deliver),
      placeState: step(parts.placeState),
      store: {
        add: store.add,
        find: step(store.find),
        list: step(store.list),
        save: step(store.save),
        dueBefore: step(store.dueBefore),
        awaitingPrices: step(store.awaitingPrices),
        claim: step(store.claim),
        settle: step(store.settle),
        release: step(store.release),
        forgetSettled: step(store.forgetSettled),
      },
    },
  };
};

/** Whatever can go on without the clock has gone on. */
const quiet = async (): Promise<void> => {
  for (let turn = 0; turn < 20; turn += 1) await new Promise((resolve) => setImmediate(resolve));
};

const fresh = () => succeed(pricesOf([seriesOf('KELP', wobbling(60), '2026-11-30')]));

const morning = async (): Promise<Stage> => {
  const stage = stageAt('2026-12-01T08:00Z', {
    prices: succeed(pricesOf([seriesOf('KELP', wobbling(60), '2026-11-27')])),
  });
  await stage.make('digest KELP 08:30 by historical 20d');
  return stage;
};

/** The dying copy works until nothing moves, then another goes on once the leases are over. */
const liveOn = async (stage: Stage, last: number, afterIt: boolean): Promise<number> => {
  const dying = dyingAt(stage.parts, last, afterIt);
  const runner = createRunner(dying.parts);
  stage.time.set(Date.parse('2026-12-01T09:00Z'));
  void runner.tick();
  await quiet();
  stage.world.prices = fresh();
  stage.time.set(Date.parse('2026-12-01T09:01Z'));
  void runner.tick();
  await quiet();
  for (const minute of ['10', '20', '30']) await stage.at(`2026-12-01T09:${minute}Z`);
  return dying.steps();
};

const keysOf = ({ posted }: Stage): readonly string[] =>
  posted.map(({ key }) => key.replace(/^.*?:\d+/, 'digest'));

test.each([
  ['before', false],
  ['after', true],
] as const)(
  'a digest on old prices and its fresh line, the copy dead %s any of its steps',
  async (_, afterIt) => {
    const undisturbed = await liveOn(await morning(), Number.POSITIVE_INFINITY, afterIt);
    expect(undisturbed).toBeGreaterThan(15);
    for (let last = 1; last <= undisturbed; last += 1) {
      const stage = await morning();
      await liveOn(stage, last, afterIt);
      const keys = keysOf(stage);
      const post = stage.posted[0]?.post;
      const isOld = post?.kind === 'digest' && post.oldPrices !== null;
      const freshLines = keys.filter((key) => key === 'digest:fresh').length;
      expect([last, ...keys.filter((key) => key !== 'digest:fresh')]).toEqual([
        last,
        'digest',
        'digest:detail',
      ]);
      // where it cannot be known whether the old prices were posted, the fresh line is one too many rather than missing
      expect([last, freshLines]).toEqual([last, isOld ? 1 : Math.min(freshLines, 1)]);
      expect(shown((await stage.find('D-1')).nextDueMs)).toBe('2026-12-02T08:30Z');
      expect(stage.told).toEqual([]);
    }
  },
);
