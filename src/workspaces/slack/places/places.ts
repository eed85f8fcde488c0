import type { ChannelFacts } from '../../access/places.ts';
import { inWords } from '../log.ts';
import type { Logger, Time } from '../ports.ts';
import { atMost } from '../wait.ts';
import { idChanges } from './idChanges.ts';
import type { Lookups, Places } from './known.ts';
import { makePeople } from './people.ts';
import { remembered } from './remembered.ts';

const minuteMs = 60_000;
const ages = { freshMs: 10 * minuteMs, usableMs: 6 * 60 * minuteMs };

/** How long somebody waits for a look-up; it goes on behind their back. */
export const learnLimitMs = 3_000;

/** `members`, without the bot: null where they do not matter, since the channel alone says enough. */
type Known = {
  readonly facts: Omit<ChannelFacts, 'guests'>;
  readonly members: readonly string[] | null;
};

/** What is known of the workspace’s channels and people, kept in memory. */
export const makePlaces = (time: Time, log: Logger): Places => {
  let lookups: Lookups | null = null;
  let self = '';
  const channels = remembered<Known>(time, ages);
  const people = makePeople(time, () => lookups);
  const ids = idChanges();
  const keyOf = (team: string, channel: string): string => `${team} ${channel}`;

  const find = async (channel: string): Promise<Known | null> => {
    const facts = (await lookups?.channel(channel)) ?? null;
    if (facts === null || lookups === null) return null;
    if (!facts.there || facts.shared || facts.kind === 'direct') return { facts, members: null };
    const members = await lookups.members(channel);
    return members === null ? null : { facts, members: members.filter((member) => member !== self) };
  };

  /** Where some of its people are still unknown they are looked for again, though the channel itself is fresh. */
  const learn = async (team: string, channel: string): Promise<void> => {
    const key = keyOf(team, channel);
    await channels.learn(key, () => find(channel));
    await people.learnAll(team, channels.get(key)?.members ?? []);
  };

  const inTime = (work: Promise<void>): Promise<void> =>
    atMost(
      time,
      learnLimitMs,
      work.catch((error: unknown) => log.error(`A look-up failed: ${inWords(error)}`)),
    );

  const knownOf = (team: string, channel: string): Known | null =>
    channels.get(keyOf(team, ids.current(team, channel)));

  return {
    channel: (team, channel) => {
      const known = knownOf(team, channel);
      return known === null
        ? null
        : { ...known.facts, guests: people.guestsAmong(team, known.members ?? []) };
    },
    person: people.get,
    isMember: (team, channel, person) => knownOf(team, channel)?.members?.includes(person) ?? null,
    learnChannel: (team, channel) => inTime(learn(team, ids.current(team, channel))),
    learnPerson: (team, person) => inTime(people.learn(team, person)),
    currentId: ids.current,
    connect: (found, botUserId) => {
      lookups = found;
      self = botUserId;
    },
    forgetChannel: (team, channel) => channels.forget(keyOf(team, channel)),
    changePerson: people.change,
    moved: (team, from, to) => {
      ids.note(team, from, to);
      channels.forget(keyOf(team, from));
      channels.forget(keyOf(team, to));
    },
  };
};
