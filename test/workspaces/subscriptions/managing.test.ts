/** Who may do what with a digest or a watch, from where. */
import { beforeEach, describe, expect, test } from 'vitest';
import { succeed } from '../../../src/terms/result.ts';
import type { Subscription } from '../../../src/terms/subscriptions.ts';
import { everythingAllowed } from '../../../src/workspaces/permissions.ts';
import { act } from '../../../src/workspaces/subscriptions/answerSubscriptions.ts';
import {
  changeDigest,
  findFor,
  listFor,
  makerOf,
  openFor,
  type SubscribingDesk,
} from '../../../src/workspaces/subscriptions/managing.ts';
import type { DeskSubscriptions } from '../../../src/workspaces/subscriptions/ports.ts';
import { subscriptionsInMemory } from '../../doubles/subscriptions.ts';
import { accepted, refusalCode } from '../../laws/outcomes.ts';
import { newDigest } from '../../records/madeSubscriptions.ts';

const asker = (person: string, channel: string) => ({
  place: 'channel',
  from: { team: 'T1', channel, person, message: null, thread: null },
});

const unchanged = {
  tickers: [],
  days: null,
  minutes: 540,
  timeZone: null,
  window: null,
  tailLevel: null,
  model: null,
};

/** Owners manage what they made, nobody else does. */
const deskOn = (subscriptions: DeskSubscriptions | null): SubscribingDesk => ({
  permissions: { ...everythingAllowed, mayManage: ({ from }, { owner }) => from.person === owner },
  subscriptions,
});

let subscriptions: DeskSubscriptions;
let desk: SubscribingDesk;
beforeEach(async () => {
  const store = subscriptionsInMemory();
  subscriptions = {
    store,
    keeps: true,
    asks: ({ questions }) => questions.join(),
    newDigest: () => newDigest(),
    newWatch: async () => {
      throw new Error('no watch is made here');
    },
    changed: (subscription) => succeed({ ...subscription, body: 'changed' }),
    paused: (subscription) => ({ ...subscription, state: 'paused', pausedWhy: 'person' }),
    resumed: (subscription) => succeed({ ...subscription, state: 'active', pausedWhy: null }),
    stopped: (subscription) => ({ ...subscription, state: 'stopped' }),
    digestNow: async () => {
      throw new Error('nothing is shown here');
    },
    weekdaysAssumed: () => false,
  };
  desk = deskOn(subscriptions);
  accepted(await store.add(newDigest()));
});

const kept = async (): Promise<Subscription | null> => accepted(await subscriptions.store.find('T1', 'D-1'));

describe('a digest of U1 in channel C1', () => {
  test.each([
    ['its owner', 'U1', 'C1', 'pause', 'not refused'],
    ['its owner from elsewhere', 'U1', 'C9', 'stop', 'not refused'],
    ['somebody else there', 'U2', 'C1', 'pause', 'not refused'],
    ['somebody else there', 'U2', 'C1', 'resume', 'not refused'],
    ['somebody else there', 'U2', 'C1', 'stop', 'notPermitted'],
    ['somebody else elsewhere', 'U2', 'C9', 'pause', 'unknownSubscription'],
    ['somebody else elsewhere', 'U2', 'C9', 'stop', 'unknownSubscription'],
  ] as const)('%s (%s in %s) may %s: %s', async (_, person, channel, what, code) => {
    expect(refusalCode(await act(desk, asker(person, channel), 'D-1', what))).toBe(code);
  });

  test('is changed by its owner alone', async () => {
    expect(refusalCode(await changeDigest(desk, asker('U2', 'C1'), 'D-1', unchanged))).toBe('notPermitted');
    expect(accepted(await changeDigest(desk, asker('U1', 'C1'), 'D-1', unchanged)).body).toBe('changed');
    expect((await kept())?.body).toBe('changed');
  });

  test('is as unknown to who may not see it as one that is not there', async () => {
    const hidden = await findFor(desk, subscriptions, asker('U2', 'C9'), 'D-1', 'see');
    const missing = await findFor(desk, subscriptions, asker('U2', 'C9'), 'D-2', 'see');
    const messageOf = (result: typeof hidden) =>
      result.ok ? '' : result.problem.message.replace(/D-\d/, 'D-n');
    expect(messageOf(hidden)).toBe(messageOf(missing));
    expect(messageOf(hidden)).not.toBe('');
  });

  test('that is stopped is not taken up again', async () => {
    accepted(await act(desk, asker('U1', 'C1'), 'D-1', 'stop'));
    expect(refusalCode(await act(desk, asker('U1', 'C1'), 'D-1', 'resume'))).toBe('unknownSubscription');
  });

  test('changed by somebody at the same time keeps what they changed', async () => {
    const { store } = subscriptions;
    const works = store.save;
    let first = true;
    Object.assign(store, {
      save: async (changed: Subscription) => {
        if (first) {
          first = false;
          accepted(await works({ ...changed, state: 'active', channel: 'C7' }));
          return succeed(null);
        }
        return works(changed);
      },
    });
    accepted(await act(desk, asker('U1', 'C1'), 'D-1', 'pause'));
    expect(await kept()).toMatchObject({ state: 'paused', channel: 'C7' });
  });

  test('is listed for its owner wherever it posts, and not for others', async () => {
    expect(accepted(await listFor(desk, 'T1', 'U1')).map(({ id }) => id)).toEqual(['D-1']);
    expect(accepted(await listFor(desk, 'T1', 'U2'))).toEqual([]);
  });
});

test('where they are only read, or not kept, nothing is changed', async () => {
  const readOnly = deskOn({ ...subscriptions, keeps: false });
  expect(refusalCode(await act(readOnly, asker('U1', 'C1'), 'D-1', 'pause'))).toBe('storeUnavailable');
  expect(refusalCode(openFor(deskOn(null)))).toBe('storeUnavailable');
  expect((await kept())?.state).toBe('active');
});

describe('who makes one, and where it speaks', () => {
  const from = { team: 'T1', channel: 'C1', person: 'U1', message: null, thread: null };

  test.each([
    ['a channel', { place: 'channel', from }, { place: 'channel', channel: 'C1', owner: 'U1', team: 'T1' }],
    [
      'a direct message',
      { place: 'direct', from: { ...from, channel: 'D1' } },
      { place: 'direct', channel: 'D1', owner: 'U1', team: 'T1' },
    ],
    [
      'a command in a channel',
      { place: 'command', from },
      { place: 'channel', channel: 'C1', owner: 'U1', team: 'T1' },
    ],
    [
      'the home page',
      { place: 'direct', from: { ...from, channel: null } },
      { place: 'direct', channel: 'U1', owner: 'U1', team: 'T1' },
    ],
    [
      'a terminal',
      { place: 'channel', from: { ...from, team: null, channel: '#risk', person: 'you' } },
      { place: 'terminal', channel: '#risk', owner: 'you', team: 'terminal' },
    ],
  ])('%s', (_, asking, maker) => {
    expect(makerOf(asking)).toEqual(maker);
  });
});
