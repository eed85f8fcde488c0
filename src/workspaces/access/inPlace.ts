import { type Asker, allowed, type Verdict } from '../permissions.ts';
import type { Configured } from './configured.ts';
import type { KnownPlaces } from './places.ts';

const silence: Verdict = { ok: false, silent: true, message: '' };
export const privately = (message: string): Verdict => ({ ok: false, silent: false, message });

export const denials = {
  person:
    'The settings of this bot name the people it answers, and you are not among them. The desk’s operator can add you.',
  channel: 'I do not answer in this channel. The desk’s operator can say where I do.',
  direct: 'I do not answer direct messages here. The desk’s operator can say where I do.',
  guest:
    'I answer members of this workspace, not its guests. The desk’s operator can name you as an exception.',
  others: 'People from outside can read this channel, so I do not answer here. Ask me in a direct message.',
  cannotTell: 'I cannot see yet who is listening here, so I do not answer for now. Ask again in a minute.',
  verb: 'That cannot be asked here. Write help for what can be asked.',
} as const;

/** Whether a person is answered at all in the place where they ask. */
export const answeredIn = (configured: Configured, places: KnownPlaces): ((asker: Asker) => Verdict) => {
  /** In a place where nobody else reads along it is enough to know the person. */
  const alone = (team: string, person: string): Verdict => {
    if (configured.namesPerson(person)) return allowed;
    const facts = places.person(team, person);
    if (facts === null) return privately(denials.cannotTell);
    if (facts.left) return silence;
    return facts.guest ? privately(denials.guest) : allowed;
  };

  /** Members of the workspace are told why; whoever is or may be from outside is told nothing. */
  const shut = (team: string, person: string): Verdict =>
    places.person(team, person)?.guest === false ? privately(denials.others) : silence;

  const amongOthers = (team: string, channel: string, person: string): Verdict => {
    if (configured.openToOthers(team, channel)) return allowed;
    const facts = places.channel(team, channel);
    if (facts === null || !facts.there) return privately(denials.cannotTell);
    if (facts.shared || facts.guests === true) return shut(team, person);
    if (facts.guests === null) return privately(denials.cannotTell);
    // whoever came in since the channel was looked at
    return places.person(team, person)?.guest === true ? silence : alone(team, person);
  };

  return (asker) => {
    const { team, channel, person } = asker.from;
    if (asker.place === 'terminal') return allowed;
    if (!configured.workspace(asker) || team === null || person === null) return silence;
    if (!configured.person(person)) return privately(denials.person);
    if (!configured.place(asker))
      return privately(asker.place === 'direct' ? denials.direct : denials.channel);
    return asker.place === 'channel' && channel !== null
      ? amongOthers(team, channel, person)
      : alone(team, person);
  };
};
