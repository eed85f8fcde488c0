import { describe, expect, test } from 'vitest';
import type { PermissionSettings } from '../../../src/workspaces/access/configured.ts';
import { createPermissions } from '../../../src/workspaces/access/createPermissions.ts';
import type { PlaceVerdict } from '../../../src/workspaces/permissions.ts';
import { knownPlaces, nothingNamed } from './knownPlaces.ts';

const places = knownPlaces({
  channels: {
    C1DESK: {},
    C1OLD: { archived: true },
    C1GONE: { there: false },
    C1LEFT: { joined: false },
    C1FUND: { shared: true },
    C1HALL: { guests: true },
    C1BIG: { guests: null },
  },
  people: { U1ADA: {}, U1BEN: {}, U1GUS: { guest: true }, U1OLD: { left: true } },
});

const permissionsUnder = (more: Partial<PermissionSettings>, nowMs = () => 0) =>
  createPermissions({ ...nothingNamed, ...more }, places, { nowMs });

const inChannel = (person: string, channel = 'C1DESK', team = 'T1') => ({
  place: 'channel',
  from: { team, channel, person, message: '1.5', thread: null },
});

describe('before a post that nobody waits for', () => {
  const paused = (why: Extract<PlaceVerdict, { kind: 'paused' }>['why']): PlaceVerdict => ({
    kind: 'paused',
    why,
  });
  const stopped = (why: 'shared' | 'guests'): PlaceVerdict => ({ kind: 'stopped', why });
  const fine: PlaceVerdict = { kind: 'fine' };
  const rows: readonly (readonly [Partial<PermissionSettings>, string, string, PlaceVerdict])[] = [
    [{}, 'C1DESK', 'U1ADA', fine],
    [{}, 'C1OLD', 'U1ADA', paused('archived')],
    [{}, 'C1GONE', 'U1ADA', paused('gone')],
    [{}, 'C1LEFT', 'U1ADA', paused('notMember')],
    [{}, 'C1UNKNOWN', 'U1ADA', paused('restricted')],
    [{}, 'C1BIG', 'U1ADA', paused('restricted')],
    [{}, 'C1FUND', 'U1ADA', stopped('shared')],
    [{}, 'C1HALL', 'U1ADA', stopped('guests')],
    [{ sharedChannels: ['C1FUND'] }, 'C1FUND', 'U1ADA', fine],
    [{ sharedChannels: ['C1FUND'] }, 'C1HALL', 'U1ADA', stopped('guests')],
    [{}, 'C1DESK', 'U1OLD', paused('ownerLeft')],
    [{}, 'DU1OLD', 'U1OLD', paused('ownerLeft')],
    [{}, 'DU1ADA', 'U1ADA', fine],
    [{}, 'DU1GUS', 'U1GUS', stopped('guests')],
    [{ people: ['U1GUS'] }, 'DU1GUS', 'U1GUS', fine],
    [{ people: ['U1BEN'] }, 'C1DESK', 'U1ADA', paused('restricted')],
    [{ channels: ['C1OTHER'] }, 'C1DESK', 'U1ADA', paused('restricted')],
    [{ channels: ['C1DESK'] }, 'DU1ADA', 'U1ADA', paused('restricted')],
    [{ channels: ['direct'] }, 'DU1ADA', 'U1ADA', fine],
    [{ workspaces: ['T9'] }, 'C1DESK', 'U1ADA', paused('restricted')],
  ];

  test.each(rows)('%j: %s for %s is %j', async (settings, channel, owner, verdict) => {
    expect(await permissionsUnder(settings).placeVerdict('T1', channel, owner)).toEqual(verdict);
  });

  test('the place and its owner are looked up', async () => {
    const own = knownPlaces({});
    await createPermissions(nothingNamed, own, { nowMs: () => 0 }).placeVerdict('T1', 'C1', 'U1');
    expect([...own.learned].sort()).toEqual(['C1', 'U1']);
  });
});

describe('the digest of somebody else', () => {
  const digest = { team: 'T1', channel: 'C1DESK', owner: 'U1BEN' };
  test.each<readonly [Partial<PermissionSettings>, string, string, boolean]>([
    [{}, 'U1ADA', 'T1', true],
    [{ workspaces: ['T1'] }, 'U1ADA', 'T1', false],
    [{ channels: ['C1DESK'] }, 'U1ADA', 'T1', false],
    [{ people: ['U1ADA', 'U1BEN'] }, 'U1ADA', 'T1', false],
    [{ verbs: { tail: ['C1DESK'] } }, 'U1ADA', 'T1', false],
    [{ sharedChannels: ['C1FUND'] }, 'U1ADA', 'T1', false],
    [{ digestManagers: ['U1GUS'] }, 'U1ADA', 'T1', false],
    [{ digestManagers: ['U1ADA'] }, 'U1ADA', 'T1', true],
    [{ people: ['U1ADA'] }, 'U1BEN', 'T1', false],
    [{ workspaces: ['T1'] }, 'U1BEN', 'T1', true],
    [{}, 'U1BEN', 'T2', false],
  ])('under %j is managed by %s of %s: %s', (settings, person, team, may) => {
    const asker = inChannel(person, 'C1DESK', team);
    expect(permissionsUnder(settings).mayManage(asker, digest)).toBe(may);
  });
});

describe('the rate of one person', () => {
  test('lets so many in a minute, says when the next one is, and counts everybody apart', () => {
    let nowMs = 0;
    const { admit } = permissionsUnder({ questionsPerMinute: 2 }, () => nowMs);
    const ask = (person: string, team = 'T1') => {
      const verdict = admit(inChannel(person, 'C1DESK', team));
      return verdict.ok ? 'in' : verdict.message.replace(/^.*\. /, '');
    };
    expect(ask('U1ADA')).toBe('in');
    nowMs = 20_000;
    expect(ask('U1ADA')).toBe('in');
    nowMs = 30_500;
    expect(ask('U1ADA')).toBe('Ask again in 30 seconds.');
    expect(ask('U1BEN')).toBe('in');
    nowMs = 59_999;
    expect(ask('U1ADA')).toBe('Ask again in 1 second.');
    nowMs = 60_000;
    expect(ask('U1ADA')).toBe('in');
    expect(ask('U1ADA')).toBe('Ask again in 20 seconds.');
    nowMs = 200_000;
    expect([ask('U1ADA'), ask('U1ADA'), ask('U1ADA')]).toEqual(['in', 'in', 'Ask again in 60 seconds.']);
  });

  test('is said privately, with how many are answered', () => {
    const { admit } = permissionsUnder({ questionsPerMinute: 1 });
    admit(inChannel('U1ADA'));
    expect(admit(inChannel('U1ADA'))).toMatchObject({
      ok: false,
      silent: false,
      message: expect.stringContaining('more than 1 question within a minute'),
    });
  });

  test('does not count who is not let in', () => {
    const { admit } = permissionsUnder({ questionsPerMinute: 1, people: ['U1ADA'] });
    for (let count = 0; count < 5; count += 1)
      expect(admit(inChannel('U1BEN'))).toMatchObject({ message: expect.stringContaining('not among them') });
  });
});
