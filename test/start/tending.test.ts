import { afterEach, describe, expect, test } from 'vitest';
import type { PostToSay } from '../../src/digests/ports.ts';
import { lookAgain } from '../../src/digests/run/lookAgain.ts';
import { openSqlite } from '../../src/records/openSqlite.ts';
import type { Store } from '../../src/records/store.ts';
import { tendEveryMs, tendWorkspace } from '../../src/start/tending.ts';
import { problem } from '../../src/terms/problem.ts';
import { refuse, succeed } from '../../src/terms/result.ts';
import type { NewSubscription } from '../../src/terms/subscriptions.ts';
import { everythingAllowed, type PlaceVerdict } from '../../src/workspaces/permissions.ts';
import { makePlaces } from '../../src/workspaces/slack/places/places.ts';
import { seriesOf, wobbling } from '../answers/madeSeries.ts';
import { cardMade } from '../contracts/pins.contract.ts';
import { testVersions } from '../doubles/records.ts';
import { manualTime } from '../doubles/time.ts';
import { accepted } from '../laws/outcomes.ts';
import { answerOf, askingAt } from '../records/madeRecords.ts';
import { snapshotOf } from '../workspaces/madeDesk.ts';

const stops: (() => Promise<unknown>)[] = [];
afterEach(async () => {
  for (const stop of stops.splice(0)) await stop();
});

const made: NewSubscription = {
  kind: 'digest',
  team: 'T1',
  owner: 'U1ADA',
  place: 'channel',
  channel: 'C1DESK',
  questions: ['tail KELP 500d at 99%'],
  body: '{}',
  schedule: { days: { kind: 'weekdays' }, minutes: 510, timeZone: 'UTC' },
  state: 'active',
  pausedWhy: null,
  createdAtMs: 0,
  nextDueMs: 1_000,
  settledUpToMs: 0,
  awaitingUntilMs: null,
  memory: '{}',
};

const kelp = (count: number, lastDay?: string) => seriesOf('KELP', wobbling(count), lastDay);

const setUp = async (fill: (store: Store) => Promise<void> = async () => {}) => {
  const store = accepted(await openSqlite(null));
  await fill(store);
  const time = manualTime();
  const told: string[] = [];
  const said: { readonly key: string; readonly channel: string; readonly thread: string | null }[] = [];
  const pins: string[] = [];
  const notes: PostToSay[] = [];
  const verdicts = new Map<string, PlaceVerdict>();
  let live = succeed(snapshotOf([kelp(50)]));
  const places = makePlaces(time, { info: () => {}, warn: () => {}, error: () => {} });
  const looking = {
    team: 'T1',
    store: store.subscriptions,
    deliver: async (post: PostToSay) => {
      if (!notes.some(({ key }) => key === post.key)) notes.push(post);
      return { kind: 'said', ts: '1.0' } as const;
    },
    placeState: async (_team: string, channel: string, owner: string) =>
      verdicts.get(channel) ?? verdicts.get(owner) ?? ({ kind: 'fine' } as const),
    tell: (message: string) => void told.push(message),
  };
  const tending = tendWorkspace({
    desk: {
      records: { store, keeps: true, versions: testVersions, tell: (message) => void told.push(message) },
      snapshot: () => live,
      permissions: everythingAllowed,
      pins: {
        store: store.pins,
        wall: () => ({
          say: async (key, { channel, thread }) => {
            if (!said.some((each) => each.key === key)) said.push({ key, channel, thread });
            return { kind: 'said', ts: '9.5' };
          },
          pin: async (channel, ts) => {
            pins.push(`${channel} ${ts}`);
            return { kind: 'done' };
          },
          unpin: async () => ({ kind: 'done' }),
        }),
      },
    },
    store,
    places,
    lookAgain: (touched) => lookAgain(looking, touched),
    time,
    tell: looking.tell,
  });
  stops.push(tending.stop, store.close);
  await time.timerSet(tendEveryMs);
  const states = async () =>
    accepted(await store.subscriptions.list({ team: 'T1' })).map(
      ({ id, channel, state, pausedWhy }) => `${id} ${channel} ${state} ${pausedWhy}`,
    );
  const tendOnce = async () => {
    time.advance(tendEveryMs);
    await time.timerSet(tendEveryMs);
  };
  const setLive = (next: typeof live) => {
    live = next;
  };
  return { store, places, told, said, pins, notes, verdicts, tending, states, tendOnce, setLive };
};

const withDigests =
  (...more: readonly Partial<NewSubscription>[]) =>
  async (store: Store) => {
    for (const each of more) accepted(await store.subscriptions.add({ ...made, ...each }));
  };

const changed = { kind: 'channelChanged', team: 'T1', channel: 'C1DESK' } as const;

describe('a channel of which there is news', () => {
  test.each(['archived', 'gone', 'notMember', 'restricted'] as const)(
    'that is %s pauses what posts there, tells the owner once, and takes it up when it works',
    async (why) => {
      const { tending, verdicts, states, notes } = await setUp(
        withDigests({}, { channel: 'C1OTHER' }, { state: 'paused', pausedWhy: 'person' }),
      );
      verdicts.set('C1DESK', { kind: 'paused', why });
      await tending.hear(changed);
      await tending.hear(changed);
      expect(await states()).toEqual([
        'D-1 C1DESK paused place',
        'D-2 C1OTHER active null',
        'D-3 C1DESK paused person',
      ]);
      expect(notes).toMatchObject([
        { channel: 'U1ADA', threadTs: null, post: { id: 'D-1', what: 'paused', why } },
      ]);
      verdicts.clear();
      await tending.hear(changed);
      expect((await states())[0]).toBe('D-1 C1DESK active null');
    },
  );

  test.each(['shared', 'guests'] as const)(
    'that is open to others (%s) stops what posts there for good',
    async (why) => {
      const { tending, verdicts, states, notes } = await setUp(withDigests({}));
      verdicts.set('C1DESK', { kind: 'stopped', why });
      await tending.hear(changed);
      verdicts.clear();
      await tending.hear(changed);
      expect(await states()).toEqual(['D-1 C1DESK stopped null']);
      expect(notes).toMatchObject([{ channel: 'U1ADA', post: { what: 'stopped', why } }]);
    },
  );

  test('that has a new id is followed by what posts there, and by its cards', async () => {
    const { tending, states, store } = await setUp(async (filled) => {
      await withDigests({}, { channel: 'C1OTHER' })(filled);
      accepted(await filled.pins.put(cardMade({ channel: 'C1DESK', state: 'standing' })));
    });
    await tending.hear({ kind: 'channelMoved', team: 'T1', from: 'C1DESK', to: 'C1NEW' });
    expect(await states()).toEqual(['D-1 C1NEW active null', 'D-2 C1OTHER active null']);
    expect(accepted(await store.pins.standingIn({ team: 'T1', channel: 'C1NEW' }))).toHaveLength(1);
  });

  test('whose new id another copy of the bot heard of is followed within a minute', async () => {
    const { store, places, tendOnce } = await setUp();
    accepted(await store.pins.moveChannel({ team: 'T1', from: 'C1DESK', to: 'C1NEW' }));
    expect(places.currentId('T1', 'C1DESK')).toBe('C1DESK');
    await tendOnce();
    expect(places.currentId('T1', 'C1DESK')).toBe('C1NEW');
    expect(places.currentId('T2', 'C1DESK')).toBe('C1DESK');
  });
});

describe('a person of whom there is news', () => {
  test('who left pauses what they made, and it goes on when they are back', async () => {
    const { tending, verdicts, states } = await setUp(withDigests({}, { owner: 'U1BEN' }));
    verdicts.set('U1ADA', { kind: 'paused', why: 'ownerLeft' });
    await tending.hear({ kind: 'personChanged', team: 'T1', person: 'U1ADA' });
    expect(await states()).toEqual(['D-1 C1DESK paused place', 'D-2 C1DESK active null']);
    verdicts.clear();
    await tending.hear({ kind: 'personChanged', team: 'T1', person: 'U1ADA' });
    expect(await states()).toEqual(['D-1 C1DESK active null', 'D-2 C1DESK active null']);
  });
});

describe('cards', () => {
  const asked = async (store: Store) => {
    accepted(await store.keep(answerOf('R-A', { series: [kelp(50)] }), askingAt(1)));
  };

  test('that were wanted when the bot ended are put up at the start', async () => {
    const { said, pins } = await setUp(async (store) => {
      await asked(store);
      accepted(await store.pins.put(cardMade({ state: 'posting', cardTs: null })));
    });
    expect(said).toEqual([{ key: 'card:T1:C1:1.5:R-A:1', channel: 'C1', thread: '1.5' }]);
    expect(pins).toEqual(['C1 9.5']);
  });

  test('have their threads told once of new prices', async () => {
    const { said, setLive, tendOnce } = await setUp(async (store) => {
      await asked(store);
      accepted(await store.pins.put(cardMade()));
    });
    expect(said).toEqual([]);
    setLive(succeed({ ...snapshotOf([kelp(50, '2026-11-30')]), fingerprint: 'cd'.repeat(32) }));
    await tendOnce();
    await tendOnce();
    expect(said.map(({ key }) => key)).toEqual(['note:T1:C1:2.5:restated', 'note:T1:C1:2.5:moved']);
  });

  test('whose pin a person took off are told of nothing', async () => {
    const { said, setLive, tendOnce, tending } = await setUp(async (store) => {
      await asked(store);
      accepted(await store.pins.put(cardMade()));
    });
    await tending.hear({ kind: 'pinRemoved', team: 'T1', channel: 'C1', ts: '2.5' });
    setLive(succeed({ ...snapshotOf([kelp(50, '2026-11-30')]), fingerprint: 'cd'.repeat(32) }));
    await tendOnce();
    expect(said).toEqual([]);
  });
});

test('a store in trouble is told to the operator and ends nothing', async () => {
  const { tending, told, store } = await setUp();
  const broken = refuse(problem('storeUnavailable', 'The disk is full.'));
  const parts = { ...store, pins: { ...store.pins, moveChannel: async () => broken } };
  const time = manualTime();
  const deaf = tendWorkspace({
    desk: {
      records: { store: parts, keeps: true, versions: testVersions, tell: () => {} },
      snapshot: () => refuse(problem('feedMissing', 'none')),
      permissions: everythingAllowed,
      pins: { store: store.pins, wall: () => null },
    },
    store: { pins: parts.pins, subscriptions: store.subscriptions },
    places: makePlaces(time, { info: () => {}, warn: () => {}, error: () => {} }),
    lookAgain: async () => {},
    time,
    tell: (message) => void told.push(message),
  });
  await deaf.hear({ kind: 'channelMoved', team: 'T1', from: 'C1', to: 'C2' });
  expect(told).toEqual(['The new id of C1 was not noted: The disk is full.']);
  await deaf.stop();
  await tending.stop();
});
