import type { Clock } from '../../terms/clock.ts';
import { type Asker, allowed, type Born, type Permissions, type Verdict } from '../permissions.ts';
import { configuredBy, type PermissionSettings } from './configured.ts';
import { answeredIn, denials, privately } from './inPlace.ts';
import type { KnownPlaces } from './places.ts';
import { postingTo } from './postingTo.ts';
import { personalRate } from './rate.ts';

const counted = (count: number, what: string): string => `${count} ${what}${count === 1 ? '' : 's'}`;

/** What a desk’s settings and the state of the workspace allow. */
export const createPermissions = (
  settings: PermissionSettings,
  places: KnownPlaces,
  clock: Clock,
): Permissions => {
  const configured = configuredBy(settings, places.currentId);
  const secondsToWait = personalRate(clock, settings.questionsPerMinute);
  const inPlace = answeredIn(configured, places);

  const mayAsk = (asker: Asker, verb: string): Verdict => {
    const here = inPlace(asker);
    if (!here.ok) return here;
    return configured.verb(asker, verb) ? allowed : privately(denials.verb);
  };

  /** What was said in private is for whoever was there, and for whoever asked it. */
  const wasThere = ({ from }: Asker, { place, from: bornFrom }: Born): boolean => {
    const { team, channel } = bornFrom;
    if (place === 'terminal') return true;
    if (team === null || team !== from.team) return false;
    if (from.person === null) return false;
    if (bornFrom.person === from.person) return true;
    if (place !== 'channel' || channel === null) return false;
    if (from.channel !== null && places.currentId(team, from.channel) === places.currentId(team, channel))
      return true;
    const facts = places.channel(team, channel);
    // found out for the next time: an id that may not be read must not take longer than one that does not exist
    if (facts === null) void places.learnChannel(team, channel);
    return facts?.kind === 'public' || places.isMember(team, channel, from.person) === true;
  };

  return {
    learn: async ({ place, from: { team, channel, person } }) => {
      if (team === null || place === 'terminal') return;
      await Promise.all([
        person === null ? null : places.learnPerson(team, person),
        channel === null || place !== 'channel' || configured.openToOthers(team, channel)
          ? null
          : places.learnChannel(team, channel),
      ]);
    },
    admit: (asker) => {
      const here = inPlace(asker);
      if (!here.ok || asker.place === 'terminal') return here;
      const seconds = secondsToWait(`${asker.from.team} ${asker.from.person}`);
      if (seconds === 0) return allowed;
      const most = counted(settings.questionsPerMinute ?? 0, 'question');
      return privately(
        `That is more than ${most} within a minute, the most that one person is answered. Ask again in ${counted(seconds, 'second')}.`,
      );
    },
    mayAsk,
    mayRead: (asker, born) => mayAsk(asker, born.verb).ok && wasThere(asker, born),
    mayManage: (asker, { team, owner }) => {
      const { person } = asker.from;
      if (asker.place === 'terminal') return true;
      if (person === null || asker.from.team !== team || !inPlace(asker).ok) return false;
      return person === owner || configured.managesDigests(person);
    },
    placeVerdict: postingTo(configured, places),
  };
};
