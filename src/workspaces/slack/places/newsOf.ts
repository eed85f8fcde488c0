import { z } from 'zod';
import type { News } from '../../news.ts';
import type { Places } from './known.ts';
import { personFacts, personShape } from './lookups.ts';

export const channelEvents = [
  'channel_archive',
  'channel_unarchive',
  'channel_rename',
  'channel_deleted',
  'channel_shared',
  'channel_unshared',
  'group_archive',
  'group_unarchive',
  'group_rename',
  'group_deleted',
  'channel_id_changed',
  'member_joined_channel',
  'member_left_channel',
] as const;

/** Some events name the channel, some describe it. */
const aboutChannel = z.object({ channel: z.union([z.string(), z.object({ id: z.string() })]) });
const idChanged = z.object({
  type: z.literal('channel_id_changed'),
  old_channel_id: z.string(),
  new_channel_id: z.string(),
});
const userChanged = z.object({ type: z.literal('user_change'), user: personShape });
const pinRemoved = z.object({
  type: z.literal('pin_removed'),
  user: z.string(),
  channel_id: z.string(),
  item: z.object({ message: z.object({ ts: z.string() }) }),
});

/** What an event tells; null where it tells nothing that matters. What is known is put right first. */
export const newsOf = (event: unknown, team: string, places: Places, botUserId: string): News | null => {
  const moved = idChanged.safeParse(event);
  if (moved.success) {
    const { old_channel_id: from, new_channel_id: to } = moved.data;
    places.moved(team, from, to);
    return { kind: 'channelMoved', team, from, to };
  }
  const changed = userChanged.safeParse(event);
  if (changed.success) {
    const { user } = changed.data;
    places.changePerson(team, user.id, personFacts(user, team));
    return { kind: 'personChanged', team, person: user.id };
  }
  const pin = pinRemoved.safeParse(event);
  if (pin.success) {
    const { user, channel_id: channel, item } = pin.data;
    return user === botUserId ? null : { kind: 'pinRemoved', team, channel, ts: item.message.ts };
  }
  const about = aboutChannel.safeParse(event);
  if (!about.success) return null;
  const { channel: named } = about.data;
  const channel = typeof named === 'string' ? named : named.id;
  places.forgetChannel(team, channel);
  return { kind: 'channelChanged', team, channel };
};
