import type { Sent } from './deliveries.ts';
import { makeEvents, type Stage } from './events.ts';
import { described } from './methods/workplace.ts';
import { channelOf, type Place } from './people.ts';
import { type Channel, type Person, team } from './workspace.ts';

type Kind = Channel['kind'];

/** What becomes of channels and people, each with the events that the platform makes of it. */
export const makeHousekeeping = (stage: Stage) => {
  const { workspace } = stage.desk;
  const { told } = makeEvents(stage);
  const named = (kind: Kind, what: string): string => `${kind === 'public' ? 'channel' : 'group'}_${what}`;

  const changePerson = (id: string, change: Partial<Person>): readonly Sent[] => {
    const person = workspace.people.get(id);
    if (person === undefined) throw new Error(`nobody called ${id}`);
    const changed = { ...person, ...change };
    workspace.people.set(id, changed);
    return told({ type: 'user_change', user: described(changed) });
  };

  const archived = (id: string, value: boolean): readonly Sent[] => {
    const channel = channelOf(workspace, id);
    channel.archived = value;
    const type = named(channel.kind, value ? 'archive' : 'unarchive');
    return told({ type, channel: id, user: 'U0ADA' });
  };

  return {
    /** A person opens the app's home, or its messages. */
    openHome: (user = 'U0ADA', tab: 'home' | 'messages' = 'home'): readonly Sent[] =>
      told({ type: 'app_home_opened', user, channel: `D${user.slice(1)}`, tab }),

    archive: (id: string): readonly Sent[] => archived(id, true),
    unarchive: (id: string): readonly Sent[] => archived(id, false),

    /** With another company, an invitation to one, or no longer. The platform tells nothing of an invitation. */
    share: (id: string, shared: Channel['shared']): readonly Sent[] => {
      channelOf(workspace, id).shared = shared;
      if (shared === 'pending') return [];
      const type = shared === 'external' ? 'channel_shared' : 'channel_unshared';
      return told({ type, channel: id, connected_team_id: 'T0OTHERS' });
    },

    /** The channel goes on under another id; the old one means nothing any more. */
    changeId: (from: string, to: string): readonly Sent[] => {
      const channel = channelOf(workspace, from);
      workspace.channels.delete(from);
      workspace.channels.set(to, { ...channel, id: to });
      return told({ type: 'channel_id_changed', old_channel_id: from, new_channel_id: to });
    },

    join: (id: string, user: string): readonly Sent[] => {
      channelOf(workspace, id).members.add(user);
      return told({ type: 'member_joined_channel', channel: id, user, channel_type: 'C', team: team.id });
    },

    leave: (id: string, user: string): readonly Sent[] => {
      channelOf(workspace, id).members.delete(user);
      return told({ type: 'member_left_channel', channel: id, user, channel_type: 'C', team: team.id });
    },

    addPerson: (person: Partial<Person> & { readonly id: string }): void => {
      const seat = {
        name: person.id.toLowerCase(),
        zone: 'Europe/London',
        guest: 'no',
        deleted: false,
      } as const;
      workspace.people.set(person.id, { ...seat, ...person });
    },

    deactivate: (user: string): readonly Sent[] => changePerson(user, { deleted: true }),
    reactivate: (user: string): readonly Sent[] => changePerson(user, { deleted: false }),

    /** A person takes a pin off by hand. */
    takePinOff: ({ channel, ts }: Place, user = 'U0BEN'): readonly Sent[] => {
      const { pins } = channelOf(workspace, channel);
      pins.splice(pins.indexOf(ts), 1);
      const item = { type: 'message', channel, created_by: 'U0LEADSMAN', message: { type: 'message', ts } };
      return told({ type: 'pin_removed', user, channel_id: channel, item, has_pins: pins.length > 0 });
    },
  };
};
