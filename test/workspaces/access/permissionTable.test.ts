/** Who × where × verb, asked of the conversation itself: a row that is answered is answered by every part of the bot. */
import { beforeAll, describe, expect, test } from 'vitest';
import { succeed } from '../../../src/terms/result.ts';
import type { PermissionSettings } from '../../../src/workspaces/access/configured.ts';
import { createPermissions } from '../../../src/workspaces/access/createPermissions.ts';
import type { Asking, Converse } from '../../../src/workspaces/conversation.ts';
import { createConverse } from '../../../src/workspaces/converse.ts';
import type { DeskRecords } from '../../../src/workspaces/records/ports.ts';
import { seriesOf, wobbling } from '../../answers/madeSeries.ts';
import { recordsInMemory } from '../../doubles/records.ts';
import { deskOn, morningMs, snapshotOf } from '../madeDesk.ts';
import { knownPlaces, nothingNamed } from './knownPlaces.ts';

const places = knownPlaces({
  channels: {
    C1DESK: {},
    C1RISK: { kind: 'private' },
    C1CLUB: { kind: 'private' },
    C1FUND: { shared: true },
    C1OPEN: { shared: true },
    C1HALL: { guests: true },
    C1FOYER: { guests: true },
    C1BIG: { guests: null },
    C1GONE: { there: false },
    C1NEW: {},
  },
  people: { U1ADA: {}, U1BEN: {}, U1GUS: { guest: true }, U1VIP: { guest: true }, U1OLD: { left: true } },
  members: { C1RISK: ['U1ADA'], C1CLUB: ['U1ADA', 'U1BEN'] },
  moved: { C1BEFORE: 'C1NEW' },
});

const open: PermissionSettings = { ...nothingNamed, sharedChannels: ['C1OPEN', 'C1FOYER'] };
const confined: PermissionSettings = {
  ...open,
  verbs: { tail: ['C1RISK'], feed: [], shape: ['direct'], claim: ['C1BEFORE'] },
};
const named: PermissionSettings = {
  ...nothingNamed,
  workspaces: ['T1DESK'],
  channels: ['C1DESK', 'C1BEFORE', 'C1FUND', 'direct'],
  people: ['U1ADA', 'U1VIP'],
};
const channelsOnly: PermissionSettings = { ...nothingNamed, channels: ['C1DESK'] };

type Outcome = 'answered' | 'silence' | 'told privately';
type Row = readonly [
  settings: 'open' | 'confined' | 'named' | 'channelsOnly',
  person: string,
  where: string,
  verb: string,
  outcome: Outcome,
  says?: string,
];

const settingsNamed = { open, confined, named, channelsOnly };

const others = 'People from outside can read this channel';
const cannotTell = 'I cannot see yet who is listening';
const notHere = 'That cannot be asked here.';

/** `direct` and `command CHANNEL` are other places than the channel itself. */
const rows: readonly Row[] = [
  // nothing is named but channels open to others: members everywhere, guests and others nowhere
  ['open', 'U1ADA', 'C1DESK', 'interval', 'answered'],
  ['open', 'U1BEN', 'C1RISK', 'tail', 'answered'],
  ['open', 'U1ADA', 'direct', 'shape', 'answered'],
  ['open', 'U1ADA', 'command C1FUND', 'claim', 'answered'],
  ['open', 'U1ADA', 'command C1HALL', 'interval', 'answered'],
  ['open', 'U1ADA', 'C1FUND', 'interval', 'told privately', others],
  ['open', 'U1ADA', 'C1FUND', 'help', 'told privately', others],
  ['open', 'U1GUS', 'C1FUND', 'interval', 'silence'],
  ['open', 'U1NOBODY', 'C1FUND', 'interval', 'silence'],
  ['open', 'U1ADA', 'C1HALL', 'interval', 'told privately', others],
  ['open', 'U1GUS', 'C1HALL', 'interval', 'silence'],
  ['open', 'U1ADA', 'C1OPEN', 'interval', 'answered'],
  ['open', 'U1NOBODY', 'C1OPEN', 'interval', 'answered'],
  ['open', 'U1GUS', 'C1FOYER', 'tail', 'answered'],
  ['open', 'U1GUS', 'direct', 'interval', 'told privately', 'not its guests'],
  ['open', 'U1GUS', 'command C1DESK', 'interval', 'told privately', 'not its guests'],
  ['open', 'U1NOBODY', 'direct', 'interval', 'told privately', cannotTell],
  ['open', 'U1OLD', 'direct', 'interval', 'silence'],
  ['open', 'U1ADA', 'C1BIG', 'interval', 'told privately', cannotTell],
  ['open', 'U1ADA', 'C1UNKNOWN', 'interval', 'told privately', cannotTell],
  ['open', 'U1ADA', 'C1GONE', 'interval', 'told privately', cannotTell],
  ['open', 'U1ADA', 'C1UNKNOWN', 'records', 'told privately', cannotTell],
  // verbs confined to channels
  ['confined', 'U1ADA', 'C1RISK', 'tail', 'answered'],
  ['confined', 'U1ADA', 'C1DESK', 'tail', 'told privately', notHere],
  ['confined', 'U1ADA', 'direct', 'tail', 'told privately', notHere],
  ['confined', 'U1ADA', 'command C1DESK', 'tail', 'told privately', notHere],
  ['confined', 'U1ADA', 'command C1RISK', 'tail', 'answered'],
  ['confined', 'U1ADA', 'C1DESK', 'interval', 'answered'],
  ['confined', 'U1ADA', 'C1DESK', 'feed', 'told privately', notHere],
  ['confined', 'U1ADA', 'direct', 'feed', 'told privately', notHere],
  ['confined', 'U1ADA', 'direct', 'shape', 'answered'],
  ['confined', 'U1ADA', 'C1RISK', 'shape', 'told privately', notHere],
  ['confined', 'U1ADA', 'C1NEW', 'claim', 'answered'],
  ['confined', 'U1ADA', 'C1RISK', 'claim', 'told privately', notHere],
  ['confined', 'U1ADA', 'C1OPEN', 'tail', 'told privately', notHere],
  ['confined', 'U1GUS', 'C1HALL', 'tail', 'silence'],
  // workspaces, channels and people named: whatever is not named is denied
  ['named', 'U1ADA', 'C1DESK', 'interval', 'answered'],
  ['named', 'U1ADA', 'direct', 'interval', 'answered'],
  ['named', 'U1ADA', 'C1NEW', 'interval', 'answered'],
  ['named', 'U1ADA', 'C1RISK', 'interval', 'told privately', 'I do not answer in this channel'],
  ['named', 'U1ADA', 'command C1RISK', 'help', 'told privately', 'I do not answer in this channel'],
  ['named', 'U1ADA', 'C1FUND', 'interval', 'told privately', others],
  ['named', 'U1BEN', 'C1DESK', 'interval', 'told privately', 'you are not among them'],
  ['named', 'U1BEN', 'direct', 'help', 'told privately', 'you are not among them'],
  ['named', 'U1VIP', 'direct', 'interval', 'answered'],
  ['named', 'U1VIP', 'command C1DESK', 'interval', 'answered'],
  ['named', 'U1ADA of T1OTHER', 'C1DESK', 'interval', 'silence'],
  ['named', 'U1ADA of T1OTHER', 'direct', 'help', 'silence'],
  ['channelsOnly', 'U1BEN', 'C1DESK', 'interval', 'answered'],
  ['channelsOnly', 'U1BEN', 'direct', 'interval', 'told privately', 'I do not answer direct messages'],
  [
    'channelsOnly',
    'U1BEN',
    'command C1RISK',
    'interval',
    'told privately',
    'I do not answer in this channel',
  ],
];

const questionOf: Readonly<Record<string, string>> = {
  interval: 'interval KELP 60d',
  tail: 'tail KELP 250d',
  shape: 'shape KELP 250d',
  claim: 'claim KELP 20bp 60d',
  records: 'records KELP',
  feed: 'feed',
  help: 'help',
};

const live = succeed(snapshotOf([seriesOf('KELP', wobbling(300))]));
let records: DeskRecords;
beforeAll(async () => {
  records = await recordsInMemory();
});

const converseUnder = (settings: PermissionSettings): Converse =>
  createConverse(
    deskOn(records, () => live, {
      permissions: createPermissions(settings, places, { nowMs: () => morningMs }),
    }),
  );

const putBy = (who: string, where: string): Pick<Asking, 'place' | 'from'> => {
  const [person = '', team = 'T1DESK'] = who.split(' of ');
  const from = { team, person, message: '1.5', thread: null };
  if (where === 'direct') return { place: 'direct', from: { ...from, channel: `D${person}` } };
  const [first = '', typedIn] = where.split(' ');
  return typedIn === undefined
    ? { place: 'channel', from: { ...from, channel: first } }
    : { place: 'command', from: { ...from, channel: typedIn } };
};

describe('who may ask what where', () => {
  test('is a table of at least forty rows', () => expect(rows.length).toBeGreaterThanOrEqual(40));

  const whole = rows.map(([settings, person, where, verb, outcome, says = '']) => {
    const asked = [settings, person, where, verb] as const;
    return [...asked, outcome, says] as const;
  });

  test.each(whole)('%s: %s in %s asks %s and is %s', async (settings, person, where, verb, outcome, says) => {
    const text = questionOf[verb] ?? verb;
    const spoken = await converseUnder(settingsNamed[settings]).ask({ text, ...putBy(person, where) });
    const [first] = spoken;
    if (outcome === 'silence') expect(spoken).toEqual([]);
    else if (outcome === 'answered') expect(first?.reply.kind).not.toBe('refusal');
    else {
      expect(first?.outcome).toMatchObject({ ok: false, problem: { code: 'notPermitted' } });
      expect(first?.reply.sentence).toContain(says);
    }
  });

  test('a line that may be asked is answered beside one that may not', async () => {
    const spoken = await converseUnder(confined).ask({
      text: 'interval KELP 60d\ntail KELP 250d',
      ...putBy('U1ADA', 'C1DESK'),
    });
    expect(spoken.map(({ reply }) => reply.kind)).toEqual(['answer', 'refusal']);
  });
});

describe('a record', () => {
  const askedBy = async (converse: Converse, text: string, who: string, where: string) => {
    const [spoken] = await converse.ask({ text, ...putBy(who, where) });
    if (spoken?.outcome?.ok !== true) throw new Error(spoken?.reply.sentence ?? 'nothing was said');
    return spoken.outcome.value[0].id;
  };
  const again = async (converse: Converse, id: string, who: string, where: string) => {
    const [spoken] = await converse.ask({ text: `again ${id}`, ...putBy(who, where) });
    return spoken?.reply;
  };
  /** What is said of an id that was never given, with the id in question put in its place. */
  const asUnknown = async (converse: Converse, id: string, who: string, where: string) => {
    const reply = await again(converse, 'R-0000000000', who, where);
    return JSON.parse(JSON.stringify(reply).replaceAll('R-0000000000', id));
  };

  const readings: readonly (readonly [string, string, string, string, string, boolean])[] = [
    // question, asked by, asked in, read by, read in, readable
    ['tail KELP 251d', 'U1ADA', 'C1RISK', 'U1ADA', 'C1RISK', true],
    ['tail KELP 252d', 'U1ADA', 'C1RISK', 'U1ADA', 'C1DESK', false],
    ['tail KELP 253d', 'U1ADA', 'C1RISK', 'U1ADA', 'direct', false],
    ['tail KELP 254d', 'U1ADA', 'C1RISK', 'U1BEN', 'C1DESK', false],
    ['tail KELP 255d', 'U1ADA', 'C1RISK', 'U1BEN', 'C1RISK', true],
    ['interval KELP 61d', 'U1ADA', 'C1DESK', 'U1BEN', 'C1CLUB', true],
    ['interval KELP 62d', 'U1ADA', 'direct', 'U1BEN', 'C1DESK', false],
    ['interval KELP 63d', 'U1ADA', 'direct', 'U1ADA', 'C1DESK', true],
    ['interval KELP 64d', 'U1ADA', 'command C1DESK', 'U1BEN', 'C1DESK', false],
    ['interval KELP 65d', 'U1ADA', 'C1RISK', 'U1BEN', 'C1DESK', false],
    ['interval KELP 66d', 'U1ADA', 'C1RISK', 'U1ADA', 'C1DESK', true],
    ['interval KELP 67d', 'U1ADA', 'C1CLUB', 'U1BEN', 'C1DESK', true],
    ['interval KELP 68d', 'U1ADA', 'C1BEFORE', 'U1BEN', 'C1NEW', true],
    ['claim KELP 21bp 60d', 'U1ADA', 'C1NEW', 'U1ADA', 'C1BEFORE', true],
  ];

  test.each(readings)('%s by %s in %s, read by %s in %s: %s', async (text, by, born, who, where, may) => {
    const converse = converseUnder(confined);
    const id = await askedBy(converse, text, by, born);
    const reply = await again(converse, id, who, where);
    if (may) expect(reply?.kind).toBe('record');
    else expect(reply).toEqual(await asUnknown(converse, id, who, where));
  });

  test.each(readings)(
    'its listing: %s by %s in %s, for %s in %s: %s',
    async (text, by, born, who, where, may) => {
      const converse = converseUnder(confined);
      const id = await askedBy(converse, text, by, born);
      const [listed] = await converse.ask({ text: 'records KELP', ...putBy(who, where) });
      const lines = listed?.reply.passages.flatMap((passage) => passage.lines) ?? [];
      expect(lines.some((line) => line.includes(id))).toBe(may);
    },
  );

  test.each(readings)(
    'its button: %s by %s in %s, pressed by %s in %s: %s',
    async (text, by, born, who, where, may) => {
      const converse = converseUnder(confined);
      const id = await askedBy(converse, text, by, born);
      const pressedOn = async (answerId: string) => {
        const [spoken] = await converse.press({
          action: 'working',
          answerId,
          question: text,
          ...putBy(who, where),
        });
        return spoken?.reply;
      };
      const reply = await pressedOn(id);
      if (may) expect(reply?.kind).toBe('working');
      else {
        const unknown = JSON.stringify(await pressedOn('R-0000000000')).replaceAll('R-0000000000', id);
        expect(reply).toEqual(JSON.parse(unknown));
      }
    },
  );

  test('that is not kept is not worked out anew under a button where its verb may not be asked', async () => {
    const converse = createConverse(
      deskOn({ ...records, keeps: false }, () => live, {
        permissions: createPermissions(confined, places, { nowMs: () => morningMs }),
      }),
    );
    const codeIn = async (where: string) => {
      const pressed = { action: 'working', answerId: 'R-0000000000', question: 'tail KELP 60d' } as const;
      const [spoken] = await converse.press({ ...pressed, ...putBy('U1ADA', where) });
      return spoken?.outcome?.ok === false ? spoken.outcome.problem.code : spoken?.reply.kind;
    };
    expect(await codeIn('C1DESK')).toBe('unknownRecord');
    expect(await codeIn('C1RISK')).not.toBe('unknownRecord');
  });

  test('that may not be read costs the store as many look-ups as one that does not exist', async () => {
    const counted: string[] = [];
    const store = {
      ...records.store,
      find: (id: string) => {
        counted.push(id);
        return records.store.find(id);
      },
    };
    const converse = createConverse(
      deskOn({ ...records, store }, () => live, {
        permissions: createPermissions(confined, places, { nowMs: () => morningMs }),
      }),
    );
    const id = await askedBy(converse, 'tail KELP 260d', 'U1ADA', 'C1RISK');
    await again(converse, id, 'U1BEN', 'C1DESK');
    await again(converse, 'R-0000000000', 'U1BEN', 'C1DESK');
    expect(counted).toEqual([id, 'R-0000000000']);
  });
});
