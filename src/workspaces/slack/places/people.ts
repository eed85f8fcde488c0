import type { PersonFacts } from '../../access/places.ts';
import type { Time } from '../ports.ts';
import type { Lookups } from './known.ts';
import { remembered } from './remembered.ts';

const hourMs = 3_600_000;
/** The platform tells of people who change, so that they are asked about seldom. */
const ages = { freshMs: 12 * hourMs, usableMs: 48 * hourMs };

/** So many people are looked up at the same time. */
const atOnce = 8;
/** More unknown people than this are not looked up one by one: the list of the whole workspace is read. */
const mostOneByOne = 40;

/** What is known of the people of each workspace. */
export const makePeople = (time: Time, lookups: () => Lookups | null) => {
  const known = remembered<PersonFacts>(time, ages);
  const keyOf = (team: string, person: string): string => `${team} ${person}`;
  const get = (team: string, person: string): PersonFacts | null => known.get(keyOf(team, person));

  const learn = (team: string, person: string): Promise<void> =>
    known.learn(keyOf(team, person), async () => (await lookups()?.person(team, person)) ?? null);

  const learnEverybody = async (team: string): Promise<void> => {
    const roster = (await lookups()?.everybody(team)) ?? new Map<string, PersonFacts>();
    for (const [person, facts] of roster) known.set(keyOf(team, person), facts);
  };

  const unknown = (team: string, members: readonly string[]): readonly string[] =>
    members.filter((member) => get(team, member) === null);

  return {
    get,
    learn,
    change: (team: string, person: string, facts: PersonFacts): void => known.set(keyOf(team, person), facts),
    /** Until all are known or a guest is found among them; gives up where the platform does not say. */
    learnAll: async (team: string, members: readonly string[]): Promise<void> => {
      if (unknown(team, members).length > mostOneByOne) await learnEverybody(team);
      const left = unknown(team, members);
      for (let from = 0; from < left.length; from += atOnce) {
        const some = left.slice(from, from + atOnce);
        await Promise.all(some.map((member) => learn(team, member)));
        const facts = some.map((member) => get(team, member));
        if (facts.some((each) => each === null || each.guest)) return;
      }
    },
    /** null where no guest is known among them and not all are known. */
    guestsAmong: (team: string, members: readonly string[]): boolean | null => {
      const facts = members.map((member) => get(team, member));
      if (facts.some((each) => each?.guest === true)) return true;
      return facts.includes(null) ? null : false;
    },
  };
};
