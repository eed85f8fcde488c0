import type { Asker } from '../permissions.ts';

/** What the desk's settings say. A list that names anything denies what it does not name; an empty one denies nothing. */
export type PermissionSettings = {
  readonly workspaces: readonly string[];
  /** Channel ids, and `direct` for direct messages. */
  readonly channels: readonly string[];
  readonly people: readonly string[];
  /** Verbs that can be asked in these channels only. */
  readonly verbs: Readonly<Record<string, readonly string[]>>;
  readonly sharedChannels: readonly string[];
  readonly digestManagers: readonly string[];
  readonly questionsPerMinute: number | null;
};

const direct = 'direct';

const permits = (named: readonly string[], one: string | null): boolean =>
  named.length === 0 || (one !== null && named.includes(one));

/** Settings read against the ids that channels have now: a channel that was given a new id keeps its permissions. */
export const configuredBy = (
  settings: PermissionSettings,
  currentId: (team: string, channel: string) => string,
) => {
  const among = (named: readonly string[], team: string | null, place: string | null): boolean => {
    if (named.length === 0) return true;
    if (place === null) return false;
    if (place === direct || team === null) return named.includes(place);
    const now = currentId(team, place);
    return named.some((one) => one === place || currentId(team, one) === now);
  };

  /** The word that stands for the asker's place among channels. */
  const placeOf = ({ place, from }: Asker): string | null => (place === 'direct' ? direct : from.channel);

  return {
    workspace: ({ from }: Asker): boolean => permits(settings.workspaces, from.team),
    person: (person: string | null): boolean => permits(settings.people, person),
    namesPerson: (person: string | null): boolean => person !== null && settings.people.includes(person),
    place: (asker: Asker): boolean => among(settings.channels, asker.from.team, placeOf(asker)),
    verb: (asker: Asker, verb: string): boolean => {
      const confined = Object.hasOwn(settings.verbs, verb) ? settings.verbs[verb] : undefined;
      return (
        confined === undefined || (confined.length > 0 && among(confined, asker.from.team, placeOf(asker)))
      );
    },
    /** Whether it is answered although others than the desk can read along. */
    openToOthers: (team: string, channel: string): boolean =>
      settings.sharedChannels.length > 0 && among(settings.sharedChannels, team, channel),
    managesDigests: (person: string): boolean => {
      const { workspaces, channels, people, verbs, sharedChannels, digestManagers } = settings;
      const lists = [workspaces, channels, people, sharedChannels, digestManagers, Object.keys(verbs)];
      return lists.every((list) => list.length === 0) || digestManagers.includes(person);
    },
  };
};

export type Configured = ReturnType<typeof configuredBy>;
