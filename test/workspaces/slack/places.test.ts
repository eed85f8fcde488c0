import { describe, expect, test } from 'vitest';
import type { PersonFacts } from '../../../src/workspaces/access/places.ts';
import { lookupsOver } from '../../../src/workspaces/slack/places/lookups.ts';
import { newsOf } from '../../../src/workspaces/slack/places/newsOf.ts';
import { learnLimitMs, makePlaces } from '../../../src/workspaces/slack/places/places.ts';
import { type Outcome, routed, type Wire } from '../../../src/workspaces/slack/wire.ts';
import { manualTime } from '../../doubles/time.ts';

const bot = 'U0BOT';
const minuteMs = 60_000;
const hourMs = 60 * minuteMs;

type Answer = Outcome | 'never';
const done = (body: Record<string, unknown>): Outcome => ({ kind: 'done', body, warnings: [] });
const refused = (code: string): Outcome => ({ kind: 'refused', code, details: [] });
const user = (id: string, more: object = {}) => ({ id, team_id: 'T1', deleted: false, ...more });

/** A platform of one channel with a few people; single answers can be put in place of its own. */
const setUp = (members: readonly string[] = ['U1ADA', bot]) => {
  const time = manualTime();
  const calls: string[] = [];
  const errors: string[] = [];
  const instead = new Map<string, Answer>();
  const channel = { id: 'C1', is_private: false, is_archived: false, is_member: true };
  const people = new Map<string, object>();
  const answer = (method: string, args: Record<string, unknown>): Outcome => {
    if (method === 'conversations.info') return done({ channel });
    if (method === 'users.list') return done({ members: members.map((id) => people.get(id) ?? user(id)) });
    if (method === 'users.info') {
      const id = String(args['user']);
      return done({ user: people.get(id) ?? user(id) });
    }
    return done({ members, response_metadata: { next_cursor: '' } });
  };
  const wire: Wire = {
    call: (method, args) => {
      const about = String(args['user'] ?? args['channel'] ?? '');
      calls.push(`${method} ${about}`.trim());
      const given = instead.get(`${method} ${about}`) ?? instead.get(method) ?? answer(method, args);
      return given === 'never' ? new Promise(() => {}) : Promise.resolve(given);
    },
  };
  const places = makePlaces(time, { info: () => {}, warn: () => {}, error: (words) => errors.push(words) });
  places.connect(lookupsOver(wire), bot);
  const hear = (event: object) => newsOf(event, 'T1', places, bot);
  const learn = () => places.learnChannel('T1', 'C1');
  const facts = () => places.channel('T1', 'C1');
  return { time, calls, errors, instead, channel, people, places, hear, learn, facts };
};

describe('a channel', () => {
  test('is unknown until it is looked up, and looked up once', async () => {
    const { learn, facts, calls } = setUp();
    expect(facts()).toBe(null);
    await Promise.all([learn(), learn()]);
    await learn();
    expect(facts()).toEqual({
      kind: 'public',
      there: true,
      archived: false,
      joined: true,
      shared: false,
      guests: false,
    });
    expect(calls).toEqual(['conversations.info C1', 'conversations.members C1', 'users.info U1ADA']);
  });

  test('is looked up anew after ten minutes, and serves for six hours where that fails', async () => {
    const { time, learn, facts, calls, instead } = setUp();
    await learn();
    time.advance(10 * minuteMs);
    await learn();
    expect(calls).toHaveLength(3);
    instead.set('conversations.info', { kind: 'unsure', reason: 'status 500' });
    time.advance(1);
    await learn();
    expect(calls).toHaveLength(4);
    expect(facts()?.guests).toBe(false);
    time.advance(6 * hourMs - 10 * minuteMs);
    expect(facts()).toBe(null);
  });

  test('that does not come is waited for so long, and not again for ten seconds', async () => {
    const { time, learn, facts, calls, instead } = setUp();
    instead.set('conversations.info', 'never');
    const first = learn();
    await time.timerSet(learnLimitMs);
    time.advance(learnLimitMs);
    await first;
    expect(facts()).toBe(null);
    expect(calls).toHaveLength(1);
  });

  test('whose look-up failed is not looked up again for ten seconds', async () => {
    const { time, learn, calls, instead } = setUp();
    instead.set('conversations.info', refused('missing_scope'));
    await learn();
    await learn();
    expect(calls).toHaveLength(1);
    time.advance(10_000);
    await learn();
    expect(calls).toHaveLength(2);
  });

  test.each([
    ['shared with another company', { is_ext_shared: true }],
    ['about to be', { is_pending_ext_shared: true }],
  ])('%s is known to be without asking who is in it', async (_, more) => {
    const { learn, facts, calls, channel } = setUp();
    Object.assign(channel, more);
    await learn();
    expect(facts()).toMatchObject({ shared: true });
    expect(calls).toEqual(['conversations.info C1']);
  });

  test('that does not exist for the bot is known to be gone', async () => {
    const { learn, facts, instead } = setUp();
    instead.set('conversations.info', refused('channel_not_found'));
    await learn();
    expect(facts()).toMatchObject({ there: false, joined: false });
  });

  test('whose people the platform does not list is not known', async () => {
    const { learn, facts, instead } = setUp();
    instead.set('conversations.members', refused('missing_scope'));
    await learn();
    expect(facts()).toBe(null);
  });

  test.each([
    ['a guest', { is_restricted: true }],
    ['a guest of one channel', { is_ultra_restricted: true }],
    ['a stranger', { is_stranger: true }],
    ['somebody of another workspace', { team_id: 'T9' }],
  ])('with %s in it has guests', async (_, more) => {
    const { learn, facts, people } = setUp(['U1ADA', 'U1GUS', bot]);
    people.set('U1GUS', user('U1GUS', more));
    await learn();
    expect(facts()?.guests).toBe(true);
  });

  test('with people of the same organisation has no guests until one of them becomes one', async () => {
    const { learn, facts, people, hear } = setUp(['U1ADA', 'U1ELSE', bot]);
    people.set('U1ELSE', user('U1ELSE', { team_id: 'T9', enterprise_user: { id: 'W1' } }));
    await learn();
    expect(facts()?.guests).toBe(false);
    hear({ type: 'user_change', user: user('U1ELSE', { is_restricted: true }) });
    expect(facts()?.guests).toBe(true);
  });

  test('with somebody whom the workspace does not know has guests', async () => {
    const { learn, facts, instead } = setUp(['U1ADA', 'U1ELSE', bot]);
    instead.set('users.info U1ELSE', refused('user_not_found'));
    await learn();
    expect(facts()?.guests).toBe(true);
  });

  test('some of whose people are unknown is not taken for free of guests, and they are looked for again', async () => {
    const { time, learn, facts, instead } = setUp(['U1ADA', 'U1BEN', bot]);
    instead.set('users.info U1BEN', { kind: 'limited', retryAfterMs: 30_000 });
    await learn();
    expect(facts()?.guests).toBe(null);
    instead.delete('users.info U1BEN');
    time.advance(10_000);
    await learn();
    expect(facts()?.guests).toBe(false);
  });

  test('of many people is looked at in one list of the whole workspace', async () => {
    const many = Array.from({ length: 60 }, (_, index) => `U1${index}`);
    const { learn, facts, calls } = setUp([...many, bot]);
    await learn();
    expect(facts()?.guests).toBe(false);
    expect(calls).toEqual(['conversations.info C1', 'conversations.members C1', 'users.list']);
  });

  test('knows its members, and the bot is not counted among its people', async () => {
    const { learn, places } = setUp();
    expect(places.isMember('T1', 'C1', 'U1ADA')).toBe(null);
    await learn();
    expect(places.isMember('T1', 'C1', 'U1ADA')).toBe(true);
    expect(places.isMember('T1', 'C1', 'U1BEN')).toBe(false);
  });
});

describe('news', () => {
  test.each([
    { type: 'channel_archive', channel: 'C1', user: 'U1' },
    { type: 'group_unarchive', channel: 'C1', user: 'U1' },
    { type: 'channel_rename', channel: { id: 'C1', name: 'new' } },
    { type: 'channel_shared', channel: 'C1' },
    { type: 'member_joined_channel', channel: 'C1', user: 'U1' },
    { type: 'member_left_channel', channel: 'C1', user: bot },
  ])('$type makes what is known of the channel unknown', async (event) => {
    const { learn, facts, hear } = setUp();
    await learn();
    expect(hear(event)).toEqual({ kind: 'channelChanged', team: 'T1', channel: 'C1' });
    expect(facts()).toBe(null);
  });

  test('of a new id is followed, through several, and a channel that comes back to an old one is found', async () => {
    const { places, hear, learn, facts } = setUp();
    const move = (from: string, to: string) =>
      hear({ type: 'channel_id_changed', old_channel_id: from, new_channel_id: to });
    expect(move('C9', 'C5')).toEqual({ kind: 'channelMoved', team: 'T1', from: 'C9', to: 'C5' });
    move('C5', 'C1');
    await learn();
    expect(places.channel('T1', 'C9')).toEqual(facts());
    expect(places.currentId('T1', 'C9')).toBe('C1');
    expect(places.currentId('T2', 'C9')).toBe('C9');
    move('C1', 'C9');
    expect(['C9', 'C5', 'C1'].map((id) => places.currentId('T1', id))).toEqual(['C9', 'C9', 'C9']);
  });

  test('of a person is known at once', () => {
    const { places, hear } = setUp();
    const left: PersonFacts = { left: true, guest: false };
    expect(hear({ type: 'user_change', user: user('U1ADA', { deleted: true }) })).toEqual({
      kind: 'personChanged',
      team: 'T1',
      person: 'U1ADA',
    });
    expect(places.person('T1', 'U1ADA')).toEqual(left);
  });

  test('of a pin is news only where a person took it off', () => {
    const { hear } = setUp();
    const pin = { type: 'pin_removed', channel_id: 'C1', item: { type: 'message', message: { ts: '2.5' } } };
    expect(hear({ ...pin, user: 'U1ADA' })).toEqual({
      kind: 'pinRemoved',
      team: 'T1',
      channel: 'C1',
      ts: '2.5',
    });
    expect(hear({ ...pin, user: bot })).toBe(null);
  });

  test('in no known form is no news', () => {
    expect(setUp().hear({ type: 'channel_archive' })).toBe(null);
  });
});

test('calls about a channel reach it under its new id; others are left as they are', async () => {
  const { places, hear } = setUp();
  hear({ type: 'channel_id_changed', old_channel_id: 'C8', new_channel_id: 'C1' });
  const calls: unknown[] = [];
  const straight: Wire = {
    call: async (method, args) => {
      calls.push([method, args]);
      return done({});
    },
  };
  const wire = routed(straight, (channel) => places.currentId('T1', channel));
  await wire.call('chat.postMessage', { channel: 'C8', text: 'one' });
  await wire.call('pins.add', { channel: 'C7', timestamp: '1.5' });
  await wire.call('users.info', { user: 'C8' });
  expect(calls).toEqual([
    ['chat.postMessage', { channel: 'C1', text: 'one' }],
    ['pins.add', { channel: 'C7', timestamp: '1.5' }],
    ['users.info', { user: 'C8' }],
  ]);
});
