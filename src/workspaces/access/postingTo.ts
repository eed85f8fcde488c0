import type { Asker, Permissions, PlaceVerdict } from '../permissions.ts';
import type { Configured } from './configured.ts';
import type { ChannelFacts, KnownPlaces } from './places.ts';

/** Whether a place may be posted to when nobody there is waiting for it. */
export const postingTo = (configured: Configured, places: KnownPlaces): Permissions['placeVerdict'] => {
  const channelVerdict = (facts: ChannelFacts | null, open: boolean): PlaceVerdict => {
    if (facts === null) return { kind: 'paused', why: 'restricted' };
    if (!facts.there) return { kind: 'paused', why: 'gone' };
    if (facts.archived) return { kind: 'paused', why: 'archived' };
    if (!facts.joined) return { kind: 'paused', why: 'notMember' };
    if (open) return { kind: 'fine' };
    if (facts.shared) return { kind: 'stopped', why: 'shared' };
    if (facts.guests === true) return { kind: 'stopped', why: 'guests' };
    return facts.guests === null ? { kind: 'paused', why: 'restricted' } : { kind: 'fine' };
  };

  const ownerVerdict = (team: string, owner: string, direct: boolean): PlaceVerdict => {
    const facts = places.person(team, owner);
    if (facts?.left === true) return { kind: 'paused', why: 'ownerLeft' };
    if (!configured.person(owner)) return { kind: 'paused', why: 'restricted' };
    if (!direct || configured.namesPerson(owner)) return { kind: 'fine' };
    if (facts === null) return { kind: 'paused', why: 'restricted' };
    return facts.guest ? { kind: 'stopped', why: 'guests' } : { kind: 'fine' };
  };

  return async (team, channel, owner) => {
    // a conversation with one person has an id of its own, or is named by the person
    const direct = /^[DUW]/.test(channel);
    await Promise.all([places.learnPerson(team, owner), direct ? null : places.learnChannel(team, channel)]);
    const asker: Asker = {
      place: direct ? 'direct' : 'channel',
      from: { team, channel, person: owner, message: null, thread: null },
    };
    if (!configured.workspace(asker) || !configured.place(asker))
      return { kind: 'paused', why: 'restricted' };
    const ofOwner = ownerVerdict(team, owner, direct);
    if (direct || ofOwner.kind !== 'fine') return ofOwner;
    return channelVerdict(places.channel(team, channel), configured.openToOthers(team, channel));
  };
};
